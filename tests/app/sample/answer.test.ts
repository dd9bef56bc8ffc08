import { describe, expect, it } from 'vitest';
import { PRICES } from '@/app/_sample/prices';
import { SAMPLE } from '@/app/_sample/sample';
import { sampleAnswer } from '@/app/_sample/sample-answer';
import { sampleProblem } from '@/app/_sample/sample-problem';
import { certify, solveBlend } from '@/engine';

const PROMISED = [PRICES.min, PRICES.first, 1500, PRICES.max];

describe('the blend that the public page solves', () => {
  it('is there at every price that the slider reaches, and proven', () => {
    for (const price of PROMISED) {
      const problem = sampleProblem(price);
      const solution = solveBlend(problem);
      expect(solution.status).toBe('optimal');
      expect(certify(problem, solution)).toMatchObject({ feasible: true, boundProven: true, agrees: true });
    }
  });

  it('costs no more than was said, and comes closer for more', () => {
    const answers = PROMISED.map(sampleAnswer);
    for (const answer of answers) expect(answer.costReplaced).toBeLessThanOrEqual(answer.price * (1 + 1e-9));
    const distances = answers.map((answer) => answer.distance);
    expect(distances).toEqual(distances.toSorted((a, b) => b - a));
    expect(distances.at(-1)).toBeLessThan((distances[0] ?? 0) * 0.7);
  });

  it('says rightly what 100 EUR more would bring', () => {
    const { per100More } = sampleAnswer(1000);
    const better = solveBlend(sampleProblem(1001)).expectedDistance - solveBlend(sampleProblem(1000)).expectedDistance;
    expect((per100More ?? 0) / 100).toBeCloseTo(better, 6);
  });

  it('leaves the target itself out', () => {
    expect(SAMPLE.candidates.map((material) => material.key)).not.toContain(SAMPLE.target.key);
  });
});
