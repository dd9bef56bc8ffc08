import { dehydrate, HydrationBoundary, QueryClient } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { requireMember } from '@/lib/auth/current';
import { relatedMapOf } from '@/lib/related/queries';
import { may } from '@/lib/shared/permissions';
import { relatedBy, relatedQuery } from '@/lib/shared/related';
import { mapQuery } from './_client/queries';
import { MapScreen } from './_components/map-screen';

export const metadata: Metadata = { title: 'Map' };

export default async function MapPage({ searchParams }: { searchParams: Promise<Record<string, unknown>> }) {
  const member = await requireMember('map.read');
  const by = relatedBy.catch('facets').parse((await searchParams).by);
  const queries = new QueryClient();
  queries.setQueryData(mapQuery(by).queryKey, await relatedMapOf(member, relatedQuery.parse({ by })));
  return (
    <HydrationBoundary state={dehydrate(queries)}>
      <MapScreen mayBlend={may(member.roles, 'blend.solve')} />
    </HydrationBoundary>
  );
}
