import 'server-only';
import { createHash } from 'node:crypto';
import { lt, sql } from 'drizzle-orm';
import { db } from '@/db/connection';
import { attempts } from '@/db/schema';
import { TooMany } from '@/lib/errors';

const WINDOW_MS = 3_600_000;

/**
 * Counts one try of this kind for this subject, in the database, so that all instances count together.
 *
 * @param kind what is tried, such as `sign-in`; @param subject whose, such as the address; @param most per hour.
 * @throws TooMany when the hour's tries are used up; the seconds until the next hour begins are in it.
 */
export async function countAttempt(kind: string, subject: string, most: number): Promise<void> {
  const key = createHash('sha256').update(`${kind}\n${subject}`).digest('hex');
  const now = Date.now();
  const windowStart = new Date(now - (now % WINDOW_MS));
  // LAST_INSERT_ID carries this try's own number back, whatever others count at the same moment; 0 is the first.
  const [{ insertId }] = await db
    .insert(attempts)
    .values({ key, windowStart, count: 1 })
    .onDuplicateKeyUpdate({ set: { count: sql`last_insert_id(${attempts.count} + 1)` } });
  const count = Math.max(1, insertId);
  if (count > most) {
    const waitS = Math.ceil((windowStart.getTime() + WINDOW_MS - now) / 1000);
    throw new TooMany(`Too many tries. Wait ${Math.ceil(waitS / 60)} minutes and try again.`, waitS);
  }
}

/** Deletes the counts of hours gone by. */
export async function sweepAttempts(): Promise<void> {
  await db.delete(attempts).where(lt(attempts.windowStart, new Date(Date.now() - WINDOW_MS)));
}
