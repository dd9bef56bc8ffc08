import { expect, it } from 'vitest';
import { solveBlend } from '@/engine/solve/solve-blend';
import { generatedProblem } from '@/tests/support/arbitraries/blend-problem';
import { highsFindsBlend } from '@/tests/support/oracles/highs';

it("agrees with HiGHS' linear programmes on what is possible", { timeout: 240_000 }, () => {
  const wrong: string[] = [];
  for (let seed = 0; seed < 300; seed++) {
    const { problem, feasible, story } = generatedProblem(20_000 + seed, { candidates: [10, 60], infeasible: 0.5 });
    const ours = solveBlend(problem).status !== 'infeasible';
    const theirs = highsFindsBlend(problem);
    if (ours !== theirs || ours !== feasible) wrong.push(`${story}: ours ${ours}, theirs ${theirs}`);
  }
  expect(wrong).toEqual([]);
});
