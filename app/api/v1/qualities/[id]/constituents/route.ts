import { teamRoute } from '@/lib/api/team-route';
import { updateComposition } from '@/lib/qualities/commands';
import { idParams } from '@/lib/shared/api-parts';
import { qualityView } from '@/lib/shared/material-view';
import { compositionUpdate } from '@/lib/shared/quality';

export const PUT = teamRoute(
  {
    id: 'qualities.constituents',
    permission: 'constituent.write',
    params: idParams,
    body: compositionUpdate,
    result: qualityView,
  },
  (ctx, { params, body }) => updateComposition(ctx, params.id, body),
);
