import fc from 'fast-check';
import { expect, it } from 'vitest';
import { readDemoLibrary } from '@/lib/library/demo-files';
import { bestCircle, facetHues } from '@/lib/library/facet-hues';

/** Every order of 1..n-1 after 0: slow, and sure. */
function* circles(n: number, head: number[] = [0]): Generator<number[]> {
  if (head.length === n) yield head;
  for (let i = 1; i < n; i++) if (!head.includes(i)) yield* circles(n, [...head, i]);
}

const worth = (like: number[][], circle: number[]) =>
  circle.reduce((sum, place, i) => sum + like[place]![circle[(i + 1) % circle.length]!]!, 0);

const symmetric = fc
  .integer({ min: 3, max: 7 })
  .chain((n) =>
    fc
      .array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: n * n, maxLength: n * n })
      .map((cells) =>
        Array.from({ length: n }, (_, i) =>
          Array.from({ length: n }, (_, j) => cells[Math.min(i, j) * n + Math.max(i, j)]!),
        ),
      ),
  );

it('finds the circle whose neighbours are most alike, as trying every circle does', () => {
  fc.assert(
    fc.property(symmetric, (like) => {
      const circle = bestCircle(like);
      expect([...circle].sort((a, b) => a - b)).toEqual(like.map((_, i) => i));
      let best = Number.NEGATIVE_INFINITY;
      for (const other of circles(like.length)) best = Math.max(best, worth(like, other));
      expect(worth(like, circle)).toBeCloseTo(best, 10);
    }),
    { numRuns: 60 },
  );
});

it('gives every family of the sample library a hue of its own, and every facet of a family a lightness of its own', () => {
  const { facets, families, materials } = readDemoLibrary();
  const ids = families.map((f) => f.id);
  const profiles = materials.map((m) => m.profile);
  const tones = facetHues(ids, facets, profiles);
  const hues = new Map(facets.map((f) => [f.family, tones.get(f.id)!.hueDeg]));
  expect(new Set(hues.values()).size).toBe(families.length);
  expect(new Set(facets.map((f) => JSON.stringify(tones.get(f.id)))).size).toBe(facets.length);
  for (const tone of tones.values()) {
    expect(tone.hueDeg).toBeGreaterThanOrEqual(0);
    expect(tone.hueDeg).toBeLessThan(360);
  }
  expect(facetHues(ids, facets, [...profiles].reverse())).toEqual(tones);
});
