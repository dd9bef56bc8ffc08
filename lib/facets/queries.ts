import 'server-only';
import { asc, eq } from 'drizzle-orm';
import { db } from '@/db/connection';
import { facets } from '@/db/schema';
import { demand, type Member } from '@/lib/auth/member';
import type { FacetView } from '@/lib/shared/facet';

/** The house's facets in their order, which is the order of every vector. */
export async function listFacets(ctx: Member): Promise<FacetView[]> {
  demand(ctx, 'facet.read');
  const rows = await db.select().from(facets).where(eq(facets.teamId, ctx.teamId)).orderBy(asc(facets.position));
  return rows.map(({ id, slug, name, family, description, hueDeg, lightness }) => ({
    id,
    slug,
    name,
    family,
    description,
    hueDeg: Number(hueDeg),
    lightness: Number(lightness),
  }));
}
