'use client';

import { useInfiniteQuery } from '@tanstack/react-query';
import { useQueryStates } from 'nuqs';
import { type ReactNode, useDeferredValue } from 'react';
import { Button, ButtonLink } from '@/app/_components/ui/button';
import { ScreenHead } from '@/app/_components/ui/screen';
import { EmptyState, ErrorState, SkeletonRows } from '@/app/_components/ui/states';
import { ApiProblem } from '@/lib/shared/api-client';
import type { FacetView } from '@/lib/shared/facet';
import { apiQuery, filtersOn, listParsers, NO_FILTERS } from '../_client/list-state';
import { MOST_ROWS, materialListOptions } from '../_client/queries';
import { FilterBar } from './filter-bar';
import { MaterialTable } from './material-table';

export interface MaterialListProps {
  facets: readonly FacetView[];
  /** Null for those who may see no price. */
  currency: string | null;
  mayWrite: boolean;
}

/** The house's materials: searched, cut and ordered by what the address says, loaded page by page as one goes down. */
export function MaterialList({ facets, currency, mayWrite }: MaterialListProps) {
  const [state, setState] = useQueryStates(listParsers, { history: 'replace', throttleMs: 120 });
  const query = useDeferredValue(apiQuery(state));
  const list = useInfiniteQuery({ ...materialListOptions(query), placeholderData: (before) => before });
  const rows = list.data?.pages.flatMap(({ items }) => items) ?? [];
  const total = list.data?.pages[0]?.total ?? 0;
  const isNarrowed = state.q !== '' || filtersOn(state) > 0;
  const clear = () => setState({ q: null, ...NO_FILTERS });

  return (
    <>
      <ScreenHead
        title="Materials"
        about={
          <span role="status" className="figures">
            {list.data ? countWords(total, isNarrowed) : 'Counting'}
          </span>
        }
        actions={
          mayWrite ? (
            <ButtonLink look="solid" href="/materials/new">
              New material
            </ButtonLink>
          ) : null
        }
      />
      <FilterBar state={state} setState={setState} facets={facets} currency={currency} />
      {list.isError && rows.length === 0 ? (
        <ListError error={list.error} onRetry={() => list.refetch()} onClear={clear} />
      ) : list.isPending ? (
        <SkeletonRows rows={10} label="Loading materials" />
      ) : rows.length === 0 ? (
        <Nothing isNarrowed={isNarrowed} onClear={clear} mayWrite={mayWrite} />
      ) : (
        <MaterialTable
          rows={rows}
          total={total}
          facets={facets}
          currency={currency}
          state={state}
          setState={setState}
          isStale={list.isPlaceholderData}
          onNearEnd={list.hasNextPage && !list.isFetching && !list.isError ? list.fetchNextPage : null}
        />
      )}
      <Foot>
        {list.isFetchingNextPage ? 'Loading more' : null}
        {list.isError && rows.length > 0 ? (
          <>
            The next rows did not load. <Button onClick={() => list.fetchNextPage()}>Try again</Button>
          </>
        ) : null}
        {rows.length >= MOST_ROWS && total > rows.length
          ? `These are the first ${rows.length.toLocaleString('en-GB')}. Search or filter to see the others.`
          : null}
      </Foot>
    </>
  );
}

function countWords(total: number, isNarrowed: boolean): string {
  const count = `${total.toLocaleString('en-GB')} ${total === 1 ? 'material' : 'materials'}`;
  return isNarrowed ? `${count} found` : count;
}

function Nothing({ isNarrowed, onClear, mayWrite }: { isNarrowed: boolean; onClear: () => void; mayWrite: boolean }) {
  if (isNarrowed)
    return (
      <EmptyState title="No material is like that" action={<Button onClick={onClear}>Clear search and filters</Button>}>
        Fewer filters, or a lower intensity of a facet, will show more.
      </EmptyState>
    );
  return (
    <EmptyState
      title="No materials yet"
      action={
        mayWrite ? (
          <ButtonLink look="solid" href="/materials/new">
            Enter the first material
          </ButtonLink>
        ) : null
      }
    >
      Enter what stands on the bench: its name, what it smells like, and what it costs.
    </EmptyState>
  );
}

/** A question at fault is put right, not asked again. */
function ListError({ error, onRetry, onClear }: { error: Error; onRetry: () => void; onClear: () => void }) {
  const isQuestion = error instanceof ApiProblem && (error.status === 422 || error.status === 403);
  return (
    <>
      <ErrorState title="The list did not load" onRetry={isQuestion ? undefined : onRetry}>
        {error.message}
      </ErrorState>
      {isQuestion ? (
        <div className="px-5 pb-8 md:px-10">
          <Button onClick={onClear}>Clear search and filters</Button>
        </div>
      ) : null}
    </>
  );
}

const Foot = ({ children }: { children: ReactNode }) => (
  <div className="flex min-h-12 items-center gap-3 px-5 py-3 text-ink-soft md:px-8" aria-live="polite">
    {children}
  </div>
);
