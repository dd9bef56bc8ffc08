import { EngineInputError } from '../errors';
import { checkId, checkList, checkNumber, checkObject, checkUnique, NOT_NEGATIVE } from '../input/fields';

export interface WeighedLine {
  id: string;
  grams: number;
  /** The line has a share, but it is less than the balance can show. */
  vanished: boolean;
}

/** A tonne to the milligram: beyond, a double could no longer tell one unit from the next. */
const MOST_UNITS = 1e9;
/** Quotas nearer to each other (or to a whole unit) than this differ by rounding only. */
const SAME_UNITS = 1e-9;

/**
 * The masses to weigh for a batch, each a whole multiple of the balance's readability, their sum exactly the batch
 * (itself rounded to the balance). Shares are taken relative to their sum.
 *
 * Largest remainder (Hamilton's method for seats): every line gets its whole units, and the units that are missing go to
 * the largest remainders, ties by id. So each line is within one unit of its exact mass.
 *
 * @throws EngineInputError if an id comes twice, no share is above 0, or a number is out of its range.
 */
export function roundToBalance(
  shares: { id: string; share: number }[],
  batchGrams: number,
  readability: number,
): WeighedLine[] {
  const sum = checkedSum(shares);
  const units = checkedUnits(batchGrams, readability);
  const lines = shares.map(({ id, share }) => {
    const quota = (share / sum) * units;
    const whole = Math.floor(quota + SAME_UNITS);
    return { id, share, units: whole, remainder: Math.round((quota - whole) / SAME_UNITS) };
  });
  const missing = units - lines.reduce((total, line) => total + line.units, 0);
  const largestFirst = lines
    .filter((line) => line.share > 0)
    .sort((a, b) => b.remainder - a.remainder || (a.id < b.id ? -1 : 1));
  for (const line of largestFirst.slice(0, missing)) line.units += 1;
  return lines.map((line) => ({
    id: line.id,
    grams: inGrams(line.units, readability),
    vanished: line.share > 0 && line.units === 0,
  }));
}

/** Units times readability without binary noise: 3 x 0.1 is 0.3. */
export function inGrams(units: number, readability: number): number {
  return Number((units * readability).toFixed(decimalsOf(readability)));
}

function decimalsOf(value: number): number {
  const [digits, exponent] = String(value).split('e');
  const decimals = (digits!.split('.')[1]?.length ?? 0) - Number(exponent ?? 0);
  return Math.min(100, Math.max(0, decimals));
}

function checkedSum(shares: readonly { id: string; share: number }[]): number {
  let sum = 0;
  for (const [index, line] of checkList(shares, 'shares').entries()) {
    checkObject(line, `shares[${index}]`);
    checkId(line.id, `shares[${index}].id`);
    sum += checkNumber(line.share, `shares[${index}].share`, NOT_NEGATIVE);
  }
  checkUnique(
    shares.map((line) => line.id),
    'shares',
  );
  if (!(sum > 0)) throw new EngineInputError('shares', 'shares must hold a share above 0.');
  return sum;
}

function checkedUnits(batchGrams: number, readability: number): number {
  checkNumber(readability, 'readability', { min: 1e-9, max: 1e6 });
  checkNumber(batchGrams, 'batchGrams', NOT_NEGATIVE);
  const units = Math.round(batchGrams / readability);
  if (units >= 1 && units <= MOST_UNITS) return units;
  throw new EngineInputError(
    'batchGrams',
    `batchGrams must be from 1 to ${MOST_UNITS} times the readability ${readability} g; it was ${batchGrams} g.`,
  );
}
