import { teamRoute } from '@/lib/api/team-route';
import { supplierInput, supplierList, supplierView } from '@/lib/shared/quality';
import { createSupplier } from '@/lib/suppliers/commands';
import { listSuppliers } from '@/lib/suppliers/queries';

export const GET = teamRoute(
  { id: 'suppliers.list', permission: 'supplier.read', result: supplierList },
  async (ctx) => ({ items: await listSuppliers(ctx) }),
);

export const POST = teamRoute(
  {
    id: 'suppliers.create',
    permission: 'price.write',
    body: supplierInput,
    result: supplierView,
    status: 201,
    once: true,
  },
  (ctx, { body }) => createSupplier(ctx, body),
);
