import { teamRoute } from '@/lib/api/team-route';
import { getBlend } from '@/lib/blends/queries';
import { blendParams, savedBlendView } from '@/lib/shared/blend-view';

export const GET = teamRoute(
  { id: 'blends.get', permission: 'blend.read', params: blendParams, result: savedBlendView },
  (ctx, { params }) => getBlend(ctx, params.id),
);
