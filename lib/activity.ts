import 'server-only';
import { activity } from '@/db/schema';
import type { Transaction } from '@/db/transaction';
import type { Member } from '@/lib/auth/member';
import { newId } from '@/lib/id';

interface Deed {
  /** "material.update". */
  action: string;
  subjectId: string;
  /** Names and counts, for people to read later; never a price or a proportion. */
  detail: Record<string, string | number | string[]>;
}

/** Notes who did what, in the transaction of the deed itself: either both are kept or neither. */
export async function noteActivity(tx: Transaction, ctx: Member, { action, subjectId, detail }: Deed): Promise<void> {
  await tx.insert(activity).values({ teamId: ctx.teamId, id: newId(), userId: ctx.userId, action, subjectId, detail });
}
