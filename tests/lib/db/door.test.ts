import { eq } from 'drizzle-orm';
import { beforeEach, expect, it, vi } from 'vitest';
import { demoSignIn, signIn, signOut, signUp } from '@/app/(door)/actions';
import { attempts, sessions, teams, users } from '@/db/schema';
import { memberOfToken, SESSION_COOKIE, startSession } from '@/lib/auth/session';
import { newId } from '@/lib/id';
import { db, makeMember, makeTeam } from '../../support/database';

/* The actions of the door, as a browser or a stranger calls them. */

const browser = vi.hoisted(() => ({
  headers: {} as Record<string, string>,
  cookies: new Map<string, { value: string; options?: Record<string, unknown> }>(),
}));
vi.mock('next/headers', () => ({
  headers: async () => new Headers(browser.headers),
  cookies: async () => ({
    get: (name: string) => browser.cookies.get(name),
    set: (name: string, value: string, options: Record<string, unknown>) =>
      browser.cookies.set(name, { value, options }),
    delete: ({ name }: { name: string }) => browser.cookies.delete(name),
  }),
}));
vi.mock('next/navigation', () => ({
  redirect: (to: string) => {
    throw new Error(`to ${to}`);
  },
}));

const OWN = { 'sec-fetch-site': 'same-origin' };
const PHRASE = 'an iris under seven lamps';
const NOTHING = { errors: {}, values: {} };

beforeEach(() => {
  browser.headers = OWN;
  browser.cookies.clear();
});

function form(fields: Record<string, string>): FormData {
  const filled = new FormData();
  for (const [name, value] of Object.entries(fields)) filled.set(name, value);
  return filled;
}

const house = (email = `${newId()}@house.example`) => ({
  ...{ houseName: 'House of Quiet Moss', name: 'Ilse Varn', email, password: PHRASE, currency: 'EUR' },
  begin: 'facets',
});

const cookie = () => browser.cookies.get(SESSION_COOKIE);

it('gives a cookie that scripts can’t read, that goes nowhere else, and that ends with the browser', async () => {
  await expect(signUp(NOTHING, form(house()))).rejects.toThrow('to /materials');
  expect(SESSION_COOKIE).toMatch(/^__Host-/);
  expect(cookie()?.options).toEqual({ httpOnly: true, secure: true, sameSite: 'lax', path: '/' });
  expect(Buffer.from(cookie()?.value ?? '', 'base64url')).toHaveLength(32);
});

it('takes no session that somebody put into the browser, and ends the one that was there', async () => {
  const input = house();
  await expect(signUp(NOTHING, form(input))).rejects.toThrow('to /materials');
  const first = cookie()?.value ?? '';
  await expect(signIn(NOTHING, form({ email: input.email, password: PHRASE }))).rejects.toThrow('to /materials');
  const second = cookie()?.value ?? '';
  expect(second).not.toBe(first);
  expect(await memberOfToken(first)).toBeNull();
  expect(await memberOfToken(second)).toMatchObject({ userName: 'Ilse Varn' });
  const stranger = 'x'.repeat(43);
  browser.cookies.set(SESSION_COOKIE, { value: stranger });
  await expect(signIn(NOTHING, form({ email: input.email, password: PHRASE }))).rejects.toThrow('to /materials');
  expect(cookie()?.value).not.toBe(stranger);
  expect(await memberOfToken(stranger)).toBeNull();
});

it('keeps the session that is there when signing in fails', async () => {
  const member = await makeMember(await makeTeam(), 'perfumer');
  const token = await startSession(member.userId, member.teamId);
  browser.cookies.set(SESSION_COOKIE, { value: token });
  const state = await signIn(NOTHING, form({ email: `${newId()}@house.example`, password: PHRASE }));
  expect(state.errors).toHaveProperty('password');
  expect(await memberOfToken(token)).not.toBeNull();
});

it('ends the session on the server when a person signs out', async () => {
  const member = await makeMember(await makeTeam(), 'perfumer');
  const token = await startSession(member.userId, member.teamId);
  browser.cookies.set(SESSION_COOKIE, { value: token });
  await expect(signOut()).rejects.toThrow('to /sign-in');
  expect(cookie()).toBeUndefined();
  expect(await memberOfToken(token)).toBeNull();
});

it.each([
  {},
  { 'sec-fetch-site': 'cross-site' },
  { 'sec-fetch-site': 'same-site' },
  { 'sec-fetch-site': 'none' },
  { origin: 'https://elsewhere.example', host: 'stillroom.example' },
  { origin: 'https://elsewhere.example', host: 'stillroom.example', 'x-forwarded-host': 'elsewhere.example' },
  { origin: 'null' },
])('does nothing for a request that comes with %j', async (headers) => {
  const member = await makeMember(await makeTeam({ isDemo: true }), 'student');
  const token = await startSession(member.userId, member.teamId);
  browser.cookies.set(SESSION_COOKIE, { value: token });
  browser.headers = headers as Record<string, string>;
  const input = house();
  for (const act of [
    () => signUp(NOTHING, form(input)),
    () => signIn(NOTHING, form(input)),
    () => demoSignIn(form({ role: 'student' })),
    () => signOut(),
  ])
    await expect(act()).rejects.toThrow('own pages');
  expect(cookie()?.value).toBe(token);
  expect(await memberOfToken(token)).not.toBeNull();
  expect(await db.select().from(users).where(eq(users.email, input.email))).toEqual([]);
  expect(await db.select().from(sessions).where(eq(sessions.userId, member.userId))).toHaveLength(1);
});

it('takes no key but those of the form, and never sends a password back', async () => {
  for (const extra of ['role', 'teamId', 'isDemo', '__proto__', 'constructor']) {
    const state = await signUp(NOTHING, form({ ...house(), [extra]: 'owner' }));
    expect(Object.keys(state.errors).length, extra).toBeGreaterThan(0);
    expect(JSON.stringify(state)).not.toContain(PHRASE);
  }
  expect(({} as Record<string, unknown>).owner).toBeUndefined();
});

it('opens no role of the demo house that there isn’t', async () => {
  for (const role of ['', 'admin', '__proto__', 'owner,perfumer'])
    await expect(demoSignIn(form({ role }))).rejects.not.toThrow('to /materials');
  expect(cookie()).toBeUndefined();
});

it('counts the houses that are opened for one address, before it does any work', async () => {
  const input = house();
  const states = [];
  for (let time = 0; time < 14; time++) {
    browser.cookies.clear();
    states.push(await signUp(NOTHING, form(input)).catch((error: Error) => ({ errors: { done: error.message } })));
  }
  expect(states.at(0)?.errors).toEqual({ done: 'to /materials' });
  expect(states.at(5)?.errors).toHaveProperty('email');
  expect(states.at(-1)?.errors).toEqual({ form: expect.stringContaining('Too many tries') });
});

it('counts the houses that are opened on the whole server', async () => {
  const before = await db.select().from(teams);
  // As though three hundred had been opened this hour: the key is a hash, so every count is raised.
  await db.update(attempts).set({ count: 300 });
  const state = await signUp(NOTHING, form(house()));
  expect(state.errors).toEqual({ form: expect.stringContaining('Too many tries') });
  expect(await db.select().from(teams)).toHaveLength(before.length);
  await db.delete(attempts);
});
