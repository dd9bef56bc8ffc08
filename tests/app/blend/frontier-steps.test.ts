import fc from 'fast-check';
import { expect, it } from 'vitest';
import { drawnFrom, usualCeiling, withTarget } from '@/app/(house)/blend/_client/begin';
import { frontierSteps, spacedOut } from '@/app/(house)/blend/_client/frontier-steps';
import { rulesOfMaterials, withMaterialRule } from '@/app/(house)/blend/_client/material-rule';
import { candidate, FACETS, INPUTS, request } from '../../support/blend-inputs';

it('falls as the price rises, from the cheapest blend to where the price no longer matters', () => {
  const steps = frontierSteps(request({ minStrength: 0.25 }), INPUTS);
  expect(steps.length).toBeGreaterThan(3);
  for (const [index, step] of steps.entries()) {
    const before = steps[index - 1];
    if (!before) continue;
    expect(step.ceiling).toBeGreaterThan(before.ceiling);
    expect(step.distance).toBeLessThanOrEqual(before.distance + 1e-9);
  }
});

it('gives no curve where the other rules clash', () => {
  expect(frontierSteps(request({ minStrength: 9 }), INPUTS)).toEqual([]);
});

it('keeps both ends of the curve and no two points on each other', () => {
  const step = fc.record({
    ceiling: fc.integer({ min: 1, max: 5000 }),
    distance: fc.double({ min: 0, max: 10, noNaN: true }),
  });
  fc.assert(
    fc.property(fc.uniqueArray(step, { selector: ({ ceiling }) => ceiling, minLength: 2 }), (list) => {
      const steps = list.sort((a, b) => a.ceiling - b.ceiling);
      const kept = spacedOut(steps);
      expect(kept[0]).toEqual(steps[0]);
      expect(kept.at(-1)).toEqual(steps.at(-1));
      expect(spacedOut(kept)).toEqual(kept);
    }),
  );
});

it('begins at a third of the target’s price, to two digits, and at none where the price is not known', () => {
  expect(usualCeiling(candidate('rose', { costPerKg: '7400' }))).toEqual({ basis: 'equal strength', amount: '2500' });
  expect(usualCeiling(candidate('rose', { costPerKg: null }))).toBeNull();
});

it('keeps the other rules when the target changes', () => {
  const before = request({ minNatural: 0.5, excluded: ['leaf'], importance: { rosy: 2 }, added: ['oil'] });
  const after = withTarget(candidate('oil', { costPerKg: '300' }), before);
  expect(after).toMatchObject({ minNatural: 0.5, excluded: ['leaf'], importance: {}, added: [] });
  expect(after.ceiling?.amount).toBe('100');
});

it('draws from a material what that material smells of', () => {
  const drawn = drawnFrom([8, 0, 1], FACETS, request({ phases: { opening: 1, heart: 1, dry: 1 } }));
  expect(drawn.target).toMatchObject({ kind: 'drawn', intensities: { rosy: 8, green: 1 } });
  expect(drawn).toMatchObject({ phases: null, minStrength: null, ceiling: null });
});

it('holds one rule for a material at a time', () => {
  const kinds = ['excluded', 'required', 'kept', 'most', 'added'] as const;
  fc.assert(
    fc.property(fc.array(fc.constantFrom(...kinds), { minLength: 1 }), (sequence) => {
      let now = request();
      for (const kind of sequence) now = withMaterialRule(now, 'oil', { kind, share: 0.1 });
      expect(rulesOfMaterials(now)).toMatchObject([{ id: 'oil', kind: sequence.at(-1) }]);
      expect(withMaterialRule(now, 'oil', null)).toEqual(request());
    }),
  );
});
