import { teamRoute } from '@/lib/api/team-route';
import { saveBlend } from '@/lib/blends/commands';
import { listBlends } from '@/lib/blends/queries';
import { saveBlendInput } from '@/lib/shared/blend-input';
import { savedBlendList, savedBlendQuery, savedBlendView, solveProgress } from '@/lib/shared/blend-view';

export const GET = teamRoute(
  { id: 'blends.list', permission: 'blend.read', query: savedBlendQuery, result: savedBlendList },
  (ctx, { query }) => listBlends(ctx, query.after),
);

export const POST = teamRoute(
  {
    id: 'blends.save',
    permission: 'blend.save',
    body: saveBlendInput,
    result: savedBlendView,
    status: 201,
    once: true,
    progress: solveProgress,
  },
  (ctx, { body }, { signal, report }) => saveBlend(ctx, body, { signal, onBetter: report }),
);
