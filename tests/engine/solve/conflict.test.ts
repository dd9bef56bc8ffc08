import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { BlendProblem } from '@/engine/contract';
import { solveBlend } from '@/engine/solve/solve-blend';
import { linearProblem } from './arbitrary-problem';

/** The problem with no rules but those named. */
function only(p: BlendProblem, rules: readonly string[]): BlendProblem {
  const has = (rule: string) => rules.includes(rule);
  const price = {
    ...(has('budgetPerKg') ? { budgetPerKg: p.budgetPerKg } : {}),
    ...(has('costPerImpact') ? { costPerImpact: p.costPerImpact } : {}),
  };
  return {
    target: p.target,
    candidates: p.candidates.map(({ minShare, maxShare, ...rest }) =>
      has(`share:${rest.id}`)
        ? { ...rest, ...(minShare === undefined ? {} : { minShare }), ...(maxShare === undefined ? {} : { maxShare }) }
        : rest,
    ),
    ...price,
    ...(has('minStrength') ? { minStrength: p.minStrength } : {}),
    ...(has('minNatural') ? { minNatural: p.minNatural } : {}),
    limits: (p.limits ?? []).filter(({ id }) => has(`limit:${id}`)),
    groups: (p.groups ?? []).filter(({ id }) => has(`group:${id}`)),
    kept: (p.kept ?? []).filter(({ id }) => has(`kept:${id}`)),
    required: (p.required ?? []).filter((id) => has(`required:${id}`)),
  };
}

/** The problem with one rule set to another value, written from the problem's own words. */
function relaxed(
  p: BlendProblem,
  { rule, side, to }: { rule: string; side?: 'min' | 'max'; to: number },
): BlendProblem {
  const [kind, id] = [rule.split(':')[0]!, rule.slice(rule.indexOf(':') + 1)];
  const swap = <T extends { id: string }>(list: T[] | undefined, change: Partial<T>) =>
    list?.map((one) => (one.id === id ? { ...one, ...change } : one));
  if (kind === 'limit') return { ...p, limits: swap(p.limits, { max: to })! };
  if (kind === 'group') return { ...p, groups: swap(p.groups, { [side!]: to })! };
  if (kind === 'kept') return { ...p, kept: swap(p.kept, { share: to })! };
  if (kind === 'share')
    return { ...p, candidates: swap(p.candidates, side === 'min' ? { minShare: to } : { maxShare: to })! };
  return { ...p, [rule]: to };
}

const impossible = (shape: Parameters<typeof linearProblem>[0]) =>
  linearProblem(shape)
    .map((problem) => ({ problem, solution: solveBlend(problem) }))
    .filter(({ solution }) => solution.status === 'infeasible');

describe('why there is no blend', () => {
  it('names rules that clash, and of which none could be spared', () => {
    fc.assert(
      fc.property(impossible({ materials: 7, facets: 2 }), ({ problem, solution }) => {
        const conflict = solution.conflict!;
        expect(conflict.length).toBeGreaterThan(0);
        expect(solveBlend(only(problem, conflict)).status).toBe('infeasible');
        for (const spared of conflict) {
          const rest = conflict.filter((rule) => rule !== spared);
          expect(solveBlend(only(problem, rest)).status, `without ${spared}`).toBe('optimal');
        }
      }),
      { seed: 1991, numRuns: 80 },
    );
  });

  it('offers only relaxations that allow a blend, and none that is needlessly wide', () => {
    fc.assert(
      fc.property(impossible({ materials: 7, facets: 2 }), ({ problem, solution }) => {
        for (const one of solution.relax!) {
          expect(solveBlend(relaxed(problem, one)).status, JSON.stringify(one)).not.toBe('infeasible');
          const nearly = one.from + 0.99 * (one.to - one.from);
          expect(solveBlend(relaxed(problem, { ...one, to: nearly })).status, JSON.stringify(one)).toBe('infeasible');
        }
      }),
      { seed: 1992, numRuns: 80 },
    );
  });

  it('finds the price that a strength costs, by hand', () => {
    const problem: BlendProblem = {
      target: [1],
      candidates: [
        { id: 'rose', profile: [1], strength: 1, costPerKg: 10 },
        { id: 'solvent', profile: [0], strength: 0, costPerKg: 1 },
      ],
      budgetPerKg: 5,
      minStrength: 0.6,
    };
    const { conflict, relax } = solveBlend(problem);
    expect(conflict).toEqual(['budgetPerKg', 'minStrength']);
    expect(relax!.map(({ rule, from }) => [rule, from])).toEqual([
      ['budgetPerKg', 5],
      ['minStrength', 0.6],
    ]);
    expect(relax![0]!.to).toBeCloseTo(6.4, 7); // 0.6 of rose at 10 and 0.4 of solvent at 1
    expect(relax![1]!.to).toBeCloseTo(4 / 9, 7); // 5 = 10 x + (1 - x)
  });
});
