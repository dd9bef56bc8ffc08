import { CholeskyDecomposition, Matrix, solve } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import type { BlendProblem, EngineMaterial } from '@/engine/contract';
import { solveBlend } from '@/engine/solve/solve-blend';

const material = (id: string, profile: number[], more: Partial<EngineMaterial> = {}): EngineMaterial => ({
  id,
  profile,
  strength: 1,
  costPerKg: 0,
  ...more,
});
const shares = (p: BlendProblem, ids: string[]) => {
  const { status, lines } = solveBlend(p);
  expect(status).toBe('optimal');
  return ids.map((id) => lines.find((one) => one.id === id)?.share ?? 0);
};
const close = (found: number[], wanted: number[], digits: number) =>
  expect(found).toEqual(wanted.map((value) => expect.closeTo(value, digits)));

describe('published least squares and quadratic programmes, posed as blends', () => {
  it('fits the line of Lawson & Hanson, chapter 23, with the slack of its third rule as a material without smell', () => {
    const problem: BlendProblem = {
      target: [0.5, 0.6, 0.7, 1.2],
      candidates: [material('x1', [0.25, 0.5, 0.5, 0.8]), material('x2', [1, 1, 1, 1]), material('rest', [0, 0, 0, 0])],
    };
    close(shares(problem, ['x1', 'x2', 'rest']), [0.62131519, 0.37868481, 0], 8);
    expect(Math.sqrt(solveBlend(problem).objective)).toBeCloseTo(0.33822935, 8);
  });

  /** min |R x - f|^2 + constant with x1 + x2 + 2 x3 <= 3: impact y_j = c_j x_j / 3, and one material for what is left. */
  it('solves problem 35 of Hock & Schittkowski: (4/3, 7/9, 4/9), 1/9', () => {
    // 2 x1^2 + 2 x2^2 + x3^2 + 2 x1 x2 + 2 x1 x3 = |x1 + x2|^2 + |x1 + x3|^2 + |x2|^2; linear part -(8, 6, 4), constant 9
    // and (x1 + x2 - a)^2 + (x1 + x3 - b)^2 + (x2 - c)^2 matches it with a + b = 4, a + c = 3, b = 2: squares sum to 9
    const columns = [
      [1, 1, 0],
      [1, 0, 1],
      [0, 1, 0],
    ];
    const weights = [1, 1, 2];
    const candidates = columns.map((column, j) =>
      material(
        `x${j + 1}`,
        column.map((value) => (3 * value) / weights[j]!),
      ),
    );
    const problem: BlendProblem = { target: [2, 2, 1], candidates: [...candidates, material('rest', [0, 0, 0])] };
    const found = shares(problem, ['x1', 'x2', 'x3']).map((share, j) => (3 * share) / weights[j]!);
    close(found, [4 / 3, 7 / 9, 4 / 9], 9);
    expect(solveBlend(problem).objective).toBeCloseTo(1 / 9, 9);
  });

  /** min 1/2 x'Hx - c'x with x1 + 2 x2 + x3 + x4 <= 5: impact y_j = w_j x_j / 5, and one material for what is left. */
  it('solves problem 76 of Hock & Schittkowski: (3/11, 23/11, 0, 6/11), -103/22', () => {
    const h = new Matrix([
      [2, 0, -1, 0],
      [0, 1, 0, 0],
      [-1, 0, 2, 1],
      [0, 0, 1, 1],
    ]);
    const c = Matrix.columnVector([1, 3, -1, 1]);
    const factor = new CholeskyDecomposition(h).lowerTriangularMatrix;
    const target = solve(factor, c).to1DArray();
    const weights = [1, 2, 1, 1];
    // 3 x1 + x2 + 2 x3 - x4 <= 4 is a price of at most 9, all prices five higher; x2 + 4 x3 >= 1.5 is a natural share
    const costs = [20, 7.5, 15, 0];
    const natural = [0, 0.125, 1, 0];
    const candidates = weights.map((weight, j) =>
      material(
        `x${j + 1}`,
        factor.getRow(j).map((value) => (5 * value) / weight),
        { costPerKg: costs[j]!, natural: natural[j]! },
      ),
    );
    const problem: BlendProblem = {
      target,
      candidates: [...candidates, material('rest', [0, 0, 0, 0], { costPerKg: 5 })],
      budgetPerKg: 9,
      minNatural: 0.075,
    };
    const found = shares(problem, ['x1', 'x2', 'x3', 'x4']).map((share, j) => (5 * share) / weights[j]!);
    close(found, [3 / 11, 23 / 11, 0, 6 / 11], 9);
    const constant = target.reduce((sum, value) => sum + value * value, 0);
    expect((solveBlend(problem).objective - constant) / 2).toBeCloseTo(-103 / 22, 9);
  });

  it('takes inverse variances where only the spread differs (worked by hand)', () => {
    const sd = (value: number) => ({ profileSd: [value] });
    const problem: BlendProblem = { target: [3], candidates: [material('a', [3], sd(1)), material('b', [3], sd(2))] };
    close(shares(problem, ['a', 'b']), [0.8, 0.2], 10);
    expect(solveBlend(problem).objective).toBeCloseTo(0.8, 12);
  });

  it('turns impact into mass (worked by hand): y (1/2, 1/2), strengths (4, 1), costs (10, 2)', () => {
    const problem: BlendProblem = {
      target: [0.5, 0.5],
      candidates: [material('a', [1, 0], { strength: 4, costPerKg: 10 }), material('b', [0, 1], { costPerKg: 2 })],
    };
    const { lines, costPerKg, costPerImpact, strength } = solveBlend(problem);
    close(
      lines.map(({ share }) => share),
      [0.2, 0.8],
      12,
    );
    close([costPerKg, costPerImpact, strength], [3.6, 2.25, 1.6], 12);
  });

  it('uses the least solvent, and the first of two that are the same', () => {
    const candidates = [
      material('rose', [4]),
      material('water', [0], { strength: 0 }),
      material('oil', [0], { strength: 0 }),
      material('rose-again', [4]),
    ];
    expect(solveBlend({ target: [4], candidates }).lines.map(({ id }) => id)).toEqual(['rose']);
    const thinned = solveBlend({
      target: [4],
      candidates,
      groups: [{ id: 'thin', members: ['oil', 'water'], min: 0.3 }],
    });
    expect(thinned.lines.map(({ id, share }) => [id, share])).toEqual([
      ['oil', expect.closeTo(0.3, 9)],
      ['rose', expect.closeTo(0.7, 9)],
    ]);
  });
});
