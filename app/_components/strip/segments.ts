import type { FacetTone } from '@/lib/shared/facet';
import { type StripBand, stripBands } from '@/lib/shared/strip-bands';

export const PHASES = ['opening', 'heart', 'dry'] as const;
export type Phase = (typeof PHASES)[number];

/** What a strip shows: one profile for the whole course, and those phases in which the material differs. */
export interface StripContent {
  facets: readonly FacetTone[];
  /** Intensities in the order of `facets`. */
  profile: ArrayLike<number>;
  phases?: Partial<Record<Phase, ArrayLike<number>>>;
}

export interface LaidBand extends StripBand {
  y: number;
  height: number;
}

export interface Segment {
  /** Null where the strip is one piece because the smell stays itself. */
  phase: Phase | null;
  y: number;
  height: number;
  bands: LaidBand[];
}

/** Lays the bands along a length, tip first: one piece, or opening, heart and dry phase in equal thirds. */
export function stripSegments(content: StripContent, length: number, most: number): Segment[] {
  const phases = content.phases;
  const pieces: { phase: Phase | null; profile: ArrayLike<number> }[] =
    phases && Object.keys(phases).length > 0
      ? PHASES.map((phase) => ({ phase, profile: phases[phase] ?? content.profile }))
      : [{ phase: null, profile: content.profile }];
  const height = length / pieces.length;
  return pieces.map(({ phase, profile }, index) => {
    const y = index * height;
    return { phase, y, height, bands: layBands(stripBands(profile, content.facets, most), y, height) };
  });
}

function layBands(bands: StripBand[], top: number, height: number): LaidBand[] {
  let y = top;
  return bands.map((band) => {
    const laid = { ...band, y, height: band.share * height };
    y += laid.height;
    return laid;
  });
}

/** Moves labels apart to at least `gap`, keeping their order and staying within the length where there is room. */
export function spreadLabels(wanted: readonly number[], gap: number, length: number): number[] {
  const placed: number[] = [];
  for (const y of wanted) placed.push(Math.max(y, (placed.at(-1) ?? -Infinity) + gap));
  for (let i = placed.length - 1, limit = length; i >= 0; i--, limit -= gap) {
    if ((placed[i] ?? 0) <= limit) break;
    placed[i] = limit;
  }
  return placed;
}
