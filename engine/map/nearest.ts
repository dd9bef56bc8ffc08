/**
 * The best few partners of every row, kept sorted: most similar first, ties by the lower row, which is the lower id.
 * `limits` holds for each row what a new partner must reach.
 */
export interface Nearest {
  top: number;
  partners: Int32Array;
  similarities: Float64Array;
  counts: Int32Array;
  limits: Float64Array;
}

export function emptyNearest(rows: number, top: number, minSimilarity: number): Nearest {
  return {
    top,
    partners: new Int32Array(rows * top),
    similarities: new Float64Array(rows * top),
    counts: new Int32Array(rows),
    limits: new Float64Array(rows).fill(minSimilarity),
  };
}

/** Offers two rows to each other. */
export function offerBoth(nearest: Nearest, row: number, other: number, similarity: number): void {
  if (similarity >= nearest.limits[row]!) offer(nearest, row, other, similarity);
  if (similarity >= nearest.limits[other]!) offer(nearest, other, row, similarity);
}

/** Offers a partner to a row; it is kept if it belongs to the best so far. */
function offer(nearest: Nearest, row: number, partner: number, similarity: number): void {
  const { top, partners, similarities, counts, limits } = nearest;
  const start = row * top;
  const count = counts[row]!;
  let place = start + count;
  while (place > start && comesBefore(partner, similarity, partners[place - 1]!, similarities[place - 1]!)) place--;
  if (place === start + top) return;
  const end = Math.min(count, top - 1);
  partners.copyWithin(place + 1, place, start + end);
  similarities.copyWithin(place + 1, place, start + end);
  partners[place] = partner;
  similarities[place] = similarity;
  counts[row] = end + 1;
  if (end + 1 === top) limits[row] = similarities[start + top - 1]!;
}

function comesBefore(partner: number, similarity: number, other: number, otherSimilarity: number): boolean {
  return similarity > otherSimilarity || (similarity === otherSimilarity && partner < other);
}
