import { checkWhole } from '../input/fields';

/** Two samples are alike and one is odd: who cannot tell picks the odd one in a third of the cases. */
export const GUESSING = 1 / 3;
export const ALPHA = 0.05;
/** The largest panel that makes sense, and for which the sums stay exact to ten digits. */
export const MOST_ASSESSORS = 1000;

/**
 * The triangle test (ISO 4120): can assessors tell two samples apart? `pValue` is the chance that at least so many
 * would be right by guessing alone, by the exact binomial distribution; `critical` the least number right at which that
 * chance is 0.05 or below, null where even all of them would not be enough, so that nothing can be decided.
 *
 * A p-value above 0.05 does not say that the samples are the same: see `trianglePower` and `triangleSimilarity`.
 *
 * @throws EngineInputError if the numbers are not whole, or more are right than took part.
 */
export function triangleTest(assessors: number, correct: number): { pValue: number; critical: number | null } {
  checkWhole(assessors, 'assessors', { min: 1, max: MOST_ASSESSORS });
  checkWhole(correct, 'correct', { min: 0, max: assessors });
  return { pValue: atLeast(assessors, GUESSING)[correct]!, critical: criticalNumber(assessors) };
}

/** The least number right with P(X >= c) <= 0.05, or null. */
export function criticalNumber(assessors: number): number | null {
  const critical = atLeast(assessors, GUESSING).findIndex((chance) => chance <= ALPHA);
  return critical <= assessors ? critical : null;
}

/** P(X >= c) for every c from 0 to n + 1, X binomial; summed from the small end, terms by logarithm so that none vanishes early. */
export function atLeast(n: number, chance: number): Float64Array {
  const tails = new Float64Array(n + 2);
  let logTerm = n * Math.log(chance);
  for (let right = n; right >= 0; right--) {
    tails[right] = tails[right + 1]! + Math.exp(logTerm);
    logTerm += Math.log((right * (1 - chance)) / ((n - right + 1) * chance));
  }
  tails[0] = 1;
  return tails;
}
