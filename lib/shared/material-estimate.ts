import { estimateEvaporation, estimateStrength, twoDigits } from '@/engine/index';
import type { StrengthClass } from '@/engine/odour/strength';

/** What is known of a material that an estimate can stand on; null where nothing is. */
export interface Evidence {
  vapourPressurePa: number | null;
  odourThresholdUgPerM3: number | null;
  strengthClass: StrengthClass;
}

export interface StrengthProposal {
  /** Impact per gram, linalool = 1; two digits, because no more are known. */
  strength: number;
  spread: number;
  source: string;
}

const MEASURED_STRENGTH =
  'Estimated from vapour pressure and odour threshold in an ideal headspace, linalool = 1; thresholds of two laboratories can lie a factor 260 apart (Abraham et al. 2012)';
const CLASS_STRENGTH = 'Estimated from the strength in words, ten times a class; our own judgement, not a measurement';

/** The strength that the evidence speaks for: from vapour pressure and threshold where both are known, else the words. */
export function proposedStrength(known: Evidence): StrengthProposal | null {
  const measured = known.vapourPressurePa !== null && known.odourThresholdUgPerM3 !== null;
  const estimate = estimateStrength({
    vapourPressurePa: known.vapourPressurePa ?? undefined,
    thresholdsUgPerM3: known.odourThresholdUgPerM3 === null ? [] : [known.odourThresholdUgPerM3],
    strengthClass: known.strengthClass,
  });
  if (!estimate) return null;
  return {
    strength: twoDigits(estimate.strength),
    spread: twoDigits(estimate.spreadFactor),
    source: measured ? MEASURED_STRENGTH : CLASS_STRENGTH,
  };
}

/** The evaporation from a blotter that the vapour pressure speaks for, 1/h, two digits; null without one. */
export function proposedEvaporation(vapourPressurePa: number | null): { perHour: number; source: string } | null {
  const estimate = vapourPressurePa === null ? null : estimateEvaporation({ vapourPressurePa });
  return (
    estimate && {
      perHour: twoDigits(estimate.perHour),
      source: 'Estimated from the vapour pressure by film theory: 20 mg on 10 cm² of paper at 25 °C, 1 mm/s',
    }
  );
}
