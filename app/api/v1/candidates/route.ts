import { teamRoute } from '@/lib/api/team-route';
import { listCandidates } from '@/lib/blends/candidates';
import { candidateList, candidateQuery } from '@/lib/shared/blend-candidate';

export const GET = teamRoute(
  { id: 'candidates.list', permission: 'blend.solve', query: candidateQuery, result: candidateList },
  (ctx, { query }) => listCandidates(ctx, query.packGrams),
);
