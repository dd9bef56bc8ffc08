import { describe, expect, it } from 'vitest';
import type { BlendProblem, BlendSolution } from '@/engine/contract';
import { solveBlend } from '@/engine/solve/solve-blend';
import { blendProblem } from '@/tests/bench/problems';

/** Each rule's limit, as a number that can be read and set. */
const limits: Record<
  string,
  { of: (p: BlendProblem) => number; to: (p: BlendProblem, value: number) => BlendProblem }
> = {
  costPerImpact: { of: (p) => p.costPerImpact!, to: (p, value) => ({ ...p, costPerImpact: value }) },
  minStrength: { of: (p) => p.minStrength!, to: (p, value) => ({ ...p, minStrength: value }) },
  minNatural: { of: (p) => p.minNatural!, to: (p, value) => ({ ...p, minNatural: value }) },
  budgetPerKg: { of: (p) => p.budgetPerKg!, to: (p, value) => ({ ...p, budgetPerKg: value }) },
  'limit:l0': {
    of: (p) => p.limits![0]!.max,
    to: (p, value) => ({ ...p, limits: [{ ...p.limits![0]!, max: value }, ...p.limits!.slice(1)] }),
  },
  'group:g': {
    of: (p) => p.groups![0]!.max!,
    to: (p, value) => ({ ...p, groups: [{ ...p.groups![0]!, max: value }] }),
  },
  'kept:m00003': {
    of: (p) => p.kept![0]!.share,
    to: (p, value) => ({ ...p, kept: [{ ...p.kept![0]!, share: value }] }),
  },
};

const price = (solution: BlendSolution, rule: string) => solution.prices.find((one) => one.rule === rule)!;

describe('what a rule costs', () => {
  const seen = new Set<string>();
  for (const seed of [1, 2, 3, 4, 5, 6]) {
    it(`is how the expected distance moves with the limit: problem ${seed}`, () => {
      const drawn = blendProblem({ materials: 40, facets: 16, limits: 3, seed });
      const problem: BlendProblem = {
        ...drawn,
        limits: drawn.limits!.map((limit) => ({ ...limit, max: 0.08 })),
        minStrength: 1,
        budgetPerKg: 30,
        groups: [{ id: 'g', members: ['m00001', 'm00002', 'm00004'], max: 0.01 }],
        kept: [{ id: 'm00003', share: 0.02 }],
      };
      const solution = solveBlend(problem);
      expect(solution.status).toBe('optimal');
      for (const [rule, { of, to }] of Object.entries(limits)) {
        const { perUnit, multiplier, slack } = price(solution, rule);
        const step = 1e-4 * of(problem);
        const ends = [solveBlend(to(problem, of(problem) + step)), solveBlend(to(problem, of(problem) - step))];
        const slope = (ends[0]!.expectedDistance - ends[1]!.expectedDistance) / (2 * step);
        const size = solution.expectedDistance / of(problem);
        expect(Math.abs(slope - perUnit!), `${rule}: ${slope} and ${perUnit}`).toBeLessThanOrEqual(
          2e-3 * Math.abs(slope) + 1e-6 * size,
        );
        if (Math.abs(multiplier) > 1e-9) {
          seen.add(rule);
          expect(Math.abs(slack)).toBeLessThanOrEqual(1e-9 * of(problem));
        }
      }
    });
  }

  it('was tried where the rules bind', () => {
    expect([...seen].sort()).toEqual(expect.arrayContaining(['group:g', 'kept:m00003', 'costPerImpact', 'limit:l0']));
  });
});
