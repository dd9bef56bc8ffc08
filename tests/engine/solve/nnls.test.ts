import fc from 'fast-check';
import { Matrix } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { EngineInputError } from '@/engine/errors';
import { nnls } from '@/engine/solve/nnls';

/** Small whole numbers make ties, zero columns and dependent columns common; the exponent spreads the scales. */
const problem = () =>
  fc
    .record({ rows: fc.integer({ min: 1, max: 7 }), columns: fc.integer({ min: 1, max: 9 }) })
    .chain(({ rows, columns }) =>
      fc.record({
        a: fc.array(fc.array(fc.integer({ min: -3, max: 4 }), { minLength: columns, maxLength: columns }), {
          minLength: rows,
          maxLength: rows,
        }),
        b: fc.array(fc.integer({ min: -5, max: 9 }), { minLength: rows, maxLength: rows }),
        scales: fc.array(fc.integer({ min: -8, max: 8 }), { minLength: columns, maxLength: columns }),
      }),
    )
    .map(({ a, b, scales }) => ({ a: new Matrix(a.map((row) => row.map((v, j) => v * 10 ** scales[j]!))), b }));

/** The definition: x >= 0, no way down along the used columns, none into the unused ones. */
function expectOptimal(a: Matrix, b: number[], x: Float64Array): void {
  const residual = b.map((value, i) => value - x.reduce((sum, weight, j) => sum + a.get(i, j) * weight, 0));
  const size = Math.hypot(...b) + 1e-300;
  for (const [j, weight] of x.entries()) {
    const column = a.getColumn(j);
    const gain = column.reduce((sum, value, i) => sum + value * residual[i]!, 0) / (Math.hypot(...column) * size || 1);
    expect(weight).toBeGreaterThanOrEqual(0);
    expect(gain).toBeLessThan(1e-12);
    if (weight > 0) expect(Math.abs(gain)).toBeLessThan(1e-12);
  }
}

describe('nnls', () => {
  it('leaves out no column that would bring the fit closer', () => {
    fc.assert(
      fc.property(problem(), ({ a, b }) => {
        const fit = nnls(a, b);
        expect(fit.status).toBe('optimal');
        expectOptimal(a, b, fit.x);
      }),
      { seed: 1974, numRuns: 800 },
    );
  });

  it('scales the weight against its column, and leaves the fit', () => {
    fc.assert(
      fc.property(problem(), ({ a, b }) => {
        const doubled = Matrix.mul(a, 4);
        const [plain, scaled] = [nnls(a, b), nnls(doubled, b)];
        expect([...scaled.x]).toEqual([...plain.x].map((weight) => weight / 4));
        expect(scaled.residualNorm).toBe(plain.residualNorm);
      }),
      { seed: 23, numRuns: 300 },
    );
  });

  it('names a right-hand side of the wrong length and a value that is not finite', () => {
    expect(() => nnls(new Matrix([[1], [2]]), [1])).toThrow(EngineInputError);
    expect(() => nnls(new Matrix([[1], [2]]), [1, Number.NaN])).toThrow(/b\[1\]/);
    expect(() => nnls(new Matrix([[1], [Number.POSITIVE_INFINITY]]), [1, 1])).toThrow(/Column 0/);
  });
});
