import fc from 'fast-check';
import { expect, it } from 'vitest';
import { EngineInputError } from '@/engine/errors';
import { agreement } from '@/engine/panel/agreement';
import { meanSquares } from '@/engine/panel/mean-squares';

/** Table 2 of Shrout and Fleiss (1979): six targets, four judges. */
const shroutFleiss = [
  [9, 2, 5, 8],
  [6, 1, 3, 2],
  [8, 4, 6, 8],
  [7, 1, 2, 6],
  [10, 5, 6, 9],
  [6, 2, 4, 7],
];

it('gives the published correlations of Shrout and Fleiss: .17 .29 .71, and .44 .62 .91 for the mean', () => {
  const found = agreement(shroutFleiss);
  const values = [found.icc11, found.icc21, found.icc31, found.icc1k, found.icc2k, found.icc3k];
  const more = [0.165742, 0.289764, 0.714841, 0.442797, 0.620051, 0.909316];
  for (const [index, expected] of more.entries()) expect(values[index]).toBeCloseTo(expected, 6);
  expect(values.map((value) => value!.toFixed(2))).toEqual(['0.17', '0.29', '0.71', '0.44', '0.62', '0.91']);
});

it('comes from their mean squares', () => {
  const squares = meanSquares(shroutFleiss);
  expect(squares.between).toBeCloseTo(11.241667, 6);
  expect(squares.within).toBeCloseTo(6.263889, 6);
  expect(squares.assessors).toBeCloseTo(32.486111, 6);
  expect(squares.residual).toBeCloseTo(1.019444, 6);
});

it('does not change with the unit or the zero of the scale', () => {
  const table = fc.array(fc.array(fc.integer({ min: 0, max: 10 }), { minLength: 3, maxLength: 3 }), {
    minLength: 2,
    maxLength: 6,
  });
  fc.assert(
    fc.property(table, fc.integer({ min: 1, max: 50 }), fc.integer({ min: -20, max: 20 }), (ratings, unit, zero) => {
      const before = agreement(ratings);
      const after = agreement(ratings.map((row) => row.map((rating) => rating * unit + zero)));
      for (const [name, value] of Object.entries(before)) {
        const other = after[name as keyof typeof after];
        if (value === null) expect(other).toBeNull();
        else expect(Math.abs(other! - value)).toBeLessThan(1e-8 * Math.max(1, Math.abs(value)));
      }
    }),
  );
});

it('is 1 where all assessors rate alike, and null, not 1, where nothing varies', () => {
  expect(
    agreement([
      [1, 1, 1],
      [4, 4, 4],
      [9, 9, 9],
    ]),
  ).toEqual({
    ...{ icc11: 1, icc21: 1, icc31: 1, icc1k: 1, icc2k: 1, icc3k: 1, kendallW: 1 },
  });
  const nothing = { icc11: null, icc21: null, icc31: null, icc1k: null, icc2k: null, icc3k: null, kendallW: null };
  expect(
    agreement([
      [0.1, 0.1],
      [0.1, 0.1],
      [0.1, 0.1],
    ]),
  ).toEqual(nothing);
  expect(agreement([[1], [2]])).toEqual(nothing);
  expect(agreement([[1, 2]])).toEqual(nothing);
});

it('tells a constant difference in severity from disagreement', () => {
  const found = agreement([
    [1, 4],
    [2, 5],
    [6, 9],
  ]);
  expect(found.icc3k).toBeCloseTo(1, 12);
  expect(found.icc2k).toBeLessThan(0.8);
  expect(found.kendallW).toBe(1);
});

it('refuses a ragged table and a missing rating', () => {
  expect(() => agreement([])).toThrow(EngineInputError);
  expect(() => agreement([[1, 2], [1]])).toThrow(EngineInputError);
  expect(() =>
    agreement([
      [1, Number.NaN],
      [1, 2],
    ]),
  ).toThrow(EngineInputError);
});
