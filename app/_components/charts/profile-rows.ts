import type { FacetTone } from '@/lib/shared/facet';

export interface ProfileRow {
  facet: FacetTone;
  target: number;
  blend: number;
  /** Target less blend: above 0 it is missing, below 0 there is too much. */
  missing: number;
}

/** Below this on the 0..10 scale a facet is not drawn: no nose tells it from nothing. */
export const DRAWN_FROM = 0.05;

/** The facets of either side, what is missing most first; ties keep the house's order. */
export function profileRows(
  facets: readonly FacetTone[],
  target: ArrayLike<number>,
  blend: ArrayLike<number>,
): ProfileRow[] {
  return facets
    .map((facet, index) => {
      const wanted = target[index] ?? 0;
      const got = blend[index] ?? 0;
      return { facet, target: wanted, blend: got, missing: wanted - got };
    })
    .filter((row) => Math.max(row.target, row.blend) >= DRAWN_FROM)
    .sort((a, b) => b.missing - a.missing);
}
