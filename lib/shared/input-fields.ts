import { z } from 'zod';
import { DECIMAL_TEXT, Decimal, decimalPlaces } from './decimal';

/*
 * Fields of input whose every fault is a sentence that names the field and the reason. Decimals are strings: a number
 * of JSON would have passed through binary floating point.
 */

export function textField(name: string, { min = 0, max }: { min?: number; max: number }) {
  const least = min === 1 ? `${name} is missing.` : `${name} needs at least ${min} characters.`;
  return z
    .string({ error: `${name} must be text.` })
    .trim()
    .min(min, least)
    .max(max, `${name} is longer than ${max} characters.`);
}

/** Text that may be left out: nothing and blanks are null. */
export function optionalText(name: string, max: number) {
  return textField(name, { max })
    .transform((text) => text || null)
    .nullable()
    .default(null);
}

export interface DecimalRange {
  /** Shown after numbers: "g/mL". */
  unit?: string;
  above?: string;
  atLeast?: string;
  atMost?: string;
  places: number;
}

/** A decimal as text, with "Density must be above 0 g/mL; it was -0.9." */
export function decimalField(name: string, range: DecimalRange) {
  return z
    .string({ error: `${name} must be a decimal number as text, such as "0.5".` })
    .trim()
    .superRefine((text, context) => {
      const fault = decimalFault(name, text, range);
      if (fault) context.addIssue({ code: 'custom', message: fault });
    });
}

export const optionalDecimal = (name: string, range: DecimalRange) =>
  decimalField(name, range).nullable().default(null);

function decimalFault(name: string, text: string, { unit = '', above, atLeast, atMost, places }: DecimalRange) {
  if (text === '') return `${name} is missing.`;
  if (!DECIMAL_TEXT.test(text)) return `${name} must be a number; it was “${text}”.`;
  const value = new Decimal(text);
  const [after, shown] = [unit && ` ${unit}`, value.toFixed()];
  if (above !== undefined && value.lte(above)) return `${name} must be above ${above}${after}; it was ${shown}.`;
  if (atLeast !== undefined && value.lt(atLeast))
    return `${name} must be at least ${atLeast}${after}; it was ${shown}.`;
  if (atMost !== undefined && value.gt(atMost)) return `${name} must be at most ${atMost}${after}; it was ${shown}.`;
  if (decimalPlaces(text) > places) return `${name} is kept to ${places} decimal places; it was ${shown}.`;
  return null;
}

/** A fraction 0..1 as text; its faults speak in per cent, as people do. */
export function fractionField(name: string, { aboveZero = false, places = 8 } = {}) {
  return z.string({ error: `${name} must be a fraction as text, such as "0.35".` }).superRefine((text, context) => {
    const fault = fractionFault(name, text, aboveZero, places);
    if (fault) context.addIssue({ code: 'custom', message: fault });
  });
}

export const optionalFraction = (name: string, options: { aboveZero?: boolean } = {}) =>
  fractionField(name, options).nullable().default(null);

function fractionFault(name: string, text: string, aboveZero: boolean, places: number) {
  if (text === '') return `${name} is missing.`;
  if (!DECIMAL_TEXT.test(text)) return `${name} must be a number; it was “${text}”.`;
  const value = new Decimal(text);
  const shown = value.times(100).toFixed();
  if (aboveZero && value.lte(0)) return `${name} must be above 0 %; it was ${shown} %.`;
  if (value.lt(0) || value.gt(1)) return `${name} must be between 0 and 100 %; it was ${shown} %.`;
  if (decimalPlaces(text) > places) return `${name} is kept to ${places - 2} decimal places of a per cent.`;
  return null;
}

/** A measured or estimated number, for which binary floating point is good enough. */
export function measureField(name: string, { unit = '', above, atLeast, atMost }: Omit<DecimalRange, 'places'>) {
  const after = unit && ` ${unit}`;
  const said = (rule: string) => (issue: { input?: unknown }) =>
    `${name} must be ${rule}${after}; it was ${issue.input}.`;
  let field = z.number({ error: `${name} must be a number.` });
  if (above !== undefined) field = field.gt(Number(above), { error: said(`above ${above}`) });
  if (atLeast !== undefined) field = field.gte(Number(atLeast), { error: said(`at least ${atLeast}`) });
  if (atMost !== undefined) field = field.lte(Number(atMost), { error: said(`at most ${atMost}`) });
  return field;
}

/** An id of ours; whether there is such a row is for the database to say. */
export const idField = (name: string) => z.string({ error: `Choose ${name}.` }).length(26, `Choose ${name}.`);

/** A strict object whose unknown keys are named. */
export function strictFields<S extends z.core.$ZodLooseShape>(shape: S) {
  return z.strictObject(shape, {
    error: (issue) =>
      issue.code === 'unrecognized_keys'
        ? `There is no field ${(issue.keys as string[]).map((key) => `“${key}”`).join(', ')} here.`
        : 'It must be an object with its fields.',
  });
}
