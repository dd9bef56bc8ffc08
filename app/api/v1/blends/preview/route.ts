import { teamRoute } from '@/lib/api/team-route';
import { previewBlend } from '@/lib/blends/commands';
import { previewBlendInput, solvedBlendView } from '@/lib/shared/blend-view';

/** Solves and keeps nothing, so it needs no idempotency key. */
export const POST = teamRoute(
  { id: 'blends.preview', permission: 'blend.solve', body: previewBlendInput, result: solvedBlendView },
  (ctx, { body }) => previewBlend(ctx, body.request),
);
