import 'server-only';
import { and, eq, max, min, sql } from 'drizzle-orm';
import { ERRNO, errnoOf } from '@/db/database-error';
import { materials, qualities, suppliers } from '@/db/schema';
import { type Transaction, transaction } from '@/db/transaction';
import { noteActivity } from '@/lib/activity';
import { demand, type Member } from '@/lib/auth/member';
import { Conflict, Invalid, NotFound } from '@/lib/errors';
import { newId } from '@/lib/id';
import type { QualityView } from '@/lib/shared/material-view';
import type { CompositionInput, OfferInput, QualityInput } from '@/lib/shared/quality';
import { writeComposition } from './composition';
import { writeOffers } from './offers';
import { getQuality } from './queries';

/** @throws NotFound for a material that is not the house's. Invalid. */
export async function createQuality(ctx: Member, materialId: string, input: QualityInput): Promise<QualityView> {
  for (const permission of ['material.write', 'constituent.write', 'price.write'] as const) demand(ctx, permission);
  const id = newId();
  await saying(() =>
    transaction(async (tx) => {
      const [material] = await tx
        .select({ name: materials.name })
        .from(materials)
        .where(and(eq(materials.teamId, ctx.teamId), eq(materials.id, materialId)));
      if (!material) throw new NotFound();
      await checkSupplier(tx, ctx, input.supplierId);
      const position = await newPosition(tx, ctx, materialId, input.preferred ? 'first' : 'last');
      await tx.insert(qualities).values({ teamId: ctx.teamId, id, materialId, position, ...columns(input) });
      await writeComposition(tx, ctx, id, input.constituents);
      await writeOffers(tx, ctx, id, input.offers);
      const detail = { name: material.name, code: input.code };
      await noteActivity(tx, ctx, { action: 'quality.create', subjectId: materialId, detail });
    }),
  );
  return getQuality(ctx, id);
}

/** Writes the whole quality over the revision that was read. @throws Conflict with the quality as it stands. NotFound. Invalid. */
export async function updateQuality(
  ctx: Member,
  id: string,
  { revision, quality: input }: { revision: number; quality: QualityInput },
): Promise<QualityView> {
  for (const permission of ['material.write', 'constituent.write', 'price.write'] as const) demand(ctx, permission);
  return overRevision(ctx, id, revision, 'quality.update', async (tx, before) => {
    await checkSupplier(tx, ctx, input.supplierId);
    const moved = input.preferred !== before.preferred;
    const place = input.preferred ? 'first' : 'last';
    await setColumns(tx, ctx, id, {
      ...columns(input),
      ...(moved && { position: await newPosition(tx, ctx, before.materialId, place) }),
    });
    await writeComposition(tx, ctx, id, input.constituents);
    await writeOffers(tx, ctx, id, input.offers);
  });
}

/** For those who keep prices and write nothing else. @throws as `updateQuality`. */
export async function updateOffers(
  ctx: Member,
  id: string,
  { revision, offers }: { revision: number; offers: OfferInput[] },
): Promise<QualityView> {
  demand(ctx, 'price.write');
  return overRevision(ctx, id, revision, 'quality.offers', (tx) => writeOffers(tx, ctx, id, offers));
}

/** For those who keep what is contained. @throws as `updateQuality`. */
export async function updateComposition(ctx: Member, id: string, input: CompositionInput): Promise<QualityView> {
  demand(ctx, 'constituent.write');
  const { revision, completeness, compositionSource, constituents } = input;
  return overRevision(ctx, id, revision, 'quality.composition', async (tx) => {
    await setColumns(tx, ctx, id, { completeness, compositionSource });
    await writeComposition(tx, ctx, id, constituents);
  });
}

/** @throws NotFound */
export async function deleteQuality(ctx: Member, id: string): Promise<void> {
  demand(ctx, 'material.write');
  const { materialId } = await getQuality(ctx, id);
  await transaction(async (tx) => {
    const mine = and(eq(qualities.teamId, ctx.teamId), eq(qualities.id, id));
    const [row] = await tx.select({ code: qualities.code }).from(qualities).where(mine);
    if (!row) throw new NotFound();
    await tx.delete(qualities).where(mine);
    await noteActivity(tx, ctx, { action: 'quality.delete', subjectId: materialId, detail: { code: row.code } });
  });
}

class Stale extends Error {}

async function overRevision(
  ctx: Member,
  id: string,
  revision: number,
  action: string,
  write: (tx: Transaction, before: QualityView) => Promise<void>,
): Promise<QualityView> {
  const before = await getQuality(ctx, id);
  try {
    await saying(() =>
      transaction(async (tx) => {
        const [result] = await tx
          .update(qualities)
          .set({ revision: sql`${qualities.revision} + 1` })
          .where(and(eq(qualities.teamId, ctx.teamId), eq(qualities.id, id), eq(qualities.revision, revision)));
        if (result.affectedRows === 0) throw new Stale();
        await write(tx, before);
        await noteActivity(tx, ctx, { action, subjectId: before.materialId, detail: { grade: before.grade } });
      }),
    );
  } catch (error) {
    if (!(error instanceof Stale)) throw error;
    throw new Conflict('Somebody changed this quality after you opened it.', await getQuality(ctx, id));
  }
  return getQuality(ctx, id);
}

const columns = ({ constituents: _, offers: __, preferred: ___, ...row }: QualityInput) => row;

function setColumns(tx: Transaction, ctx: Member, id: string, values: Partial<typeof qualities.$inferInsert>) {
  return tx
    .update(qualities)
    .set(values)
    .where(and(eq(qualities.teamId, ctx.teamId), eq(qualities.id, id)));
}

/** Before or behind all other qualities of the material. */
async function newPosition(tx: Transaction, ctx: Member, materialId: string, place: 'first' | 'last') {
  const [ends] = await tx
    .select({ first: min(qualities.position), last: max(qualities.position) })
    .from(qualities)
    .where(and(eq(qualities.teamId, ctx.teamId), eq(qualities.materialId, materialId)));
  return place === 'first' ? (ends?.first ?? 1) - 1 : (ends?.last ?? -1) + 1;
}

async function checkSupplier(tx: Transaction, ctx: Member, supplierId: string): Promise<void> {
  const [row] = await tx
    .select({ id: suppliers.id })
    .from(suppliers)
    .where(and(eq(suppliers.teamId, ctx.teamId), eq(suppliers.id, supplierId)));
  if (!row) throw new Invalid({ supplierId: 'The house has no such supplier.' });
}

async function saying(work: () => Promise<void>): Promise<void> {
  try {
    await work();
  } catch (error) {
    if (errnoOf(error) === ERRNO.duplicate)
      throw new Invalid({ code: 'This supplier already has a quality with this code and grade.' });
    throw error;
  }
}
