import { teamRoute } from '@/lib/api/team-route';
import { updateOffers } from '@/lib/qualities/commands';
import { idParams } from '@/lib/shared/api-parts';
import { qualityView } from '@/lib/shared/material-view';
import { offersUpdate } from '@/lib/shared/quality';

export const PUT = teamRoute(
  { id: 'qualities.offers', permission: 'price.write', params: idParams, body: offersUpdate, result: qualityView },
  (ctx, { params, body }) => updateOffers(ctx, params.id, body),
);
