import fc from 'fast-check';
import { expect, it } from 'vitest';
import { EngineInputError } from '@/engine/errors';
import { circleOrder } from '@/engine/map/circle-order';
import { facetHues } from '@/engine/map/facet-hues';

const around = (likeness: number[][], order: number[]) =>
  order.reduce((sum, one, place) => sum + likeness[one]![order[(place + 1) % order.length]!]!, 0);

function permutations(list: number[]): number[][] {
  if (list.length < 2) return [list];
  return list.flatMap((first) => permutations(list.filter((it) => it !== first)).map((rest) => [first, ...rest]));
}

const likenessTable = fc
  .integer({ min: 4, max: 7 })
  .chain((count) =>
    fc
      .array(fc.integer({ min: 0, max: 20 }), { minLength: count * count, maxLength: count * count })
      .map((values) =>
        Array.from({ length: count }, (_, i) =>
          Array.from({ length: count }, (_, j) => values[Math.min(i, j) * count + Math.max(i, j)]!),
        ),
      ),
  );

it('puts alike things side by side: no other circle has likelier neighbours', () => {
  fc.assert(
    fc.property(likenessTable, (likeness) => {
      const order = circleOrder(likeness);
      const rest = likeness.map((_, index) => index).slice(1);
      const best = Math.max(...permutations(rest).map((others) => around(likeness, [0, ...others])));
      expect(order[0]).toBe(0);
      expect([...order].sort()).toEqual(likeness.map((_, index) => index));
      expect(around(likeness, order)).toBe(best);
      expect(order[1]!).toBeLessThan(order.at(-1)!);
    }),
    { numRuns: 60 },
  );
});

const facets = ['rosy', 'lemony', 'smoky', 'honeyed', 'minty', 'waxy'].map((id) => ({ id, family: `family of ${id}` }));

it('gives families that occur together neighbouring hues', () => {
  // A ring of materials, each of two facets: rosy-honeyed, honeyed-smoky, smoky-waxy, waxy-minty, minty-lemony, lemony-rosy.
  const ring = [0, 3, 2, 5, 4, 1];
  const profiles = ring.map((first, place) =>
    facets.map((_, facet) => Number(facet === first || facet === ring[(place + 1) % ring.length])),
  );
  const hues = facetHues(facets, profiles).map((hue) => hue.hueDeg);
  expect(hues).toEqual([0, 60, 240, 300, 120, 180]);
});

it('lets the facets of one family share the hue and differ in lightness', () => {
  const family = [
    { id: 'rosy', family: 'floral' },
    { id: 'smoky', family: 'resinous' },
    { id: 'violet', family: 'floral' },
    { id: 'jasmine', family: 'floral' },
  ];
  const [rosy, smoky, violet, jasmine] = facetHues(family, [[1, 2, 3, 4]]);
  expect([violet!.hueDeg, jasmine!.hueDeg]).toEqual([rosy!.hueDeg, rosy!.hueDeg]);
  expect(smoky!.hueDeg).toBe(180);
  expect([rosy, violet, jasmine, smoky].map((hue) => hue!.lightness)).toEqual([0.78, 0.62, 0.46, 0.62]);
});

it('knows facets that no material has yet', () => {
  expect(new Set(facetHues(facets, []).map((hue) => hue.hueDeg)).size).toBe(6);
});

it('orders fifteen families and refuses more', () => {
  const many = (count: number) =>
    Array.from({ length: count }, (_, index) => ({ id: `f${index}`, family: `f${index}` }));
  expect(new Set(facetHues(many(15), []).map((hue) => hue.hueDeg)).size).toBe(15);
  expect(() => facetHues(many(16), [])).toThrow(EngineInputError);
  expect(() => facetHues([...many(1), ...many(1)], [])).toThrow(EngineInputError);
  expect(() => facetHues(many(2), [[1]])).toThrow(EngineInputError);
});
