import 'server-only';
import { createHash, randomBytes } from 'node:crypto';
import { DrizzleMySQLAdapter } from '@lucia-auth/adapter-drizzle';
import { and, eq, lte, or } from 'drizzle-orm';
import { Lucia, TimeSpan } from 'lucia';
import { db } from '@/db/connection';
import { membershipRoles, memberships, sessions, teams, users } from '@/db/schema';
import type { Role } from '@/lib/shared/permissions';
import type { Member } from './member';

/**
 * Sessions, by Lucia made safe: the cookie holds a random token, the database only its SHA-256, and a session has an
 * idle end and an absolute one. Nothing else in the project knows Lucia.
 */

export const SESSION_COOKIE = '__Host-stillroom';
const IDLE_HOURS = 8;
const ABSOLUTE_DAYS = 7;
/** The idle end is written at most this often. */
const TOUCH_MS = 5 * 60_000;
const HOUR_MS = 3_600_000;

const adapter = new DrizzleMySQLAdapter(db, sessions, users);

interface SessionAttributes {
  teamId: string;
  endsAt: Date;
}

const lucia = new Lucia<SessionAttributes, { name: string }>(adapter, {
  sessionExpiresIn: new TimeSpan(IDLE_HOURS, 'h'),
  getSessionAttributes: (row) => ({ teamId: row.teamId, endsAt: row.endsAt }),
  getUserAttributes: (row) => ({ name: row.name }),
});

declare module 'lucia' {
  interface Register {
    Lucia: typeof lucia;
    DatabaseSessionAttributes: SessionAttributes;
    DatabaseUserAttributes: { name: string };
  }
}

const hashOf = (token: string) => createHash('sha256').update(token).digest('hex');

/** Starts a session of a person in a house. @returns the token for the cookie, 256 bits, stored nowhere. */
export async function startSession(userId: string, teamId: string): Promise<string> {
  const token = randomBytes(32).toString('base64url');
  const endsAt = new Date(Date.now() + ABSOLUTE_DAYS * 24 * HOUR_MS);
  await lucia.createSession(userId, { teamId, endsAt }, { sessionId: hashOf(token) });
  return token;
}

/** Ends the session of this token, at once. */
export async function endSession(token: string): Promise<void> {
  await lucia.invalidateSession(hashOf(token));
}

/** Deletes sessions past their idle or absolute end. */
export async function sweepSessions(): Promise<void> {
  const now = new Date();
  await db.delete(sessions).where(or(lte(sessions.expiresAt, now), lte(sessions.endsAt, now)));
}

/** The member behind a token, or null: unknown, ended, or no longer a member of the house. */
export async function memberOfToken(token: string): Promise<Member | null> {
  const id = hashOf(token);
  const { session, user } = await lucia.validateSession(id);
  if (!session) return null;
  if (session.endsAt.getTime() <= Date.now()) {
    await lucia.invalidateSession(id);
    return null;
  }
  await touch(id, session.expiresAt);
  return findMember(user.id, user.name, session.teamId);
}

/** Moves the idle end on, so that eight idle hours end a session, counted from the last request. */
async function touch(id: string, expiresAt: Date): Promise<void> {
  const next = new Date(Date.now() + IDLE_HOURS * HOUR_MS);
  if (next.getTime() - expiresAt.getTime() > TOUCH_MS) await adapter.updateSessionExpiration(id, next);
}

/** Roles are read with every request, so that a change holds on the next one. */
async function findMember(userId: string, userName: string, teamId: string): Promise<Member | null> {
  const rows = await db
    .select({ teamName: teams.name, isDemo: teams.isDemo, currency: teams.currency, role: membershipRoles.role })
    .from(memberships)
    .innerJoin(teams, eq(teams.id, memberships.teamId))
    .innerJoin(
      membershipRoles,
      and(eq(membershipRoles.teamId, memberships.teamId), eq(membershipRoles.userId, memberships.userId)),
    )
    .where(and(eq(memberships.teamId, teamId), eq(memberships.userId, userId)));
  const first = rows[0];
  if (!first) return null;
  const { teamName, isDemo, currency } = first;
  return { teamId, teamName, isDemo, currency, userId, userName, roles: rows.map((row) => row.role as Role) };
}
