import type { WeightedRows } from './multipliers';
import { type Closeness, closenessGradient } from './objective';
import { dot } from './vectors';

/** Rounding of a sum, as a multiple of the size of its terms: generous against 2^-53 times the number of rules. */
const ROUNDING = 1e-13;

/**
 * A number that no blend allowed by the rules can undercut, for the convex problem.
 *
 * E is convex, so it lies above its tangent at y; a weighted sum of the rules, each <= 0, may be added; the least value
 * of that linear function over all impact shares is taken at one single material (weak duality):
 *
 *   bound = E - gap,   gap = grad.y - min over s_i > 0 of (grad_i + (G'lambda)_i / s_i),   (G'lambda)_i >= 0 where s_i = 0
 *
 * Any y and lambda >= 0 give a true bound; good ones give a tight bound. Where an odourless material breaks the
 * condition, only the trivial bound 0 is left.
 */
export function lowerBound(
  closeness: Closeness,
  strengths: Float64Array,
  { objective, y, weighted }: { objective: number; y: Float64Array; weighted: WeightedRows },
): number {
  const gradient = closenessGradient(closeness, y);
  let least = Number.POSITIVE_INFINITY;
  for (const [index, strength] of strengths.entries()) {
    const price = weighted.sum[index]!;
    if (strength > 0) least = Math.min(least, gradient[index]! + price / strength);
    else if (price < -ROUNDING * weighted.size[index]!) return 0;
  }
  return Math.max(0, objective - (dot(gradient, y) - least));
}

/**
 * Whether the multipliers prove that no blend keeps all rules (Farkas 1902): the rules, weighted and added, would demand
 * sum_i (G'lambda)_i z_i <= 0, while (G'lambda)_i >= s_i makes that sum at least 1. Half of s_i would do as well;
 * what counts is that the sign is beyond rounding.
 */
export function provesInfeasible(weighted: WeightedRows, strengths: Float64Array): boolean {
  return strengths.every((strength, index) => {
    const rounding = ROUNDING * weighted.size[index]!;
    const value = weighted.sum[index]!;
    return strength > 0 ? value >= strength / 2 && value > rounding : value >= -rounding;
  });
}
