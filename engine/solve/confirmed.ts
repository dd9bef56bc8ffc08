import { certify } from '../certify/certify';
import type { BlendProblem, BlendSolution } from '../contract';

/** Below this share of what is promised, an answer's own evidence leaves no doubt that rounding could matter to. */
const CLEAR = 1e-11;

/**
 * The answer as it is where `certify` agrees with it, or 'stopped' in place of a claim that it does not confirm.
 *
 * `certify` reads the whole problem once more and costs as much as the solve, so a clear optimum is not asked about:
 * only one near the edge of what is promised, one found by a search, and every "no blend".
 */
export function confirmed(problem: BlendProblem, answer: BlendSolution, targetSize: number): BlendSolution {
  if (answer.status === 'stopped' || isClear(answer, targetSize)) return answer;
  if (certify(problem, answer).agrees) return answer;
  const doubt = 'The proof of this answer did not hold to the last digits, so it is not called final.';
  const { conflict: _, relax: __, farkas: ___, ...rest } = answer;
  if (answer.status === 'infeasible')
    return { ...rest, status: 'stopped', bound: 0, warnings: [...answer.warnings, doubt] };
  return { ...answer, status: 'stopped', warnings: [...answer.warnings, doubt] };
}

function isClear({ status, objective, bound, kktResidual, nodes }: BlendSolution, targetSize: number): boolean {
  const scale = CLEAR * Math.max(objective, targetSize);
  return status === 'optimal' && nodes === 1 && objective - bound <= scale && kktResidual <= CLEAR;
}
