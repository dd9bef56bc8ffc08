import 'server-only';
import { constituents, facets, limitMaxima, limitSets, limits, limitTerms, productCategories } from '@/db/schema';
import type { Transaction } from '@/db/transaction';
import { facetHues } from '@/engine';
import { newId } from '@/lib/id';
import { insertRows } from './batches';
import type { DemoLibrary } from './demo-files';
import { fractionOfPercent, sourceLine } from './library-text';

export type IdByKey = ReadonlyMap<string, string>;
export const newIds = (keys: string[]): IdByKey => new Map(keys.map((key) => [key, newId()]));

/** What every house begins with: facets, constituents, product categories and limits. */
export async function loadWords(tx: Transaction, teamId: string, library: DemoLibrary) {
  const facetIds = newIds(library.facets.map((f) => f.id));
  const constituentIds = newIds(library.constituents.map((c) => c.key));
  await insertRows(tx, facets, facetRows(teamId, library, facetIds));
  await insertRows(
    tx,
    constituents,
    library.constituents.map((c) => ({
      teamId,
      id: constituentIds.get(c.key)!,
      slug: c.key,
      name: c.name,
      cas: c.cas,
    })),
  );
  await insertRows(
    tx,
    productCategories,
    library.categories.map((c, position) => ({
      teamId,
      code: c.code,
      name: c.description,
      exposure: c.exposure,
      position,
      source: sourceLine(c, 300),
    })),
  );
  await loadLimits(tx, teamId, library, constituentIds);
  return { facetIds, constituentIds };
}

function facetRows(teamId: string, library: DemoLibrary, ids: IdByKey) {
  const familyName = new Map(library.families.map((family) => [family.id, family.name]));
  const profiles = library.materials.map((m) => library.facets.map((facet) => m.profile[facet.id]?.[0] ?? 0));
  const colours = facetHues(library.facets, profiles);
  return library.facets.map((facet, position) => ({
    teamId,
    id: ids.get(facet.id)!,
    slug: facet.id,
    name: facet.name,
    family: familyName.get(facet.family)!,
    description: facet.description,
    position,
    hueDeg: colours[position]!.hueDeg.toFixed(3),
    lightness: colours[position]!.lightness.toFixed(3),
  }));
}

/** A demand on the material itself, such as a peroxide value, has no maximum by category; its note carries the figure. */
async function loadLimits(tx: Transaction, teamId: string, library: DemoLibrary, constituentIds: IdByKey) {
  const sets = library.limitSets.map((set) => ({ ...set, id: newId() }));
  const all = sets.flatMap((set) => set.limits.map((limit) => ({ ...limit, setId: set.id, rowId: newId() })));
  await insertRows(
    tx,
    limitSets,
    sets.map(({ id, key: slug, title, edition, date, scope, ...provenance }) => ({
      teamId,
      id,
      slug,
      title,
      edition,
      datedOn: date,
      scope,
      source: sourceLine(provenance),
    })),
  );
  await insertRows(
    tx,
    limits,
    all.map(({ rowId, setId, id: slug, name, kind, via, source, confidence, note, maxPeroxideMmolPerL }) => ({
      teamId,
      id: rowId,
      setId,
      slug,
      name,
      kind,
      via,
      source,
      note: [
        note,
        maxPeroxideMmolPerL && `Peroxide value at most ${maxPeroxideMmolPerL} mmol/L.`,
        confidence && `Confidence ${confidence}.`,
      ]
        .filter(Boolean)
        .join(' '),
    })),
  );
  await insertRows(
    tx,
    limitTerms,
    all.flatMap(({ rowId, terms }) =>
      terms.map(({ constituent, factor }) => ({
        teamId,
        limitId: rowId,
        constituentId: constituentIds.get(constituent)!,
        factor: factor.toFixed(6),
      })),
    ),
  );
  await insertRows(
    tx,
    limitMaxima,
    all.flatMap(({ rowId, maxPctByCategory }) =>
      Object.entries(maxPctByCategory).map(([category, percent]) => ({
        teamId,
        limitId: rowId,
        category,
        maxFraction: fractionOfPercent(percent, 'down'),
      })),
    ),
  );
}
