import 'server-only';
import { ERRNO, errnoOf } from '@/db/database-error';
import { suppliers } from '@/db/schema';
import { transaction } from '@/db/transaction';
import { noteActivity } from '@/lib/activity';
import { demand, type Member } from '@/lib/auth/member';
import { Invalid } from '@/lib/errors';
import { newId } from '@/lib/id';
import type { SupplierView } from '@/lib/shared/quality';

/** @throws Invalid when there is one by that name. */
export async function createSupplier(ctx: Member, input: { name: string; note: string | null }): Promise<SupplierView> {
  demand(ctx, 'price.write');
  const id = newId();
  try {
    await transaction(async (tx) => {
      await tx.insert(suppliers).values({ teamId: ctx.teamId, id, ...input });
      await noteActivity(tx, ctx, { action: 'supplier.create', subjectId: id, detail: {} });
    });
  } catch (error) {
    if (errnoOf(error) === ERRNO.duplicate) throw new Invalid({ name: `There is a supplier called “${input.name}”.` });
    throw error;
  }
  return { id, ...input };
}
