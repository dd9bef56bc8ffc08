import { teamRoute } from '@/lib/api/team-route';
import { deleteMaterial, updateMaterial } from '@/lib/materials/commands';
import { getMaterial } from '@/lib/materials/queries';
import { done, idParams } from '@/lib/shared/api-parts';
import { materialUpdate } from '@/lib/shared/material';
import { materialView } from '@/lib/shared/material-view';

export const GET = teamRoute(
  { id: 'materials.get', permission: 'material.read', params: idParams, result: materialView },
  (ctx, { params }) => getMaterial(ctx, params.id),
);

export const PUT = teamRoute(
  {
    id: 'materials.update',
    permission: 'material.write',
    params: idParams,
    body: materialUpdate,
    result: materialView,
  },
  (ctx, { params, body }) => updateMaterial(ctx, params.id, body),
);

export const DELETE = teamRoute(
  { id: 'materials.delete', permission: 'material.write', params: idParams, result: done },
  async (ctx, { params }) => {
    await deleteMaterial(ctx, params.id);
    return { done: true };
  },
);
