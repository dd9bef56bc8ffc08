import {
  createLoader,
  createSerializer,
  type inferParserType,
  parseAsArrayOf,
  parseAsString,
  parseAsStringLiteral,
} from 'nuqs/server';
import { MATERIAL_SORTS, PAGE_SIZE } from '@/lib/shared/material-list';
import { MATERIAL_KINDS } from '@/lib/shared/material-words';

/** What the address of the list says: the same words as the query of the API. */
export const listParsers = {
  q: parseAsString.withDefault(''),
  kind: parseAsArrayOf(parseAsStringLiteral(MATERIAL_KINDS)).withDefault([]),
  /** "rosy:4", "green". */
  facets: parseAsArrayOf(parseAsString).withDefault([]),
  natural: parseAsString,
  minPrice: parseAsString,
  maxPrice: parseAsString,
  maxEqual: parseAsString,
  pack: parseAsString,
  sort: parseAsStringLiteral(MATERIAL_SORTS).withDefault('name'),
  order: parseAsStringLiteral(['asc', 'desc'] as const),
};
export type ListState = inferParserType<typeof listParsers>;

export const loadListState = createLoader(listParsers);
const serialise = createSerializer(listParsers);

/** The query of the API for this state: equal states give equal text, so that it can be a key of the cache. */
export function apiQuery(state: ListState): string {
  const query = new URLSearchParams(serialise(state).replace(/^\?/, ''));
  query.set('limit', String(PAGE_SIZE));
  query.sort();
  return query.toString();
}

/** How many filters are on, the search and the order aside. */
export function filtersOn({ kind, facets, natural, minPrice, maxPrice, maxEqual }: ListState): number {
  const single = [natural, minPrice, maxPrice, maxEqual].filter(Boolean).length;
  return kind.length + facets.length + single;
}

export const NO_FILTERS = {
  kind: null,
  facets: null,
  natural: null,
  minPrice: null,
  maxPrice: null,
  maxEqual: null,
} as const;
