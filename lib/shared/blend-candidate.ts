import { z } from 'zod';

/** One material as the engine and its screen need it: the vector in the order of the facets, and its preferred quality. */
export const candidateView = z.strictObject({
  id: z.string(),
  name: z.string(),
  botanicalName: z.string().nullable(),
  kind: z.string(),
  profile: z.array(z.number()),
  sd: z.array(z.number()),
  /** Whole vectors of those phases in which it differs. */
  phases: z.partialRecord(z.enum(['opening', 'heart', 'dry']), z.array(z.number())),
  strength: z.number(),
  natural: z.number(),
  maxShare: z.number().nullable(),
  evaporation: z.number().nullable(),
  /** A decimal in the house's currency at the asked pack size; null with the reason beside it. */
  costPerKg: z.string().nullable(),
  costReason: z.string().nullable(),
  offer: z
    .strictObject({
      id: z.string(),
      supplier: z.string(),
      grade: z.string(),
      packAmount: z.string(),
      packUnit: z.enum(['g', 'mL']),
      price: z.string(),
      currency: z.string(),
      offeredOn: z.string(),
    })
    .nullable(),
  /** How much its composition says: null where no quality is entered. */
  completeness: z.enum(['full', 'declared', 'unknown']).nullable(),
  constituents: z.array(z.strictObject({ id: z.string(), max: z.number(), typical: z.number().nullable() })),
});
export type Candidate = z.output<typeof candidateView>;

export const candidateQuery = z.strictObject({ packGrams: z.enum(['10', '25', '100', '1000', '5000']).default('100') });

export const candidateList = z.strictObject({
  currency: z.string(),
  packGrams: z.string(),
  /** Facet ids: the order of every vector. */
  facetIds: z.array(z.string()),
  items: z.array(candidateView),
});
export type CandidateList = z.output<typeof candidateList>;

/** Only a full statement says what is not in it; every other composition leaves limits open. */
export function isIncomplete(candidate: Pick<Candidate, 'completeness'>): boolean {
  return candidate.completeness !== 'full';
}
