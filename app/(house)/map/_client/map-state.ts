import { parseAsArrayOf, parseAsFloat, parseAsString, parseAsStringLiteral, useQueryStates } from 'nuqs';
import type { RelatedBy } from '@/lib/shared/related';

export const NATURES = ['all', 'natural', 'synthetic'] as const;
export type Nature = (typeof NATURES)[number];

/** Where the map stands, wholly in the URL: what is linked, what is shown, what is looked at. */
const PARSERS = {
  by: parseAsStringLiteral(['facets', 'constituents']).withDefault('facets'),
  /** Least likeness of a link; null for what suits the kind of link. */
  alike: parseAsFloat,
  /** Slugs of the facets that are asked about. */
  smells: parseAsArrayOf(parseAsString).withDefault([]),
  /** Families that are shown; none for all. */
  family: parseAsArrayOf(parseAsString).withDefault([]),
  nature: parseAsStringLiteral(NATURES).withDefault('all'),
  /** Only this material and its neighbours. */
  focus: parseAsString,
  /** The material in the side sheet. */
  at: parseAsString,
  view: parseAsStringLiteral(['graph', 'table']).withDefault('graph'),
  sort: parseAsString.withDefault('name'),
};

/** Writes go to the history only where going back means something: another material looked at. */
export function useMapState() {
  return useQueryStates(PARSERS, { history: 'replace', shallow: true });
}
export type MapState = ReturnType<typeof useMapState>[0];
export type SetMapState = ReturnType<typeof useMapState>[1];

const USUAL_LIKENESS: Record<RelatedBy, number> = { facets: 0.75, constituents: 0.5 };
export const likenessOf = ({ by, alike }: Pick<MapState, 'by' | 'alike'>): number => alike ?? USUAL_LIKENESS[by];
