import 'server-only';
import { and, eq, ne, sql } from 'drizzle-orm';
import { ERRNO, errnoOf } from '@/db/database-error';
import { facets, materials } from '@/db/schema';
import { type Transaction, transaction } from '@/db/transaction';
import { noteActivity } from '@/lib/activity';
import { demand, type Member } from '@/lib/auth/member';
import { Conflict, Invalid, NotFound } from '@/lib/errors';
import { newId } from '@/lib/id';
import type { MaterialInput } from '@/lib/shared/material';
import type { MaterialView } from '@/lib/shared/material-view';
import { clearLists, insertLists } from './lists';
import { getMaterial } from './queries';

/** @throws Invalid when the name is taken or a facet is not the house's. */
export async function createMaterial(ctx: Member, input: MaterialInput): Promise<MaterialView> {
  demand(ctx, 'material.write');
  const id = newId();
  await saying(input.name, () =>
    transaction(async (tx) => {
      await checkNameAndFacets(tx, ctx, input);
      await tx.insert(materials).values({ teamId: ctx.teamId, id, ...columns(input) });
      await insertLists(tx, ctx, id, input);
      await noteActivity(tx, ctx, { action: 'material.create', subjectId: id, detail: { name: input.name } });
    }),
  );
  return getMaterial(ctx, id);
}

/**
 * Writes the whole material over the revision that the person read.
 *
 * @throws Conflict with the material as it stands when somebody wrote meanwhile: nothing is overwritten. NotFound. Invalid.
 */
export async function updateMaterial(
  ctx: Member,
  id: string,
  { revision, material }: { revision: number; material: MaterialInput },
): Promise<MaterialView> {
  demand(ctx, 'material.write');
  const before = await getMaterial(ctx, id);
  await saying(material.name, () =>
    transaction(async (tx) => {
      const [result] = await tx
        .update(materials)
        .set({ ...columns(material), revision: sql`${materials.revision} + 1`, updatedAt: sql`utc_timestamp(3)` })
        .where(and(eq(materials.teamId, ctx.teamId), eq(materials.id, id), eq(materials.revision, revision)));
      if (result.affectedRows === 0) throw new Stale();
      await checkNameAndFacets(tx, ctx, material, id);
      await clearLists(tx, ctx, id);
      await insertLists(tx, ctx, id, material);
      const detail = { name: material.name, changed: changedFields(before, material) };
      await noteActivity(tx, ctx, { action: 'material.update', subjectId: id, detail });
    }),
  ).catch(async (error) => {
    if (!(error instanceof Stale)) throw error;
    throw new Conflict('Somebody changed this material after you opened it.', await getMaterial(ctx, id));
  });
  return getMaterial(ctx, id);
}

/** Takes a material away with its qualities and offers. @throws Conflict while something is made of it. NotFound. */
export async function deleteMaterial(ctx: Member, id: string): Promise<void> {
  demand(ctx, 'material.write');
  try {
    await transaction(async (tx) => {
      const mine = and(eq(materials.teamId, ctx.teamId), eq(materials.id, id));
      const [row] = await tx.select({ name: materials.name }).from(materials).where(mine);
      if (!row) throw new NotFound();
      await tx.delete(materials).where(mine);
      await noteActivity(tx, ctx, { action: 'material.delete', subjectId: id, detail: { name: row.name } });
    });
  } catch (error) {
    if (errnoOf(error) === ERRNO.stillReferenced)
      throw new Conflict('Something in the house is made of this material, so it stays.');
    throw error;
  }
}

class Stale extends Error {}

const columns = ({ synonyms: _, cas: __, facets: ___, cautions: ____, ...row }: MaterialInput) => row;

/** Two people may take one name at the same moment: then it is the database that refuses the second. */
async function saying(name: string, work: () => Promise<void>): Promise<void> {
  try {
    await work();
  } catch (error) {
    if (errnoOf(error) === ERRNO.duplicate) throw new Invalid({ name: nameTaken(name) });
    throw error;
  }
}

const nameTaken = (name: string) => `The house already has a material called “${name}”. Give this one another name.`;

async function checkNameAndFacets(tx: Transaction, ctx: Member, input: MaterialInput, id?: string): Promise<void> {
  const [taken] = await tx
    .select({ id: materials.id })
    .from(materials)
    .where(
      and(eq(materials.teamId, ctx.teamId), eq(materials.name, input.name), id ? ne(materials.id, id) : undefined),
    );
  if (taken) throw new Invalid({ name: nameTaken(input.name) });
  const rows = await tx.select({ id: facets.id }).from(facets).where(eq(facets.teamId, ctx.teamId));
  const known = new Set(rows.map((row) => row.id));
  const faults = input.facets.flatMap(({ facetId }, at) =>
    known.has(facetId) ? [] : [[`facets.${at}.facetId`, 'The house has no such facet.'] as const],
  );
  if (faults.length > 0) throw new Invalid(Object.fromEntries(faults));
}

/** Names of fields for the activity log; what stood in them stays out of it. */
function changedFields(before: MaterialView, after: MaterialInput): string[] {
  const same = (a: unknown, b: unknown) => JSON.stringify(a ?? null) === JSON.stringify(b ?? null);
  return (Object.keys(after) as (keyof MaterialInput)[]).filter((field) => !same(before[field], after[field]));
}
