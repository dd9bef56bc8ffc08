import type { BlendProblem, BlendSolution, Certificate } from '../contract';
import { checkProblem } from '../input/problem';
import { lowerBound, provesInfeasible } from './bound';
import { checkSolution } from './check-solution';
import { claimsHold } from './claims';
import { worstViolation } from './feasibility';
import { weightedRows } from './multipliers';
import { closenessOf, closenessParts } from './objective';
import { hasDiscreteRules, type Row, rowsOf } from './rows';
import { dot } from './vectors';

/** A rule is kept if it is exceeded by no more than this, relative to its limit: rounding, no weighable amount. */
export const FEASIBLE = 1e-9;
/** The objective is exact to this, relative to max(objective, sum w t^2). */
export const EXACT = 1e-9;

/**
 * Whether an answer is what it says it is, judged from the problem alone.
 *
 * Writes the rules and the objective from the problem's own words and unscaled data, and takes from the answer only its
 * mass shares and its claimed multipliers. `feasible`, `objective` and `worstViolation` follow from the shares;
 * `bound` from weak duality (`lowerBound`); `infeasibilityProven` from Farkas' lemma. With rules that count materials
 * no bound can be had from multipliers: `boundProven` is false. `agrees` says that everything the answer claims and
 * that can be checked here was found true. Without a blend the objective and the violation are infinite.
 *
 * @throws EngineInputError if the problem is badly put, or the answer names what the problem does not have.
 */
export function certify(problem: BlendProblem, solution: BlendSolution): Certificate {
  checkProblem(problem);
  checkSolution(problem, solution);
  const rows = rowsOf(problem);
  return solution.lines.length > 0 ? certifyBlend(problem, rows, solution) : certifyNone(problem, rows, solution);
}

function certifyBlend(problem: BlendProblem, rows: readonly Row[], solution: BlendSolution): Certificate {
  const shares = new Map(solution.lines.map((line) => [line.id, line.share]));
  const x = Float64Array.from(problem.candidates, (candidate) => shares.get(candidate.id) ?? 0);
  const strengths = Float64Array.from(problem.candidates, (candidate) => candidate.strength);
  const strength = dot(strengths, x);
  if (!(strength > 0)) return odourless;
  const y = x.map((share, index) => (share * strengths[index]!) / strength);
  const closeness = closenessOf(problem);
  const { far, spread } = closenessParts(closeness, y);
  const objective = far + spread;
  const weighted = weightedRows(rows, solution.prices, { candidates: x.length, path: 'solution.prices' });
  const bound = Math.min(objective, lowerBound(closeness, strengths, { objective, y, weighted }));
  const tolerance = EXACT * Math.max(objective, closeness.targetSize);
  const violation = worstViolation(problem, rows, x);
  const convex = !hasDiscreteRules(problem);
  const boundProven = convex && !(solution.bound > bound + tolerance);
  const sound = violation <= FEASIBLE && claimsHold({ problem, solution, x, y, closeness }, tolerance);
  const proven = !convex || (boundProven && (solution.status === 'stopped' || objective - bound <= tolerance));
  return {
    feasible: violation <= FEASIBLE,
    worstViolation: violation,
    objective,
    bound,
    gap: objective - bound,
    boundProven,
    infeasibilityProven: false,
    agrees: solution.status !== 'infeasible' && sound && proven,
  };
}

/** Without a blend there is nothing to linearise at: E >= 0 is the only bound left, unless Farkas rules out everything. */
function certifyNone(problem: BlendProblem, rows: readonly Row[], solution: BlendSolution): Certificate {
  const strengths = Float64Array.from(problem.candidates, (candidate) => candidate.strength);
  const weighted = weightedRows(rows, solution.farkas ?? [], {
    candidates: strengths.length,
    path: 'solution.farkas',
  });
  const infeasibilityProven = solution.status === 'infeasible' && provesInfeasible(weighted, strengths);
  const convex = !hasDiscreteRules(problem);
  return {
    ...odourless,
    bound: infeasibilityProven ? Number.POSITIVE_INFINITY : 0,
    gap: infeasibilityProven ? 0 : Number.POSITIVE_INFINITY,
    boundProven: convex && (infeasibilityProven || !(solution.bound > 0)),
    infeasibilityProven,
    agrees: solution.status === 'stopped' || (solution.status === 'infeasible' && (infeasibilityProven || !convex)),
  };
}

/** What is known of shares that have no smell at all: they are no blend. */
const odourless: Certificate = {
  feasible: false,
  worstViolation: Number.POSITIVE_INFINITY,
  objective: Number.POSITIVE_INFINITY,
  bound: 0,
  gap: Number.POSITIVE_INFINITY,
  boundProven: false,
  infeasibilityProven: false,
  agrees: false,
};
