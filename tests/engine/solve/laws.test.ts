import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { BlendProblem, BlendSolution } from '@/engine/contract';
import { solveBlend } from '@/engine/solve/solve-blend';
import { linearProblem } from './arbitrary-problem';
import { judge } from './definition';

const RUNS = { seed: 1828, numRuns: 80 };
const shape = { materials: 8, facets: 4 };

/** Two answers are the same as far as the problem decides it: the status and the optimal value. */
function expectSame(one: BlendSolution, other: BlendSolution, p: BlendProblem): void {
  expect(other.status).toBe(one.status);
  if (one.status === 'infeasible') return;
  const size = Math.max(one.objective, judge(p, one).targetSize);
  expect(Math.abs(one.objective - other.objective)).toBeLessThanOrEqual(3e-9 * size);
}

const law = (
  name: string,
  change: (p: BlendProblem) => BlendProblem,
  more?: (a: BlendSolution, b: BlendSolution) => void,
  drawn = linearProblem(shape),
) =>
  it(name, () => {
    fc.assert(
      fc.property(drawn, (p) => {
        const [one, other] = [solveBlend(p), solveBlend(change(p))];
        expectSame(one, other, p);
        if (one.status !== 'infeasible') more?.(one, other);
      }),
      RUNS,
    );
  });

const map = (p: BlendProblem, change: (m: BlendProblem['candidates'][number]) => object): BlendProblem => ({
  ...p,
  candidates: p.candidates.map((m) => ({ ...m, ...change(m) })),
});
const plain = linearProblem({ ...shape, spread: false });

describe('laws of the answer', () => {
  law(
    'the order of the candidates does not matter, to the last bit',
    (p) => ({ ...p, candidates: [...p.candidates].reverse() }),
    (one, other) => expect(other).toEqual(one),
  );

  law(
    'in another currency only the prices change',
    (p) => ({
      ...map(p, ({ costPerKg }) => ({ costPerKg: 4 * costPerKg })),
      ...(p.budgetPerKg === undefined ? {} : { budgetPerKg: 4 * p.budgetPerKg }),
      ...(p.costPerImpact === undefined ? {} : { costPerImpact: 4 * p.costPerImpact }),
    }),
    (one, other) => {
      expect(other.lines).toEqual(one.lines);
      expect(other.costPerKg).toBe(4 * one.costPerKg);
    },
  );

  law(
    'in another unit of strength nothing changes but the strength',
    (p) => ({
      ...map(p, ({ strength }) => ({ strength: 8 * strength })),
      ...(p.minStrength === undefined ? {} : { minStrength: 8 * p.minStrength }),
      ...(p.costPerImpact === undefined ? {} : { costPerImpact: p.costPerImpact / 8 }),
    }),
    (one, other) => {
      expect(other.lines.map(({ id }) => id)).toEqual(one.lines.map(({ id }) => id));
      expect(other.strength / one.strength).toBeCloseTo(8, 6);
    },
    linearProblem({ ...shape, decades: 2 }).map((p) =>
      map(p, ({ profile }) => ({ profileSd: Array.from(profile, () => 1) })),
    ),
  );

  law(
    'without spread a double of a material changes nothing',
    (p) => {
      const { minShare: _, ...first } = p.candidates[0]!;
      const loose = p.kept?.length || p.required?.length || p.groups?.length || first.maxShare !== undefined;
      return loose ? p : { ...p, candidates: [...p.candidates, { ...first, id: 'double' }] };
    },
    undefined,
    plain,
  );

  law('a rule that every blend keeps changes nothing', (p) => ({
    ...p,
    groups: [...(p.groups ?? []), { id: 'all', members: p.candidates.map(({ id }) => id), min: 0.5, max: 1 }],
    limits: [...(p.limits ?? []), { id: 'none', terms: [{ constituentId: 'nowhere', factor: 1 }], max: 0.1 }],
  }));

  law(
    'a material that is worse in every respect is never wanted',
    (p) => {
      const first = p.candidates[0]!;
      if (p.groups?.length || p.kept?.length || p.required?.length || first.maxShare !== undefined) return p;
      if (first.minShare !== undefined || first.natural !== undefined || first.strength === 0) return p;
      const worse = { ...first, id: 'worse', costPerKg: 2 * first.costPerKg, strength: first.strength / 2 };
      return { ...p, candidates: [...p.candidates, worse] };
    },
    undefined,
    plain.filter(({ minStrength }) => minStrength === undefined),
  );

  it('adding a rule never brings the blend closer', () => {
    fc.assert(
      fc.property(linearProblem(shape), fc.constantFrom(1, 5, 30), (p, budgetPerKg) => {
        const [free, bound] = [solveBlend({ ...p, budgetPerKg: undefined }), solveBlend({ ...p, budgetPerKg })];
        if (free.status === 'infeasible') expect(bound.status).toBe('infeasible');
        else if (bound.status !== 'infeasible')
          expect(bound.objective).toBeGreaterThanOrEqual(free.objective * (1 - 1e-9) - 1e-9);
      }),
      RUNS,
    );
  });
});
