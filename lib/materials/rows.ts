import 'server-only';
import { and, asc, eq, inArray } from 'drizzle-orm';
import { db } from '@/db/connection';
import { materialCas, materials } from '@/db/schema';
import type { Member } from '@/lib/auth/member';
import { qualityTerms } from '@/lib/prices/queries';
import { may } from '@/lib/shared/permissions';
import type { QualityTerms } from '@/lib/shared/price';
import { type Smell, smellsOf } from './smell';
import { viewRow } from './view';

export type MaterialRecord = typeof materials.$inferSelect;

/** Everything that a row of a list is made from. */
export interface RowParts {
  record: MaterialRecord;
  cas: string[];
  smell: Smell;
  /** Only for those who may see prices. */
  terms?: QualityTerms[];
}

/** The rows of these materials, in this order, with costs for those who may see them. */
export async function materialRows(ctx: Member, ids: readonly string[], packGrams: string) {
  const parts = await rowParts(ctx, ids);
  return {
    items: parts.map((part) => viewRow(ctx, part, packGrams)),
    ...(may(ctx.roles, 'price.read') && { currency: ctx.currency }),
  };
}

async function rowParts(ctx: Member, ids: readonly string[]): Promise<RowParts[]> {
  if (ids.length === 0) return [];
  const [records, cas, smell, terms] = await Promise.all([
    db
      .select()
      .from(materials)
      .where(and(eq(materials.teamId, ctx.teamId), inArray(materials.id, [...ids]))),
    casOf(ctx, ids),
    smellsOf(ctx, ids),
    may(ctx.roles, 'price.read') ? qualityTerms(ctx, ids) : null,
  ]);
  const byId = new Map(records.map((record) => [record.id, record]));
  return ids.flatMap((id) => {
    const record = byId.get(id);
    return record
      ? [{ record, cas: cas.get(id) ?? [], smell: smell(id), ...(terms && { terms: terms.get(id) ?? [] }) }]
      : [];
  });
}

export async function casOf(ctx: Member, ids: readonly string[]): Promise<Map<string, string[]>> {
  const rows = await db
    .select()
    .from(materialCas)
    .where(and(eq(materialCas.teamId, ctx.teamId), inArray(materialCas.materialId, [...ids])))
    .orderBy(asc(materialCas.position));
  const found = new Map<string, string[]>();
  for (const { materialId, cas } of rows) found.set(materialId, [...(found.get(materialId) ?? []), cas]);
  return found;
}
