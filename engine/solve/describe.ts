import type { BlendSolution } from '../contract';
import { answerOf, answerWithout, farkasOf } from './answer';
import type { Closest } from './closest';
import { irreducibleConflict } from './conflict';
import type { Prepared } from './prepare';
import { relaxations } from './relax';

/** What was found for the convex problem, in the contract's words: a blend with its proof, or why there is none. */
export function describe(prepared: Prepared, found: Closest): BlendSolution {
  const counts = { nodes: 1, iterations: found.iterations };
  if (found.kind === 'blend') return answerOf(prepared, found.point, found.evidence, counts);
  const conflict = irreducibleConflict(prepared, found.weights);
  return answerWithout(
    {
      status: 'infeasible',
      bound: null as unknown as number,
      farkas: farkasOf(prepared, found.weights),
      conflict,
      relax: relaxations(prepared, conflict),
    },
    counts,
  );
}
