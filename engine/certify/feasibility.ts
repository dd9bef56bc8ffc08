import type { BlendProblem } from '../contract';
import type { Row } from './rows';
import { dot } from './vectors';

/**
 * The largest violation of any rule by the mass shares x, relative to the rule's limit: 0.01 is one part in a hundred
 * too much (or too little). A limit of 0 is measured against the largest amount that a material could bring.
 */
export function worstViolation(problem: BlendProblem, rows: readonly Row[], x: Float64Array): number {
  let worst = Math.abs(x.reduce((sum, share) => sum + share, 0) - 1);
  for (const share of x) worst = Math.max(worst, -share);
  for (const row of rows) worst = Math.max(worst, rowViolation(row, x));
  return Math.max(worst, countViolation(problem, x), doseViolation(problem, x));
}

function rowViolation(row: Row, x: Float64Array): number {
  const excess = dot(row.excess, x);
  const over = row.exact ? Math.abs(excess) : Math.max(0, excess);
  if (over === 0) return 0;
  const limit = Math.abs(dot(row.limit, x));
  return over / (limit > 0 ? limit : row.excess.reduce((most, value) => Math.max(most, Math.abs(value)), 0));
}

function countViolation(problem: BlendProblem, x: Float64Array): number {
  if (problem.maxMaterials === undefined) return 0;
  const used = x.reduce((count, share) => count + (share > 0 ? 1 : 0), 0);
  return Math.max(0, used / problem.maxMaterials - 1);
}

function doseViolation(problem: BlendProblem, x: Float64Array): number {
  const { minDose = 0, kept = [] } = problem;
  if (minDose === 0) return 0;
  const keptIds = new Set(kept.map((line) => line.id));
  let worst = 0;
  for (const [index, candidate] of problem.candidates.entries()) {
    if (x[index]! > 0 && !keptIds.has(candidate.id)) worst = Math.max(worst, 1 - x[index]! / minDose);
  }
  return worst;
}
