import 'server-only';
import { and, eq, inArray } from 'drizzle-orm';
import { constituents, qualityConstituents } from '@/db/schema';
import type { Transaction } from '@/db/transaction';
import type { Member } from '@/lib/auth/member';
import { Invalid } from '@/lib/errors';
import { minimaFault, type QualityInput } from '@/lib/shared/quality';

/** Writes what a quality contains, in place of what stood there. @throws Invalid when minima leave no room for each other. */
export async function writeComposition(
  tx: Transaction,
  ctx: Member,
  qualityId: string,
  ranges: QualityInput['constituents'],
): Promise<void> {
  const slugs = await slugsOf(
    tx,
    ctx,
    ranges.map(({ constituentId }) => constituentId),
  );
  const unknown = ranges.findIndex(({ constituentId }) => !slugs.has(constituentId));
  if (unknown >= 0)
    throw new Invalid({ [`constituents.${unknown}.constituentId`]: 'The house has no such constituent.' });
  const fault = minimaFault(ranges.map((range) => ({ ...range, slug: slugs.get(range.constituentId) ?? '' })));
  if (fault) throw new Invalid({ constituents: fault });
  await tx
    .delete(qualityConstituents)
    .where(and(eq(qualityConstituents.teamId, ctx.teamId), eq(qualityConstituents.qualityId, qualityId)));
  if (ranges.length > 0)
    await tx.insert(qualityConstituents).values(ranges.map((range) => ({ teamId: ctx.teamId, qualityId, ...range })));
}

async function slugsOf(tx: Transaction, ctx: Member, ids: string[]): Promise<Map<string, string>> {
  if (ids.length === 0) return new Map();
  const rows = await tx
    .select({ id: constituents.id, slug: constituents.slug })
    .from(constituents)
    .where(and(eq(constituents.teamId, ctx.teamId), inArray(constituents.id, ids)));
  return new Map(rows.map(({ id, slug }) => [id, slug]));
}
