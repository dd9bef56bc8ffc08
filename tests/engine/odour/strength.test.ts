import { expect, it } from 'vitest';
import { EngineInputError } from '@/engine/errors';
import { estimateStrength, STRENGTH_CLASSES, type StrengthClass, twoDigits } from '@/engine/odour/strength';

const GAS_CONSTANT = 8.314462618;

/** Odour activity of a material in a blend, step by step: moles, Raoult, gas concentration, over the threshold. */
function odourActivity(masses: { grams: number; molarMass: number; pressurePa: number; thresholdUgPerM3: number }[]) {
  const moles = masses.map(({ grams, molarMass }) => grams / molarMass);
  const all = moles.reduce((sum, part) => sum + part, 0);
  return masses.map(({ molarMass, pressurePa, thresholdUgPerM3 }, index) => {
    const gramsPerM3 = ((moles[index]! / all) * pressurePa * molarMass) / (GAS_CONSTANT * 298.15);
    return (gramsPerM3 * 1e6) / thresholdUgPerM3;
  });
}

it('is the odour activity per gram in an ideal headspace, relative to linalool', () => {
  const limonene = { grams: 10, molarMass: 136.23, pressurePa: 200, thresholdUgPerM3: 813.15 };
  const linalool = { grams: 20, molarMass: 154.25, pressurePa: 21, thresholdUgPerM3: 5.8342 };
  const [first, second] = odourActivity([limonene, linalool]);
  const estimate = estimateStrength({ vapourPressurePa: 200, thresholdsUgPerM3: [813.15] });
  expect(estimate!.strength).toBeCloseTo(first! / 10 / (second! / 20), 10);
  expect(estimate!.basis).toBe('vapour pressure and threshold');
  expect(estimateStrength({ vapourPressurePa: 21, thresholdsUgPerM3: [5.8342] })!.strength).toBeCloseTo(1, 12);
});

it('widens with thresholds that disagree, and takes their geometric mean', () => {
  const ppm = (value: number) => ((value * 136.23) / 24.465) * 1000;
  // Abraham et al. 2012 list both 0.038 ppm and 9.86 ppm for limonene.
  const both = estimateStrength({ vapourPressurePa: 200, thresholdsUgPerM3: [ppm(0.038), ppm(9.86)] });
  expect(both!.spreadFactor).toBeCloseTo(Math.sqrt(9.86 / 0.038), 6);
  const middle = estimateStrength({ vapourPressurePa: 200, thresholdsUgPerM3: [ppm(Math.sqrt(0.038 * 9.86))] });
  expect(both!.strength).toBeCloseTo(middle!.strength, 10);
  expect(estimateStrength({ vapourPressurePa: 200, thresholdsUgPerM3: [10, 10] })!.spreadFactor).toBe(5);
});

it('falls back to the class, ten times per step, and to null', () => {
  const values = STRENGTH_CLASSES.map((strengthClass) => estimateStrength({ vapourPressurePa: 3, strengthClass }));
  expect(values.map((value) => value!.strength)).toEqual([0, 0.01, 0.1, 1, 10, 100, 1000]);
  expect(values.every((value) => value!.basis === 'class')).toBe(true);
  expect(estimateStrength({ vapourPressurePa: 3 })).toBeNull();
  expect(() => estimateStrength({ strengthClass: 'loud' as StrengthClass })).toThrow(EngineInputError);
});

it('is shown with two digits', () => {
  expect([0.003149, 1.96, 38213, 0].map(twoDigits)).toEqual([0.0031, 2, 38000, 0]);
});
