import fc from 'fast-check';
import { expect, it } from 'vitest';
import { EngineInputError } from '@/engine/errors';
import { blendProfile } from '@/engine/odour/blend-profile';

const line = (share: number, strength: number, profile: number[]) => ({
  share,
  material: { id: `${profile}`, profile, strength, costPerKg: 1 },
});

it('weighs facets by impact, not by mass', () => {
  // y (.5, .5) from s (4, 1), x (.2, .8), by hand: a fifth of the mass does half of the smelling.
  const { profile, strength } = blendProfile([line(0.2, 4, [1, 0]), line(0.8, 1, [0, 1])]);
  expect(Array.from(profile)).toEqual([expect.closeTo(0.5, 12), expect.closeTo(0.5, 12)]);
  expect(strength).toBeCloseTo(1.6, 12);
});

/** Doses for the impacts (.5, .3, .2) with strengths (100, 10, 1): x proportional to y^(1/n) / s, by hand. */
it.each([
  [1, [0.0212766, 0.12765957, 0.85106383]],
  [0.5, [0.04854369, 0.17475728, 0.77669903]],
])('gives the impacts whose doses follow in closed form, n = %d', (exponent, doses) => {
  const unit = (index: number) => [0, 1, 2].map((facet) => Number(facet === index));
  const blend = doses.map((dose, index) => line(dose, [100, 10, 1][index]!, unit(index)));
  const { profile } = blendProfile(blend, exponent);
  for (const [index, impact] of [0.5, 0.3, 0.2].entries())
    expect(Math.abs(profile[index]! - impact)).toBeLessThan(1e-7);
});

it('does not see dilution: odourless lines change the strength only', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.01, max: 0.99, noNaN: true }),
      fc.double({ min: 0.2, max: 1, noNaN: true }),
      (part, n) => {
        const neat = [line(0.3, 7, [1, 5]), line(0.7, 2, [4, 0])];
        const thinned = [...neat.map((one) => ({ ...one, share: one.share * part })), line(1 - part, 0, [9, 9])];
        const before = blendProfile(neat, n);
        const after = blendProfile(thinned, n);
        for (const facet of [0, 1]) expect(after.profile[facet]).toBeCloseTo(before.profile[facet]!, 12);
        expect(after.strength).toBeCloseTo(before.strength * part, 12);
      },
    ),
  );
});

it('smells of nothing where nothing smells', () => {
  expect(blendProfile([line(1, 0, [3, 4])])).toEqual({ profile: Float64Array.of(0, 0), strength: 0 });
});

it('refuses lines on different facets, no lines, and shares that are all 0', () => {
  expect(() => blendProfile([line(1, 1, [1]), line(1, 1, [1, 2])])).toThrow(EngineInputError);
  expect(() => blendProfile([])).toThrow(EngineInputError);
  expect(() => blendProfile([line(0, 1, [1])])).toThrow(EngineInputError);
});
