import { eq } from 'drizzle-orm';
import { expect, it } from 'vitest';
import { suppliers } from '@/db/schema';
import { answerOnce } from '@/lib/api/idempotency';
import type { Member } from '@/lib/auth/member';
import { newId } from '@/lib/id';
import { db, makeMember, makeTeam } from '../../support/database';

const claim = (ctx: Member, key: string, text = '{}') => ({
  ctx,
  operation: 'suppliers.create',
  key,
  text,
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
  await expect(answerOnce(claim(one, 'k', '{"a":1}'), addSupplier(one))).rejects.toThrow('another body');
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
