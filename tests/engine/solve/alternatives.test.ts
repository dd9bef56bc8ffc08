import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { alternativeBlends } from '@/engine/solve/alternatives';
import { solveBlend } from '@/engine/solve/solve-blend';
import { linearProblem } from './arbitrary-problem';
import { judge } from './definition';

describe('alternativeBlends', () => {
  it('gives the best first, and then blends that each lack something that mattered in every earlier one', () => {
    fc.assert(
      fc.property(linearProblem({ materials: 8, facets: 4 }), (problem) => {
        const blends = alternativeBlends(problem, 4);
        const best = solveBlend(problem);
        if (best.lines.length === 0) expect(blends).toEqual([]);
        else expect(blends[0]).toEqual(best);
        for (const [place, blend] of blends.entries()) {
          expect(judge(problem, blend).violation).toBeLessThanOrEqual(1e-9);
          for (const earlier of blends.slice(0, place)) {
            expect(blend.objective).toBeGreaterThanOrEqual(earlier.objective * (1 - 1e-9) - 1e-9);
            const used = blend.lines.map(({ id }) => id);
            expect(earlier.lines.some(({ id, impact }) => impact >= 0.05 && !used.includes(id))).toBe(true);
          }
        }
      }),
      { seed: 1972, numRuns: 60 },
    );
  });

  it('finds every single material that is a blend by itself', () => {
    const candidates = [1, 2, 3, 4].map((k) => ({ id: `m${k}`, profile: [k], strength: 1, costPerKg: 1 }));
    const blends = alternativeBlends({ target: [1], candidates, maxMaterials: 1 }, 9);
    expect(blends.map(({ lines }) => lines[0]!.id)).toEqual(['m1', 'm2', 'm3', 'm4']);
  });

  it('wants a whole number of them', () => {
    const problem = { target: [1], candidates: [{ id: 'a', profile: [1], strength: 1, costPerKg: 1 }] };
    expect(() => alternativeBlends(problem, 0)).toThrow(/count/);
  });
});
