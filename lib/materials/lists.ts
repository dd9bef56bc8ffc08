import 'server-only';
import { and, eq } from 'drizzle-orm';
import { materialCas, materialCautions, materialFacets, materialSynonyms } from '@/db/schema';
import type { Transaction } from '@/db/transaction';
import type { Member } from '@/lib/auth/member';
import type { MaterialInput } from '@/lib/shared/material';

/* The lists that belong to a material: written whole with it, so that they are always of one revision. */

export async function clearLists(tx: Transaction, ctx: Member, materialId: string): Promise<void> {
  for (const table of [materialSynonyms, materialCas, materialFacets, materialCautions])
    await tx.delete(table).where(and(eq(table.teamId, ctx.teamId), eq(table.materialId, materialId)));
}

export async function insertLists(tx: Transaction, ctx: Member, materialId: string, input: MaterialInput) {
  const mine = { teamId: ctx.teamId, materialId };
  const synonyms = input.synonyms.map((name, position) => ({ ...mine, name, position }));
  const cas = input.cas.map((number, position) => ({ ...mine, cas: number, position }));
  const facets = input.facets
    .filter(({ phase, intensity, sd }) => phase !== 'all' || intensity > 0 || sd > 0)
    .map(({ facetId, phase, intensity, sd }) => ({
      ...mine,
      facetId,
      phase,
      intensity: intensity.toFixed(2),
      sd: sd.toFixed(2),
    }));
  const cautions = input.cautions.map((caution) => ({ ...mine, ...caution }));
  if (synonyms.length > 0) await tx.insert(materialSynonyms).values(synonyms);
  if (cas.length > 0) await tx.insert(materialCas).values(cas);
  if (facets.length > 0) await tx.insert(materialFacets).values(facets);
  if (cautions.length > 0) await tx.insert(materialCautions).values(cautions);
}
