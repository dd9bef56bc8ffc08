import { z } from 'zod';
import { casFault } from './cas';
import {
  fractionField,
  idField,
  measureField,
  optionalFraction,
  optionalText,
  strictFields,
  textField,
} from './input-fields';
import { CAUTION_CODES, FACET_PHASES, MATERIAL_KINDS, STRENGTH_CLASSES } from './material-words';

/* What a person may say of a material: one schema for the form, the API and imports. */

const facetIntensity = strictFields({
  facetId: idField('a facet'),
  phase: z.enum(FACET_PHASES, { error: 'The phase must be all, opening, heart or dry.' }),
  intensity: measureField('Intensity', { atLeast: '0', atMost: '10' }),
  /** Between noses, in the same units. */
  sd: measureField('Spread', { atLeast: '0', atMost: '10' }),
});

const caution = strictFields({
  code: z.enum(CAUTION_CODES, { error: `A caution must be one of: ${CAUTION_CODES.join(', ')}.` }),
  source: textField('Where the caution is known from', { min: 1, max: 300 }),
});

const cas = z
  .string({ error: 'A CAS number must be text.' })
  .trim()
  .superRefine((text, context) => {
    const fault = casFault(text);
    if (fault) context.addIssue({ code: 'custom', message: fault });
  });

const optionalMeasure = (name: string, unit: string, rule: { above?: string; atLeast?: string }) =>
  measureField(name, { unit, ...rule })
    .nullable()
    .default(null);

export const materialInput = strictFields({
  name: textField('Name', { min: 2, max: 160 }),
  kind: z.enum(MATERIAL_KINDS, { error: `Kind must be one of: ${MATERIAL_KINDS.join(', ')}.` }),
  botanicalName: optionalText('Botanical name', 160),
  plantPart: optionalText('Plant part', 80),
  chemicalName: optionalText('Chemical name', 200),
  inciName: optionalText('INCI name', 200),
  synonyms: z
    .array(textField('Synonym', { min: 1, max: 160 }), { error: 'Synonyms must be a list of names.' })
    .max(40, 'At most 40 synonyms.')
    .default([]),
  cas: z.array(cas, { error: 'CAS must be a list of numbers.' }).max(20, 'At most 20 CAS numbers.').default([]),
  smell: textField('What it smells like', { max: 4000 }).default(''),
  naturalShare: fractionField('Natural share'),
  strength: measureField('Odour strength', { atLeast: '0', atMost: '1000000' }),
  strengthSpread: measureField('Factor of the strength', { atLeast: '1', atMost: '1000' }).default(1),
  strengthClass: z.enum(STRENGTH_CLASSES, {
    error: `Strength in words must be one of: ${STRENGTH_CLASSES.join(', ')}.`,
  }),
  strengthSource: textField('Where the strength is known from', { min: 1, max: 400 }),
  vapourPressurePa: optionalMeasure('Vapour pressure', 'Pa', { above: '0' }),
  vapourPressureSource: optionalText('Source of the vapour pressure', 400),
  odourThresholdUgPerM3: optionalMeasure('Odour threshold', 'µg/m³', { above: '0' }),
  odourThresholdSource: optionalText('Source of the odour threshold', 400),
  evaporationPerHour: optionalMeasure('Evaporation', 'per hour', { atLeast: '0' }),
  evaporationSource: optionalText('Source of the evaporation', 400),
  usualDilution: optionalFraction('Usual dilution', { aboveZero: true }),
  dilutionSolvent: optionalText('Solvent of the dilution', 80),
  maxShare: optionalFraction('Largest share in a concentrate', { aboveZero: true }),
  note: optionalText('Note', 8000),
  facets: z
    .array(facetIntensity, { error: 'Facets must be a list.' })
    .max(800, 'Too many facet intensities.')
    .default([]),
  cautions: z.array(caution, { error: 'Cautions must be a list.' }).max(CAUTION_CODES.length).default([]),
}).superRefine((material, context) => {
  const fault = (path: (string | number)[], message: string) => context.addIssue({ code: 'custom', path, message });
  for (const [of, where] of SOURCED) {
    if (material[of] !== null && material[where] === null)
      fault([where], `Say where the ${SOURCED_NAMES[of]} is known from, if only “estimate”.`);
  }
  if (material.strengthClass === 'odourless' && material.strength > 0)
    fault(['strength'], `Something odourless has strength 0; it was ${material.strength}.`);
  repeated(material.cas, (value, at) => fault(['cas', at], `CAS number ${value} is there twice.`));
  repeated(
    material.facets.map(({ facetId, phase }) => `${facetId} ${phase}`),
    (_, at) => fault(['facets', at], 'The same facet is there twice in one phase.'),
  );
  repeated(
    material.cautions.map(({ code }) => code),
    (code, at) => fault(['cautions', at], `The caution “${code}” is there twice.`),
  );
});

const SOURCED = [
  ['vapourPressurePa', 'vapourPressureSource'],
  ['odourThresholdUgPerM3', 'odourThresholdSource'],
  ['evaporationPerHour', 'evaporationSource'],
] as const;
const SOURCED_NAMES = {
  vapourPressurePa: 'vapour pressure',
  odourThresholdUgPerM3: 'odour threshold',
  evaporationPerHour: 'evaporation',
};

/** Calls back for every value that came before. */
function repeated(values: readonly string[], told: (value: string, at: number) => void) {
  const seen = new Set<string>();
  for (const [at, value] of values.entries()) {
    if (seen.has(value)) told(value, at);
    seen.add(value);
  }
}

export type MaterialInput = z.output<typeof materialInput>;

/** A write names the revision that it read. */
export const revisionField = z
  .int({ error: 'Send the revision that you read, a whole number.' })
  .min(1, 'Send the revision that you read.');

export const materialUpdate = strictFields({ revision: revisionField, material: materialInput });

/* What leaves the server. `null` is "not known"; a field that a role may not see is not there. */

export const phaseProfiles = z.strictObject({
  opening: z.array(z.number()).optional(),
  heart: z.array(z.number()).optional(),
  dry: z.array(z.number()).optional(),
});

/** A cost per kg, per mL or at equal strength, to the digits of money; `reason` says why there is none. */
export const costView = z.strictObject({ value: z.string().nullable(), reason: z.string().nullable() });

/** What stands in a row of the list. Profiles are in the order of the house's facets. */
export const materialRow = z.strictObject({
  id: z.string(),
  name: z.string(),
  kind: z.enum(MATERIAL_KINDS),
  botanicalName: z.string().nullable(),
  cas: z.array(z.string()),
  profile: z.array(z.number()),
  phases: phaseProfiles.optional(),
  naturalShare: z.string(),
  strength: z.number(),
  strengthClass: z.enum(STRENGTH_CLASSES),
  lastsHours: z.number().nullable(),
  updatedAt: z.string(),
  costPerKg: costView.optional(),
  costAtEqualStrength: costView.optional(),
});
export type MaterialRow = z.infer<typeof materialRow>;

export const materialPage = z.strictObject({
  items: z.array(materialRow),
  total: z.int(),
  nextCursor: z.string().nullable(),
  /** ISO 4217; only with costs. */
  currency: z.string().optional(),
});
export type MaterialPage = z.infer<typeof materialPage>;

export const relatedMaterial = z.strictObject({
  id: z.string(),
  name: z.string(),
  kind: z.enum(MATERIAL_KINDS),
  profile: z.array(z.number()),
  phases: phaseProfiles.optional(),
  lastsHours: z.number().nullable(),
  naturalShare: z.string(),
  similarity: z.number(),
  /** Facets that both have, those first that make them alike. */
  sharedFacetIds: z.array(z.string()),
  costAtEqualStrength: costView.optional(),
});
export const relatedList = z.strictObject({ items: z.array(relatedMaterial) });
export type RelatedMaterial = z.infer<typeof relatedMaterial>;
