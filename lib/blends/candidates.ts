import 'server-only';
import { and, asc, eq, inArray } from 'drizzle-orm';
import { db } from '@/db/connection';
import { limitTerms, materialFacets, materials, offers, qualities, qualityConstituents, suppliers } from '@/db/schema';
import { demand, type Member } from '@/lib/auth/member';
import { listFacets } from '@/lib/facets/queries';
import type { Candidate, CandidateList } from '@/lib/shared/blend-candidate';
import { groupedBy } from '@/lib/shared/grouped-by';
import { materialCost, type OfferTerms } from '@/lib/shared/price';

/** Digits of a cost per kg that are handed on; a quotient such as 100 / 3 has no end. */
const COST_DIGITS = 20;

/** Every material of the house, ready for the engine: priced at a pack size, with its preferred quality's composition. */
export async function listCandidates(ctx: Member, packGrams: string): Promise<CandidateList> {
  demand(ctx, 'blend.solve');
  return readCandidates(ctx, packGrams);
}

/** For what a caller derives from them and shows by role, such as the changes since a blend was saved. */
export async function readCandidates(ctx: Member, packGrams: string): Promise<CandidateList> {
  const [facets, rows, intensities, grades] = await Promise.all([
    listFacets(ctx),
    db.select().from(materials).where(eq(materials.teamId, ctx.teamId)).orderBy(asc(materials.name), asc(materials.id)),
    db.select().from(materialFacets).where(eq(materialFacets.teamId, ctx.teamId)),
    selectQualities(ctx),
  ]);
  const facetIds = facets.map(({ id }) => id);
  const intensitiesOf = groupedBy(intensities, ({ materialId }) => materialId);
  const preferred = new Map<string, Quality>();
  for (const grade of grades) if (!preferred.has(grade.materialId)) preferred.set(grade.materialId, grade);
  const [offersOf, constituentsOf] = await readQualities(
    ctx,
    [...preferred.values()].map(({ id }) => id),
  );
  const items = rows.map((row): Candidate => {
    const quality = preferred.get(row.id);
    const own = quality ? (offersOf.get(quality.id) ?? []) : [];
    return {
      ...{ id: row.id, name: row.name, botanicalName: row.botanicalName, kind: row.kind, strength: row.strength },
      ...vectors(intensitiesOf.get(row.id) ?? [], facetIds),
      natural: Number(row.naturalShare),
      maxShare: row.maxShare === null ? null : Number(row.maxShare),
      evaporation: row.evaporationPerHour,
      ...priced(row.strength, quality, own, { currency: ctx.currency, packGrams }),
      completeness: (quality?.completeness as Candidate['completeness']) ?? null,
      constituents: quality ? (constituentsOf.get(quality.id) ?? []) : [],
    };
  });
  return { currency: ctx.currency, packGrams, facetIds, items };
}

type Quality = Awaited<ReturnType<typeof selectQualities>>[number];
type Offer = OfferTerms & { offeredOn: string };

/** The preferred quality of each material comes first: the lowest position, then the oldest. */
function selectQualities(ctx: Member) {
  return db
    .select({
      id: qualities.id,
      materialId: qualities.materialId,
      position: qualities.position,
      completeness: qualities.completeness,
      densityGPerMl: qualities.densityGPerMl,
      grade: qualities.grade,
      supplier: suppliers.name,
    })
    .from(qualities)
    .innerJoin(suppliers, and(eq(suppliers.teamId, qualities.teamId), eq(suppliers.id, qualities.supplierId)))
    .where(eq(qualities.teamId, ctx.teamId))
    .orderBy(asc(qualities.position), asc(qualities.id));
}

/** Offers, and those constituents that some limit speaks of: the others would only be carried about. */
async function readQualities(ctx: Member, qualityIds: string[]) {
  if (qualityIds.length === 0)
    return [new Map<string, Offer[]>(), new Map<string, Candidate['constituents']>()] as const;
  const limited = db.select({ id: limitTerms.constituentId }).from(limitTerms).where(eq(limitTerms.teamId, ctx.teamId));
  const [offered, held] = await Promise.all([
    db
      .select()
      .from(offers)
      .where(and(eq(offers.teamId, ctx.teamId), inArray(offers.qualityId, qualityIds))),
    db
      .select()
      .from(qualityConstituents)
      .where(
        and(
          eq(qualityConstituents.teamId, ctx.teamId),
          inArray(qualityConstituents.qualityId, qualityIds),
          inArray(qualityConstituents.constituentId, limited),
        ),
      )
      .orderBy(asc(qualityConstituents.constituentId)),
  ]);
  const constituentsOf = new Map(
    [...groupedBy(held, ({ qualityId }) => qualityId)].map(([id, list]) => [
      id,
      list.map(({ constituentId, maxFraction, typicalFraction }) => ({
        id: constituentId,
        max: Number(maxFraction),
        typical: typicalFraction === null ? null : Number(typicalFraction),
      })),
    ]),
  );
  return [
    groupedBy(offered as (Offer & { qualityId: string })[], ({ qualityId }) => qualityId),
    constituentsOf,
  ] as const;
}

type Intensity = typeof materialFacets.$inferSelect;

/** The whole vector, its spread, and whole vectors of the phases that have rows of their own. */
function vectors(rows: readonly Intensity[], facetIds: readonly string[]) {
  const whole = rows.filter(({ phase }) => phase === 'all');
  const vector = (list: readonly Intensity[], of: 'intensity' | 'sd') => {
    const values = new Map(list.map((row) => [row.facetId, Number(row[of])]));
    return facetIds.map((id) => values.get(id) ?? 0);
  };
  const phases: Candidate['phases'] = {};
  for (const phase of ['opening', 'heart', 'dry'] as const) {
    const own = rows.filter((row) => row.phase === phase);
    if (own.length > 0) phases[phase] = vector([...whole, ...own], 'intensity');
  }
  return { profile: vector(whole, 'intensity'), sd: vector(whole, 'sd'), phases };
}

function priced(
  strength: number,
  quality: Quality | undefined,
  own: readonly Offer[],
  { currency, packGrams }: { currency: string; packGrams: string },
): Pick<Candidate, 'costPerKg' | 'costReason' | 'offer'> {
  const { perKg, purchase } = materialCost(
    { strength, qualities: quality ? [{ ...quality, offers: own }] : [] },
    currency,
    packGrams,
  );
  const bought = own.find(({ id }) => id === purchase?.offer.id);
  if (!perKg.value || !quality || !bought) return { costPerKg: null, costReason: perKg.reason, offer: null };
  const { id, packAmount, packUnit, price, offeredOn } = bought;
  const { supplier, grade } = quality;
  return {
    costPerKg: perKg.value.toSignificantDigits(COST_DIGITS).toFixed(),
    costReason: null,
    offer: { id, supplier, grade, packAmount, packUnit, price, currency, offeredOn },
  };
}
