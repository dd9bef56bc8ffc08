import 'server-only';
import { and, asc, eq, gt } from 'drizzle-orm';
import { db } from '@/db/connection';
import { constituents, materialFacets, materials, qualities, qualityConstituents } from '@/db/schema';
import type { Member } from '@/lib/auth/member';

export interface Contained {
  id: string;
  name: string;
  max: number;
  typical?: number;
}

/** Materials that smell: an odourless solvent has no place on a map of smells. */
export function smellingMaterials(ctx: Member) {
  const { id, name, botanicalName, kind, naturalShare, smell } = materials;
  return db
    .select({ id, name, botanicalName, kind, naturalShare, smell })
    .from(materials)
    .where(and(eq(materials.teamId, ctx.teamId), gt(materials.strength, 0)))
    .orderBy(asc(materials.name), asc(materials.id));
}

/** Material to phase to facet to intensity. */
export async function smells(ctx: Member): Promise<Map<string, Map<string, Map<string, number>>>> {
  const { materialId, facetId, phase, intensity } = materialFacets;
  const rows = await db
    .select({ materialId, facetId, phase, intensity })
    .from(materialFacets)
    .where(eq(materialFacets.teamId, ctx.teamId));
  const smelt = new Map<string, Map<string, Map<string, number>>>();
  for (const row of rows) {
    const phases = smelt.get(row.materialId) ?? new Map<string, Map<string, number>>();
    const facets = phases.get(row.phase) ?? new Map<string, number>();
    facets.set(row.facetId, Number(row.intensity));
    smelt.set(row.materialId, phases.set(row.phase, facets));
  }
  return smelt;
}

/** Material to what its preferred quality contains. */
export async function contents(ctx: Member): Promise<Map<string, Contained[]>> {
  const rows = await db
    .select({
      materialId: qualities.materialId,
      qualityId: qualities.id,
      id: constituents.id,
      name: constituents.name,
      max: qualityConstituents.maxFraction,
      typical: qualityConstituents.typicalFraction,
    })
    .from(qualities)
    .innerJoin(
      qualityConstituents,
      and(eq(qualityConstituents.teamId, qualities.teamId), eq(qualityConstituents.qualityId, qualities.id)),
    )
    .innerJoin(
      constituents,
      and(eq(constituents.teamId, qualityConstituents.teamId), eq(constituents.id, qualityConstituents.constituentId)),
    )
    .where(eq(qualities.teamId, ctx.teamId))
    .orderBy(asc(qualities.materialId), asc(qualities.position), asc(qualities.id));
  const preferred = new Map<string, string>();
  const contained = new Map<string, Contained[]>();
  for (const { materialId, qualityId, id, name, max, typical } of rows) {
    if (!preferred.has(materialId)) preferred.set(materialId, qualityId);
    if (preferred.get(materialId) !== qualityId) continue;
    const list = contained.get(materialId) ?? [];
    list.push({ id, name, max: Number(max), ...(typical === null ? {} : { typical: Number(typical) }) });
    contained.set(materialId, list);
  }
  return contained;
}
