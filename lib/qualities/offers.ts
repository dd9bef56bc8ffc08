import 'server-only';
import { and, eq, notInArray } from 'drizzle-orm';
import { offers } from '@/db/schema';
import type { Transaction } from '@/db/transaction';
import type { Member } from '@/lib/auth/member';
import { Invalid } from '@/lib/errors';
import { newId } from '@/lib/id';
import type { OfferInput } from '@/lib/shared/quality';

/** Makes these the offers of a quality: known ones are changed, new ones added, the rest goes. @throws Invalid for an id that is not one of its offers. */
export async function writeOffers(
  tx: Transaction,
  ctx: Member,
  qualityId: string,
  wanted: OfferInput[],
): Promise<void> {
  const mine = and(eq(offers.teamId, ctx.teamId), eq(offers.qualityId, qualityId));
  const rows = await tx.select({ id: offers.id }).from(offers).where(mine);
  const known = new Set(rows.map(({ id }) => id));
  const stranger = wanted.findIndex(({ id }) => id !== undefined && !known.delete(id));
  if (stranger >= 0) throw new Invalid({ [`offers.${stranger}.id`]: 'This quality has no such offer any more.' });
  const kept = wanted.flatMap(({ id }) => (id ? [id] : []));
  await tx.delete(offers).where(kept.length > 0 ? and(mine, notInArray(offers.id, kept)) : mine);
  for (const { id, ...values } of wanted) {
    if (id)
      await tx
        .update(offers)
        .set(values)
        .where(and(mine, eq(offers.id, id)));
    else await tx.insert(offers).values({ teamId: ctx.teamId, id: newId(), qualityId, ...values });
  }
}
