import 'server-only';
import { z } from 'zod';

/**
 * The shape of the sample library in `db/demo/`. Everything is strict: a field nobody expects is a mistake in the file.
 *
 * Ratings, strengths, prices, suppliers and people are invented, and the files say so. Chemical and botanical names, CAS
 * numbers, physical data, composition ranges and limits are published facts; each carries `source` (the document) and
 * `via`, how the figure got here: read in the document, read in a text that reprints it, or from memory.
 */

/** A key is one slug, unique within its kind. */
export const key = z.string().regex(/^[a-z0-9]+(-[a-z0-9]+)*$/);
const sentence = z.string().min(3).max(400);
const date = z.iso.date();
const percent = z.number().min(0).max(100);
const fraction = z.number().min(0).max(1);
const money = z.string().regex(/^\d{1,10}\.\d{2}$/);

export const via = z.enum(['document text seen', 'secondary text seen', 'memory', 'invented', 'computed']);
const confidence = z.enum(['high', 'medium', 'low']);
const provenance = { source: sentence, via, confidence: confidence.optional() };

export const facetFile = z.strictObject({
  families: z.array(z.strictObject({ id: key, name: z.string() })),
  facets: z.array(z.strictObject({ id: key, name: z.string(), family: key, description: sentence })),
});

/** Facet id to [intensity 0..10, standard deviation between noses]. A facet that is not named is 0. */
export const profile = z.record(key, z.tuple([z.number().min(0).max(10), z.number().min(0).max(4)]));

export const materialKind = z.enum([
  'oil',
  'absolute',
  'resinoid',
  'extract',
  'synthetic',
  'isolate',
  'ready base',
  'solvent',
]);
export const form = z.enum(['mobile liquid', 'viscous liquid', 'paste', 'crystals', 'solid']);
export const caution = z.enum([
  'sensitiser',
  'phototoxic',
  'flammable',
  'warm',
  'strong',
  'oxidises',
  'irritant',
  'discolours',
  'aspiration',
  'restricted',
]);

/** Odour impact per gram, linalool = 1. `spreadFactor` 2 reads "between half and twice that". */
const strength = z.strictObject({
  value: z.number().min(0),
  spreadFactor: z.number().min(1),
  class: z.enum(['odourless', 'faint', 'weak', 'medium', 'strong', 'very strong', 'mighty']),
  basis: sentence,
});

export const material = z.strictObject({
  key,
  name: z.string().min(2),
  kind: materialKind,
  botanical: z.string().optional(),
  part: z.string().optional(),
  chemicalName: z.string().optional(),
  inci: z.string().optional(),
  synonyms: z.array(z.string()),
  cas: z.array(z.string()),
  naturalShare: fraction,
  form,
  smell: sentence,
  profile,
  /** Only what differs from `profile` in that phase; a facet set to [0, 0] is gone by then. */
  phases: z
    .strictObject({ opening: profile.optional(), heart: profile.optional(), dry: profile.optional() })
    .optional(),
  strength,
  evaporation: z.strictObject({ perHour: z.number().min(0).max(6), basis: sentence }),
  vapourPressure: z
    .strictObject({ pa25C: z.number().positive(), spreadFactor: z.number().min(1).optional(), ...provenance })
    .optional(),
  odourThreshold: z.strictObject({ microgramsPerM3: z.number().positive(), ...provenance }).optional(),
  density: z.strictObject({ gPerMl: z.number().min(0.5).max(2), ...provenance }).optional(),
  flashPoint: z.strictObject({ celsius: z.number(), ...provenance }).optional(),
  /** How it usually stands on the bench; fraction 1 means as it is, and then no solvent. */
  usualDilution: z.strictObject({ fraction: z.number().gt(0).max(1), solvent: key.nullable() }),
  /** The largest mass share of a concentrate that is advisable, an invented house rule. */
  maxShare: z.number().gt(0).max(1),
  cautions: z.array(caution),
  /** A ready base is made of other materials; shares of its mass. */
  madeOf: z.array(z.strictObject({ material: key, share: z.number().gt(0).max(1) })).optional(),
});

export const materialFile = z.strictObject({
  family: key,
  title: z.string(),
  note: sentence,
  materials: z.array(material),
});

export const constituentFile = z.strictObject({
  note: sentence,
  constituents: z.array(
    z.strictObject({
      key,
      name: z.string(),
      cas: z.string().nullable(),
      otherCas: z.array(z.string()).optional(),
      /** Constituents that the law counts as one, such as the rose ketones. */
      group: key.optional(),
      /**
       * A natural complex counted as a whole, such as bergamot oil: limits and labels speak of it beside what it contains.
       * Its key begins with `whole-`, and it stays out of sums that must not exceed 100 %.
       */
      whole: z.literal(true).optional(),
    }),
  ),
});

export const supplierFile = z.strictObject({
  note: sentence,
  suppliers: z.array(
    z.strictObject({
      key,
      name: z.string(),
      country: z.string().length(2),
      email: z.email(),
      currency: z.string().length(3),
      leadDays: z.int().min(1),
      minOrder: money,
      shipping: money,
      freeShippingFrom: money.nullable(),
      note: sentence,
    }),
  ),
});

export const quality = z.strictObject({
  key,
  material: key,
  supplier: key,
  supplierCode: z.string(),
  grade: z.string(),
  origin: z.string(),
  preferred: z.boolean(),
  /** full: the constituents named are all that matter; declared: only what must be declared; unknown: nothing reliable. */
  completeness: z.enum(['full', 'declared', 'unknown']),
  declaration: z.strictObject({ title: z.string(), date, note: sentence }).nullable(),
  densityGPerMl: z.number().min(0.5).max(2).nullable(),
  form,
  colour: z.string(),
  warmToC: z.number().min(25).max(80).nullable(),
  offers: z.array(
    z.strictObject({
      packAmount: z.number().positive(),
      packUnit: z.enum(['g', 'mL']),
      price: money,
      currency: z.literal('EUR'),
      date,
    }),
  ),
  constituents: z.array(
    z.strictObject({
      constituent: key,
      minPct: percent,
      typicalPct: percent,
      maxPct: percent,
      ...provenance,
    }),
  ),
});

export const qualityFile = z.strictObject({ family: key, note: sentence, qualities: z.array(quality) });

/** Product categories. `exposure` is our reading of the category for rules that speak of leave-on and rinse-off. */
export const categoryFile = z.strictObject({
  note: sentence,
  categories: z.array(
    z.strictObject({
      code: z.string(),
      description: sentence,
      exposure: z.enum(['leave-on', 'rinse-off', 'oral', 'household', 'no skin contact']),
      ...provenance,
    }),
  ),
});

export const limit = z.strictObject({
  id: key,
  name: z.string(),
  kind: z.enum(['restriction', 'prohibition', 'specification']),
  terms: z.array(z.strictObject({ constituent: key, factor: z.number().positive() })).min(1),
  /** Per cent by mass in the finished product. A category that is missing has no figure here: not the same as no limit. */
  maxPctByCategory: z.record(z.string(), percent),
  /** Categories where the document itself says that there is no restriction. */
  unrestrictedCategories: z.array(z.string()).optional(),
  /** A demand on the material itself. */
  maxPeroxideMmolPerL: z.number().positive().optional(),
  ...provenance,
  note: z.string(),
});

export const limitSetFile = z.strictObject({
  key,
  title: z.string(),
  edition: z.string(),
  date,
  scope: sentence,
  ...provenance,
  limits: z.array(limit),
});

export const allergenFile = z.strictObject({
  key,
  title: z.string(),
  edition: z.string(),
  date,
  scope: sentence,
  ...provenance,
  entries: z.array(
    z.strictObject({
      entry: z.int(),
      labelName: z.string(),
      cas: z.array(z.string()),
      constituents: z.array(key),
      naturalComplex: z.boolean(),
      leaveOnPct: percent,
      rinseOffPct: percent,
      inOriginal26: z.boolean(),
      /** Last days for products that follow only the earlier list; null where the duty is old. */
      placeOnMarketUntil: date.nullable(),
      makeAvailableUntil: date.nullable(),
      ...provenance,
    }),
  ),
});

export const peopleFile = z.strictObject({
  note: sentence,
  house: z.strictObject({ name: z.string(), currency: z.literal('EUR'), timeZone: z.string() }),
  members: z.array(
    z.strictObject({
      key,
      name: z.string(),
      email: z.email().regex(/\.example$/),
      roles: z.array(z.enum(['owner', 'perfumer', 'evaluator', 'buyer', 'safety', 'student'])).min(1),
    }),
  ),
});

export type DemoMaterial = z.infer<typeof material>;
export type DemoQuality = z.infer<typeof quality>;
export type DemoLimitSet = z.infer<typeof limitSetFile>;
export type DemoProfile = z.infer<typeof profile>;
