import { queryOptions } from '@tanstack/react-query';
import { callApi } from '@/lib/shared/api-client';
import type { CandidateList } from '@/lib/shared/blend-candidate';
import type { LimitTables } from '@/lib/shared/limit-view';

/** Fetched once for a pack size and kept while the screen is open: the sliders ask nobody but the worker. */
export const candidatesQuery = (packGrams: string) =>
  queryOptions({
    queryKey: ['candidates', packGrams],
    queryFn: ({ signal }) => callApi<CandidateList>(`/api/v1/candidates?packGrams=${packGrams}`, { signal }),
    staleTime: 5 * 60_000,
  });

export const limitsQuery = queryOptions({
  queryKey: ['limits'],
  queryFn: ({ signal }) => callApi<LimitTables>('/api/v1/limits', { signal }),
  staleTime: 5 * 60_000,
});
