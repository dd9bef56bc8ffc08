import type { BlendProblem, BlendSolution, Run } from '../contract';
import { checkProblem } from '../input/problem';
import { checkRun } from '../input/run';
import { closest } from './closest';
import { confirmed } from './confirmed';
import { describe } from './describe';
import { hasDiscreteRules } from './discrete';
import { describeFewest } from './fewest';
import { prepare } from './prepare';

/**
 * The blend whose smell comes closest to the target under the rules, with its proof; or why there is none.
 *
 * In grams per unit of impact the problem is a convex quadratic one with linear rules (see `README.md`): an active set
 * finds the optimum, weak duality proves it, and 'optimal' is said only where the proof holds to 1e-9. Rules that count
 * materials or set a smallest dose are searched by branch and bound; out of time, `run` gets the best blend so far with
 * an honest bound and the status 'stopped'. The convex problem always ends, after a bounded number of steps.
 *
 * @throws EngineInputError if the problem is badly put: a fault of the caller.
 */
export function solveBlend(problem: BlendProblem, run?: Run): BlendSolution {
  checkProblem(problem);
  checkRun(run);
  const prepared = prepare(problem);
  const answer = hasDiscreteRules(problem) ? describeFewest(prepared, run) : describe(prepared, closest(prepared));
  return confirmed(problem, answer, prepared.targetSize);
}
