import fc from 'fast-check';
import { expect, it } from 'vitest';
import { kendallW } from '@/engine/panel/kendall-w';

const byColumns = (columns: number[][]) => columns[0]!.map((_, row) => columns.map((column) => column[row]!));

it("gives Siegel's example (1956): published 0.16", () => {
  const judges = [
    [1, 6, 3, 2, 5, 4],
    [1, 5, 6, 4, 2, 3],
    [6, 3, 2, 5, 4, 1],
  ];
  expect(kendallW(byColumns(judges))).toBeCloseTo(0.161905, 6);
});

it('corrects for ties: the anxiety data of the R manuals, published 0.54', () => {
  const raters = [
    [3, 3, 3, 4, 5, 5, 2, 3, 5, 2, 2, 6, 1, 5, 2, 2, 1, 2, 4, 3],
    [3, 6, 4, 6, 2, 4, 2, 4, 3, 3, 2, 3, 3, 3, 2, 2, 1, 3, 3, 4],
    [2, 1, 4, 4, 3, 2, 1, 6, 1, 1, 1, 2, 3, 3, 1, 1, 3, 3, 2, 2],
  ];
  const found = kendallW(byColumns(raters))!;
  expect(found).toBeCloseTo(0.539657, 6);
  expect(3 * 19 * found).toBeCloseTo(30.760442, 5);
});

it("gives Friedman's statistic for the base-running times of Hollander and Wolfe (1973)", () => {
  // 22 players, three ways of rounding first base; from R's manual of friedman.test, confirmed by its 11.142857.
  const times = [
    ...[5.4, 5.5, 5.55, 5.85, 5.7, 5.75, 5.2, 5.6, 5.5, 5.55, 5.5, 5.4, 5.9, 5.85, 5.7, 5.45, 5.55, 5.6],
    ...[5.4, 5.4, 5.35, 5.45, 5.5, 5.35, 5.25, 5.15, 5.0, 5.85, 5.8, 5.7, 5.25, 5.2, 5.1, 5.65, 5.55, 5.45],
    ...[5.6, 5.35, 5.45, 5.05, 5.0, 4.95, 5.5, 5.5, 5.4, 5.45, 5.55, 5.5, 5.55, 5.55, 5.35, 5.45, 5.5, 5.55],
    ...[5.5, 5.45, 5.25, 5.65, 5.6, 5.4, 5.7, 5.65, 5.55, 6.3, 6.3, 6.25],
  ];
  const players = Array.from({ length: 22 }, (_, player) => times.slice(3 * player, 3 * player + 3));
  const ways = byColumns(players);
  expect(22 * 2 * kendallW(ways)!).toBeCloseTo(11.142857, 6);
});

it('reads the Shrout and Fleiss table as ranks', () => {
  const table = [
    [9, 2, 5, 8],
    [6, 1, 3, 2],
    [8, 4, 6, 8],
    [7, 1, 2, 6],
    [10, 5, 6, 9],
    [6, 2, 4, 7],
  ];
  expect(kendallW(table)).toBeCloseTo(0.887037, 6);
});

it('lies between 0 and 1, and sees only the order of the ratings', () => {
  const table = fc.array(fc.array(fc.integer({ min: 0, max: 5 }), { minLength: 4, maxLength: 4 }), {
    minLength: 2,
    maxLength: 8,
  });
  fc.assert(
    fc.property(table, (ratings) => {
      const found = kendallW(ratings);
      if (found === null) return;
      expect(found).toBeGreaterThanOrEqual(-1e-12);
      expect(found).toBeLessThanOrEqual(1 + 1e-12);
      expect(kendallW(ratings.map((row) => row.map((rating) => Math.exp(rating))))).toBe(found);
    }),
  );
});
