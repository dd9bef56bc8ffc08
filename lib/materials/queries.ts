import 'server-only';
import { and, asc, eq } from 'drizzle-orm';
import { db } from '@/db/connection';
import { materialCautions, materialParts, materialSynonyms, materials } from '@/db/schema';
import { demand, type Member } from '@/lib/auth/member';
import { NotFound } from '@/lib/errors';
import { qualitiesOf } from '@/lib/qualities/queries';
import type { MaterialView } from '@/lib/shared/material-view';
import { casOf } from './rows';
import { smellsOf } from './smell';
import { viewMaterial } from './view';

/** @throws NotFound for an id that is not of this house, whether or not another house has it. */
export async function getMaterial(ctx: Member, id: string): Promise<MaterialView> {
  demand(ctx, 'material.read');
  const [record] = await db
    .select()
    .from(materials)
    .where(and(eq(materials.teamId, ctx.teamId), eq(materials.id, id)));
  if (!record) throw new NotFound();
  const [synonyms, cas, smell, cautions, qualities, parts] = await Promise.all([
    synonymsOf(ctx, id),
    casOf(ctx, [id]),
    smellsOf(ctx, [id]),
    cautionsOf(ctx, id),
    qualitiesOf(ctx, record),
    partsOf(ctx, id),
  ]);
  return viewMaterial(ctx, { record, synonyms, cas: cas.get(id) ?? [], smell: smell(id), cautions, qualities, parts });
}

async function synonymsOf(ctx: Member, id: string): Promise<string[]> {
  const rows = await db
    .select()
    .from(materialSynonyms)
    .where(and(eq(materialSynonyms.teamId, ctx.teamId), eq(materialSynonyms.materialId, id)))
    .orderBy(asc(materialSynonyms.position));
  return rows.map(({ name }) => name);
}

function cautionsOf(ctx: Member, id: string) {
  return db
    .select({ code: materialCautions.code, source: materialCautions.source })
    .from(materialCautions)
    .where(and(eq(materialCautions.teamId, ctx.teamId), eq(materialCautions.materialId, id)))
    .orderBy(asc(materialCautions.code));
}

function partsOf(ctx: Member, id: string) {
  return db
    .select({ materialId: materialParts.partId, name: materials.name, share: materialParts.share })
    .from(materialParts)
    .innerJoin(materials, and(eq(materials.teamId, materialParts.teamId), eq(materials.id, materialParts.partId)))
    .where(and(eq(materialParts.teamId, ctx.teamId), eq(materialParts.materialId, id)))
    .orderBy(asc(materials.name));
}
