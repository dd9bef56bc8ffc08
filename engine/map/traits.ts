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

type Visit = (trait: number, weight: number) => void;

export function facetTraits(materials: readonly EngineMaterial[]): Traits {
  const facets = materials[0]?.profile.length ?? 0;
  return unitTraits(materials, facets, ({ profile }, visit) => {
    for (let facet = 0; facet < facets; facet++) if (profile[facet] !== 0) visit(facet, profile[facet]!);
  });
}

/** Constituents by their typical mass fraction, the worst case where that is not known. */
export function constituentTraits(materials: readonly EngineMaterial[]): Traits {
  const names = materials.flatMap((material) => (material.constituents ?? []).map((constituent) => constituent.id));
  const numbers = new Map([...new Set(names)].sort().map((id, number) => [id, number]));
  return unitTraits(materials, numbers.size, ({ constituents = [] }, visit) => {
    const held = constituents.map(({ id, typical, max }) => ({ number: numbers.get(id)!, fraction: typical ?? max }));
    held.sort((a, b) => a.number - b.number);
    for (const { number, fraction } of held) if (fraction !== 0) visit(number, fraction);
  });
}

/** Goes through the library twice, to count and to fill: a list per material would cost more than all comparisons. */
function unitTraits(
  materials: readonly EngineMaterial[],
  traitCount: number,
  eachTrait: (material: EngineMaterial, visit: Visit) => void,
): Traits {
  const sorted = [...materials].sort((a, b) => (a.id < b.id ? -1 : 1));
  const starts = new Int32Array(sorted.length + 1);
  for (const [row, material] of sorted.entries()) {
    let count = 0;
    eachTrait(material, () => count++);
    starts[row + 1] = starts[row]! + count;
  }
  const traits = new Int32Array(starts[sorted.length]!);
  const weights = new Float64Array(traits.length);
  for (const [row, material] of sorted.entries()) {
    let entry = starts[row]!;
    eachTrait(material, (trait, weight) => {
      traits[entry] = trait;
      weights[entry++] = weight;
    });
    toUnit(weights, starts[row]!, entry);
  }
  return { ids: sorted.map((material) => material.id), starts, traits, weights, traitCount };
}

/** Scaled by the largest first, so that no square of a tiny weight vanishes. */
function toUnit(weights: Float64Array, from: number, to: number): void {
  let largest = 0;
  for (let entry = from; entry < to; entry++) largest = Math.max(largest, Math.abs(weights[entry]!));
  let squares = 0;
  for (let entry = from; entry < to; entry++) squares += (weights[entry]! / largest) ** 2;
  const length = Math.sqrt(squares);
  for (let entry = from; entry < to; entry++) weights[entry] = weights[entry]! / largest / length;
}
