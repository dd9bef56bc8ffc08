import { Matrix } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { nnls } from '@/engine/solve/nnls';

const close = (found: ArrayLike<number>, wanted: number[], relative: number) => {
  expect(found.length).toBe(wanted.length);
  for (const [i, value] of wanted.entries()) {
    expect(Math.abs(found[i]! - value), `entry ${i}: ${found[i]}`).toBeLessThanOrEqual(
      relative * Math.max(1e-12, Math.abs(value)),
    );
  }
};

describe('published non-negative least squares', () => {
  it('agrees with the two examples of the SciPy manual (optimize.nnls)', () => {
    const a = new Matrix([
      [1, 0],
      [1, 0],
      [0, 1],
    ]);
    close(nnls(a, [2, 1, 1]).x, [1.5, 1], 1e-14);
    expect(nnls(a, [2, 1, 1]).residualNorm).toBeCloseTo(0.7071067811865475, 14);
    close(nnls(a, [-1, -1, -1]).x, [0, 0], 0);
    expect(nnls(a, [-1, -1, -1]).residualNorm).toBeCloseTo(1.7320508075688772, 14);
  });

  it('agrees with the widely used 4 x 2 manual example (data from memory, answer recomputed)', () => {
    const c = new Matrix([
      [0.0372, 0.2868],
      [0.6861, 7071e-4],
      [0.6233, 0.6245],
      [0.6344, 0.617],
    ]);
    const fit = nnls(c, [0.8587, 0.1781, 0.0747, 0.8405]);
    close(fit.x, [0, 0.69290031], 1e-8);
    expect(fit.residualNorm).toBeCloseTo(0.91189221, 8);
    expect(fit.dual[0]).toBeCloseTo(-0.150566, 6);
  });

  it('agrees with the NNLS of the 5 x 4 box example (answer recomputed)', () => {
    const c = new Matrix([
      [0.9501, 0.762, 0.6153, 0.4057],
      [0.2311, 0.4564, 0.7919, 0.9354],
      [0.6068, 0.0185, 0.9218, 0.9169],
      [0.4859, 0.8214, 0.7382, 0.4102],
      [0.8912, 0.4447, 0.1762, 0.8936],
    ]);
    const fit = nnls(c, [0.0578, 0.3528, 0.8131, 0.0098, 0.1388]);
    close(fit.x, [0, 0, 0.18391198, 0.28268174], 5e-8);
    expect(fit.residualNorm).toBeCloseTo(0.50974878, 8);
  });

  it('finds the ones behind the 6 x 6 Hilbert matrix', () => {
    const h = new Matrix(Array.from({ length: 6 }, (_, i) => Array.from({ length: 6 }, (_, j) => 1 / (i + j + 1))));
    const fit = nnls(
      h,
      h.to2DArray().map((row) => row.reduce((sum, v) => sum + v, 0)),
    );
    close(fit.x, [1, 1, 1, 1, 1, 1], 1e-8);
    expect(fit.residualNorm).toBeLessThan(1e-14);
  });
});
