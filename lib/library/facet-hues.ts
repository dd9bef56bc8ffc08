import 'server-only';
import type { DemoProfile } from './demo-format';

/** The hue of the first family: where a rose is pink in OKLCH. The circle has to begin somewhere. */
const FIRST_HUE_DEG = 5;
const LIGHTEST = 0.8;
const DARKEST = 0.54;

interface Facet {
  id: string;
  family: string;
}

/**
 * A hue for every family and a lightness for every facet in it, from the library itself.
 *
 * Families that occur together in materials become neighbours: the circle through all families that is richest in
 * likeness of neighbours (seriation of the co-occurrence matrix, exactly, by the dynamic programme of Held and Karp,
 * 1962; eleven families take about 100,000 steps). The first family fixes where the circle begins, the second which
 * way round it runs; both only name the answer. Facets of one family differ in lightness, in their order.
 */
export function facetHues(families: string[], facets: Facet[], profiles: DemoProfile[]) {
  const found = bestCircle(likeness(families, facets, profiles));
  const backwards = found.indexOf(1) > found.length / 2;
  const circle = backwards ? [0, ...found.slice(1).reverse()] : found;
  return new Map(
    facets.map((facet) => {
      const kin = facets.filter((other) => other.family === facet.family);
      const place = kin.length === 1 ? 0.5 : kin.indexOf(facet) / (kin.length - 1);
      const turn = circle.indexOf(families.indexOf(facet.family)) / families.length;
      return [
        facet.id,
        { hueDeg: (FIRST_HUE_DEG + 360 * turn) % 360, lightness: DARKEST + (LIGHTEST - DARKEST) * place },
      ] as const;
    }),
  );
}

/** Cosine between families, each seen as its summed intensity in every material. */
function likeness(families: string[], facets: Facet[], profiles: DemoProfile[]): number[][] {
  const sums = families.map((family) => {
    const own = facets.filter((facet) => facet.family === family);
    return profiles.map((profile) => own.reduce((sum, facet) => sum + (profile[facet.id]?.[0] ?? 0), 0));
  });
  const dot = (a: number[], b: number[]) => a.reduce((sum, value, i) => sum + value * b[i]!, 0);
  return sums.map((a) => sums.map((b) => dot(a, b) / (Math.sqrt(dot(a, a) * dot(b, b)) || 1)));
}

/**
 * The circle through all places, beginning at place 0, with the largest sum of likeness between neighbours.
 *
 * `best[set][last]` is the richest path from 0 through exactly the places of `set` (a bit each) that ends in `last`.
 */
export function bestCircle(like: number[][]): number[] {
  const n = like.length;
  if (n < 3) return like.map((_, i) => i);
  const best = Array.from({ length: 1 << n }, () => new Float64Array(n).fill(Number.NEGATIVE_INFINITY));
  const before = Array.from({ length: 1 << n }, () => new Int8Array(n));
  best[1]![0] = 0;
  for (let set = 1; set < 1 << n; set += 2) {
    for (let last = 0; last < n; last++) {
      const value = best[set]![last]!;
      if (value === Number.NEGATIVE_INFINITY) continue;
      for (let next = 1; next < n; next++) {
        if (set & (1 << next)) continue;
        const wider = set | (1 << next);
        const sum = value + like[last]![next]!;
        if (sum <= best[wider]![next]!) continue;
        best[wider]![next] = sum;
        before[wider]![next] = last;
      }
    }
  }
  const all = (1 << n) - 1;
  let last = 1;
  for (let i = 2; i < n; i++) if (best[all]![i]! + like[i]![0]! > best[all]![last]! + like[last]![0]!) last = i;
  const circle: number[] = [];
  for (let set = all; last !== 0; ) {
    circle.unshift(last);
    const previous = before[set]![last]!;
    set ^= 1 << last;
    last = previous;
  }
  return [0, ...circle];
}
