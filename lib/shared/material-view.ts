import { z } from 'zod';
import { costView, phaseProfiles } from './material';
import { CAUTION_CODES, COMPLETENESS, FACET_PHASES, FORMS, MATERIAL_KINDS, STRENGTH_CLASSES } from './material-words';

/* A material as its page shows it. A field that a role may not see is not there. */

export const offerView = z.strictObject({
  id: z.string(),
  packAmount: z.string(),
  packUnit: z.enum(['g', 'mL']),
  price: z.string(),
  currency: z.string(),
  offeredOn: z.string(),
  costPerKg: costView,
  costPerMl: costView,
  costAtEqualStrength: costView,
});
export type OfferView = z.infer<typeof offerView>;

export const qualityView = z.strictObject({
  id: z.string(),
  materialId: z.string(),
  revision: z.int(),
  preferred: z.boolean(),
  grade: z.string(),
  origin: z.string().nullable(),
  completeness: z.enum(COMPLETENESS),
  densityGPerMl: z.string().nullable(),
  form: z.enum(FORMS),
  warmToC: z.string().nullable(),
  flashPointC: z.string().nullable(),
  colour: z.string().nullable(),
  constituents: z.array(
    z.strictObject({
      constituentId: z.string(),
      slug: z.string(),
      name: z.string(),
      cas: z.string().nullable(),
      minFraction: z.string(),
      typicalFraction: z.string().nullable(),
      maxFraction: z.string(),
      /** Documents name suppliers, so sources go with the right to know them. */
      source: z.string().optional(),
    }),
  ),
  supplier: z.strictObject({ id: z.string(), name: z.string() }).optional(),
  code: z.string().optional(),
  compositionSource: z.string().optional(),
  offers: z.array(offerView).optional(),
});
export type QualityView = z.infer<typeof qualityView>;

export const materialView = z.strictObject({
  id: z.string(),
  revision: z.int(),
  updatedAt: z.string(),
  name: z.string(),
  kind: z.enum(MATERIAL_KINDS),
  botanicalName: z.string().nullable(),
  plantPart: z.string().nullable(),
  chemicalName: z.string().nullable(),
  inciName: z.string().nullable(),
  synonyms: z.array(z.string()),
  cas: z.array(z.string()),
  smell: z.string(),
  naturalShare: z.string(),
  strength: z.number(),
  strengthSpread: z.number(),
  strengthClass: z.enum(STRENGTH_CLASSES),
  strengthSource: z.string(),
  vapourPressurePa: z.number().nullable(),
  vapourPressureSource: z.string().nullable(),
  odourThresholdUgPerM3: z.number().nullable(),
  odourThresholdSource: z.string().nullable(),
  evaporationPerHour: z.number().nullable(),
  evaporationSource: z.string().nullable(),
  lastsHours: z.number().nullable(),
  usualDilution: z.string().nullable(),
  dilutionSolvent: z.string().nullable(),
  maxShare: z.string().nullable(),
  note: z.string().nullable(),
  /** As entered: what holds for all phases, and what differs in one. */
  facets: z.array(
    z.strictObject({ facetId: z.string(), phase: z.enum(FACET_PHASES), intensity: z.number(), sd: z.number() }),
  ),
  /** In the order of the house's facets. */
  profile: z.array(z.number()),
  profileSd: z.array(z.number()),
  phases: phaseProfiles.optional(),
  cautions: z.array(z.strictObject({ code: z.enum(CAUTION_CODES), source: z.string() })),
  qualities: z.array(qualityView),
  /** What a ready base is made of: a formula, for those who may read formulas. */
  parts: z.array(z.strictObject({ materialId: z.string(), name: z.string(), share: z.string() })).optional(),
  currency: z.string().optional(),
});
export type MaterialView = z.infer<typeof materialView>;
