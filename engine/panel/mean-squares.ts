/**
 * Two-way analysis of variance of ratings, rows samples and columns assessors, one rating each: mean squares between
 * samples, within samples, between assessors, and of the residual. Two passes, so that nothing cancels.
 */
export interface MeanSquares {
  between: number;
  within: number;
  assessors: number;
  residual: number;
}

export function meanSquares(ratings: readonly (readonly number[])[]): MeanSquares {
  const n = ratings.length;
  const k = ratings[0]!.length;
  const rows = ratings.map(mean);
  const columns = ratings[0]!.map((_, assessor) => mean(ratings.map((row) => row[assessor]!)));
  const all = mean(rows);
  let within = 0;
  let residual = 0;
  for (const [sample, row] of ratings.entries()) {
    for (const [assessor, rating] of row.entries()) {
      within += (rating - rows[sample]!) ** 2;
      residual += (rating - rows[sample]! - (columns[assessor]! - all)) ** 2;
    }
  }
  const spread = (means: readonly number[]) => means.reduce((sum, value) => sum + (value - all) ** 2, 0);
  return {
    between: (k * spread(rows)) / (n - 1),
    within: within / (n * (k - 1)),
    assessors: (n * spread(columns)) / (k - 1),
    residual: residual / ((n - 1) * (k - 1)),
  };
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}
