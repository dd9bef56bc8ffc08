import fc from 'fast-check';
import { expect, it } from 'vitest';
import { arctangent } from '@/engine/portable/arctangent';
import { exponential } from '@/engine/portable/exponential';

/** Distance in units of the last place. */
function ulps(a: number, b: number): number {
  const spacing = Math.max(Number.MIN_VALUE, Math.abs(b) * Number.EPSILON);
  return a === b ? 0 : Math.abs(a - b) / spacing;
}

it('raises e to a power as the platform does, to the last place or the one before', () => {
  fc.assert(
    fc.property(fc.double({ min: -745, max: 709.7, noNaN: true }), (x) => {
      expect(ulps(exponential(x), Math.exp(x))).toBeLessThanOrEqual(1);
    }),
    { numRuns: 5000 },
  );
});

it('knows the ends of the exponential', () => {
  expect([0, -800, 800, Number.NEGATIVE_INFINITY, Number.NaN].map(exponential)).toEqual([
    1,
    0,
    Infinity,
    0,
    Number.NaN,
  ]);
  expect(ulps(exponential(1), Math.E)).toBeLessThanOrEqual(1);
  expect(exponential(-744)).toBeGreaterThan(0);
});

it('measures angles as the platform does, to two places of the last', () => {
  const side = fc.double({ min: 0, max: 10, noNaN: true });
  fc.assert(
    fc.property(side, side, (y, x) => {
      fc.pre(x > 0 || y > 0);
      expect(ulps(arctangent(y, x), Math.atan2(y, x))).toBeLessThanOrEqual(2);
    }),
    { numRuns: 5000 },
  );
  expect(arctangent(1, 0)).toBe(Math.PI / 2);
  expect(arctangent(1, 1)).toBe(Math.PI / 4);
  expect(arctangent(0, 1)).toBe(0);
});
