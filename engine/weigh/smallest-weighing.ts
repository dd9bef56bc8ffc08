import { checkNumber, checkObject } from '../input/fields';

/** A balance: its readability d, and the standard deviation s of repeated weighings where it was measured; in grams. */
export interface Balance {
  readabilityGrams: number;
  repeatabilityGrams?: number;
}

/** No balance repeats itself better than this part of its readability (USP <41>). */
const LEAST_REPEATABILITY = 0.41;
const GRAMS = { min: 1e-9, max: 1e9 };

/**
 * The least mass that the balance weighs to within `tolerance`: 2 s / m <= tolerance, the repeatability criterion of
 * USP <41>, which asks 0.001; fragrance work is commonly content with 0.01.
 *
 * @throws EngineInputError if a number is out of its range.
 */
export function smallestWeighing(balance: Balance, tolerance: number): number {
  checkObject(balance, 'balance');
  const readability = checkNumber(balance.readabilityGrams, 'balance.readabilityGrams', GRAMS);
  checkNumber(tolerance, 'tolerance', { min: 1e-6, max: 1 });
  const { repeatabilityGrams = 0 } = balance;
  checkNumber(repeatabilityGrams, 'balance.repeatabilityGrams', { min: 0, max: GRAMS.max });
  return (2 * Math.max(repeatabilityGrams, LEAST_REPEATABILITY * readability)) / tolerance;
}
