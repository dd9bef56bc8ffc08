import { EngineInputError } from '../errors';
import type { Row } from './rows';
import { addScaled } from './vectors';

/** The multiplier that an answer claims for one rule. */
export interface ClaimedMultiplier {
  rule: string;
  side?: 'min' | 'max';
  multiplier: number;
}

/** G' lambda, and beside it how large the terms were that it was summed from: the size of its rounding. */
export interface WeightedRows {
  sum: Float64Array;
  size: Float64Array;
}

const COUNTING_RULES = new Set(['maxMaterials', 'minDose']);

/** Multiplies every row by what the answer claims for it and adds up. A negative claim counts for nothing: only exact rows may have one. */
export function weightedRows(
  rows: readonly Row[],
  claims: readonly ClaimedMultiplier[],
  { candidates, path }: { candidates: number; path: string },
): WeightedRows {
  const weighted = { sum: new Float64Array(candidates), size: new Float64Array(candidates) };
  for (const [index, claim] of claims.entries()) {
    const row = rowOf(rows, claim, `${path}[${index}]`);
    if (!row) continue;
    const multiplier = row.exact ? claim.multiplier : Math.max(0, claim.multiplier);
    if (multiplier === 0) continue;
    addScaled(weighted.sum, multiplier, row.excess);
    addScaled(
      weighted.size,
      Math.abs(multiplier),
      row.excess.map((value, place) => Math.abs(value) + Math.abs(row.limit[place]!)),
    );
  }
  return weighted;
}

function rowOf(rows: readonly Row[], claim: ClaimedMultiplier, path: string): Row | undefined {
  const named = rows.filter((row) => row.rule === claim.rule);
  const meant = named.filter((row) => row.exact || claim.side === undefined || row.side === claim.side);
  if (meant.length === 1) return meant[0];
  if (COUNTING_RULES.has(claim.rule)) return undefined;
  const what = meant.length === 0 ? 'is no rule of the problem' : 'has two sides';
  throw new EngineInputError(path, `The rule "${claim.rule}" ${what}.`);
}
