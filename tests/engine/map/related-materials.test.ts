import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { EngineMaterial } from '@/engine/contract';
import { EngineInputError } from '@/engine/errors';
import { relatedMaterials } from '@/engine/map/related-materials';
import { allPairs } from '@/tests/support/all-pairs';
import { generatedMaterials } from '@/tests/support/arbitraries/materials';
import { seededRandom } from '@/tests/support/arbitraries/random';

const material = (id: string, profile: number[], held: Record<string, number> = {}): EngineMaterial => ({
  id,
  profile,
  strength: 1,
  costPerKg: 1,
  constituents: Object.entries(held).map(([name, max]) => ({ id: name, max })),
});

const small = fc
  .array(fc.tuple(fc.array(fc.integer({ min: 0, max: 2 }), { minLength: 3, maxLength: 3 }), fc.boolean()), {
    minLength: 1,
    maxLength: 9,
  })
  .map((rows) => rows.map(([profile, holds], index) => material(`m${index}`, profile, holds ? { linalool: 0.5 } : {})));

const options = fc.record({
  top: fc.integer({ min: 1, max: 4 }),
  minSimilarity: fc.constantFrom(0, 0.5, 0.9, 1),
  by: fc.constantFrom('facets' as const, 'constituents' as const),
});

it('links exactly the pairs that comparing all with all links, ties and all', () => {
  fc.assert(
    fc.property(small, options, (materials, wanted) => {
      expect(relatedMaterials(materials, wanted)).toEqual(allPairs(materials, wanted));
    }),
    { numRuns: 500 },
  );
});

it('does not depend on the order of the materials', () => {
  fc.assert(
    fc.property(small, options, (materials, wanted) => {
      expect(relatedMaterials([...materials].reverse(), wanted)).toEqual(relatedMaterials(materials, wanted));
    }),
  );
});

describe.each(Array.from({ length: 12 }, (_, seed) => seed))('a library of 400 materials, seed %d', (seed) => {
  const { materials } = generatedMaterials(seededRandom(seed), 400);
  it.each([
    { top: 6, minSimilarity: 0.85, by: 'facets' as const },
    { top: 3, minSimilarity: 0, by: 'facets' as const },
    { top: 6, minSimilarity: 0.3, by: 'constituents' as const },
  ])('has the neighbours of the definition: $top by $by', (wanted) => {
    expect(relatedMaterials(materials, wanted)).toEqual(allPairs(materials, wanted));
  });
});

it('relates nothing to a material without facets, and nothing that shares no facet', () => {
  const materials = [material('a', [0, 0]), material('b', [1, 0]), material('c', [0, 1]), material('d', [2, 0])];
  expect(relatedMaterials(materials, { top: 5, minSimilarity: 0, by: 'facets' })).toEqual([
    { a: 'b', b: 'd', similarity: 1 },
  ]);
});

it('compares what materials are made of by typical fractions, not by the worst case', () => {
  const held = (typical: number) => [
    { id: 'linalool', max: 0.9, typical },
    { id: 'limonene', max: 0.4 },
  ];
  const [link] = relatedMaterials(
    [
      { ...material('a', [1]), constituents: held(0.4) },
      { ...material('b', [1]), constituents: held(0.3) },
    ],
    { top: 1, minSimilarity: 0, by: 'constituents' },
  );
  expect(link!.similarity).toBeCloseTo((0.4 * 0.3 + 0.16) / Math.hypot(0.4, 0.4) / Math.hypot(0.3, 0.4), 12);
});

it('refuses options out of range', () => {
  const by = 'facets' as const;
  expect(() => relatedMaterials([], { top: 0, minSimilarity: 0, by })).toThrow(EngineInputError);
  expect(() => relatedMaterials([], { top: 1, minSimilarity: 1.1, by })).toThrow(EngineInputError);
  expect(() => relatedMaterials([], { top: 1, minSimilarity: 0, by: 'smell' as 'facets' })).toThrow(EngineInputError);
  expect(relatedMaterials([], { top: 1, minSimilarity: 0, by })).toEqual([]);
});
