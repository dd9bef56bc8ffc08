import type { BlendProblem } from '../contract';

/** Whether a rule counts materials or sets a smallest dose, so that the problem is no longer convex. */
export function hasDiscreteRules({ maxMaterials, minDose = 0 }: BlendProblem): boolean {
  return maxMaterials !== undefined || minDose > 0;
}
