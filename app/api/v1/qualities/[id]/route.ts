import { teamRoute } from '@/lib/api/team-route';
import { deleteQuality, updateQuality } from '@/lib/qualities/commands';
import { getQuality } from '@/lib/qualities/queries';
import { done, idParams } from '@/lib/shared/api-parts';
import { qualityView } from '@/lib/shared/material-view';
import { qualityUpdate } from '@/lib/shared/quality';

export const GET = teamRoute(
  { id: 'qualities.get', permission: 'material.read', params: idParams, result: qualityView },
  (ctx, { params }) => getQuality(ctx, params.id),
);

export const PUT = teamRoute(
  { id: 'qualities.update', permission: 'material.write', params: idParams, body: qualityUpdate, result: qualityView },
  (ctx, { params, body }) => updateQuality(ctx, params.id, body),
);

export const DELETE = teamRoute(
  { id: 'qualities.delete', permission: 'material.write', params: idParams, result: done },
  async (ctx, { params }) => {
    await deleteQuality(ctx, params.id);
    return { done: true };
  },
);
