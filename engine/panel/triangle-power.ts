import { checkNumber, checkWhole, FRACTION } from '../input/fields';
import { atLeast, criticalNumber, GUESSING, MOST_ASSESSORS } from './triangle-test';

/**
 * The chance that a triangle test at 0.05 finds a difference that a fraction of assessors truly perceives (the others
 * guess). Null where the panel is too small to find anything. Small power means that "not significant" is inconclusive.
 *
 * @throws EngineInputError if the panel is not a whole number, or the fraction is not from 0 to 1.
 */
export function trianglePower(assessors: number, perceiving: number): number | null {
  checkWhole(assessors, 'assessors', { min: 1, max: MOST_ASSESSORS });
  checkNumber(perceiving, 'perceiving', FRACTION);
  const critical = criticalNumber(assessors);
  if (critical === null) return null;
  const chance = GUESSING + perceiving * (1 - GUESSING);
  return chance === 1 ? 1 : atLeast(assessors, chance)[critical]!;
}

/** One-sided 95 % point of the normal distribution. */
const NORMAL_95 = 1.645;

/**
 * The largest fraction of people who perceive the difference that is still compatible with the result, with 95 %
 * confidence (ISO 4120's formula for similarity): the claim "the same" means that this is small.
 *
 * @throws EngineInputError if the numbers are not whole, or more are right than took part.
 */
export function triangleSimilarity(assessors: number, correct: number): number {
  checkWhole(assessors, 'assessors', { min: 1, max: MOST_ASSESSORS });
  checkWhole(correct, 'correct', { min: 0, max: assessors });
  const share = correct / assessors;
  const limit = 1.5 * share - 0.5 + 1.5 * NORMAL_95 * Math.sqrt((share * (1 - share)) / assessors);
  return Math.min(1, Math.max(0, limit));
}
