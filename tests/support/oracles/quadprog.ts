import { solveQP } from 'quadprog';
import { closenessOf } from '@/engine/certify/objective';
import { type Row, rowsOf } from '@/engine/certify/rows';
import type { BlendProblem } from '@/engine/contract';

/** Makes the quadratic form positive definite, as the method demands; relative to its largest entry. */
const RIDGE = 1e-11;

/**
 * The mass shares that the npm package quadprog finds (Goldfarb and Idnani's dual method), or null where it gives up.
 *
 * Posed in impact shares, an odourless material by its grams per unit of impact; rows divided by their largest entry.
 */
export function quadprogBlend(problem: BlendProblem): Float64Array | null {
  const { vectors, weights, target, variances } = closenessOf(problem);
  const strengths = problem.candidates.map((candidate) => candidate.strength);
  const middle = Math.max(...strengths) / 1e3;
  const units = strengths.map((strength) => (strength > 0 ? strength : middle));
  const smelling = strengths.map((strength) => (strength > 0 ? 1 : 0));
  const products = (a: Float64Array, b: Float64Array) => {
    let sum = 0;
    for (let row = 0; row < weights.length; row++) sum += 2 * weights[row]! * a[row]! * b[row]!;
    return sum;
  };
  const form = vectors.map((one, i) =>
    vectors.map((other, j) => smelling[i]! * smelling[j]! * products(one, other) + (i === j ? 2 * variances[i]! : 0)),
  );
  const largest = Math.max(...form.map((row, i) => row[i]!), Number.MIN_VALUE);
  for (const [i, row] of form.entries()) row[i]! += RIDGE * largest;
  const pull = vectors.map((vector, i) => smelling[i]! * products(vector, target));
  const rows = rowsOf(problem).sort((a, b) => Number(b.exact) - Number(a.exact));
  const constraints = [smelling, ...rows.map((row) => scaledRow(row, units)), ...identity(units.length)];
  const bounds = constraints.map((_, index) => (index === 0 ? 1 : 0));
  const scale = 1 / largest;
  const result = solveQP(
    oneBased(form.map((row) => oneBased(row.map((value) => value * scale)))),
    oneBased(pull.map((value) => value * scale)),
    oneBased(transposed(constraints).map(oneBased)),
    oneBased(bounds),
    1 + rows.filter((row) => row.exact).length,
  );
  if (result.message !== '') return null;
  const grams = Float64Array.from(result.solution.slice(1), (value, i) => Math.max(0, value) / units[i]!);
  const all = grams.reduce((sum, value) => sum + value, 0);
  return grams.map((value) => value / all);
}

/** The package wants rows >= 0. */
function scaledRow(row: Row, units: readonly number[]): number[] {
  const entries = Array.from(row.excess, (value, i) => -value / units[i]!);
  const largest = Math.max(...entries.map(Math.abs), Number.MIN_VALUE);
  return entries.map((value) => value / largest);
}

function identity(size: number): number[][] {
  return Array.from({ length: size }, (_, i) => Array.from({ length: size }, (_, j) => Number(i === j)));
}

function transposed(rows: readonly number[][]): number[][] {
  return rows[0]!.map((_, column) => rows.map((row) => row[column]!));
}

function oneBased<T>(list: readonly T[]): T[] {
  const shifted: T[] = [];
  for (const [index, value] of list.entries()) shifted[index + 1] = value;
  return shifted;
}
