import { eq, sql } from 'drizzle-orm';
import { beforeEach, describe, expect, it } from 'vitest';
import { teams } from '@/db/schema';
import { DatabaseBusy, type Transaction, transaction, waitMs } from '@/db/transaction';
import { db, makeTeam } from '../support/database';

const nameOf = async (id: string) => (await db.select().from(teams).where(eq(teams.id, id)))[0]?.name;
const rename = (tx: Transaction, id: string, name: string) => tx.update(teams).set({ name }).where(eq(teams.id, id));

describe('a transaction', () => {
  let first: { id: string };
  let second: { id: string };
  beforeEach(async () => {
    first = await makeTeam();
    second = await makeTeam();
  });

  it('leaves nothing behind when its work throws', async () => {
    const work = transaction(async (tx) => {
      await rename(tx, first.id, 'half');
      throw new Error('changed my mind');
    });
    await expect(work).rejects.toThrow('changed my mind');
    expect(await nameOf(first.id)).toBe('House of Trials');
  });

  it('ends both of two deadlocked transactions whole', async () => {
    const bothHoldOne = barrier(2);
    const cross = (from: { id: string }, to: { id: string }, name: string) =>
      transaction(async (tx) => {
        await rename(tx, from.id, name);
        await bothHoldOne();
        await rename(tx, to.id, name);
      });
    await Promise.all([cross(first, second, 'rose'), cross(second, first, 'iris')]);
    expect(await nameOf(first.id)).toBe(await nameOf(second.id));
    expect(['rose', 'iris']).toContain(await nameOf(first.id));
  });

  it('loses no update when two read a row and then write it', async () => {
    const bothHaveRead = barrier(2);
    const append = (letter: string) =>
      transaction(async (tx) => {
        const [row] = await tx.select().from(teams).where(eq(teams.id, first.id));
        await bothHaveRead();
        await rename(tx, first.id, `${row?.name}${letter}`);
      });
    await Promise.all([append('a'), append('b')]);
    expect(await nameOf(first.id)).toMatch(/^House of Trials(ab|ba)$/);
  });

  it('gives up after five retries, in its own words, with nothing written', async () => {
    let tries = 0;
    const work = transaction(async (tx) => {
      tries++;
      await rename(tx, first.id, 'half');
      await tx.execute(sql`signal sqlstate '40001' set mysql_errno = 1213, message_text = 'a deadlock'`);
    });
    await expect(work).rejects.toThrow(DatabaseBusy);
    expect(tries).toBe(6);
    expect(await nameOf(first.id)).toBe('House of Trials');
  });

  it('tries nothing again that would fail again', async () => {
    let tries = 0;
    const work = transaction(async (tx) => {
      tries++;
      await tx.insert(teams).values({ id: first.id, name: 'twice', currency: 'EUR' });
    });
    await expect(work).rejects.toThrow();
    expect(tries).toBe(1);
  });
});

describe('the wait between retries', () => {
  it('lies between 20 and 500 ms, whatever chance says', () => {
    for (let retry = 0; retry < 10; retry++) {
      expect(waitMs(retry, 0)).toBe(20);
      expect(waitMs(retry, 0.999999)).toBeLessThanOrEqual(500);
    }
    expect(waitMs(9, 1)).toBe(500);
  });
});

/** Lets nobody on until so many have arrived; later arrivals, as in a retry, go straight through. */
function barrier(count: number) {
  let arrived = 0;
  let open = () => {};
  const opened = new Promise<void>((resolve) => {
    open = resolve;
  });
  return () => {
    if (++arrived >= count) open();
    return opened;
  };
}
