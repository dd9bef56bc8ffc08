import type { BlendProblem, EngineMaterial } from '../contract';

/**
 * One linear rule of a blend problem, written from the problem's words: the sum of `excess[i]` z_i must be <= 0 (= 0
 * where `exact`). In mass shares, which sum to 1, the same sum is what the rule is exceeded by, and the sum of
 * `limit[i]` x_i is the limit it is measured against.
 */
export interface Row {
  rule: string;
  side: 'min' | 'max';
  exact: boolean;
  excess: Float64Array;
  limit: Float64Array;
}

/** A used material that is `required` weighs at least this, unless a smallest dose says more. */
const LEAST_REQUIRED_SHARE = 1e-4;

/** Every linear rule of the problem as a row. Rules that count materials are no rows; see `hasDiscreteRules`. */
export function rowsOf(problem: BlendProblem): Row[] {
  return [...priceRows(problem), ...qualityRows(problem), ...limitRows(problem), ...massRows(problem)];
}

/** Whether a rule counts materials, so that the problem is no longer convex. */
export function hasDiscreteRules(problem: BlendProblem): boolean {
  return problem.maxMaterials !== undefined || (problem.minDose ?? 0) > 0;
}

type Amount = (material: EngineMaterial) => number;

/** What a material holds must stay at or below what it may hold. */
function atMost(problem: BlendProblem, rule: string, holds: Amount, may: Amount): Row {
  return row(problem, { rule, side: 'max', exact: false }, (material) => holds(material) - may(material), may);
}

function atLeast(problem: BlendProblem, rule: string, holds: Amount, must: Amount): Row {
  return row(problem, { rule, side: 'min', exact: false }, (material) => must(material) - holds(material), must);
}

function row(problem: BlendProblem, name: Pick<Row, 'rule' | 'side' | 'exact'>, excess: Amount, limit: Amount): Row {
  return {
    ...name,
    excess: Float64Array.from(problem.candidates, excess),
    limit: Float64Array.from(problem.candidates, limit),
  };
}

function priceRows(problem: BlendProblem): Row[] {
  const rows: Row[] = [];
  const price: Amount = (material) => material.costPerKg;
  const { budgetPerKg, costPerImpact } = problem;
  if (budgetPerKg !== undefined) rows.push(atMost(problem, 'budgetPerKg', price, () => budgetPerKg));
  if (costPerImpact !== undefined) {
    rows.push(atMost(problem, 'costPerImpact', price, (material) => costPerImpact * material.strength));
  }
  return rows;
}

function qualityRows(problem: BlendProblem): Row[] {
  const rows: Row[] = [];
  const { minStrength, minNatural } = problem;
  if (minStrength !== undefined) {
    rows.push(
      atLeast(
        problem,
        'minStrength',
        (material) => material.strength,
        () => minStrength,
      ),
    );
  }
  if (minNatural !== undefined) {
    rows.push(
      atLeast(
        problem,
        'minNatural',
        (material) => material.natural ?? 0,
        () => minNatural,
      ),
    );
  }
  return rows;
}

function limitRows(problem: BlendProblem): Row[] {
  return (problem.limits ?? []).map((limit) => {
    const counted = (material: EngineMaterial) => {
      let sum = 0;
      for (const { constituentId, factor } of limit.terms) {
        for (const constituent of material.constituents ?? []) {
          if (constituent.id === constituentId) sum += factor * constituent.max;
        }
      }
      return sum;
    };
    return atMost(problem, `limit:${limit.id}`, counted, () => limit.max);
  });
}

function massRows(problem: BlendProblem): Row[] {
  const rows: Row[] = [];
  for (const { id, minShare, maxShare } of problem.candidates) {
    rows.push(...shareRows(problem, `share:${id}`, new Set([id]), { min: minShare, max: maxShare }));
  }
  for (const { id, members, min, max } of problem.groups ?? []) {
    rows.push(...shareRows(problem, `group:${id}`, new Set(members), { min, max }));
  }
  for (const { id, share } of problem.kept ?? []) {
    rows.push({ ...shareRows(problem, `kept:${id}`, new Set([id]), { max: share })[0]!, exact: true });
  }
  const minShares = new Map(problem.candidates.map((candidate) => [candidate.id, candidate.minShare ?? 0]));
  for (const id of problem.required ?? []) {
    const min = Math.max(minShares.get(id) ?? 0, problem.minDose ?? LEAST_REQUIRED_SHARE);
    rows.push(...shareRows(problem, `required:${id}`, new Set([id]), { min }));
  }
  return rows;
}

function shareRows(
  problem: BlendProblem,
  rule: string,
  members: ReadonlySet<string>,
  { min, max }: { min?: number | undefined; max?: number | undefined },
): Row[] {
  const rows: Row[] = [];
  const counts: Amount = (material) => (members.has(material.id) ? 1 : 0);
  if (min !== undefined) rows.push(atLeast(problem, rule, counts, () => min));
  if (max !== undefined) rows.push(atMost(problem, rule, counts, () => max));
  return rows;
}
