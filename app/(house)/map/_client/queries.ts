import { queryOptions } from '@tanstack/react-query';
import { type RelatedBy, type RelatedMap, relatedMap } from '@/lib/shared/related';

/** The whole map of the house; likeness, families and facets are then filtered in the browser, without a wait. */
export const mapQuery = (by: RelatedBy) =>
  queryOptions({ queryKey: ['related', by], queryFn: ({ signal }) => fetchMap(by, signal) });

async function fetchMap(by: RelatedBy, signal: AbortSignal): Promise<RelatedMap> {
  const response = await fetch(`/api/v1/related?by=${by}`, { signal });
  if (!response.ok) throw new Error(`The map was answered with ${response.status}.`);
  return relatedMap.parse(await response.json());
}
