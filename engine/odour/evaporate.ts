import type { BlendLine } from '../contract';
import { checkList, checkNumber, checkObject, NOT_NEGATIVE } from '../input/fields';
import { checkLines } from '../input/material';
import { EXPONENT } from './blend-profile';
import { type Evaporation, endTime, exposureAt } from './exposure';
import { impactShares, mixedProfile } from './impact';

export interface EvaporatingBlend {
  hours: number;
  /** What the rest smells of; zero when nothing that smells is left. */
  profile: Float64Array;
  /** The fraction of each line that is left, 1 at the start. */
  left: Float64Array;
  /** Total impact left, as a fraction of the total at the start. */
  intensity: number;
}

/**
 * A blend at the given hours as it evaporates after Raoult: what is left of each line, what the rest smells of, and
 * how much impact is left.
 *
 * Solved exactly through the exposure (`exposureAt`). Mass stands for moles. K_i = k_i (sum n_0 + n_R), so that k_i is
 * the rate at which a trace of the material would leave the fresh blend; `carrier` n_R is what does not evaporate
 * (paper, skin, residue), in the unit of the shares. With much carrier every line decays on its own, n_i0 exp(-k_i t).
 *
 * @throws EngineInputError if there are no lines, their facets differ, or a number is out of its range.
 */
export function evaporate(
  lines: BlendLine[],
  hours: number[],
  options: { exponent?: number; carrier?: number } = {},
): EvaporatingBlend[] {
  checkLines(lines, 'lines');
  for (const [index, time] of checkList(hours, 'hours').entries()) checkNumber(time, `hours[${index}]`, NOT_NEGATIVE);
  checkObject(options, 'options');
  const { exponent = 1, carrier = 0 } = options;
  checkNumber(exponent, 'options.exponent', EXPONENT);
  checkNumber(carrier, 'options.carrier', NOT_NEGATIVE);
  const evaporation = evaporationOf(lines, carrier);
  const end = endTime(evaporation);
  return hours.map((time) => {
    const exposure = time < end ? exposureAt(time, evaporation) : Number.POSITIVE_INFINITY;
    const left = evaporation.rates.map((rate) => (rate > 0 ? Math.exp(-rate * exposure) : 1));
    return { hours: time, left, ...smellOf(lines, left, exponent) };
  });
}

function evaporationOf(lines: readonly BlendLine[], carrier: number): Evaporation {
  const amounts = Float64Array.from(lines, (line) => line.share);
  const all = amounts.reduce((sum, amount) => sum + amount, carrier);
  const rates = Float64Array.from(lines, (line) => (line.material.evaporation ?? 0) * all);
  const fixed = amounts.reduce((sum, amount, line) => sum + (rates[line] === 0 ? amount : 0), carrier);
  return { amounts: amounts.map((amount, line) => (rates[line] === 0 ? 0 : amount)), rates, carrier: fixed };
}

function smellOf(lines: readonly BlendLine[], left: Float64Array, exponent: number) {
  const strengths = lines.map((line) => line.material.strength);
  const amounts = left.map((fraction, line) => fraction * lines[line]!.share);
  const impacts = impactShares(strengths, amounts, exponent);
  const fresh = impactShares(
    strengths,
    lines.map((line) => line.share),
    exponent,
  );
  return {
    profile: mixedProfile(
      lines.map((line) => line.material.profile),
      impacts,
    ),
    intensity: fresh.reduce((sum, impact, line) => sum + impact * left[line]! ** exponent, 0),
  };
}
