import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { certify } from '@/engine/certify/certify';
import { solveBlend } from '@/engine/solve/solve-blend';
import { linearProblem } from './arbitrary-problem';
import { expectImpossible, expectOptimal } from './definition';

describe('solveBlend under linear rules', () => {
  for (const [name, shape] of [
    ['small', { materials: 4, facets: 2 }],
    ['middling', { materials: 9, facets: 5 }],
    ['more facets than materials', { materials: 6, facets: 12 }],
    ['more materials than facets, no spread', { materials: 14, facets: 3, spread: false }],
    ['strengths over ten decades', { materials: 8, facets: 4, decades: 10 }],
  ] as const) {
    it(`answers with the optimum or with a proof that there is none: ${name}`, () => {
      fc.assert(
        fc.property(linearProblem(shape), (problem) => {
          const solution = solveBlend(problem);
          if (solution.status === 'infeasible') expectImpossible(problem, solution);
          else expectOptimal(problem, solution);
          expect(certify(problem, solution).agrees).toBe(true);
        }),
        { seed: 1983, numRuns: 120 },
      );
    });
  }
});
