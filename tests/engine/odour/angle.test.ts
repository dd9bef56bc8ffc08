import fc from 'fast-check';
import { expect, it } from 'vitest';
import { profileAngle } from '@/engine/odour/angle';

it('agrees with worked angles', () => {
  // Sums of descriptor vectors as in Snitz et al. 2013: (1,2,0) + (0,1,3) against (1,2,0) + (2,1,1); cosine 15/19.
  expect(profileAngle([1, 3, 3], [3, 3, 1])).toBeCloseTo(0.6608453, 8);
  // Cosine 0.96, by hand.
  expect(profileAngle([3, 4], [4, 3])).toBeCloseTo(0.28379411, 8);
});

it('keeps its digits for profiles that are nearly alike', () => {
  expect(profileAngle([1, 0], [1, 1e-10])).toBeCloseTo(1e-10, 20);
});

it('is null for a profile of nothing, under the weights', () => {
  expect(profileAngle([0, 0], [1, 2])).toBeNull();
  expect(profileAngle([1, 0], [1, 2], [0, 1])).toBeNull();
});

// Whole steps, so that scaling does not round a value away.
const vector = fc.array(fc.integer({ min: 0, max: 100 }), { minLength: 3, maxLength: 3 });

it('sees rays: it is symmetric, does not change with scale, and keeps the triangle inequality', () => {
  const size = fc.double({ min: 1e-6, max: 1e6, noNaN: true });
  fc.assert(
    fc.property(vector, vector, vector, size, (a, b, c, scale) => {
      const [ab, bc, ac] = [profileAngle(a, b), profileAngle(b, c), profileAngle(a, c)];
      if (ab === null || bc === null || ac === null) return;
      expect(profileAngle(b, a)).toBeCloseTo(ab, 12);
      const scaled = a.map((value) => value * scale);
      expect(profileAngle(scaled, b)).toBeCloseTo(ab, 12);
      expect(ac).toBeLessThanOrEqual(ab + bc + 1e-12);
    }),
  );
});
