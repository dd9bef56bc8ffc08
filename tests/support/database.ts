import { db } from '@/db/connection';
import { membershipRoles, memberships, teams, users } from '@/db/schema';
import type { Member } from '@/lib/auth/member';
import { newId } from '@/lib/id';
import type { Role } from '@/lib/shared/permissions';

/**
 * What tests that need a database begin with. Each worker has its own database, empty before each file (see
 * `worker-database.ts`), and each test makes its own house, so that no test reads what another wrote.
 */
export { db };

/** A house without anything in it. */
export async function makeTeam({ name = 'House of Trials', currency = 'EUR', isDemo = false } = {}) {
  const team = { id: newId(), name, currency, isDemo };
  await db.insert(teams).values(team);
  return team;
}

type Team = Awaited<ReturnType<typeof makeTeam>>;

/** A person of a house, as `ctx` for every query and command. The person cannot sign in: there is no password. */
export async function makeMember(team: Team, ...roles: Role[]): Promise<Member> {
  const userId = newId();
  const userName = `${roles.join(' and ') || 'nobody'} of ${team.name}`.slice(0, 120);
  await db.insert(users).values({ id: userId, email: `${userId}@house.example`, name: userName, passwordHash: '-' });
  await db.insert(memberships).values({ teamId: team.id, userId });
  if (roles.length > 0) {
    await db.insert(membershipRoles).values(roles.map((role) => ({ teamId: team.id, userId, role })));
  }
  const { id: teamId, name: teamName, currency, isDemo } = team;
  return { teamId, teamName, currency, isDemo, userId, userName, roles };
}
