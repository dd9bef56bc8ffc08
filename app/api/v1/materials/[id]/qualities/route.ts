import { teamRoute } from '@/lib/api/team-route';
import { createQuality } from '@/lib/qualities/commands';
import { idParams } from '@/lib/shared/api-parts';
import { qualityView } from '@/lib/shared/material-view';
import { qualityInput } from '@/lib/shared/quality';

export const POST = teamRoute(
  {
    id: 'qualities.create',
    permission: 'material.write',
    params: idParams,
    body: qualityInput,
    result: qualityView,
    status: 201,
    once: true,
  },
  (ctx, { params, body }) => createQuality(ctx, params.id, body),
);
