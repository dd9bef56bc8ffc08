import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { certify } from '@/engine/certify/certify';
import type { BlendProblem } from '@/engine/contract';
import { solveBlend } from '@/engine/solve/solve-blend';
import { linearProblem } from './arbitrary-problem';

/** All sets of at most k of the numbers below n. */
function subsets(n: number, k: number, from = 0): number[][] {
  if (k === 0) return [[]];
  const rest: number[][] = [[]];
  for (let i = from; i < n; i++) for (const more of subsets(n, k - 1, i + 1)) rest.push([i, ...more]);
  return rest;
}

/** The best blend by trying every set of materials, each used at its smallest dose or more; null if none allows one. */
function bruteForce({ maxMaterials, minDose = 0, ...problem }: BlendProblem): number | null {
  const all = problem.candidates;
  const kept = new Set((problem.kept ?? []).map(({ id }) => id));
  let best: number | null = null;
  for (const set of subsets(all.length, Math.min(maxMaterials ?? all.length, all.length))) {
    const candidates = set.map((i) => {
      const one = all[i]!;
      return minDose > 0 && !kept.has(one.id) ? { ...one, minShare: Math.max(minDose, one.minShare ?? 0) } : one;
    });
    const has = (id: string) => candidates.some((one) => one.id === id);
    const misses = all.some((one) => !has(one.id) && ((one.minShare ?? 0) > 0 || problem.required?.includes(one.id)));
    if (misses || problem.kept?.some(({ id, share }) => share > 0 && !has(id))) continue;
    if (!candidates.some((one) => one.strength > 0)) continue;
    if (candidates.some((one) => one.minShare !== undefined && one.minShare > (one.maxShare ?? 1))) continue;
    const groups = problem.groups?.map((group) => ({ ...group, members: group.members.filter(has) })) ?? [];
    const solution = solveBlend({
      ...problem,
      candidates,
      groups,
      kept: problem.kept?.filter(({ id }) => has(id)) ?? [],
    });
    if (solution.status !== 'infeasible' && (best === null || solution.objective < best)) best = solution.objective;
  }
  return best;
}

const counted = (shape: Parameters<typeof linearProblem>[0]) =>
  fc
    .record({
      problem: linearProblem(shape),
      maxMaterials: fc.integer({ min: 1, max: 4 }),
      minDose: fc.constantFrom(undefined, undefined, 0.02, 0.1),
    })
    .map(({ problem, ...rules }) => ({ ...problem, ...rules }));

function expectBest(problem: BlendProblem): void {
  const solution = solveBlend(problem);
  const best = bruteForce(problem);
  expect(certify(problem, solution).agrees).toBe(true);
  if (best === null) {
    expect(solution.status).toBe('infeasible');
    return;
  }
  expect(solution.status).toBe('optimal');
  const size = Math.max(best, problem.target.length * 64);
  expect(Math.abs(solution.objective - best)).toBeLessThanOrEqual(2e-9 * size);
  expect(solution.lines.length).toBeLessThanOrEqual(problem.maxMaterials ?? Number.POSITIVE_INFINITY);
}

describe('rules that count materials', () => {
  it('finds the best of all sets of materials: small', () => {
    fc.assert(fc.property(counted({ materials: 6, facets: 4 }), expectBest), { seed: 1960, numRuns: 60 });
  });

  it('finds the best of all sets of up to 4 of 14 materials', () => {
    const fourteen = counted({ materials: 12, facets: 5 }).filter(({ candidates }) => candidates.length > 11);
    fc.assert(fc.property(fourteen, expectBest), { seed: 14, numRuns: 4 });
  });

  /** A target in the midst of ten materials, of which four may be used. */
  const profile = (i: number) =>
    Array.from({ length: 8 }, (_, f) => Math.round(10 * Math.abs(Math.sin(37 * i + 11 * f * f + 1))));
  const candidates = Array.from({ length: 24 }, (_, i) => ({
    id: `m${i}`,
    profile: profile(i),
    strength: 1,
    costPerKg: 10,
  }));
  const target = Array.from({ length: 8 }, (_, f) =>
    candidates.slice(0, 10).reduce((sum, one) => sum + one.profile[f]! / 10, 0),
  );
  const many: BlendProblem = { target, candidates, maxMaterials: 4 };

  it('stops in time with the best so far, a bound below the optimum, and says so', () => {
    const optimum = solveBlend(many);
    expect(optimum.status).toBe('optimal');
    let calls = 0;
    const hurried = solveBlend(many, { timeLimitMs: 1, now: () => calls++ });
    expect(hurried.status).toBe('stopped');
    expect(hurried.lines.length).toBeGreaterThan(0);
    expect(hurried.bound).toBeLessThanOrEqual(optimum.objective * (1 + 1e-12));
    expect(hurried.objective).toBeGreaterThanOrEqual(optimum.objective * (1 - 1e-12));
    expect(hurried.warnings.join()).toMatch(/ended before/);
    expect(certify(many, hurried).agrees).toBe(true);
  });

  it('tells of every better blend, each better than the last, and ends with the one it returns', () => {
    const told: number[] = [];
    const solution = solveBlend(many, {
      onBetter: ({ distance, bound, lines }) => {
        expect(bound).toBeLessThanOrEqual(distance + 1e-9);
        expect(lines.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 12);
        told.push(distance);
      },
    });
    expect(told.length).toBeGreaterThan(0);
    expect(told).toEqual([...told].sort((a, b) => b - a));
    expect(told.at(-1)).toBe(solution.distance);
  });

  it('answers the same every time', () => {
    expect(solveBlend(many)).toEqual(solveBlend({ ...many, candidates: [...many.candidates].reverse() }));
  });

  it('leaves the last place empty where the smallest dose of any more material is too much of it', () => {
    const make = (id: string, profile: number[]) => ({ id, profile, strength: 1, costPerKg: 1 });
    const candidates = [make('a', [10, 0, 0]), make('b', [9.9, 10, 0]), make('c', [9.9, 0, 10])];
    const problem: BlendProblem = { target: [10, 0.1, 0.1], candidates, maxMaterials: 2, minDose: 0.1 };
    const { status, lines } = solveBlend(problem);
    expect(status).toBe('optimal');
    expect(lines.map(({ id }) => id)).toEqual(['a']);
    expectBest(problem);
  });

  it('names the count that cannot be kept, and the least that can', () => {
    const candidates = ['a', 'b', 'c'].map((id) => ({ id, profile: [1], strength: 1, costPerKg: 1, maxShare: 0.4 }));
    const solution = solveBlend({ target: [1], candidates, maxMaterials: 2 });
    expect(solution.status).toBe('infeasible');
    expect(solution.conflict).toContain('maxMaterials');
    expect(solution.relax).toContainEqual({ rule: 'maxMaterials', side: 'max', from: 2, to: 3 });
  });
});
