import { expect, it } from 'vitest';
import { EngineInputError } from '@/engine/errors';
import { trianglePower, triangleSimilarity } from '@/engine/panel/triangle-power';
import { criticalNumber, triangleTest } from '@/engine/panel/triangle-test';

/** Triangle test, 5 %, from ISO 4120's table as reprinted by the FAO (V7180E). */
const published: [assessors: number, critical: number][] = [
  ...([
    [6, 5],
    [8, 6],
    [10, 7],
    [12, 8],
    [15, 9],
    [18, 10],
    [20, 11],
    [24, 13],
    [27, 14],
  ] as [number, number][]),
  ...([
    [30, 15],
    [36, 18],
    [42, 20],
    [48, 22],
    [54, 25],
    [60, 27],
    [66, 29],
    [72, 32],
    [84, 36],
    [96, 41],
  ] as [number, number][]),
];

it.each(published)('asks of %d assessors that %d be right, as ISO 4120 prints', (assessors, critical) => {
  expect(triangleTest(assessors, 0).critical).toBe(critical);
});

it('gives the exact tail of the binomial', () => {
  expect(triangleTest(24, 13).pValue).toBeCloseTo(0.028441128, 9);
  expect(triangleTest(30, 15).pValue).toBeCloseTo(0.043482276, 9);
  expect(triangleTest(12, 8).pValue).toBeCloseTo(0.018758, 6);
  expect(triangleTest(30, 14).pValue).toBeCloseTo(0.089771, 6);
  expect(triangleTest(2, 2).pValue).toBeCloseTo(1 / 9, 15);
  expect(triangleTest(5, 0).pValue).toBe(1);
});

it('agrees with counting every outcome of a small panel', () => {
  for (let n = 1; n <= 8; n++) {
    const right = Array.from(
      { length: 3 ** n },
      (_, outcome) => [...outcome.toString(3).padStart(n, '0')].filter((pick) => pick === '0').length,
    );
    for (let correct = 0; correct <= n; correct++) {
      const share = right.filter((count) => count >= correct).length / right.length;
      expect(triangleTest(n, correct).pValue).toBeCloseTo(share, 13);
    }
  }
});

it('says that two assessors can decide nothing', () => {
  expect(triangleTest(2, 2).critical).toBeNull();
  expect(triangleTest(3, 3).critical).toBe(3);
  expect(trianglePower(2, 0.5)).toBeNull();
});

/** Smallest panels for alpha = beta = 0.05, computed by the exact binomial; the standard's figures from memory. */
it.each([
  [0.5, 23, 12],
  [0.4, 40, 19],
  [0.3, 66, 29],
  [0.2, 147, 59],
])('needs for a fraction of %d perceiving a panel of %d', (perceiving, assessors, critical) => {
  const enough = (n: number) => (trianglePower(n, perceiving) ?? 0) >= 0.95;
  expect(criticalNumber(assessors)).toBe(critical);
  expect(enough(assessors)).toBe(true);
  expect(Array.from({ length: assessors - 1 }, (_, index) => index + 1).some(enough)).toBe(false);
});

it('bounds the fraction who perceive a difference: 22 of 66 right leave at most 0.1432', () => {
  expect(triangleSimilarity(66, 22)).toBeCloseTo(0.1432, 4);
});

it('refuses halves of people and more right than there are', () => {
  expect(() => triangleTest(10, 11)).toThrow(EngineInputError);
  expect(() => triangleTest(10.5, 3)).toThrow(EngineInputError);
  expect(() => triangleTest(0, 0)).toThrow(EngineInputError);
});
