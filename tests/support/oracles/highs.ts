import loadHighs from 'highs';
import { type Closeness, closenessOf } from '@/engine/certify/objective';
import { type Row, rowsOf } from '@/engine/certify/rows';
import type { BlendProblem } from '@/engine/contract';

const highs = await loadHighs();

/** A blend this weak, relative to the strongest material, counts as one without smell. */
const NO_SMELL = 1e-9;

/** Whether HiGHS, as a linear programme in mass shares, finds a blend that smells and keeps every linear rule. */
export function highsFindsBlend(problem: BlendProblem): boolean {
  const strongest = Math.max(...problem.candidates.map((candidate) => candidate.strength));
  const strength = problem.candidates.map((candidate) => candidate.strength / strongest);
  const ones = problem.candidates.map(() => 1);
  const lines = ['Maximize', ` obj: ${sum(strength)}`, 'Subject To', ` whole: ${sum(ones)} = 1`];
  for (const [index, row] of rowsOf(problem).entries()) {
    const terms = sum(byLimit(row));
    if (terms !== '') lines.push(` r${index}: ${terms} ${row.exact ? '=' : '<='} 0`);
  }
  const found = highs.solve([...lines, 'End'].join('\n'), { primal_feasibility_tolerance: 1e-9 });
  return found.Status === 'Optimal' && found.ObjectiveValue > NO_SMELL;
}

/**
 * The least E that HiGHS finds as a quadratic programme in impact shares, with the residuals as variables of their own;
 * null where it does not claim an optimum. Answered as mass shares, so that the caller judges them by the definition.
 */
export function highsBlend(problem: BlendProblem): Float64Array | null {
  const { vectors, weights, target, variances } = inOwnUnit(closenessOf(problem));
  const strengths = problem.candidates.map((candidate) => candidate.strength);
  const units = strengths.map((strength) => (strength > 0 ? strength : Math.max(...strengths) / 1e3));
  const residuals = Array.from(weights, (weight, row) => (weight > 0 ? ` ${2 * weight} d${row} ^ 2` : ''));
  const spreads = Array.from(variances, (variance, i) => (variance > 0 ? ` ${2 * variance} x${i} ^ 2` : ''));
  const squares = [...residuals, ...spreads].filter((term) => term !== '').join(' +');
  const lines = ['Minimize', ` obj: [${squares} ] / 2`, 'Subject To'];
  lines.push(` whole: ${sum(strengths.map((strength) => Number(strength > 0)))} = 1`);
  for (const row of weights.keys()) {
    const mixed = sum(vectors.map((vector, i) => (strengths[i]! > 0 ? vector[row]! : 0)));
    lines.push(` f${row}: ${mixed} - d${row} = ${target[row]}`);
  }
  for (const [index, row] of rowsOf(problem).entries()) {
    const entries = Array.from(row.excess, (value, i) => value / units[i]!);
    const largest = Math.max(...entries.map(Math.abs), Number.MIN_VALUE);
    const terms = sum(entries.map((value) => value / largest));
    if (terms !== '') lines.push(` r${index}: ${terms} ${row.exact ? '=' : '<='} 0`);
  }
  lines.push('Bounds', ...Array.from(weights, (_, row) => ` d${row} free`), 'End');
  const found = solved(lines.join('\n'));
  if (found?.Status !== 'Optimal') return null;
  const columns = found.Columns as Record<string, { Primal: number }>;
  const grams = Float64Array.from(units, (unit, i) => Math.max(0, columns[`x${i}`]?.Primal ?? 0) / unit);
  const all = grams.reduce((total, value) => total + value, 0);
  return grams.map((value) => value / all);
}

/** Its quadratic solver sometimes fails outright; the package then throws. */
function solved(programme: string) {
  try {
    return highs.solve(programme, { primal_feasibility_tolerance: 1e-10, small_matrix_value: 1e-12 });
  } catch {
    return null;
  }
}

/** Intensities up to 1, because the solver's tolerances are absolute. */
function inOwnUnit({ vectors, weights, target, variances }: Closeness) {
  const largest = vectors.reduce((most, vector) => Math.max(most, ...vector.map(Math.abs)), Number.MIN_VALUE);
  return {
    weights,
    vectors: vectors.map((vector) => vector.map((value) => value / largest)),
    target: target.map((value) => value / largest),
    variances: variances.map((value) => value / largest ** 2),
  };
}

function byLimit(row: Row): number[] {
  const limit = Math.max(...row.limit.map(Math.abs));
  const scale = limit > 0 ? limit : Math.max(...row.excess.map(Math.abs), Number.MIN_VALUE);
  return Array.from(row.excess, (value) => value / scale);
}

function sum(coefficients: readonly number[]): string {
  const terms = coefficients.map((value, index) =>
    value === 0 ? '' : `${value < 0 ? '-' : '+'} ${Math.abs(value)} x${index}`,
  );
  return terms.filter((term) => term !== '').join(' ');
}
