import { expect, it } from 'vitest';
import { certify } from '@/engine/certify/certify';
import { worstViolation } from '@/engine/certify/feasibility';
import { closenessOf, closenessParts } from '@/engine/certify/objective';
import { rowsOf } from '@/engine/certify/rows';
import type { BlendProblem } from '@/engine/contract';
import { solveBlend } from '@/engine/solve/solve-blend';
import { generatedProblem } from '@/tests/support/arbitraries/blend-problem';
import { highsBlend } from '@/tests/support/oracles/highs';
import { quadprogBlend } from '@/tests/support/oracles/quadprog';

/** A peer's blend counts where it keeps the rules this well; looser ones may undercut the true optimum. */
const KEEPS_RULES = 1e-7;
const SAME = 1e-6;

interface Comparison {
  compared: number;
  agreed: number;
  /** Ours ended short of the optimum and said so. */
  stopped: number;
  /** Ours is worse than the peer's, or better without a certificate: never. */
  wrong: string[];
}

/**
 * Compares our objective with that of a peer's mass shares, both by the definition, where the peer's are a blend. A peer
 * may miss the optimum (rules on mass are hard to see in impact shares, five decades apart); then ours must be proven.
 */
function compare(count: number, peer: (problem: BlendProblem) => Float64Array | null, candidates: [number, number]) {
  const result: Comparison = { compared: 0, agreed: 0, stopped: 0, wrong: [] };
  for (let seed = 0; seed < count; seed++) {
    const { problem, story } = generatedProblem(10_000 + seed, { candidates, infeasible: 0 });
    const shares = peer(problem);
    if (!shares || !(worstViolation(problem, rowsOf(problem), shares) <= KEEPS_RULES)) continue;
    const theirs = objectiveOf(problem, shares);
    const solution = solveBlend(problem);
    const ours = certify(problem, solution);
    const tolerance = SAME * Math.max(theirs, closenessOf(problem).targetSize);
    const better = ours.objective < theirs - tolerance;
    result.compared++;
    if (solution.status === 'stopped') result.stopped++;
    else if (ours.objective > theirs + tolerance || !ours.feasible || !(ours.agrees || !better)) {
      result.wrong.push(`${story}: ours ${ours.objective}, theirs ${theirs}`);
    } else if (!better) result.agreed++;
  }
  return result;
}

function objectiveOf(problem: BlendProblem, x: Float64Array): number {
  const impacts = x.map((share, index) => share * problem.candidates[index]!.strength);
  const all = impacts.reduce((sum, impact) => sum + impact, 0);
  const { far, spread } = closenessParts(
    closenessOf(problem),
    impacts.map((impact) => impact / all),
  );
  return far + spread;
}

it('agrees with quadprog on 500 problems of up to 100 materials', { timeout: 240_000 }, () => {
  const { compared, agreed, stopped, wrong } = compare(500, quadprogBlend, [5, 100]);
  expect(wrong).toEqual([]);
  expect(compared).toBeGreaterThan(430);
  expect(stopped).toBeLessThanOrEqual(1);
  expect(agreed / compared).toBeGreaterThan(0.94);
});

it("agrees with HiGHS' quadratic programmes", { timeout: 240_000 }, () => {
  const { compared, agreed, stopped, wrong } = compare(100, highsBlend, [3, 40]);
  expect(wrong).toEqual([]);
  expect(compared).toBeGreaterThan(60);
  expect(stopped).toBeLessThanOrEqual(1);
  expect(agreed / compared).toBeGreaterThan(0.9);
});
