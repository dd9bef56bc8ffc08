import 'server-only';
import { eq } from 'drizzle-orm';
import { db } from '@/db/connection';
import { materials } from '@/db/schema';
import { relatedMaterials } from '@/engine';
import { demand, type Member } from '@/lib/auth/member';
import { NotFound } from '@/lib/errors';
import { listFacets } from '@/lib/facets/queries';
import type { RelatedMaterial } from '@/lib/shared/material';
import { USUAL_PACK_GRAMS } from '@/lib/shared/price';
import { materialRows } from './rows';
import { smellsOf } from './smell';

const SHOWN = 8;
/** Below this two materials share a facet or two and are not close. */
const MIN_SIMILARITY = 0.5;
const SHARED_SHOWN = 4;

/** What this material is close to: by the cosine of the facets, closest first. @throws NotFound */
export async function listRelated(ctx: Member, id: string): Promise<RelatedMaterial[]> {
  demand(ctx, 'material.read');
  const all = await db
    .select({ id: materials.id, strength: materials.strength })
    .from(materials)
    .where(eq(materials.teamId, ctx.teamId));
  if (!all.some((row) => row.id === id)) throw new NotFound();
  const facetIds = (await listFacets(ctx)).map((facet) => facet.id);
  if (facetIds.length === 0) return []; // the engine takes no empty vector
  const smellOf = await smellsOf(
    ctx,
    all.map((row) => row.id),
  );
  const engineMaterials = all.map((row) => ({ ...row, profile: smellOf(row.id).profile, costPerKg: 0 }));
  const links = relatedMaterials(engineMaterials, { top: SHOWN, minSimilarity: MIN_SIMILARITY, by: 'facets' });
  const close = links
    .filter(({ a, b }) => a === id || b === id)
    .slice(0, SHOWN)
    .map(({ a, b, similarity }) => ({ id: a === id ? b : a, similarity }));
  const { items } = await materialRows(
    ctx,
    close.map((each) => each.id),
    USUAL_PACK_GRAMS,
  );
  return items.map((row, place) => ({
    id: row.id,
    name: row.name,
    kind: row.kind,
    profile: row.profile,
    phases: row.phases,
    lastsHours: row.lastsHours,
    naturalShare: row.naturalShare,
    similarity: close[place]?.similarity ?? 0,
    sharedFacetIds: sharedFacets(smellOf(id).profile, row.profile, facetIds),
    ...(row.costAtEqualStrength && { costAtEqualStrength: row.costAtEqualStrength }),
  }));
}

/** The facets that make two profiles alike, the greatest product first. */
function sharedFacets(one: readonly number[], other: readonly number[], facetIds: readonly string[]): string[] {
  return facetIds
    .map((facetId, place) => ({ facetId, product: (one[place] ?? 0) * (other[place] ?? 0) }))
    .filter(({ product }) => product > 0)
    .sort((a, b) => b.product - a.product)
    .slice(0, SHARED_SHOWN)
    .map(({ facetId }) => facetId);
}
