import { teamRoute } from '@/lib/api/team-route';
import { createMaterial } from '@/lib/materials/commands';
import { listMaterials } from '@/lib/materials/list';
import { materialInput, materialPage } from '@/lib/shared/material';
import { materialListQuery } from '@/lib/shared/material-list';
import { materialView } from '@/lib/shared/material-view';

export const GET = teamRoute(
  { id: 'materials.list', permission: 'material.read', query: materialListQuery, result: materialPage },
  (ctx, { query }) => listMaterials(ctx, query),
);

export const POST = teamRoute(
  {
    id: 'materials.create',
    permission: 'material.write',
    body: materialInput,
    result: materialView,
    status: 201,
    once: true,
  },
  (ctx, { body }) => createMaterial(ctx, body),
);
