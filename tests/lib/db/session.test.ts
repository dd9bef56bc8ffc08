import { eq } from 'drizzle-orm';
import { afterEach, expect, it, vi } from 'vitest';
import { membershipRoles, memberships, sessions } from '@/db/schema';
import { endSession, memberOfToken, startSession, sweepSessions } from '@/lib/auth/session';
import { db, makeMember, makeTeam } from '../../support/database';

const HOUR_MS = 3_600_000;
const START = new Date('2026-12-01T08:00:00Z').getTime();

afterEach(() => {
  vi.useRealTimers();
});

async function signedIn() {
  const team = await makeTeam();
  const member = await makeMember(team, 'perfumer', 'buyer');
  vi.useFakeTimers({ toFake: ['Date'], now: START });
  return { team, member, token: await startSession(member.userId, team.id) };
}

const at = (hours: number, seconds = 0) => vi.setSystemTime(START + hours * HOUR_MS + seconds * 1000);

it('knows the member by the token, with all roles held', async () => {
  const { member, token } = await signedIn();
  const found = await memberOfToken(token);
  expect(found).toMatchObject({ userId: member.userId, teamId: member.teamId });
  expect([...(found?.roles ?? [])].sort()).toEqual(['buyer', 'perfumer']);
});

it('stores nothing that signs anyone in', async () => {
  const { member, token } = await signedIn();
  const [row] = await db.select().from(sessions).where(eq(sessions.userId, member.userId));
  expect(JSON.stringify(row)).not.toContain(token);
  expect(await memberOfToken(row?.id ?? '')).toBeNull();
  expect(await memberOfToken(`${token} `)).toBeNull();
});

it('ends after eight idle hours, to the second', async () => {
  const first = await signedIn();
  at(8, -1);
  expect(await memberOfToken(first.token)).not.toBeNull();
  vi.useRealTimers();
  const second = await signedIn();
  at(8, 1);
  expect(await memberOfToken(second.token)).toBeNull();
});

it('counts the idle hours from the last request', async () => {
  const { token } = await signedIn();
  for (const hour of [3, 10, 17, 24]) {
    at(hour);
    expect(await memberOfToken(token)).not.toBeNull();
  }
  at(24 + 8, 1);
  expect(await memberOfToken(token)).toBeNull();
});

it('ends after seven days however much it is used, to the second', async () => {
  const { token } = await signedIn();
  for (let hour = 7; hour < 168; hour += 7) {
    at(hour);
    expect(await memberOfToken(token)).not.toBeNull();
  }
  at(168, -1);
  expect(await memberOfToken(token)).not.toBeNull();
  at(168, 1);
  expect(await memberOfToken(token)).toBeNull();
});

it('holds signing out, a removed membership and a changed role on the next request', async () => {
  const { team, member, token } = await signedIn();
  await db.delete(membershipRoles).where(eq(membershipRoles.role, 'buyer'));
  expect((await memberOfToken(token))?.roles).toEqual(['perfumer']);
  await db.delete(memberships).where(eq(memberships.userId, member.userId));
  expect(await memberOfToken(token)).toBeNull();
  const other = await makeMember(team, 'student');
  const second = await startSession(other.userId, team.id);
  await endSession(second);
  expect(await memberOfToken(second)).toBeNull();
});

it('sweeps away what has ended', async () => {
  const { member } = await signedIn();
  at(9);
  await sweepSessions();
  expect(await db.select().from(sessions).where(eq(sessions.userId, member.userId))).toEqual([]);
});
