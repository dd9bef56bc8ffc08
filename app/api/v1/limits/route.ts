import { teamRoute } from '@/lib/api/team-route';
import { getLimitTables } from '@/lib/limits/queries';
import { limitTables } from '@/lib/shared/limit-view';

export const GET = teamRoute({ id: 'limits.list', permission: 'limit.read', result: limitTables }, (ctx) =>
  getLimitTables(ctx),
);
