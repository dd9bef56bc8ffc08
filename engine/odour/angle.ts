import { ANY, checkVector, NOT_NEGATIVE } from '../input/fields';
import { arctangent } from '../portable/arctangent';

/**
 * The angle between two facet profiles under the facets' weights, in radians; null where a profile is zero, because
 * nothing smells like nothing.
 *
 * By 2 atan2(|u - v|, |u + v|) with unit vectors u and v (W. Kahan's form): the arc cosine would lose half the digits
 * for profiles that are nearly alike, which are the ones of interest. Sums and means of profiles have the same angle.
 *
 * @throws EngineInputError if the lengths differ or a value is not a finite number.
 */
export function profileAngle(a: ArrayLike<number>, b: ArrayLike<number>, weights?: ArrayLike<number>): number | null {
  const facets = checkVector(a, 'a', ANY);
  checkVector(b, 'b', ANY, facets);
  if (weights) checkVector(weights, 'weights', NOT_NEGATIVE, facets);
  const u = unit(a, weights);
  const v = unit(b, weights);
  if (!u || !v) return null;
  let difference = 0;
  let sum = 0;
  for (let facet = 0; facet < facets; facet++) {
    difference += (u[facet]! - v[facet]!) ** 2;
    sum += (u[facet]! + v[facet]!) ** 2;
  }
  return 2 * arctangent(Math.sqrt(difference), Math.sqrt(sum));
}

/** Scaled by the largest value first, so that no square of a tiny profile vanishes. */
function unit(vector: ArrayLike<number>, weights: ArrayLike<number> | undefined): Float64Array | null {
  const scaled = Float64Array.from(vector, (value, facet) => value * Math.sqrt(weights?.[facet] ?? 1));
  const largest = scaled.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  if (!(largest > 0)) return null;
  for (let facet = 0; facet < scaled.length; facet++) scaled[facet]! /= largest;
  const length = Math.sqrt(scaled.reduce((total, value) => total + value * value, 0));
  return scaled.map((value) => value / length);
}
