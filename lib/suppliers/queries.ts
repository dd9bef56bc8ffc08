import 'server-only';
import { asc, eq } from 'drizzle-orm';
import { db } from '@/db/connection';
import { suppliers } from '@/db/schema';
import { demand, type Member } from '@/lib/auth/member';
import type { SupplierView } from '@/lib/shared/quality';

export async function listSuppliers(ctx: Member): Promise<SupplierView[]> {
  demand(ctx, 'supplier.read');
  const { id, name, note } = suppliers;
  return db.select({ id, name, note }).from(suppliers).where(eq(suppliers.teamId, ctx.teamId)).orderBy(asc(name));
}
