import { teamRoute } from '@/lib/api/team-route';
import { createConstituent } from '@/lib/constituents/commands';
import { listConstituents } from '@/lib/constituents/queries';
import { constituentInput, constituentView, constituentViews } from '@/lib/shared/constituent';

export const GET = teamRoute(
  { id: 'constituents.list', permission: 'constituent.read', result: constituentViews },
  async (ctx) => ({ items: await listConstituents(ctx) }),
);

export const POST = teamRoute(
  {
    id: 'constituents.create',
    permission: 'constituent.write',
    body: constituentInput,
    result: constituentView,
    status: 201,
    once: true,
  },
  (ctx, { body }) => createConstituent(ctx, body),
);
