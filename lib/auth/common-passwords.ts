import 'server-only';
import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import path from 'node:path';

/**
 * Leaked passwords of 15 characters and more, as the first eight bytes of their SHA-256, sorted.
 *
 * Made by lib/auth/build-common-passwords.ts from a list of the million most frequent ones. A chance hit of another
 * password on eight bytes is less likely than one in 10^15.
 */
const BYTES = 8;
let prefixes: Buffer | undefined;

export const COMMON_PASSWORDS_FILE = path.join(process.cwd(), 'lib/auth/common-passwords.bin');

/** Whether the password is on the shipped list, in the letter case of the list. */
export function isCommonPassword(password: string): boolean {
  prefixes ??= readFileSync(COMMON_PASSWORDS_FILE);
  const wanted = passwordPrefix(password);
  let low = 0;
  let high = prefixes.length / BYTES - 1;
  while (low <= high) {
    const middle = (low + high) >> 1;
    const order = prefixes.compare(wanted, 0, BYTES, middle * BYTES, middle * BYTES + BYTES);
    if (order === 0) return true;
    if (order < 0) low = middle + 1;
    else high = middle - 1;
  }
  return false;
}

export const passwordPrefix = (password: string): Buffer =>
  createHash('sha256').update(password).digest().subarray(0, BYTES);
