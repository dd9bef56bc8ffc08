import { teamRoute } from '@/lib/api/team-route';
import { listRelated } from '@/lib/materials/related';
import { idParams } from '@/lib/shared/api-parts';
import { relatedList } from '@/lib/shared/material';

export const GET = teamRoute(
  { id: 'materials.related', permission: 'material.read', params: idParams, result: relatedList },
  async (ctx, { params }) => ({ items: await listRelated(ctx, params.id) }),
);
