import 'server-only';
import { and, eq } from 'drizzle-orm';
import { db } from '@/db/connection';
import { ERRNO, errnoOf } from '@/db/database-error';
import { membershipRoles, memberships, teams, users } from '@/db/schema';
import { transaction } from '@/db/transaction';
import { countAttempt } from '@/lib/auth/attempts';
import { hashPassword, passwordFault, verifyPassword } from '@/lib/auth/password';
import { startSession } from '@/lib/auth/session';
import { Invalid, NotFound } from '@/lib/errors';
import { newId } from '@/lib/id';
import { loadLibrary } from '@/lib/library/load-library';
import type { SignUpInput } from '@/lib/shared/people-input';
import { ROLES, type Role } from '@/lib/shared/permissions';

/** In an hour of the clock, so that no sixty minutes in a row hold more than a hundred. */
const SIGN_IN_TRIES = 50;
/**
 * Opening a house costs a password's hash and hundreds of rows, and tells whether an address is taken: without mail
 * there is no other way to say why nothing was opened. So it is counted, for each address and for the whole server;
 * the addresses of senders can't be trusted behind an unknown proxy.
 */
const SIGN_UP_TRIES = 10;
const SIGN_UPS_OF_ALL = 300;
/** Anyone may look around the demo house, and each look is a row. */
const DEMO_SIGN_INS = 3000;

/**
 * Makes a house and its owner, with the facets, limits and, if wanted, the materials of the sample library.
 *
 * @returns the token of the new session. @throws Invalid by field, TooMany.
 */
export async function signUp(input: SignUpInput): Promise<string> {
  const fault = passwordFault(input.password, [input.houseName, input.email.split('@')[0] ?? '']);
  if (fault) throw new Invalid({ password: fault });
  await countAttempt('sign-up', input.email, SIGN_UP_TRIES);
  await countAttempt('sign-up', 'all', SIGN_UPS_OF_ALL);
  const passwordHash = await hashPassword(input.password);
  const teamId = newId();
  const userId = newId();
  try {
    await transaction(async (tx) => {
      await tx.insert(teams).values({ id: teamId, name: input.houseName, currency: input.currency });
      await tx.insert(users).values({ id: userId, email: input.email, name: input.name, passwordHash });
      await tx.insert(memberships).values({ teamId, userId });
      await tx.insert(membershipRoles).values({ teamId, userId, role: 'owner' });
      await loadLibrary(tx, { teamId, begin: input.begin, currency: input.currency });
    });
  } catch (error) {
    if (errnoOf(error) === ERRNO.duplicate)
      throw new Invalid({ email: 'This address can’t be used for a new house. If it is yours, sign in.' });
    throw error;
  }
  return startSession(userId, teamId);
}

/** @returns the token of the new session. @throws Invalid, in the same words for an unknown address as for a wrong password. */
export async function signIn(input: { email: string; password: string }): Promise<string> {
  await countAttempt('sign-in', input.email, SIGN_IN_TRIES);
  const [user] = await db.select().from(users).where(eq(users.email, input.email));
  const right = await verifyPassword(user?.passwordHash ?? null, input.password);
  const [membership] =
    user && right ? await db.select().from(memberships).where(eq(memberships.userId, user.id)).limit(1) : [];
  if (!user || !membership) throw new Invalid({ password: 'Address and password don’t belong together.' });
  return startSession(user.id, membership.teamId);
}

/** Signs in as the demo house's person of this role, while the demo house is loaded. @throws NotFound when it isn't. */
export async function signInAsDemo(role: Role): Promise<string> {
  if (!ROLES.includes(role)) throw new NotFound();
  await countAttempt('demo', 'all', DEMO_SIGN_INS);
  const [member] = await db
    .select({ teamId: teams.id, userId: membershipRoles.userId })
    .from(teams)
    .innerJoin(membershipRoles, eq(membershipRoles.teamId, teams.id))
    .where(and(eq(teams.isDemo, true), eq(membershipRoles.role, role)))
    .orderBy(membershipRoles.userId)
    .limit(1);
  if (!member) throw new NotFound();
  return startSession(member.userId, member.teamId);
}
