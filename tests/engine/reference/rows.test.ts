import { Matrix, QrDecomposition, solve } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { nnls } from '@/engine/solve/nnls';

/**
 * min |C x - d| with G x >= h, by the two steps of Lawson and Hanson (1974, chapter 23): z = R x - Q'd makes it a least
 * distance, min |z| with (G R^-1) z >= h - G R^-1 Q'd, and that is the residual of [G'; h'] u, u >= 0, against (0, 1).
 */
function underRows(c: Matrix, d: number[], { g, h }: { g: Matrix; h: number[] }) {
  const { orthogonalMatrix: q, upperTriangularMatrix: r } = new QrDecomposition(c);
  const start = q.transpose().mmul(Matrix.columnVector(d));
  const rows = solve(r.transpose(), g.transpose()).transpose();
  const right = Matrix.sub(Matrix.columnVector(h), rows.mmul(start));
  const both = Matrix.zeros(c.columns + 1, g.rows);
  both.setSubMatrix(rows.transpose(), 0, 0).setRow(c.columns, right.to1DArray());
  const fit = nnls(both, [...new Array(c.columns).fill(0), 1]);
  expect(fit.status).toBe('optimal');
  const { x: u } = fit;
  const room = 1 - right.to1DArray().reduce((sum, value, row) => sum + value * u[row]!, 0);
  const multipliers = [...u].map((value) => value / room);
  const z = rows.transpose().mmul(Matrix.columnVector(multipliers));
  return { x: solve(r, z.add(start)).to1DArray(), multipliers };
}

const close = (found: number[], wanted: number[], digits: number) =>
  expect(found).toEqual(wanted.map((value) => expect.closeTo(value, digits)));
/** -rows, for limits from above. */
const turned = (rows: number[][]) => rows.map((row) => row.map((value) => -value));

describe('published least squares under rows, through nnls', () => {
  const three = [
    [1, 0, 0],
    [0, 1, 0],
    [0, 0, 1],
  ];
  const four = [
    [1, 0, 0, 0],
    [0, 1, 0, 0],
    [0, 0, 1, 0],
    [0, 0, 0, 1],
  ];

  /** The example of the R package quadprog (manual of solve.QP); the fractions were worked out from its active rows. */
  const rows = [
    [-4, -3, 0],
    [2, 1, 0],
    [0, -2, 1],
  ];
  const limits = [-8, 2, 0];
  const value = (b: number[]) => b.reduce((sum, one) => sum + (one * one) / 2, 0) - 5 * b[1]!;

  it('solves the example of the quadprog manual: (10, 22, 44) / 21, -50 / 21, and its multipliers', () => {
    const { x, multipliers } = underRows(new Matrix(three), [0, 5, 0], { g: new Matrix(rows), h: limits });
    close(x, [10 / 21, 22 / 21, 44 / 21], 12);
    expect(value(x)).toBeCloseTo(-50 / 21, 12);
    close(multipliers, [0, 5 / 21, 44 / 21], 12);
  });

  it('solves it with 3 b1 + 2 b2 + b3 = 1 (from the tests of numerical R packages)', () => {
    const g = new Matrix([...rows, [3, 2, 1], [-3, -2, -1]]);
    const { x } = underRows(new Matrix(three), [0, 5, 0], { g, h: [...limits, 1, -1] });
    close(x, [1.4, -0.8, -1.6], 10);
    expect(value(x)).toBeCloseTo(6.58, 9);
  });

  it('solves it with 0 <= b <= 1.5 (from the tests of numerical R packages)', () => {
    const g = new Matrix([...rows, ...three, ...turned(three)]);
    const { x } = underRows(new Matrix(three), [0, 5, 0], { g, h: [...limits, 0, 0, 0, -1.5, -1.5, -1.5] });
    close(x, [0.625, 0.75, 1.5], 10);
    expect(value(x)).toBeCloseTo(-2.1484375, 10);
  });

  /** A widely used manual example; its rows are from memory, the digits were recomputed. */
  const c = new Matrix([
    [0.9501, 0.762, 0.6153, 0.4057],
    [0.2311, 0.4564, 0.7919, 0.9354],
    [0.6068, 0.0185, 0.9218, 0.9169],
    [0.4859, 0.8214, 0.7382, 0.4102],
    [0.8912, 0.4447, 0.1762, 0.8936],
  ]);
  const d = [0.0578, 0.3528, 0.8131, 0.0098, 0.1388];
  const box = [...four, ...turned(four)];
  const ends = [-0.1, -0.1, -0.1, -0.1, -2, -2, -2, -2];
  const squares = (x: number[]) =>
    Matrix.sub(c.mmul(Matrix.columnVector(x)), Matrix.columnVector(d)).norm('frobenius') ** 2;

  it('fits the 5 x 4 example within its box', () => {
    const { x } = underRows(c, d, { g: new Matrix(box), h: ends });
    close(x, [-0.1, -0.1, 0.25952925, 0.34959275], 8);
    expect(squares(x) / 2).toBeCloseTo(0.08125111, 8);
  });

  it('fits it under three rows as well, of which the second binds', () => {
    const upper = turned([
      [0.2027, 0.2721, 0.7467, 0.4659],
      [0.1987, 0.1988, 0.445, 0.4186],
      [0.6037, 0.0152, 0.9318, 0.8462],
    ]);
    const h = [...ends, -0.5251, -0.2026, -0.6721];
    const { x, multipliers } = underRows(c, d, { g: new Matrix([...box, ...upper]), h });
    close(x, [-0.1, -0.1, 0.21522797, 0.35015182], 8);
    expect(squares(x)).toBeCloseTo(0.16716126, 8);
    expect(multipliers.slice(8).map((one) => one > 1e-9)).toEqual([false, true, false]);
  });
});
