import type { FacetTone } from './facet';

/** One band of a strip: a facet and its share of the whole smell. `facet` is null for all the small ones together. */
export interface StripBand {
  facet: FacetTone | null;
  share: number;
}

/**
 * The bands of a profile, largest first; beyond `most` the rest is one band, 'other', at the end. Ties keep the
 * house's order of facets. A profile of zeros has no bands.
 */
export function stripBands(profile: ArrayLike<number>, facets: readonly FacetTone[], most = Infinity): StripBand[] {
  const smelt = facets
    .map((facet, index) => ({ facet, intensity: profile[index] ?? 0 }))
    .filter(({ intensity }) => intensity > 0)
    .sort((a, b) => b.intensity - a.intensity);
  const total = smelt.reduce((sum, { intensity }) => sum + intensity, 0);
  const bands: StripBand[] = smelt.slice(0, most).map(({ facet, intensity }) => ({ facet, share: intensity / total }));
  const rest = smelt.slice(most).reduce((sum, { intensity }) => sum + intensity, 0);
  return rest > 0 ? [...bands, { facet: null, share: rest / total }] : bands;
}

/** "mostly rosy, honeyed and green; lasts a day", or "no smell" for a profile of zeros. */
export function smellInWords(
  profile: ArrayLike<number>,
  facets: readonly FacetTone[],
  lastsHours?: number | null,
): string {
  const names = stripBands(profile, facets, 3).flatMap(({ facet }) => (facet ? [facet.name.toLowerCase()] : []));
  const smell = names.length === 0 ? 'no smell' : `mostly ${new Intl.ListFormat('en-GB').format(names)}`;
  return lastsHours ? `${smell}; lasts ${lastingInWords(lastsHours)}` : smell;
}

const SPANS: readonly [upTo: number, words: string][] = [
  [0.5, 'some minutes'],
  [1.5, 'an hour'],
  [6, 'some hours'],
  [16, 'half a day'],
  [36, 'a day'],
  [100, 'some days'],
  [250, 'a week'],
  [Infinity, 'for weeks'],
];

/** How long, as one would say it: a time on a blotter is never known to the minute. */
export function lastingInWords(hours: number): string {
  return SPANS.find(([upTo]) => hours <= upTo)?.[1] ?? 'for weeks';
}
