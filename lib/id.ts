import 'server-only';
import { randomBytes } from 'node:crypto';

const DIGITS = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';

/**
 * A new id: 48 bits of milliseconds, then 80 random bits, in 26 characters of Crockford's base 32.
 *
 * Ids sort by the time they were made, need no counter in the database, and are safe on a multi-writer cluster.
 */
export function newId(nowMs: number = Date.now()): string {
  let value = (BigInt(nowMs) << 80n) | BigInt(`0x${randomBytes(10).toString('hex')}`);
  let id = '';
  for (let i = 0; i < 26; i++) {
    id = DIGITS[Number(value & 31n)] + id;
    value >>= 5n;
  }
  return id;
}
