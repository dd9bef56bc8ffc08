import { eq } from 'drizzle-orm';
import { afterEach, expect, it, vi } from 'vitest';
import { idempotencyKeys, suppliers } from '@/db/schema';
import { answerOnce, sweepIdempotencyKeys } from '@/lib/api/idempotency';
import type { Member } from '@/lib/auth/member';
import { newId } from '@/lib/id';
import { log } from '@/lib/log';
import { db, makeMember, makeTeam } from '../../support/database';

afterEach(() => {
  vi.useRealTimers();
});

const claim = (ctx: Member, key: string, request = '/api/v1/suppliers {}') => ({
  ctx,
  operation: 'suppliers.create',
  key,
  request,
  status: 201,
});

function addSupplier(ctx: Member) {
  return async () => {
    const id = newId();
    await db.insert(suppliers).values({ teamId: ctx.teamId, id, name: `Supplier ${id}` });
    return { id };
  };
}

it('gives fifty repeats at once one row and one answer', async () => {
  const ctx = await makeMember(await makeTeam(), 'buyer');
  const answers = await Promise.all(Array.from({ length: 50 }, () => answerOnce(claim(ctx, 'same'), addSupplier(ctx))));
  expect(new Set(answers.map((a) => JSON.stringify(a))).size).toBe(1);
  expect(await db.select().from(suppliers).where(eq(suppliers.teamId, ctx.teamId))).toHaveLength(1);
});

it('refuses the key with another body, and keeps the keys of two people apart', async () => {
  const team = await makeTeam();
  const [one, two] = [await makeMember(team, 'buyer'), await makeMember(team, 'owner')];
  const first = await answerOnce(claim(one, 'k'), addSupplier(one));
  await expect(answerOnce(claim(one, 'k', '/api/v1/suppliers {"a":1}'), addSupplier(one))).rejects.toThrow(
    'another address or body',
  );
  const second = await answerOnce(claim(two, 'k'), addSupplier(two));
  expect(second.answer).not.toEqual(first.answer);
});

it('frees the key when the work fails', async () => {
  const ctx = await makeMember(await makeTeam(), 'buyer');
  const fails = async () => {
    throw new Error('no power');
  };
  await expect(answerOnce(claim(ctx, 'again'), fails)).rejects.toThrow('no power');
  expect((await answerOnce(claim(ctx, 'again'), addSupplier(ctx))).status).toBe(201);
});

it('asks for a key, by name', async () => {
  const ctx = await makeMember(await makeTeam(), 'buyer');
  await expect(answerOnce({ ...claim(ctx, ''), key: null }, addSupplier(ctx))).rejects.toThrow('Idempotency-Key');
});

it('lets no slow work lose its key to a repeat, or answer for one that took it over', async () => {
  const ctx = await makeMember(await makeTeam(), 'buyer');
  vi.useFakeTimers({ toFake: ['Date'] });
  let finish = (_: unknown) => {};
  const work = new Promise((resolve) => {
    finish = resolve;
  });
  const slow = answerOnce(claim(ctx, 'slow'), () => work);
  await vi.waitFor(async () => expect(await keysOf(ctx)).toHaveLength(1));
  pass(5);
  await expect(impatient(answerOnce(claim(ctx, 'slow'), addSupplier(ctx)))).rejects.toThrow('still at work');
  pass(6);
  const second = await answerOnce(claim(ctx, 'slow'), addSupplier(ctx));
  finish({ id: 'of the first' });
  await slow;
  expect(await answerOnce(claim(ctx, 'slow'), addSupplier(ctx))).toEqual(second);
});

it('does nothing twice when the answer could not be stored', async () => {
  const ctx = await makeMember(await makeTeam(), 'buyer');
  vi.useFakeTimers({ toFake: ['Date'] });
  const told = vi.spyOn(log, 'error').mockImplementation(() => {});
  const unstorable = async () => ({ ...(await addSupplier(ctx)()), digits: 1n }); // JSON has no such number
  await answerOnce(claim(ctx, 'lost'), unstorable);
  expect(told).toHaveBeenCalled();
  await expect(impatient(answerOnce(claim(ctx, 'lost'), addSupplier(ctx)))).rejects.toThrow('still at work');
  expect(await db.select().from(suppliers).where(eq(suppliers.teamId, ctx.teamId))).toHaveLength(1);
});

const pass = (minutes: number) => vi.setSystemTime(Date.now() + minutes * 60_000);

/** Waits no real seconds: the clock jumps past the end of the wait once the repeat waits. */
async function impatient<T>(repeat: Promise<T>): Promise<T> {
  setTimeout(() => vi.setSystemTime(Date.now() + 11_000), 300);
  return repeat;
}

it('forgets a key after a day', async () => {
  const ctx = await makeMember(await makeTeam(), 'buyer');
  await answerOnce(claim(ctx, 'old'), addSupplier(ctx));
  await sweepIdempotencyKeys();
  expect(await keysOf(ctx)).toHaveLength(1);
  const dayAgo = new Date(Date.now() - 25 * 3_600_000);
  await db.update(idempotencyKeys).set({ createdAt: dayAgo }).where(eq(idempotencyKeys.userId, ctx.userId));
  await sweepIdempotencyKeys();
  expect(await keysOf(ctx)).toEqual([]);
});

const keysOf = (ctx: Member) => db.select().from(idempotencyKeys).where(eq(idempotencyKeys.userId, ctx.userId));
