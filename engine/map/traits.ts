import type { EngineMaterial } from '../contract';

/**
 * What materials are compared by, as unit vectors: for each material the traits it has (facets or constituents, in
 * ascending order) and their weights. Rows are sorted by material id, so that answers do not depend on the input's order.
 */
export interface Traits {
  ids: string[];
  /** Row r holds the entries from `starts[r]` to `starts[r + 1]`. */
  starts: Int32Array;
  traits: Int32Array;
  weights: Float64Array;
  traitCount: number;
}

export function facetTraits(materials: readonly EngineMaterial[]): Traits {
  return unitTraits(
    materials,
    (material) => Array.from(material.profile).map((intensity, facet) => [facet, intensity]),
    materials[0]?.profile.length ?? 0,
  );
}

/** Constituents by their typical mass fraction, the worst case where that is not known. */
export function constituentTraits(materials: readonly EngineMaterial[]): Traits {
  const names = materials.flatMap((material) => (material.constituents ?? []).map((constituent) => constituent.id));
  const numbers = new Map([...new Set(names)].sort().map((id, number) => [id, number]));
  return unitTraits(
    materials,
    (material) => {
      const held = material.constituents ?? [];
      return held
        .map(({ id, typical, max }): [number, number] => [numbers.get(id)!, typical ?? max])
        .sort((a, b) => a[0] - b[0]);
    },
    numbers.size,
  );
}

function unitTraits(
  materials: readonly EngineMaterial[],
  traitsOf: (material: EngineMaterial) => [trait: number, weight: number][],
  traitCount: number,
): Traits {
  const sorted = [...materials].sort((a, b) => (a.id < b.id ? -1 : 1));
  const rows = sorted.map((material) => unit(traitsOf(material).filter(([, weight]) => weight !== 0)));
  const starts = new Int32Array(rows.length + 1);
  for (const [row, entries] of rows.entries()) starts[row + 1] = starts[row]! + entries.length;
  const entries = rows.flat();
  return {
    ids: sorted.map((material) => material.id),
    starts,
    traits: Int32Array.from(entries, ([trait]) => trait),
    weights: Float64Array.from(entries, ([, weight]) => weight),
    traitCount,
  };
}

/** Scaled by the largest first, so that no square of a tiny weight vanishes. */
function unit(entries: [trait: number, weight: number][]): [trait: number, weight: number][] {
  const largest = entries.reduce((most, [, weight]) => Math.max(most, Math.abs(weight)), 0);
  const length = Math.sqrt(entries.reduce((sum, [, weight]) => sum + (weight / largest) ** 2, 0));
  return entries.map(([trait, weight]) => [trait, weight / largest / length]);
}
