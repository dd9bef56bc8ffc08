import 'server-only';
import { ERRNO, errnoOf } from '@/db/database-error';
import { constituents } from '@/db/schema';
import { transaction } from '@/db/transaction';
import { noteActivity } from '@/lib/activity';
import { demand, type Member } from '@/lib/auth/member';
import { Invalid } from '@/lib/errors';
import { newId } from '@/lib/id';
import type { ConstituentInput, ConstituentView } from '@/lib/shared/constituent';

/** @throws Invalid when there is one by that name. */
export async function createConstituent(ctx: Member, input: ConstituentInput): Promise<ConstituentView> {
  demand(ctx, 'constituent.write');
  const id = newId();
  const row = { id, slug: slugOf(input.name), ...input };
  try {
    await transaction(async (tx) => {
      await tx.insert(constituents).values({ teamId: ctx.teamId, ...row });
      await noteActivity(tx, ctx, { action: 'constituent.create', subjectId: id, detail: { name: input.name } });
    });
  } catch (error) {
    if (errnoOf(error) === ERRNO.duplicate)
      throw new Invalid({ name: `There is a constituent called “${input.name}”, or one that differs in signs alone.` });
    throw error;
  }
  return row;
}

/** "α-Pinene" and "alpha-pinene" are one word in slugs. A whole natural complex has its own prefix, kept for the library. */
function slugOf(name: string): string {
  const latin = name.toLowerCase().replaceAll('α', 'alpha').replaceAll('β', 'beta').replaceAll('γ', 'gamma');
  const plain = latin
    .normalize('NFKD')
    .replaceAll(/[^a-z0-9]+/g, '-')
    .replaceAll(/^-+|-+$/g, '');
  return (plain.replace(/^whole-/, '') || 'constituent').slice(0, 80);
}
