import { infiniteQueryOptions } from '@tanstack/react-query';
import { callApi } from '@/lib/shared/api-client';
import type { MaterialPage } from '@/lib/shared/material';

/** Beyond so many rows the list asks for a narrower search instead of loading on. */
export const MOST_ROWS = 2000;

export const materialKeys = {
  all: ['materials'] as const,
  list: (query: string) => [...materialKeys.all, 'list', query] as const,
};

export const materialListOptions = (query: string) =>
  infiniteQueryOptions({
    queryKey: materialKeys.list(query),
    queryFn: ({ pageParam, signal }) =>
      callApi<MaterialPage>(`/api/v1/materials?${query}${pageParam ? `&cursor=${pageParam}` : ''}`, { signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (last, pages) => {
      const rows = pages.reduce((sum, { items }) => sum + items.length, 0);
      return rows >= MOST_ROWS ? undefined : last.nextCursor;
    },
  });
