import { emptyNearest, type Nearest, offerBoth } from './nearest';
import { BLOCK, principalCoordinates, STRIDE } from './principal-coordinates';
import type { Traits } from './traits';

/** Coordinates are rounded where similarities are not; a bound is trusted to this. */
const ROUNDING = 1e-9;

interface Rows {
  count: number;
  /** Unit vectors, row by row. */
  vectors: Float64Array;
  width: number;
  coordinates: Float64Array;
  blocks: number;
}

/**
 * Compares every row with all before it along the principal axes of the library: after a few coordinates the rest of a
 * scalar product is at most the product of what is left of both lengths (Cauchy and Schwarz), and where that cannot
 * reach what either row still wants, the pair is dropped. Pairs that remain are multiplied out, trait by trait.
 */
export function compareByAxes(traits: Traits, nearest: Nearest): void {
  const rows = rowsOf(traits);
  raiseLimits(rows, nearest);
  for (let row = 1; row < rows.count; row++) compareRow(rows, row, nearest);
}

function rowsOf({ ids, starts, traits, weights, traitCount }: Traits): Rows {
  const vectors = new Float64Array(ids.length * traitCount);
  for (let row = 0; row < ids.length; row++) {
    for (let entry = starts[row]!; entry < starts[row + 1]!; entry++) {
      vectors[row * traitCount + traits[entry]!] = weights[entry]!;
    }
  }
  return { count: ids.length, vectors, width: traitCount, ...principalCoordinates(vectors, traitCount) };
}

function compareRow(rows: Rows, row: number, nearest: Nearest): void {
  const { coordinates: c, blocks } = rows;
  const { limits } = nearest;
  const size = blocks * STRIDE;
  const at = row * size;
  const [c0, c1, c2, c3, left] = [c[at]!, c[at + 1]!, c[at + 2]!, c[at + 3]!, c[at + BLOCK]!];
  for (let other = 0; other < row; other++) {
    const to = other * size;
    const sum = c0 * c[to]! + c1 * c[to + 1]! + c2 * c[to + 2]! + c3 * c[to + 3]!;
    const wanted = Math.min(limits[row]!, limits[other]!) - ROUNDING;
    if (sum + left * c[to + BLOCK]! < wanted || !reaches(rows, at, to, sum, wanted)) continue;
    const similarity = product(rows, row, other);
    if (similarity > 0) offerBoth(nearest, row, other, similarity);
  }
}

/** Whether the bound still holds out after the other blocks. Five numbers, because an object for each pair is waste. */
function reaches({ coordinates: c, blocks }: Rows, at: number, to: number, first: number, wanted: number): boolean {
  let sum = first;
  for (let block = STRIDE; block < blocks * STRIDE; block += STRIDE) {
    const a = at + block;
    const b = to + block;
    sum += c[a]! * c[b]! + c[a + 1]! * c[b + 1]! + c[a + 2]! * c[b + 2]! + c[a + 3]! * c[b + 3]!;
    if (sum + c[a + BLOCK]! * c[b + BLOCK]! < wanted) return false;
  }
  return true;
}

function product({ vectors, width }: Rows, row: number, other: number): number {
  let sum = 0;
  for (let a = row * width, b = other * width, end = a + width; a < end; a++, b++) sum += vectors[a]! * vectors[b]!;
  return sum;
}

/**
 * What the best few of some likely partners reach is a limit that the true best few reach too. Likely partners stand
 * side by side when rows are sorted by the signs of their coordinates.
 */
function raiseLimits(rows: Rows, nearest: Nearest): void {
  const { top, limits } = nearest;
  const sample = emptyNearest(rows.count, top, limits[0] ?? 0);
  const order = bySigns(rows);
  const reach = 2 * top + 8;
  for (let place = 0; place < order.length; place++) {
    for (let next = place + 1; next <= place + reach && next < order.length; next++) {
      const similarity = product(rows, order[place]!, order[next]!);
      if (similarity > 0) offerBoth(sample, order[place]!, order[next]!, similarity);
    }
  }
  limits.set(sample.limits);
}

/** The first axis is the library's mean, and has one sign for all. */
function bySigns({ count, coordinates, blocks }: Rows): number[] {
  const keys = Float64Array.from({ length: count }, (_, row) => {
    let key = 0;
    for (let block = 0; block < blocks; block++) {
      const from = row * blocks * STRIDE + block * STRIDE;
      for (let axis = block === 0 ? 1 : 0; axis < BLOCK; axis++) key = 2 * key + Number(coordinates[from + axis]! > 0);
    }
    return key;
  });
  return Array.from(keys.keys()).sort((a, b) => keys[a]! - keys[b]! || a - b);
}
