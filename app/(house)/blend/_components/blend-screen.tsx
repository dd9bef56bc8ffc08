'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { ErrorState, LoadingState } from '@/app/_components/ui/states';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { FacetView } from '@/lib/shared/facet';
import { candidatesQuery, limitsQuery } from '../_client/queries';
import { BlendBench } from './blend-bench';

export interface BlendScreenProps {
  facets: readonly FacetView[];
  currency: string;
  maySave: boolean;
  /** The request of a saved blend to go on from. */
  start: BlendRequest | null;
}

/** Fetches what the worker needs once, then leaves the bench to itself. */
export function BlendScreen({ facets, currency, maySave, start }: BlendScreenProps) {
  const [packGrams, setPackGrams] = useState<BlendRequest['packGrams']>(start?.packGrams ?? '100');
  const candidates = useQuery({ ...candidatesQuery(packGrams), placeholderData: keepPreviousData });
  const limits = useQuery(limitsQuery);
  const inputs = useMemo(
    () =>
      candidates.data && limits.data
        ? { facetIds: candidates.data.facetIds, candidates: candidates.data.items, limits: limits.data }
        : null,
    [candidates.data, limits.data],
  );
  const failed = [candidates, limits].find(({ isError }) => isError);
  if (!inputs && failed)
    return (
      <ErrorState title="The materials did not load" onRetry={() => failed.refetch()}>
        {failed.error?.message}
      </ErrorState>
    );
  if (!inputs) return <LoadingState>Laying out the materials</LoadingState>;
  return (
    <BlendBench
      facets={facets}
      currency={currency}
      maySave={maySave}
      start={start}
      inputs={inputs}
      tables={inputs.limits}
      onPackGrams={setPackGrams}
    />
  );
}
