import 'server-only';
import { and, asc, eq } from 'drizzle-orm';
import { db } from '@/db/connection';
import { constituents, limitMaxima, limitSets, limits, limitTerms, productCategories } from '@/db/schema';
import { demand, type Member } from '@/lib/auth/member';
import { Decimal } from '@/lib/shared/decimal';
import { groupedBy } from '@/lib/shared/grouped-by';
import type { LimitTables, LimitView } from '@/lib/shared/limit-view';

/** The house's limit tables with every figure and its source; sets out of force are there and marked so. */
export async function getLimitTables(ctx: Member): Promise<LimitTables> {
  demand(ctx, 'limit.read');
  return readLimitTables(ctx);
}

/** For those who may solve a blend: its verdicts need the tables whatever else the roles show. */
export async function readLimitTables(ctx: Pick<Member, 'teamId'>): Promise<LimitTables> {
  const [categories, sets, rows, terms, maxima] = await Promise.all([
    db
      .select()
      .from(productCategories)
      .where(eq(productCategories.teamId, ctx.teamId))
      .orderBy(asc(productCategories.position)),
    db
      .select()
      .from(limitSets)
      .where(eq(limitSets.teamId, ctx.teamId))
      .orderBy(asc(limitSets.title), asc(limitSets.id)),
    db.select().from(limits).where(eq(limits.teamId, ctx.teamId)).orderBy(asc(limits.name), asc(limits.id)),
    selectTerms(ctx),
    db.select().from(limitMaxima).where(eq(limitMaxima.teamId, ctx.teamId)),
  ]);
  const termsOf = groupedBy(terms, ({ limitId }) => limitId);
  const maximaOf = groupedBy(maxima, ({ limitId }) => limitId);
  const views = rows.map(({ setId, id, name, kind, source, via, note }) => ({
    setId,
    view: {
      id,
      name,
      kind: kind as LimitView['kind'],
      source,
      via,
      note,
      terms: (termsOf.get(id) ?? []).map(({ constituentId, factor }) => ({ constituentId, factor: Number(factor) })),
      maxima: Object.fromEntries(
        (maximaOf.get(id) ?? []).map(({ category, maxFraction }) => [category, new Decimal(maxFraction).toFixed()]),
      ),
    },
  }));
  const names = new Map(terms.map(({ constituentId, constituentName }) => [constituentId, constituentName]));
  return {
    categories: categories.map(({ code, name, exposure, source }) => ({ code, name, exposure, source })),
    constituents: [...names].map(([id, name]) => ({ id, name })),
    sets: sets.map(({ id, title, edition, datedOn, scope, source, inForce }) => ({
      ...{ id, title, edition, datedOn, scope, source, inForce },
      limits: views.filter(({ setId }) => setId === id).map(({ view }) => view),
    })),
  };
}

function selectTerms(ctx: Pick<Member, 'teamId'>) {
  return db
    .select({
      limitId: limitTerms.limitId,
      constituentId: limitTerms.constituentId,
      factor: limitTerms.factor,
      constituentName: constituents.name,
    })
    .from(limitTerms)
    .innerJoin(
      constituents,
      and(eq(constituents.teamId, limitTerms.teamId), eq(constituents.id, limitTerms.constituentId)),
    )
    .where(eq(limitTerms.teamId, ctx.teamId));
}
