import type { BlendProblem, BlendSolution, Run } from '../contract';
import { checkProblem } from '../input/problem';
import { closest } from './closest';
import { describe } from './describe';
import { prepare } from './prepare';

/**
 * The blend whose smell comes closest to the target under the rules, with its proof; or why there is none.
 *
 * The impact shares y make the problem a convex quadratic one with linear rules (see `README.md`): an active set finds
 * the optimum, weak duality proves it, and 'optimal' is said only where the proof holds to 1e-9.
 *
 * @throws EngineInputError if the problem is badly put: a fault of the caller.
 */
export function solveBlend(problem: BlendProblem, _run?: Run): BlendSolution {
  checkProblem(problem);
  const prepared = prepare(problem);
  return describe(prepared, closest(prepared));
}
