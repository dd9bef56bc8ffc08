import type { EngineMaterial } from '../contract';
import { EngineInputError } from '../errors';
import { checkList, checkNumber, checkObject, checkUnique, checkWhole, FRACTION } from '../input/fields';
import { checkMaterial } from '../input/material';
import { emptyNearest, type Nearest, offer } from './nearest';
import { constituentTraits, facetTraits, type Traits } from './traits';

export interface Relation {
  a: string;
  b: string;
  /** Cosine between the two, up to 1. */
  similarity: number;
}

/**
 * Links between materials that smell alike (cosine of their facets) or are made alike (cosine of their constituents):
 * every material with its `top` nearest, as far as they reach `minSimilarity`. Each pair comes once, a before b, the
 * most similar first. A material without any trait has no neighbours, and materials that share nothing are not related.
 *
 * Exact, and the same to the last bit as comparing all pairs; but only traits that two materials share are ever
 * multiplied (an inverted index), and each pair is looked at once.
 *
 * @throws EngineInputError if a material is not well put, an id comes twice, or an option is out of its range.
 */
export function relatedMaterials(
  materials: EngineMaterial[],
  options: { top: number; minSimilarity: number; by: 'facets' | 'constituents' },
): Relation[] {
  checkInput(materials, options);
  const traits = options.by === 'facets' ? facetTraits(materials) : constituentTraits(materials);
  const top = Math.min(options.top, Math.max(1, materials.length - 1));
  const nearest = emptyNearest(materials.length, top, options.minSimilarity);
  compareAll(traits, nearest);
  return relations(traits.ids, nearest);
}

/** Compares every row with all before it, trait by trait, then enters the row into the index. */
function compareAll({ ids, starts, traits, weights, traitCount }: Traits, nearest: Nearest): void {
  const index = emptyIndex(traits, traitCount);
  const similarities = new Float64Array(ids.length);
  for (let row = 0; row < ids.length; row++) {
    similarities.fill(0, 0, row);
    for (let entry = starts[row]!; entry < starts[row + 1]!; entry++) {
      const trait = traits[entry]!;
      addProducts(similarities, index, trait, weights[entry]!);
      enter(index, trait, row, weights[entry]!);
    }
    offerAll(similarities, row, nearest);
  }
}

/** For each trait the rows that have it and their weights, filled as rows are entered. */
interface Index {
  from: Int32Array;
  to: Int32Array;
  rows: Int32Array;
  weights: Float64Array;
}

function emptyIndex(traits: Int32Array, traitCount: number): Index {
  const counts = new Int32Array(traitCount);
  for (const trait of traits) counts[trait]! += 1;
  const from = new Int32Array(traitCount);
  for (let trait = 1; trait < traitCount; trait++) from[trait] = from[trait - 1]! + counts[trait - 1]!;
  return { from, to: from.slice(), rows: new Int32Array(traits.length), weights: new Float64Array(traits.length) };
}

function enter(index: Index, trait: number, row: number, weight: number): void {
  const place = index.to[trait]!;
  index.rows[place] = row;
  index.weights[place] = weight;
  index.to[trait] = place + 1;
}

function addProducts(similarities: Float64Array, index: Index, trait: number, weight: number): void {
  const { rows, weights } = index;
  const end = index.to[trait]!;
  for (let place = index.from[trait]!; place < end; place++) similarities[rows[place]!]! += weight * weights[place]!;
}

function offerAll(similarities: Float64Array, row: number, nearest: Nearest): void {
  const { limits } = nearest;
  for (let other = 0; other < row; other++) {
    const similarity = similarities[other]!;
    if (!(similarity > 0)) continue;
    if (similarity >= limits[row]!) offer(nearest, row, other, similarity);
    if (similarity >= limits[other]!) offer(nearest, other, row, similarity);
  }
}

function relations(ids: readonly string[], { top, partners, similarities, counts }: Nearest): Relation[] {
  const found = new Map<number, Relation>();
  for (let row = 0; row < ids.length; row++) {
    for (let place = row * top; place < row * top + counts[row]!; place++) {
      const [first, second] = [Math.min(row, partners[place]!), Math.max(row, partners[place]!)];
      const similarity = Math.min(1, similarities[place]!);
      found.set(first * ids.length + second, { a: ids[first]!, b: ids[second]!, similarity });
    }
  }
  const order = (one: Relation, other: Relation) =>
    other.similarity - one.similarity || compareText(one.a, other.a) || compareText(one.b, other.b);
  return [...found.values()].sort(order);
}

function compareText(one: string, other: string): number {
  return one < other ? -1 : Number(one > other);
}

function checkInput(materials: readonly EngineMaterial[], options: Parameters<typeof relatedMaterials>[1]): void {
  checkObject(options, 'options');
  checkWhole(options.top, 'options.top', { min: 1, max: 200 });
  checkNumber(options.minSimilarity, 'options.minSimilarity', FRACTION);
  if (options.by !== 'facets' && options.by !== 'constituents') {
    throw new EngineInputError('options.by', 'options.by must be "facets" or "constituents".');
  }
  const list = checkList(materials, 'materials');
  for (const [index, material] of list.entries()) {
    checkMaterial(material, `materials[${index}]`, list[0]?.profile?.length);
  }
  checkUnique(
    list.map((material) => material.id),
    'materials',
  );
}
