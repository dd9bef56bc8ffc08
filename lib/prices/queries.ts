import 'server-only';
import { and, eq, inArray } from 'drizzle-orm';
import { db } from '@/db/connection';
import { offers, qualities } from '@/db/schema';
import { demand, type Member } from '@/lib/auth/member';
import type { OfferTerms, QualityTerms } from '@/lib/shared/price';

export interface OfferRow extends OfferTerms {
  qualityId: string;
  offeredOn: string;
}

/** The qualities of these materials with their offers, by material: what `materialCost` is worked out from. */
export async function qualityTerms(ctx: Member, materialIds: readonly string[]): Promise<Map<string, QualityTerms[]>> {
  demand(ctx, 'price.read');
  const terms = new Map<string, QualityTerms[]>();
  if (materialIds.length === 0) return terms;
  const rows = await db
    .select({
      materialId: qualities.materialId,
      id: qualities.id,
      position: qualities.position,
      densityGPerMl: qualities.densityGPerMl,
    })
    .from(qualities)
    .where(and(eq(qualities.teamId, ctx.teamId), inArray(qualities.materialId, [...materialIds])));
  const offered = await offersOf(
    ctx,
    rows.map(({ id }) => id),
  );
  for (const { materialId, ...quality } of rows) {
    const list = terms.get(materialId) ?? [];
    list.push({ ...quality, offers: offered.get(quality.id) ?? [] });
    terms.set(materialId, list);
  }
  return terms;
}

/** The offers of these qualities, smallest pack first. */
export async function offersOf(ctx: Member, qualityIds: readonly string[]): Promise<Map<string, OfferRow[]>> {
  demand(ctx, 'price.read');
  const found = new Map<string, OfferRow[]>();
  if (qualityIds.length === 0) return found;
  const rows = await db
    .select()
    .from(offers)
    .where(and(eq(offers.teamId, ctx.teamId), inArray(offers.qualityId, [...qualityIds])))
    .orderBy(offers.packUnit, offers.packAmount, offers.id);
  for (const row of rows) {
    const list = found.get(row.qualityId) ?? [];
    list.push({ ...row, packUnit: row.packUnit as 'g' | 'mL' });
    found.set(row.qualityId, list);
  }
  return found;
}
