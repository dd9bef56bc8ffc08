import 'server-only';
import { randomBytes } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { db } from '@/db/connection';
import { ERRNO, errnoOf } from '@/db/database-error';
import { membershipRoles, memberships, teams, users } from '@/db/schema';
import { type Transaction, transaction } from '@/db/transaction';
import { hashPassword } from '@/lib/auth/password';
import { newId } from '@/lib/id';
import { readDemoLibrary } from './demo-files';
import { loadLibrary } from './load-library';

/**
 * Makes the demo house with its people and the sample library, unless there is one.
 *
 * Nobody can sign in to it with a password: theirs is drawn at random and thrown away. Two instances that start
 * together cannot both make it, since an e-mail address is taken once.
 *
 * @returns whether it made one.
 */
export async function makeDemoHouse(): Promise<boolean> {
  if (await isThere()) return false;
  const passwordHash = await hashPassword(randomBytes(32).toString('base64url'));
  try {
    await transaction((tx) => insertDemoHouse(tx, passwordHash));
    return true;
  } catch (error) {
    if (errnoOf(error) === ERRNO.duplicate && (await isThere())) return false;
    throw error;
  }
}

async function isThere(): Promise<boolean> {
  const houses = await db.select({ id: teams.id }).from(teams).where(eq(teams.isDemo, true)).limit(1);
  return houses.length > 0;
}

async function insertDemoHouse(tx: Transaction, passwordHash: string) {
  const { people } = readDemoLibrary();
  const teamId = newId();
  const { name: houseName, currency } = people.house;
  await tx.insert(teams).values({ id: teamId, name: houseName, currency, isDemo: true });
  for (const { name, email, roles } of people.members) {
    const userId = newId();
    await tx.insert(users).values({ id: userId, email, name, passwordHash });
    await tx.insert(memberships).values({ teamId, userId });
    await tx.insert(membershipRoles).values(roles.map((role) => ({ teamId, userId, role })));
  }
  await loadLibrary(tx, { teamId, begin: 'sample', currency });
}
