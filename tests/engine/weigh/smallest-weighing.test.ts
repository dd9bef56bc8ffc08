import { expect, it } from 'vitest';
import { preDilution } from '@/engine/weigh/pre-dilution';
import { smallestWeighing } from '@/engine/weigh/smallest-weighing';

it('is 2000 times the repeatability, and 820 times the readability at best (USP <41>)', () => {
  expect(smallestWeighing({ readabilityGrams: 1e-5, repeatabilityGrams: 0.00015 }, 0.001)).toBeCloseTo(0.3, 12);
  expect(smallestWeighing({ readabilityGrams: 0.001 }, 0.001)).toBeCloseTo(0.82, 12);
  expect(smallestWeighing({ readabilityGrams: 0.01 }, 0.001)).toBeCloseTo(8.2, 12);
});

it('is ten times lower at a tolerance of one in a hundred', () => {
  expect(smallestWeighing({ readabilityGrams: 0.001 }, 0.01)).toBeCloseTo(0.082, 12);
});

it('suggests the strongest decimal stock that lifts a line over the smallest weighing', () => {
  expect(preDilution(0.5, 0.082)).toEqual({ fraction: 1, stockGrams: 0.5, solventGrams: 0 });
  expect(preDilution(0.082, 0.082)!.fraction).toBe(1);
  expect(preDilution(0.02, 0.082)!.fraction).toBe(0.1);
  expect(preDilution(0.0009, 0.082)).toEqual({
    fraction: 0.01,
    stockGrams: expect.closeTo(0.09, 12),
    solventGrams: expect.closeTo(0.0891, 12),
  });
  expect(preDilution(0.00001, 0.082)).toBeNull();
});

it('counts the solvent that a stock brings: 2 g from a 10 % stock are 20 g, 18 of them solvent', () => {
  const { stockGrams, solventGrams } = preDilution(2, 20)!;
  expect(stockGrams).toBeCloseTo(20, 12);
  expect(solventGrams).toBeCloseTo(18, 12);
});
