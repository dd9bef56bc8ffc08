import { eq } from 'drizzle-orm';
import { expect, it } from 'vitest';
import { facets, materials, memberships, offers, users } from '@/db/schema';
import { memberOfToken } from '@/lib/auth/session';
import { Invalid, TooMany } from '@/lib/errors';
import { newId } from '@/lib/id';
import { signIn, signInAsDemo, signUp } from '@/lib/people/commands';
import { signUpInput } from '@/lib/shared/people-input';
import { db, makeMember, makeTeam } from '../../support/database';

const PHRASE = 'an iris under seven lamps';

const house = (email = `${newId()}@house.example`) => ({
  houseName: 'House of Quiet Moss',
  name: 'Ilse Varn',
  email,
  password: PHRASE,
  currency: 'EUR' as const,
  begin: 'facets' as const,
});

async function faultOf(work: Promise<unknown>): Promise<Record<string, string>> {
  const error = await work.then(
    () => null,
    (cause: unknown) => cause,
  );
  expect(error).toBeInstanceOf(Invalid);
  return (error as Invalid).fields;
}

it('makes a house and its owner, signed in, and lets the owner in again', async () => {
  const input = house();
  const owner = await memberOfToken(await signUp(input));
  expect(owner).toMatchObject({ teamName: 'House of Quiet Moss', userName: 'Ilse Varn', roles: ['owner'] });
  const again = await memberOfToken(await signIn(input));
  expect(again?.teamId).toBe(owner?.teamId);
});

it('begins with the words and limits alone, or with the sample library priced in the currency of the house', async () => {
  const empty = await memberOfToken(await signUp(house()));
  const full = await memberOfToken(await signUp({ ...house(), begin: 'sample', currency: 'SEK' }));
  const count = async (table: typeof facets | typeof materials | typeof offers, teamId = '') =>
    (await db.select({ teamId: table.teamId }).from(table).where(eq(table.teamId, teamId))).length;
  expect(await count(facets, empty?.teamId)).toBeGreaterThan(40);
  expect(await count(materials, empty?.teamId)).toBe(0);
  expect(await count(materials, full?.teamId)).toBeGreaterThan(180);
  const prices = await db
    .select()
    .from(offers)
    .where(eq(offers.teamId, full?.teamId ?? ''));
  expect(new Set(prices.map((offer) => offer.currency))).toEqual(new Set(['SEK']));
});

it('leaves nothing behind when the address is taken', async () => {
  const input = house();
  await signUp(input);
  const before = await db.select().from(memberships);
  expect(await faultOf(signUp(input))).toHaveProperty('email');
  expect(await db.select().from(memberships)).toHaveLength(before.length);
});

it('answers a wrong password and an unknown address in the same words', async () => {
  const input = house();
  await signUp(input);
  const wrong = await faultOf(signIn({ email: input.email, password: 'an iris under six lamps' }));
  const unknown = await faultOf(signIn({ email: `${newId()}@house.example`, password: PHRASE }));
  expect(wrong).toEqual(unknown);
});

it('compares addresses exactly', async () => {
  const input = house();
  await signUp(input);
  await faultOf(signIn({ email: input.email.toUpperCase(), password: PHRASE }));
  const [row] = await db.select().from(users).where(eq(users.email, input.email));
  expect(row?.passwordHash).toContain('argon2id');
});

it('refuses a short password before it makes anything', async () => {
  expect(await faultOf(signUp({ ...house(), password: 'short' }))).toEqual({
    password: expect.stringContaining('at least 15 characters'),
  });
});

it('takes no key that the form does not have', () => {
  expect(signUpInput.safeParse({ ...house(), role: 'owner', teamId: newId() }).success).toBe(false);
});

it('stops counting guesses at a hundred an hour', async () => {
  const { countAttempt } = await import('@/lib/auth/attempts');
  const subject = newId();
  const tries = await Promise.allSettled(Array.from({ length: 120 }, () => countAttempt('sign-in', subject, 100)));
  expect(tries.filter((t) => t.status === 'fulfilled')).toHaveLength(100);
  for (const t of tries) if (t.status === 'rejected') expect(t.reason).toBeInstanceOf(TooMany);
});

it('signs in a demo person by role, and only while there is a demo house', async () => {
  await expect(signInAsDemo('student')).rejects.toThrow();
  const demo = await makeTeam({ isDemo: true, name: 'Demo' });
  const student = await makeMember(demo, 'student');
  expect((await memberOfToken(await signInAsDemo('student')))?.userId).toBe(student.userId);
});
