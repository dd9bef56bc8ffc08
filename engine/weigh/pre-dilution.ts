import { checkNumber } from '../input/fields';

export interface PreDilution {
  /** Mass fraction of the material in the stock; 1 means as it is. */
  fraction: number;
  /** To weigh of the stock, and how much solvent that brings, which the formula must count. */
  stockGrams: number;
  solventGrams: number;
}

/** The usual stocks of a bench, strongest first. */
const STOCKS = [1, 0.1, 0.01, 0.001];
const GRAMS = { min: 1e-15, max: 1e9 };
/** A line that misses the smallest weighing by rounding only does not need a stock. */
const ROUNDING = 1e-9;

/**
 * The strongest decimal stock of which a line can still be weighed: at least `smallestGrams` must go on the balance.
 * Null where even the thinnest is not enough.
 *
 * @throws EngineInputError if a mass is not positive.
 */
export function preDilution(grams: number, smallestGrams: number): PreDilution | null {
  checkNumber(grams, 'grams', GRAMS);
  checkNumber(smallestGrams, 'smallestGrams', GRAMS);
  const fraction = STOCKS.find((stock) => grams / stock >= smallestGrams * (1 - ROUNDING));
  if (fraction === undefined) return null;
  const stockGrams = grams / fraction;
  return { fraction, stockGrams, solventGrams: stockGrams - grams };
}
