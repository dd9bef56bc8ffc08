import 'server-only';
import { and, count, eq, gte, inArray, lte, type SQL, sql } from 'drizzle-orm';
import { db } from '@/db/connection';
import { facets, materialCas, materialFacets, materialSynonyms, materials } from '@/db/schema';
import { demand, type Member } from '@/lib/auth/member';
import { costTable } from '@/lib/prices/cost-table';
import type { MaterialPage } from '@/lib/shared/material';
import { type FacetFloor, FIRST_ORDER, type MaterialListQuery, type MaterialSort } from '@/lib/shared/material-list';
import { cursorOf, readCursor } from './cursor';
import { materialRows } from './rows';

/**
 * One page of the house's materials. Pages follow each other by the key of the last row, not by counting rows, so that
 * a row that comes or goes meanwhile shifts nothing.
 *
 * @throws Forbidden when a cost is asked for by somebody who may see none: an order by price tells prices.
 */
export async function listMaterials(ctx: Member, query: MaterialListQuery): Promise<MaterialPage> {
  demand(ctx, 'material.read');
  if (asksForCost(query)) demand(ctx, 'price.read');
  const { sort, limit } = query;
  const order = query.order ?? FIRST_ORDER[sort];
  const costs = costTable(ctx, query.pack);
  const key = sortKey(sort, costs.costPerKg);
  const wanted = and(eq(materials.teamId, ctx.teamId), ...conditions(ctx, query, costs.costPerKg));
  const after = query.cursor ? afterCursor(key, order, readCursor(query.cursor, sort, order)) : undefined;
  const from = asksForCost(query)
    ? db
        .select({ id: materials.id, key: sql<string | null>`cast(${key.value} as char)` })
        .from(materials)
        .leftJoin(costs, and(eq(costs.materialId, materials.id), eq(costs.place, 1)))
    : db.select({ id: materials.id, key: sql<string | null>`cast(${key.value} as char)` }).from(materials);
  const found = await from
    .where(and(wanted, after))
    .orderBy(sql`${key.value} is null`, order === 'asc' ? sql`${key.value}` : sql`${key.value} desc`, materials.id)
    .limit(limit + 1);
  const shown = found.slice(0, limit);
  const last = shown.at(-1);
  const more = found.length > limit && last;
  return {
    ...(await materialRows(
      ctx,
      shown.map(({ id }) => id),
      query.pack,
    )),
    total: await countOf(ctx, query, wanted),
    nextCursor: more ? cursorOf(sort, order, last) : null,
  };
}

/** Each word is looked for in every name of every material. */
const MAX_WORDS = 10;

const asksForCost = ({ sort, minPrice, maxPrice, maxEqual }: MaterialListQuery) =>
  sort === 'price' || sort === 'equal' || Boolean(minPrice ?? maxPrice ?? maxEqual);

async function countOf(ctx: Member, query: MaterialListQuery, wanted: SQL | undefined): Promise<number> {
  const counted = db.select({ total: count() }).from(materials);
  const costs = costTable(ctx, query.pack);
  const rows = asksForCost(query)
    ? await counted.leftJoin(costs, and(eq(costs.materialId, materials.id), eq(costs.place, 1))).where(wanted)
    : await counted.where(wanted);
  return rows[0]?.total ?? 0;
}

interface SortKey {
  value: SQL | typeof materials.name;
  /** The type that a cursor's text is read back as, so that it compares as the column does. */
  read: (text: string) => SQL;
}

function sortKey(sort: MaterialSort, costPerKg: SQL.Aliased<string>): SortKey {
  const asDecimal = (text: string) => sql`cast(${text} as decimal(38,12))`;
  const asDouble = (text: string) => sql`cast(${text} as double)`;
  const keys: Record<MaterialSort, SortKey> = {
    name: { value: sql`${materials.name}`, read: (text) => sql`${text}` },
    price: { value: sql`${costPerKg}`, read: asDecimal },
    equal: { value: sql`${costPerKg} / nullif(${materials.strength}, 0)`, read: asDouble },
    strength: { value: sql`${materials.strength}`, read: asDouble },
    natural: { value: sql`${materials.naturalShare}`, read: asDecimal },
    updated: { value: sql`${materials.updatedAt}`, read: (text) => sql`cast(${text} as datetime(3))` },
  };
  return keys[sort];
}

/** What comes after the last row of the page before; rows without a value come last, by id. */
function afterCursor(key: SortKey, order: 'asc' | 'desc', last: { key: string | null; id: string }): SQL {
  if (last.key === null) return sql`(${key.value} is null and ${materials.id} > ${last.id})`;
  const [value, at] = [key.value, key.read(last.key)];
  const beyond = order === 'asc' ? sql`${value} > ${at}` : sql`${value} < ${at}`;
  return sql`(${beyond} or (${value} = ${at} and ${materials.id} > ${last.id}) or ${value} is null)`;
}

function conditions(ctx: Member, query: MaterialListQuery, costPerKg: SQL.Aliased<string>): (SQL | undefined)[] {
  const { q, kind, facets: floors, natural, minPrice, maxPrice, maxEqual } = query;
  const money = (text: string) => sql`cast(${text} as decimal(20,8))`;
  return [
    ...(q ?? '')
      .split(/\s+/)
      .filter(Boolean)
      .slice(0, MAX_WORDS)
      .map((word) => matches(ctx, word)),
    kind?.length ? inArray(materials.kind, kind) : undefined,
    ...(floors ?? []).map((floor) => smellsOf(ctx, floor)),
    natural ? gte(materials.naturalShare, natural) : undefined,
    minPrice ? gte(sql`${costPerKg}`, money(minPrice)) : undefined,
    maxPrice ? lte(sql`${costPerKg}`, money(maxPrice)) : undefined,
    maxEqual ? lte(sql`${costPerKg} / nullif(${materials.strength}, 0)`, money(maxEqual)) : undefined,
  ];
}

/** A word stands anywhere in one of the names; the collation takes e for é. */
function matches(ctx: Member, word: string): SQL {
  const like = `%${word.replaceAll(/[\\%_]/g, (sign) => `\\${sign}`)}%`;
  const names = [materials.name, materials.botanicalName, materials.chemicalName, materials.inciName];
  const inNames = names.map((name) => sql`${name} like ${like}`);
  const inSynonyms = sql`exists (select 1 from ${materialSynonyms} where ${materialSynonyms.teamId} = ${ctx.teamId}
    and ${materialSynonyms.materialId} = ${materials.id} and ${materialSynonyms.name} like ${like})`;
  const inCas = sql`exists (select 1 from ${materialCas} where ${materialCas.teamId} = ${ctx.teamId}
    and ${materialCas.materialId} = ${materials.id} and ${materialCas.cas} like ${like})`;
  const places = /^[\d-]+$/.test(word) ? [...inNames, inSynonyms, inCas] : [...inNames, inSynonyms];
  return sql`(${sql.join(places, sql` or `)})`;
}

function smellsOf(ctx: Member, { slug, min }: FacetFloor): SQL {
  return sql`exists (select 1 from ${materialFacets} join ${facets}
    on ${facets.teamId} = ${materialFacets.teamId} and ${facets.id} = ${materialFacets.facetId}
    where ${materialFacets.teamId} = ${ctx.teamId} and ${materialFacets.materialId} = ${materials.id}
    and ${facets.slug} = ${slug} and ${materialFacets.intensity} >= ${min})`;
}
