/**
 * Kendall's coefficient of concordance of ratings, rows samples and columns assessors: 1 where all assessors rank the
 * samples alike, near 0 where they rank at random. With the correction for ties; null where nobody ranks anything.
 *
 *   W = 12 S / (m^2 (n^3 - n) - m T),   S = sum (R_j - m (n + 1) / 2)^2,   T = sum over tie groups of (t^3 - t)
 */
export function kendallW(ratings: readonly (readonly number[])[]): number | null {
  const n = ratings.length;
  const m = ratings[0]!.length;
  const rankSums = new Float64Array(n);
  let ties = 0;
  for (let assessor = 0; assessor < m; assessor++) {
    ties += addRanks(
      ratings.map((row) => row[assessor]!),
      rankSums,
    );
  }
  const middle = (m * (n + 1)) / 2;
  const spread = rankSums.reduce((sum, ranks) => sum + (ranks - middle) ** 2, 0);
  const most = m * m * (n ** 3 - n) - m * ties;
  return most > 0 ? (12 * spread) / most : null;
}

/** Adds one assessor's ranks, equal ratings sharing their mean rank, and answers the sum of t^3 - t over the ties. */
function addRanks(values: readonly number[], rankSums: Float64Array): number {
  const order = values.map((_, index) => index).sort((a, b) => values[a]! - values[b]!);
  let ties = 0;
  for (let start = 0, end = 0; start < order.length; start = end) {
    while (end < order.length && values[order[end]!] === values[order[start]!]) end++;
    for (let place = start; place < end; place++) rankSums[order[place]!]! += (start + 1 + end) / 2;
    ties += (end - start) ** 3 - (end - start);
  }
  return ties;
}
