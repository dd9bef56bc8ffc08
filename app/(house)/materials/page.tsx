import { dehydrate, HydrationBoundary, QueryClient } from '@tanstack/react-query';
import type { Metadata } from 'next';
import type { SearchParams } from 'nuqs/server';
import { requireMember } from '@/lib/auth/current';
import { Forbidden } from '@/lib/errors';
import { listFacets } from '@/lib/facets/queries';
import { listMaterials } from '@/lib/materials/list';
import { materialListQuery } from '@/lib/shared/material-list';
import { may } from '@/lib/shared/permissions';
import { apiQuery, loadListState } from './_client/list-state';
import { materialListOptions } from './_client/queries';
import { MaterialList } from './_components/material-list';

export const metadata: Metadata = { title: 'Materials' };

export default async function MaterialsPage({ searchParams }: { searchParams: Promise<SearchParams> }) {
  const ctx = await requireMember('material.read');
  const query = apiQuery(await loadListState(searchParams));
  const queries = new QueryClient();
  const asked = materialListQuery.safeParse(Object.fromEntries(new URLSearchParams(query)));
  // What can't be answered here is asked again by the list itself, which shows the sentence.
  const page = asked.success ? await listMaterials(ctx, asked.data).catch(nullIfForbidden) : null;
  if (page)
    queries.setQueryData(materialListOptions(query).queryKey, { pages: [page], pageParams: [null as string | null] });
  return (
    <HydrationBoundary state={dehydrate(queries)}>
      <MaterialList
        facets={await listFacets(ctx)}
        currency={may(ctx.roles, 'price.read') ? ctx.currency : null}
        mayWrite={may(ctx.roles, 'material.write')}
      />
    </HydrationBoundary>
  );
}

function nullIfForbidden(error: unknown): null {
  if (error instanceof Forbidden) return null;
  throw error;
}
