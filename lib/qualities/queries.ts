import 'server-only';
import { and, asc, desc, eq, inArray } from 'drizzle-orm';
import { db } from '@/db/connection';
import { constituents, materials, qualities, qualityConstituents, suppliers } from '@/db/schema';
import { demand, type Member } from '@/lib/auth/member';
import { NotFound } from '@/lib/errors';
import { offersOf } from '@/lib/prices/queries';
import type { QualityView } from '@/lib/shared/material-view';
import { may } from '@/lib/shared/permissions';
import { viewQuality } from './view';

/** The qualities of a material, the preferred one first. */
export async function qualitiesOf(ctx: Member, material: { id: string; strength: number }): Promise<QualityView[]> {
  demand(ctx, 'material.read');
  const rows = await db
    .select({ quality: qualities, supplierName: suppliers.name })
    .from(qualities)
    .innerJoin(suppliers, and(eq(suppliers.teamId, qualities.teamId), eq(suppliers.id, qualities.supplierId)))
    .where(and(eq(qualities.teamId, ctx.teamId), eq(qualities.materialId, material.id)))
    .orderBy(asc(qualities.position), asc(qualities.id));
  const ids = rows.map(({ quality }) => quality.id);
  const [ranges, offered] = await Promise.all([
    rangesOf(ctx, ids),
    may(ctx.roles, 'price.read') ? offersOf(ctx, ids) : new Map(),
  ]);
  return rows.map(({ quality, supplierName }, place) =>
    viewQuality(ctx, {
      quality,
      supplierName,
      preferred: place === 0,
      ranges: ranges.get(quality.id) ?? [],
      offers: offered.get(quality.id) ?? [],
      strength: material.strength,
    }),
  );
}

/** @throws NotFound */
export async function getQuality(ctx: Member, id: string): Promise<QualityView> {
  demand(ctx, 'material.read');
  const [material] = await db
    .select({ id: materials.id, strength: materials.strength })
    .from(qualities)
    .innerJoin(materials, and(eq(materials.teamId, qualities.teamId), eq(materials.id, qualities.materialId)))
    .where(and(eq(qualities.teamId, ctx.teamId), eq(qualities.id, id)));
  const quality = material && (await qualitiesOf(ctx, material)).find((each) => each.id === id);
  if (!quality) throw new NotFound();
  return quality;
}

export type RangeRow = Awaited<ReturnType<typeof selectRanges>>[number];

function selectRanges(ctx: Member, qualityIds: readonly string[]) {
  const { qualityId, constituentId, minFraction, typicalFraction, maxFraction, source } = qualityConstituents;
  const { slug, name, cas } = constituents;
  return db
    .select({ qualityId, constituentId, minFraction, typicalFraction, maxFraction, source, slug, name, cas })
    .from(qualityConstituents)
    .innerJoin(
      constituents,
      and(eq(constituents.teamId, qualityConstituents.teamId), eq(constituents.id, constituentId)),
    )
    .where(and(eq(qualityConstituents.teamId, ctx.teamId), inArray(qualityId, [...qualityIds])))
    .orderBy(desc(maxFraction), asc(name));
}

async function rangesOf(ctx: Member, qualityIds: readonly string[]): Promise<Map<string, RangeRow[]>> {
  const found = new Map<string, RangeRow[]>();
  if (qualityIds.length === 0 || !may(ctx.roles, 'constituent.read')) return found;
  for (const row of await selectRanges(ctx, qualityIds))
    found.set(row.qualityId, [...(found.get(row.qualityId) ?? []), row]);
  return found;
}
