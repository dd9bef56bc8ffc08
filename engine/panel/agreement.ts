import { EngineInputError } from '../errors';
import { ANY, checkList, checkVector } from '../input/fields';
import { kendallW } from './kendall-w';
import { meanSquares } from './mean-squares';

export interface Agreement {
  /** Intraclass correlations after Shrout and Fleiss (1979): one assessor (1), or the mean of all k. */
  icc11: number | null;
  icc21: number | null;
  icc31: number | null;
  icc1k: number | null;
  icc2k: number | null;
  icc3k: number | null;
  kendallW: number | null;
}

/** Differences below this part of the largest rating are rounding: they do not count as variation. */
const SAME_RATING = 1e-12;

/**
 * How far assessors agree; rows are samples, columns assessors, every cell filled.
 *
 * icc2k answers "can the panel's mean be trusted", icc21 "what is one more assessor worth", icc3k whether they agree up
 * to how high each one rates; Kendall's W whether they rank alike. An estimate may be negative. Null, not 1, where the
 * ratio has nothing to stand on: nothing varies, or there are fewer than two samples or assessors.
 *
 * @throws EngineInputError if the table is empty or ragged, or a rating is missing: a gap is never filled silently.
 */
export function agreement(ratings: number[][]): Agreement {
  const { n, k, largest } = checkedTable(ratings);
  const none = null;
  if (n < 2 || k < 2) {
    return { icc11: none, icc21: none, icc31: none, icc1k: none, icc2k: none, icc3k: none, kendallW: none };
  }
  const { between, within, assessors, residual } = meanSquares(ratings);
  const nothing = (SAME_RATING * largest) ** 2;
  const ratio = (part: number, whole: number) => (whole > nothing ? part / whole : null);
  const beyondChance = between - within;
  const beyondResidual = between - residual;
  const severity = (assessors - residual) / n;
  return {
    icc11: ratio(beyondChance, between + (k - 1) * within),
    icc21: ratio(beyondResidual, between + (k - 1) * residual + k * severity),
    icc31: ratio(beyondResidual, between + (k - 1) * residual),
    icc1k: ratio(beyondChance, between),
    icc2k: ratio(beyondResidual, between + severity),
    icc3k: ratio(beyondResidual, between),
    kendallW: kendallW(ratings),
  };
}

function checkedTable(ratings: readonly (readonly number[])[]): { n: number; k: number; largest: number } {
  const rows = checkList(ratings, 'ratings');
  if (rows.length === 0) throw new EngineInputError('ratings', 'ratings must have a row for each sample.');
  let k: number | undefined;
  let largest = 0;
  for (const [sample, row] of rows.entries()) {
    checkList(row, `ratings[${sample}]`);
    k = checkVector(row, `ratings[${sample}]`, ANY, k);
    for (const rating of row) largest = Math.max(largest, Math.abs(rating));
  }
  return { n: rows.length, k: k!, largest };
}
