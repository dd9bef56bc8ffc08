import type { FacetTone } from '@/lib/shared/facet';
import { DRAWN_FROM } from './profile-rows';

export interface Petal {
  facet: FacetTone;
  intensity: number;
  /** Degrees clockwise from above. */
  angle: number;
}

/** One petal for each facet that is there, in the order of the colour circle, so that like lies by like. */
export function petals(facets: readonly FacetTone[], profile: ArrayLike<number>): Petal[] {
  const there = facets
    .map((facet, index) => ({ facet, intensity: profile[index] ?? 0 }))
    .filter(({ intensity }) => intensity >= DRAWN_FROM)
    .sort((a, b) => a.facet.hueDeg - b.facet.hueDeg || b.facet.lightness - a.facet.lightness);
  return there.map((petal, index) => ({ ...petal, angle: (index * 360) / there.length }));
}

/** The outline of a petal of this length that points up from 0,0: slender at the heart, broad towards the tip. */
export function petalPath(length: number, halfWidth: number): string {
  const w = Math.min(halfWidth, length * 0.42);
  const n = (value: number) => value.toFixed(2);
  return [
    'M0 0',
    `C${n(-w * 0.35)} ${n(-length * 0.3)} ${n(-w)} ${n(-length * 0.5)} ${n(-w)} ${n(-length * 0.74)}`,
    `C${n(-w)} ${n(-length * 0.93)} ${n(-w * 0.45)} ${n(-length)} 0 ${n(-length)}`,
    `C${n(w * 0.45)} ${n(-length)} ${n(w)} ${n(-length * 0.93)} ${n(w)} ${n(-length * 0.74)}`,
    `C${n(w)} ${n(-length * 0.5)} ${n(w * 0.35)} ${n(-length * 0.3)} 0 0Z`,
  ].join('');
}
