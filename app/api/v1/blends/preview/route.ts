import { teamRoute } from '@/lib/api/team-route';
import { previewBlend } from '@/lib/blends/commands';
import { previewBlendInput, solvedBlendView, solveProgress } from '@/lib/shared/blend-view';

/** Solves and keeps nothing, so it needs no idempotency key. */
export const POST = teamRoute(
  {
    id: 'blends.preview',
    permission: 'blend.solve',
    body: previewBlendInput,
    result: solvedBlendView,
    progress: solveProgress,
  },
  (ctx, { body }, { signal, report }) => previewBlend(ctx, body.request, { signal, onBetter: report }),
);
