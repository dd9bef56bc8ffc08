import { EngineInputError } from '../errors';
import { checkList, checkNumber, checkObject, checkOptional, NOT_NEGATIVE } from '../input/fields';

/** From what nobody smells to what fills a room; each class is ten times the one before. */
export const STRENGTH_CLASSES = ['odourless', 'faint', 'weak', 'medium', 'strong', 'very strong', 'mighty'] as const;
export type StrengthClass = (typeof STRENGTH_CLASSES)[number];

export interface StrengthEvidence {
  /** At 25 degrees C. */
  vapourPressurePa?: number;
  /** Detection thresholds in air, as many as are published. */
  thresholdsUgPerM3?: number[];
  strengthClass?: StrengthClass;
}

export interface StrengthEstimate {
  /** Impact per gram; linalool = 1. */
  strength: number;
  /** The strength is known within this factor, up or down. */
  spreadFactor: number;
  basis: 'vapour pressure and threshold' | 'class';
}

/**
 * The material whose strength is 1: linalool. 21 Pa is a rounded, illustrative vapour pressure; the threshold, 5.8
 * microgram/m3, follows from its dose-response curve (Wakayama et al. 2019: 50.63, 0.08, 0.65, detection at 1.4).
 */
const LINALOOL = { vapourPressurePa: 21, thresholdUgPerM3: 5.8342 };

/**
 * Thresholds are the weak link: one compilation (Abraham et al. 2012) holds two for limonene, a factor 260 apart, so a
 * single one is trusted within the root of that. Several that agree narrow it, but not below what an ideal headspace
 * may be wrong by: a factor 5 for acetone in pentane (Poling et al., 5th edition, example 8-12).
 */
const ONE_THRESHOLD_SPREAD = Math.sqrt(260);
const IDEAL_HEADSPACE_SPREAD = 5;
/** A nose puts a material into the right class or one beside it: our own judgement, not a measurement. */
const CLASS_SPREAD = 10;

const MEASURED = { min: 1e-15, max: 1e15 };

/**
 * How strong a material is per gram, with the factor within which that is known; null where nothing is known of it.
 *
 * From vapour pressure P and thresholds: the odour activity value per gram in an ideal headspace. A gram brings 1/M
 * moles to the liquid and each mole brings M grams to the air, so the molar mass cancels, and what is left is P over the
 * threshold (their geometric mean), relative to linalool. Otherwise from its class.
 *
 * @throws EngineInputError if a value is not a positive number, or the class is unknown.
 */
export function estimateStrength(evidence: StrengthEvidence): StrengthEstimate | null {
  checkObject(evidence, 'evidence');
  const { vapourPressurePa, thresholdsUgPerM3 = [], strengthClass } = evidence;
  checkOptional(vapourPressurePa, 'vapourPressurePa', MEASURED);
  for (const [index, threshold] of checkList(thresholdsUgPerM3, 'thresholdsUgPerM3').entries()) {
    checkNumber(threshold, `thresholdsUgPerM3[${index}]`, MEASURED);
  }
  if (vapourPressurePa !== undefined && thresholdsUgPerM3.length > 0) {
    return fromThresholds(vapourPressurePa, thresholdsUgPerM3);
  }
  return strengthClass === undefined ? null : fromClass(strengthClass);
}

/**
 * A strength as it may be shown: two digits, because no more are known.
 *
 * @throws EngineInputError if it is not a number from 0.
 */
export function twoDigits(strength: number): number {
  checkNumber(strength, 'strength', NOT_NEGATIVE);
  return Number(strength.toPrecision(2));
}

function fromThresholds(vapourPressurePa: number, thresholds: readonly number[]): StrengthEstimate {
  const logs = thresholds.map(Math.log);
  const mean = logs.reduce((sum, log) => sum + log, 0) / logs.length;
  const widest = Math.exp(Math.max(...logs.map((log) => Math.abs(log - mean))));
  return {
    strength: vapourPressurePa / Math.exp(mean) / (LINALOOL.vapourPressurePa / LINALOOL.thresholdUgPerM3),
    spreadFactor: thresholds.length === 1 ? ONE_THRESHOLD_SPREAD : Math.max(widest, IDEAL_HEADSPACE_SPREAD),
    basis: 'vapour pressure and threshold',
  };
}

/** `medium` is linalool's class; odourless is exactly 0, and that is certain. */
function fromClass(strengthClass: StrengthClass): StrengthEstimate {
  const index = STRENGTH_CLASSES.indexOf(strengthClass);
  if (index < 0) {
    throw new EngineInputError('strengthClass', `strengthClass must be one of ${STRENGTH_CLASSES.join(', ')}.`);
  }
  if (index === 0) return { strength: 0, spreadFactor: 1, basis: 'class' };
  return { strength: 10 ** (index - STRENGTH_CLASSES.indexOf('medium')), spreadFactor: CLASS_SPREAD, basis: 'class' };
}
