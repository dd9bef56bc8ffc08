import 'server-only';
import { eq } from 'drizzle-orm';
import { db } from '@/db/connection';
import { materials } from '@/db/schema';
import { profileAngle } from '@/engine';
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
  const all = await db.select({ id: materials.id }).from(materials).where(eq(materials.teamId, ctx.teamId));
  if (!all.some((row) => row.id === id)) throw new NotFound();
  const facetIds = (await listFacets(ctx)).map((facet) => facet.id);
  if (facetIds.length === 0) return []; // the engine takes no empty vector
  const smellOf = await smellsOf(
    ctx,
    all.map((row) => row.id),
  );
  const close = closest(
    smellOf(id).profile,
    all.filter((row) => row.id !== id).map((row) => ({ id: row.id, profile: smellOf(row.id).profile })),
  );
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

/** Against this one profile only: comparing all materials with all others would hold the server up for seconds. */
function closest(profile: number[], others: { id: string; profile: number[] }[]) {
  return others
    .map((other) => ({ id: other.id, similarity: likeness(profile, other.profile) }))
    .filter(({ similarity }) => similarity >= MIN_SIMILARITY)
    .sort((a, b) => b.similarity - a.similarity || (a.id < b.id ? -1 : 1))
    .slice(0, SHOWN);
}

function likeness(one: number[], other: number[]): number {
  const angle = profileAngle(one, other);
  return angle === null ? 0 : Math.cos(angle);
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
