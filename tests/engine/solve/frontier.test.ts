import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { BlendProblem } from '@/engine/contract';
import { traceFrontier } from '@/engine/solve/frontier';
import { solveBlend } from '@/engine/solve/solve-blend';
import { linearProblem } from './arbitrary-problem';
import { expectImpossible, expectOptimal } from './definition';

/** Reference, section 5.4: y = (a, 1 - a), a <= (B - 2) / ((10 - B) / 4 + B - 2) up to 1/2, distance |a - 1/2|. */
const twoMaterials: BlendProblem = {
  target: [0.5, 0.5],
  candidates: [
    { id: 'm1', profile: [1, 0], strength: 4, costPerKg: 10 },
    { id: 'm2', profile: [0, 1], strength: 1, costPerKg: 2 },
  ],
};

describe('traceFrontier', () => {
  it('reaches the distances worked out by hand', () => {
    const points = traceFrontier(twoMaterials, [3.6, 2.5, 3]);
    expect(points.map(({ ceiling }) => ceiling)).toEqual([3.6, 2.5, 3]);
    expect(points[0]!.distance).toBeCloseTo(0, 9);
    expect(points[1]!.distance).toBeCloseTo(0.5 - 4 / 19, 12);
    expect(points[2]!.distance).toBeCloseTo(3 / 22, 12);
    expect(points[2]!.solution.prices[0]!.perUnit).toBeCloseTo(-32 / 121, 10);
    expect(points[0]!.solution.lines.map(({ share }) => share)).toEqual([
      expect.closeTo(0.2, 6),
      expect.closeTo(0.8, 6),
    ]);
  });

  it('agrees with solving each price by itself, and never gets worse as the price rises', () => {
    fc.assert(
      fc.property(
        linearProblem({ materials: 9, facets: 4 }),
        fc.constantFrom('budgetPerKg', 'costPerImpact'),
        (drawn, field) => {
          const { budgetPerKg, costPerImpact, ...rest } = drawn;
          const problem = field === 'costPerImpact' ? { ...rest, costPerImpact: 1 } : rest;
          const points = traceFrontier(problem, 5);
          let before = Number.POSITIVE_INFINITY;
          for (const { ceiling, solution, expectedDistance } of points) {
            const alone = { ...problem, [field]: ceiling };
            expectOptimal(alone, solution);
            expect(expectedDistance).toBeLessThanOrEqual(before + 1e-6);
            before = expectedDistance;
          }
          if (points.length === 0) expect(solveBlend(rest).status).toBe('infeasible');
        },
      ),
      { seed: 1952, numRuns: 80 },
    );
  });

  it('says of a ceiling below the cheapest blend that there is none', () => {
    const [point] = traceFrontier(twoMaterials, [1]);
    expectImpossible({ ...twoMaterials, budgetPerKg: 1 }, point!.solution);
  });

  it('names a ceiling that is no price', () => {
    expect(() => traceFrontier(twoMaterials, [3, Number.NaN])).toThrow(/ceilings\[1\]/);
    expect(() => traceFrontier(twoMaterials, 0)).toThrow(/ceilings/);
  });
});
