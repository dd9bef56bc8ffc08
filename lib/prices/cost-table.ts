import 'server-only';
import { and, eq, sql } from 'drizzle-orm';
import { db } from '@/db/connection';
import { offers, qualities } from '@/db/schema';
import type { Member } from '@/lib/auth/member';

/**
 * `materialCost` of lib/shared/price.ts as a table of the database, so that lists can be sorted and cut by cost: for
 * each material the cost per kg of the cheapest way to have `packGrams` grams of its preferred quality.
 *
 * Quotients keep eight digits after the point, enough to sort by; what is shown is computed exactly. A test holds the
 * two together on random offers.
 */
export function costTable(ctx: Member, packGrams: string) {
  const chosen = preferred(ctx);
  const grams = sql`if(${offers.packUnit} = 'g', ${offers.packAmount}, ${offers.packAmount} * ${chosen.density})`;
  const wanted = sql`cast(${packGrams} as decimal(20,6))`;
  // Whole division and remainder are exact in decimals; the ceiling of a rounded quotient would not be.
  const packs = sql`greatest(1, ${wanted} div (${grams}) + (mod(${wanted}, ${grams}) > 0))`;
  return db
    .select({
      materialId: chosen.materialId,
      costPerKg: sql<string>`${offers.price} * 1000 / (${grams})`.as('cost_per_kg'),
      place: sql<number>`row_number() over (
        partition by ${chosen.materialId}
        order by ${packs} * ${offers.price}, ${packs} * (${grams}) desc, ${offers.id}
      )`.as('place'),
    })
    .from(offers)
    .innerJoin(chosen, and(eq(chosen.id, offers.qualityId), eq(chosen.rank, 1)))
    .where(
      and(
        eq(offers.teamId, ctx.teamId),
        eq(offers.currency, ctx.currency),
        sql`(${offers.packUnit} = 'g' or ${chosen.density} is not null)`,
      ),
    )
    .as('costs');
}

/** Qualities ranked within their material: rank 1 is the preferred one. */
function preferred(ctx: Member) {
  return db
    .select({
      id: qualities.id,
      materialId: sql<string>`${qualities.materialId}`.as('ranked_material_id'),
      density: sql<string | null>`${qualities.densityGPerMl}`.as('density'),
      rank: sql<number>`row_number() over (
        partition by ${qualities.materialId} order by ${qualities.position}, ${qualities.id}
      )`.as('place_of_quality'),
    })
    .from(qualities)
    .where(eq(qualities.teamId, ctx.teamId))
    .as('ranked');
}
