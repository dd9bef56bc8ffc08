import { teamRoute } from '@/lib/api/team-route';
import { relatedMapOf } from '@/lib/related/queries';
import { relatedMap, relatedQuery } from '@/lib/shared/related';

export const GET = teamRoute(
  { id: 'related.map', permission: 'map.read', query: relatedQuery, result: relatedMap },
  (ctx, { query }) => relatedMapOf(ctx, query),
);
