import type { BlendProblem } from '../contract';
import type { Prepared } from './prepare';

/** Whether a rule counts materials or sets a smallest dose, so that the problem is no longer convex. */
export function hasDiscreteRules({ maxMaterials, minDose = 0 }: BlendProblem): boolean {
  return maxMaterials !== undefined || minDose > 0;
}

/** Materials that every blend uses: kept, required, or with a least share. */
export function mandatory({ problem, materials }: Prepared): number[] {
  const ids = new Set(problem.required ?? []);
  for (const { id, share } of problem.kept ?? []) if (share > 0) ids.add(id);
  for (const { id, minShare = 0 } of materials) if (minShare > 0) ids.add(id);
  return materials.flatMap(({ id }, i) => (ids.has(id) ? [i] : []));
}
