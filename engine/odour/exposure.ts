/**
 * Raoult evaporation through the exposure s, where ds = dt / N and N is all that is left (Rayleigh 1902 for distillation;
 * Stiver and Mackay 1984 for oil). With it every line decays on its own, n_i = n_i0 exp(-K_i s), and the time is
 *
 *   t(s) = n_R s + sum_i (n_i0 / K_i) (1 - exp(-K_i s))
 *
 * so that there is no integrator, no step size and no stiffness.
 */
export interface Evaporation {
  /** n_i0, amounts at the start. */
  amounts: Float64Array;
  /** K_i, amount per hour at full share. */
  rates: Float64Array;
  /** n_R: what never evaporates. A line with rate 0 is carrier too. */
  carrier: number;
}

/**
 * Rates are at most 30 decades apart in any input that is let in, and one decade costs Newton a few steps: this is
 * never reached, and only guards against a fault here.
 */
const MOST_STEPS = 10_000;

/** The time at which everything has evaporated: sum n_i0 / K_i; infinite with carrier. */
export function endTime({ amounts, rates, carrier }: Evaporation): number {
  if (carrier > 0) return Number.POSITIVE_INFINITY;
  return amounts.reduce((sum, amount, line) => sum + (amount === 0 ? 0 : amount / rates[line]!), 0);
}

/**
 * The exposure at a time before the end. t(s) is increasing and concave, so Newton from s = t / N_0 climbs to the root
 * from below without overshooting; it ends where rounding leaves nothing to climb.
 */
export function exposureAt(hours: number, evaporation: Evaporation): number {
  let exposure = hours / left(0, evaporation);
  for (let step = 0; step < MOST_STEPS; step++) {
    const climbed = exposure + (hours - timeAt(exposure, evaporation)) / left(exposure, evaporation);
    if (!(climbed > exposure)) break;
    exposure = climbed;
  }
  return exposure;
}

function timeAt(exposure: number, { amounts, rates, carrier }: Evaporation): number {
  let hours = carrier * exposure;
  for (const [line, amount] of amounts.entries()) {
    const rate = rates[line]!;
    hours += rate > 0 ? (-amount / rate) * Math.expm1(-rate * exposure) : amount * exposure;
  }
  return hours;
}

/** N(s) = dt/ds. */
function left(exposure: number, { amounts, rates, carrier }: Evaporation): number {
  return amounts.reduce((sum, amount, line) => sum + amount * Math.exp(-rates[line]! * exposure), carrier);
}
