import fc from 'fast-check';
import { expect, it } from 'vitest';
import { worstViolation } from '@/engine/certify/feasibility';
import { rowsOf } from '@/engine/certify/rows';
import { checkProblem } from '@/engine/input/problem';
import { generatedProblem } from './blend-problem';
import { smallBlendProblem } from './small-blend-problem';

const SEEDS = Array.from({ length: 200 }, (_, seed) => seed);

it('draws the same problem from the same seed, and another from the next', () => {
  expect(generatedProblem(7)).toEqual(generatedProblem(7));
  expect(generatedProblem(7)).not.toEqual(generatedProblem(8));
});

it('draws well-put problems whose witness keeps every rule, counting rules too', () => {
  for (const seed of SEEDS) {
    const { problem, feasible, witness } = generatedProblem(seed, { discrete: seed % 2 === 0 });
    expect(() => checkProblem(problem)).not.toThrow();
    const shares = new Map(witness.map((line) => [line.id, line.share]));
    const x = Float64Array.from(problem.candidates, (candidate) => shares.get(candidate.id) ?? 0);
    const violation = worstViolation(problem, rowsOf(problem), x);
    expect(violation <= 1e-12, `seed ${seed}: ${violation}`).toBe(feasible);
  }
});

it('covers every rule and every awkwardness', () => {
  const problems = SEEDS.map((seed) => generatedProblem(seed));
  const share = (has: (problem: (typeof problems)[number]) => unknown) =>
    problems.filter((problem) => Boolean(has(problem))).length / problems.length;
  expect(share(({ feasible }) => !feasible)).toBeCloseTo(0.25, 1);
  for (const rule of ['budgetPerKg', 'costPerImpact', 'minStrength', 'minNatural', 'limits', 'groups'] as const) {
    expect(share(({ problem }) => problem[rule] !== undefined)).toBeGreaterThan(0.2);
  }
  for (const rule of ['kept', 'required', 'stages', 'weights'] as const) {
    expect(share(({ problem }) => problem[rule])).toBeGreaterThan(0.1);
  }
  expect(share(({ problem }) => problem.candidates.some((candidate) => candidate.strength === 0))).toBeGreaterThan(0.5);
  const strengths = problems.map(({ problem }) => problem.candidates.map((candidate) => candidate.strength));
  const decades = strengths.map((all) => Math.log10(Math.max(...all) / Math.min(...all.filter((one) => one > 0))));
  expect(decades.reduce((sum, span) => sum + span, 0) / decades.length).toBeGreaterThan(4.5);
});

it('draws small problems that are well put', () => {
  fc.assert(fc.property(smallBlendProblem(), (problem) => checkProblem(problem)));
});
