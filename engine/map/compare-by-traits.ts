import { type Nearest, offerBoth } from './nearest';
import type { Traits } from './traits';

/** How many traits two rows share on average. */
export function sharedPerPair({ ids, traits, traitCount }: Traits): number {
  const counts = new Int32Array(traitCount);
  for (const trait of traits) counts[trait]! += 1;
  return counts.reduce((sum, count) => sum + count * count, 0) / Math.max(1, ids.length ** 2);
}

/**
 * Compares every row with all before it through an index of traits, into which it is then entered: only traits that two
 * rows share are multiplied. The sums run over ascending traits, as in a plain scalar product.
 */
export function compareByTraits({ ids, starts, traits, weights, traitCount }: Traits, nearest: Nearest): void {
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
    if (similarity > 0 && (similarity >= limits[row]! || similarity >= limits[other]!)) {
      offerBoth(nearest, row, other, similarity);
    }
  }
}
