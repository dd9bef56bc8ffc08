import { z } from 'zod';
import { Decimal } from './decimal';
import {
  decimalField,
  fractionField,
  idField,
  optionalDecimal,
  optionalFraction,
  optionalText,
  strictFields,
  textField,
} from './input-fields';
import { revisionField } from './material';
import { COMPLETENESS, FORMS } from './material-words';

/* What a person may say of a quality: one supplier's grade of a material. */

const constituentRange = strictFields({
  constituentId: idField('a constituent'),
  minFraction: fractionField('Minimum'),
  typicalFraction: optionalFraction('Typical'),
  maxFraction: fractionField('Maximum'),
  source: textField('Where the range is known from', { min: 1, max: 300 }),
}).superRefine((range, context) => {
  const fault = rangeFault(range);
  if (fault) context.addIssue({ code: 'custom', path: [fault.field], message: fault.sentence });
});

const percent = (fraction: string) => `${new Decimal(fraction).times(100).toFixed()} %`;

interface Range {
  minFraction: string;
  typicalFraction: string | null;
  maxFraction: string;
}

/** Minimum <= typical <= maximum, or the sentence that says which two clash. */
function rangeFault({ minFraction: min, typicalFraction: typical, maxFraction: max }: Range) {
  if (new Decimal(min).gt(max))
    return { field: 'maxFraction', sentence: `Maximum ${percent(max)} is below the minimum ${percent(min)}.` };
  if (typical !== null && new Decimal(typical).lt(min))
    return { field: 'typicalFraction', sentence: `Typical ${percent(typical)} is below the minimum ${percent(min)}.` };
  if (typical !== null && new Decimal(typical).gt(max))
    return { field: 'typicalFraction', sentence: `Typical ${percent(typical)} is above the maximum ${percent(max)}.` };
  return null;
}

export const constituentList = z
  .array(constituentRange, { error: 'Constituents must be a list.' })
  .max(300, 'At most 300 constituents.')
  .superRefine((ranges, context) => {
    const seen = new Set<string>();
    for (const [at, { constituentId }] of ranges.entries()) {
      if (seen.has(constituentId))
        context.addIssue({ code: 'custom', path: [at, 'constituentId'], message: 'This constituent is there twice.' });
      seen.add(constituentId);
    }
  });

/** A natural complex counted as a whole, beside what it contains: it stays out of sums. */
export const isWhole = (slug: string) => slug.startsWith('whole-');

/** Minima must leave room for each other; maxima may exceed 100 % together, for they never all occur at once. */
export function minimaFault(ranges: readonly { slug: string; minFraction: string }[]): string | null {
  const sum = ranges
    .filter(({ slug }) => !isWhole(slug))
    .reduce((total, { minFraction }) => total.plus(minFraction), new Decimal(0));
  return sum.gt(1)
    ? `The minima add up to ${sum.times(100).toFixed()} %; together they can be at most 100 %. One of them is too high.`
    : null;
}

export const offerInput = strictFields({
  /** Of an offer that is there already; left out for a new one. */
  id: idField('an offer').optional(),
  packAmount: decimalField('Pack size', { above: '0', atMost: '1000000', places: 6 }),
  packUnit: z.enum(['g', 'mL'], { error: 'A pack is measured in g or mL.' }),
  price: decimalField('Price', { above: '0', atMost: '9999999', places: 4 }),
  currency: z
    .string({ error: 'Currency must be text.' })
    .regex(/^[A-Z]{3}$/, 'Currency must be three capital letters, such as EUR.'),
  offeredOn: z.iso.date({ error: 'The day of the offer must be a date, such as 2026-03-09.' }),
});
export type OfferInput = z.output<typeof offerInput>;

export const offerList = z.array(offerInput, { error: 'Offers must be a list.' }).max(100, 'At most 100 offers.');

export const qualityInput = strictFields({
  supplierId: idField('a supplier'),
  preferred: z.boolean({ error: 'Say whether the material shows this quality: true or false.' }).default(false),
  code: textField('Supplier’s code', { min: 1, max: 60 }),
  grade: textField('Grade', { max: 120 }).default(''),
  origin: optionalText('Origin', 120),
  completeness: z.enum(COMPLETENESS, { error: 'Completeness must be full, declared or unknown.' }),
  compositionSource: textField('The document that states the composition', { max: 400 }).default(''),
  densityGPerMl: optionalDecimal('Density', { unit: 'g/mL', above: '0', atMost: '25', places: 4 }),
  form: z.enum(FORMS, { error: `Form must be one of: ${FORMS.join(', ')}.` }),
  warmToC: optionalDecimal('Warming temperature', { unit: '°C', atLeast: '0', atMost: '120', places: 1 }),
  flashPointC: optionalDecimal('Flash point', { unit: '°C', atLeast: '-100', atMost: '400', places: 1 }),
  colour: optionalText('Colour', 80),
  constituents: constituentList.default([]),
  offers: offerList.default([]),
}).superRefine((quality, context) => {
  if (quality.completeness !== 'unknown' && quality.compositionSource === '')
    context.addIssue({
      code: 'custom',
      path: ['compositionSource'],
      message: 'Name the document that states the composition, or call it unknown.',
    });
});
export type QualityInput = z.output<typeof qualityInput>;
export const qualityUpdate = strictFields({ revision: revisionField, quality: qualityInput });

/** For those who keep prices without writing materials, and those who keep compositions. */
export const offersUpdate = strictFields({ revision: revisionField, offers: offerList });
export const compositionUpdate = strictFields({
  revision: revisionField,
  completeness: z.enum(COMPLETENESS, { error: 'Completeness must be full, declared or unknown.' }),
  compositionSource: textField('The document that states the composition', { min: 1, max: 400 }),
  constituents: constituentList,
});
export type CompositionInput = z.output<typeof compositionUpdate>;

export const supplierInput = strictFields({
  name: textField('Supplier', { min: 2, max: 120 }),
  note: optionalText('Note', 400),
});
export const supplierView = z.strictObject({ id: z.string(), name: z.string(), note: z.string().nullable() });
export const supplierList = z.strictObject({ items: z.array(supplierView) });
export type SupplierView = z.infer<typeof supplierView>;
