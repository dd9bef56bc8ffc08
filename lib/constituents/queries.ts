import 'server-only';
import { asc, eq } from 'drizzle-orm';
import { db } from '@/db/connection';
import { constituents } from '@/db/schema';
import { demand, type Member } from '@/lib/auth/member';
import type { ConstituentView } from '@/lib/shared/constituent';

export async function listConstituents(ctx: Member): Promise<ConstituentView[]> {
  demand(ctx, 'constituent.read');
  const { id, slug, name, cas } = constituents;
  return db
    .select({ id, slug, name, cas })
    .from(constituents)
    .where(eq(constituents.teamId, ctx.teamId))
    .orderBy(asc(name));
}
