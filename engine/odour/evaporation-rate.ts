import { EngineInputError } from '../errors';
import { checkObject, checkOptional } from '../input/fields';

/** Half-lives on a blotter, in hours, where only the place in the scent is known: common practice, not a measurement. */
const HALF_LIVES = { top: 0.3, heart: 3, base: 30 } as const;
export type NoteClass = keyof typeof HALF_LIVES;

export interface RateEstimate {
  perHour: number;
  basis: 'vapour pressure' | 'class';
}

/** 20 mg of mean molar mass 150 g/mol on 10 cm2 of paper at 25 degrees C, through a film that lets 1 mm/s pass. */
const BLOTTER = { moles: 0.02 / 150, areaM2: 1e-3, filmMPerS: 1e-3, kelvin: 298.15 };
const GAS_CONSTANT = 8.314462618;
const SECONDS_PER_HOUR = 3600;

/**
 * How fast a material leaves a blotter, 1/h; null where nothing is known of it.
 *
 * From its vapour pressure by film theory, k = h A P / (R T N_0), at the stated blotter; the pressure's order of
 * magnitude is what it stands on. Otherwise from its class by half-life, k = ln 2 / half-life.
 *
 * @throws EngineInputError if the pressure is not a positive number, or the class is unknown.
 */
export function estimateEvaporation(evidence: {
  vapourPressurePa?: number;
  noteClass?: NoteClass;
}): RateEstimate | null {
  checkObject(evidence, 'evidence');
  const { vapourPressurePa, noteClass } = evidence;
  checkOptional(vapourPressurePa, 'vapourPressurePa', { min: 1e-15, max: 1e9 });
  if (vapourPressurePa !== undefined) {
    const molesPerS = (BLOTTER.filmMPerS * BLOTTER.areaM2 * vapourPressurePa) / (GAS_CONSTANT * BLOTTER.kelvin);
    return { perHour: (molesPerS / BLOTTER.moles) * SECONDS_PER_HOUR, basis: 'vapour pressure' };
  }
  if (noteClass === undefined) return null;
  if (typeof noteClass !== 'string' || !Object.hasOwn(HALF_LIVES, noteClass)) {
    throw new EngineInputError('noteClass', `noteClass must be one of ${Object.keys(HALF_LIVES).join(', ')}.`);
  }
  return { perHour: Math.LN2 / HALF_LIVES[noteClass], basis: 'class' };
}
