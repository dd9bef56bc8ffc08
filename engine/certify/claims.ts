import type { BlendProblem, BlendSolution } from '../contract';
import { profileAngle } from '../odour/angle';
import { type Closeness, closenessParts, stackedProfile } from './objective';
import { dot } from './vectors';

/** A value that is no sum of squares is exact to this, relative to its size. */
const SAME = 1e-9;

interface Evidence {
  problem: BlendProblem;
  solution: BlendSolution;
  x: Float64Array;
  y: Float64Array;
  closeness: Closeness;
}

/** Whether the values an answer shows (distance, price, strength, impacts, ...) are those of its mass shares. */
export function claimsHold(evidence: Evidence, tolerance: number): boolean {
  return (
    closenessHolds(evidence, tolerance) && massValuesHold(evidence) && impactsHold(evidence) && smellHolds(evidence)
  );
}

/** Distances are compared by their squares, on the objective's scale: a root would magnify rounding near 0. */
function closenessHolds({ solution, y, closeness }: Evidence, tolerance: number): boolean {
  const { far, spread } = closenessParts(closeness, y);
  return (
    near(solution.objective, far + spread, tolerance) &&
    near(closeness.totalWeight * solution.distance ** 2, far, tolerance) &&
    near(closeness.totalWeight * solution.expectedDistance ** 2, far + spread, tolerance) &&
    solution.distance >= 0 &&
    solution.bound <= solution.objective + tolerance
  );
}

function massValuesHold({ problem, solution, x }: Evidence): boolean {
  const total = (amount: (index: number) => number) => x.reduce((sum, share, index) => sum + share * amount(index), 0);
  const { candidates } = problem;
  const cost = total((index) => candidates[index]!.costPerKg);
  const strength = total((index) => candidates[index]!.strength);
  return (
    same(solution.costPerKg, cost) &&
    same(solution.strength, strength) &&
    same(solution.costPerImpact, cost / strength) &&
    near(
      solution.natural,
      total((index) => candidates[index]!.natural ?? 0),
      SAME,
    )
  );
}

function impactsHold({ problem, solution, y }: Evidence): boolean {
  const impacts = new Map(problem.candidates.map((candidate, index) => [candidate.id, y[index]!]));
  return solution.lines.every((line) => same(line.impact, impacts.get(line.id)!));
}

/** The profile is the fresh blend's; the angle is between all stages' profiles and targets, stacked. */
function smellHolds({ problem, solution, y, closeness }: Evidence): boolean {
  const stacked = stackedProfile(closeness, y);
  const angle = profileAngle(stacked, closeness.target, closeness.weights);
  if (solution.angle === null || angle === null) {
    if (solution.angle !== angle) return false;
  } else if (!near(solution.angle, angle, 1e-7)) return false;
  return Array.from(problem.target).every((_, facet) => {
    const column = Float64Array.from(problem.candidates, (candidate) => candidate.profile[facet]!);
    const size = column.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
    return near(solution.profile?.[facet], dot(column, y), SAME * size);
  });
}

function same(claimed: number, found: number): boolean {
  return near(claimed, found, SAME * Math.abs(found));
}

function near(claimed: number | undefined, found: number, tolerance: number): boolean {
  return typeof claimed === 'number' && Math.abs(claimed - found) <= tolerance;
}
