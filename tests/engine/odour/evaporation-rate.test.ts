import { expect, it } from 'vitest';
import { EngineInputError } from '@/engine/errors';
import { estimateEvaporation, type NoteClass } from '@/engine/odour/evaporation-rate';

/** Computed with NumPy for 20 mg on a 10 cm2 blotter through a film of 1 mm/s; the pressures are illustrative. */
it.each([
  ['ethanol', 7900, 86],
  ['limonene', 200, 2.18],
  ['linalool', 21, 0.229],
  ['2-phenylethanol', 10, 0.109],
  ['vanillin', 0.016, 1.7e-4],
])('gives %s at %d Pa a rate of %d per hour', (_, vapourPressurePa, perHour) => {
  const estimate = estimateEvaporation({ vapourPressurePa, noteClass: 'base' });
  expect(estimate!.basis).toBe('vapour pressure');
  expect(Math.abs(estimate!.perHour / perHour - 1)).toBeLessThan(0.03);
});

it('falls back to the half-life of the class: 0.3, 3 and 30 h (common practice), and to null', () => {
  const halfLife = (noteClass: NoteClass) => Math.LN2 / estimateEvaporation({ noteClass })!.perHour;
  expect(halfLife('top')).toBeCloseTo(0.3, 12);
  expect(halfLife('heart')).toBeCloseTo(3, 12);
  expect(halfLife('base')).toBeCloseTo(30, 12);
  expect(estimateEvaporation({})).toBeNull();
  expect(() => estimateEvaporation({ noteClass: 'toString' as NoteClass })).toThrow(EngineInputError);
});
