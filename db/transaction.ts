import { setTimeout as sleep } from 'node:timers/promises';
import { db } from './connection';
import { errnoOf } from './database-error';

export type Transaction = Parameters<Parameters<typeof db.transaction>[0]>[0];

/** A deadlock, a lock that took too long, a row that another transaction changed after we had read it. */
const RETRIED = new Set([1213, 1205, 1020]);
const RETRIES = 5;
const SHORTEST_WAIT_MS = 20;
const LONGEST_WAIT_MS = 500;

/** The rows were fought over through every retry. Nothing was written; the person may try again. */
export class DatabaseBusy extends Error {
  override name = 'DatabaseBusy';
}

/**
 * Does the work in one transaction: all of it or none.
 *
 * When it loses against another transaction it is rolled back first and then done again from the beginning, at most
 * five times, so `work` must have no effect outside the database. Every other error ends it at once.
 *
 * @throws DatabaseBusy when the last retry lost too.
 */
export async function transaction<T>(work: (tx: Transaction) => Promise<T>): Promise<T> {
  for (let retry = 0; ; retry++) {
    try {
      return await db.transaction(work); // has rolled back by the time it throws
    } catch (error) {
      if (!RETRIED.has(errnoOf(error) ?? 0)) throw error;
      if (retry === RETRIES) throw new DatabaseBusy('These rows are being changed by others.', { cause: error });
      await sleep(waitMs(retry, Math.random()));
    }
  }
}

/** Full jitter: anywhere between the shortest wait and a ceiling that doubles, so that two losers part ways. */
export function waitMs(retry: number, chance: number): number {
  const ceiling = Math.min(LONGEST_WAIT_MS, SHORTEST_WAIT_MS * 2 ** (retry + 1));
  return SHORTEST_WAIT_MS + chance * (ceiling - SHORTEST_WAIT_MS);
}
