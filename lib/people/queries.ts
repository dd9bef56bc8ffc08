import 'server-only';
import { and, eq } from 'drizzle-orm';
import { db } from '@/db/connection';
import { membershipRoles, teams, users } from '@/db/schema';
import type { Role } from '@/lib/shared/permissions';

export interface DemoPerson {
  name: string;
  role: Role;
}

/** The people of the demo house, one for each role; none when it isn't loaded. Public: it holds no one real. */
export async function listDemoPeople(): Promise<DemoPerson[]> {
  const rows = await db
    .select({ name: users.name, role: membershipRoles.role })
    .from(teams)
    .innerJoin(membershipRoles, eq(membershipRoles.teamId, teams.id))
    .innerJoin(users, eq(users.id, membershipRoles.userId))
    .where(and(eq(teams.isDemo, true)))
    .orderBy(membershipRoles.userId);
  return rows.map((row) => ({ name: row.name, role: row.role as Role }));
}
