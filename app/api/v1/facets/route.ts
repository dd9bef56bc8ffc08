import { teamRoute } from '@/lib/api/team-route';
import { listFacets } from '@/lib/facets/queries';
import { facetList } from '@/lib/shared/facet';

export const GET = teamRoute({ id: 'facets.list', permission: 'facet.read', result: facetList }, async (ctx) => ({
  items: await listFacets(ctx),
}));
