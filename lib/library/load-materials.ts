import 'server-only';
import { materialCas, materialCautions, materialFacets, materialParts, materialSynonyms, materials } from '@/db/schema';
import type { Transaction } from '@/db/transaction';
import { insertRows } from './batches';
import type { DemoLibrary } from './demo-files';
import type { DemoMaterial, DemoProfile } from './demo-format';
import { fraction, sourceLine } from './library-text';
import { type IdByKey, newIds } from './load-words';

const CAUTION_SOURCE = 'Common practice of the trade; the supplier’s safety data sheet decides.';

/** The materials with their names, numbers, ratings, cautions and, for a ready base, its parts. */
export async function loadMaterials(tx: Transaction, teamId: string, library: DemoLibrary, facetIds: IdByKey) {
  const ids = newIds(library.materials.map((m) => m.key));
  const nameOf = new Map(library.materials.map((m) => [m.key, m.name]));
  const each = <T>(rowsOf: (material: DemoMaterial, materialId: string) => T[]): T[] =>
    library.materials.flatMap((material) => rowsOf(material, ids.get(material.key)!));

  await insertRows(
    tx,
    materials,
    each((m, id) => [{ teamId, id, ...materialRow(m, nameOf) }]),
  );
  await insertRows(
    tx,
    materialCas,
    each((m, materialId) => m.cas.map((cas, position) => ({ teamId, materialId, cas, position }))),
  );
  await insertRows(
    tx,
    materialSynonyms,
    each((m, materialId) => m.synonyms.map((name, position) => ({ teamId, materialId, name, position }))),
  );
  await insertRows(
    tx,
    materialFacets,
    each((m, materialId) =>
      ratingRows(m).map((row) => ({ teamId, materialId, ...row, facetId: facetIds.get(row.facet)! })),
    ),
  );
  await insertRows(
    tx,
    materialCautions,
    each((m, materialId) => m.cautions.map((code) => ({ teamId, materialId, code, source: CAUTION_SOURCE }))),
  );
  await insertRows(
    tx,
    materialParts,
    each((m, materialId) =>
      (m.madeOf ?? []).map((p) => ({ teamId, materialId, partId: ids.get(p.material)!, share: fraction(p.share) })),
    ),
  );
  return ids;
}

function materialRow(m: DemoMaterial, nameOf: ReadonlyMap<string, string>) {
  return {
    name: m.name,
    kind: m.kind,
    botanicalName: m.botanical ?? null,
    plantPart: m.part ?? null,
    chemicalName: m.chemicalName ?? null,
    inciName: m.inci ?? null,
    smell: m.smell,
    naturalShare: fraction(m.naturalShare),
    strength: m.strength.value,
    strengthSpread: m.strength.spreadFactor,
    strengthClass: m.strength.class,
    strengthSource: m.strength.basis,
    vapourPressurePa: m.vapourPressure?.pa25C ?? null,
    vapourPressureSource: m.vapourPressure ? sourceLine(m.vapourPressure) : null,
    odourThresholdUgPerM3: m.odourThreshold?.microgramsPerM3 ?? null,
    odourThresholdSource: m.odourThreshold ? sourceLine(m.odourThreshold) : null,
    evaporationPerHour: m.evaporation.perHour,
    evaporationSource: m.evaporation.basis,
    usualDilution: fraction(m.usualDilution.fraction),
    dilutionSolvent: m.usualDilution.solvent ? (nameOf.get(m.usualDilution.solvent) ?? null) : null,
    maxShare: fraction(m.maxShare),
  };
}

/** The profile counts for all phases; a phase adds only what differs in it. */
function ratingRows(m: DemoMaterial) {
  const phases: [string, DemoProfile | undefined][] = [['all', m.profile], ...Object.entries(m.phases ?? {})];
  return phases.flatMap(([phase, profile]) =>
    Object.entries(profile ?? {}).map(([facet, [intensity, sd]]) => ({
      facet,
      phase,
      intensity: intensity.toFixed(2),
      sd: sd.toFixed(2),
    })),
  );
}
