import type { BlendProblem, BlendSolution, Run } from '../contract';
import { checkProblem } from '../input/problem';
import { answerOf, answerWithout, farkasOf } from './answer';
import { closest } from './closest';
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
  const found = closest(prepared);
  const counts = { nodes: 1, iterations: found.iterations };
  if (found.kind === 'blend') return answerOf(prepared, found.point, found.evidence, counts);
  return answerWithout(
    { status: 'infeasible', bound: null as unknown as number, farkas: farkasOf(prepared, found.weights) },
    counts,
  );
}
