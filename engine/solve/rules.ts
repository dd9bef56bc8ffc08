import type { BlendProblem, EngineMaterial } from '../contract';

/**
 * One linear rule, normalised by its limit so that its value is a relative excess: 0.01 is one part in a hundred too
 * much (or too little). In z it reads   sum_i (amount_i / scale - sense) z_i <= 0   for an upper limit, the reverse
 * for a lower one, = 0 for a kept line; the price at equal strength has c_i / U - s_i in place of the bracket.
 */
export interface Rule {
  rule: string;
  side?: 'min' | 'max';
  kind: 'max' | 'min' | 'exact';
  /** What the limit is measured against: the mass of the blend, or its impact (the price at equal strength). */
  per: 'mass' | 'impact';
  limit: number;
  /** Whether the limit is a share of the mass, and so at most 1. */
  isFraction: boolean;
  /** The row is the contract's row divided by this: the limit, or 1 where the limit is 0. */
  scale: number;
  /** Amount per gram of each material that has any: a dense list, or the materials named. */
  amounts: Float64Array | { at: number[]; amount: number };
  /** The material whose smallest dose this is: a rule only while a search takes it to be used. */
  doseOf?: number;
}

/** A used material that is `required` weighs at least this, unless a smallest dose says more. */
export const LEAST_REQUIRED_SHARE = 1e-4;

/**
 * The linear rules of a problem over its materials, sorted as given; those of single materials come last, because
 * only the materials in use can break their upper limits, and the solver looks at no others.
 *
 * Rules that nothing can break (a lower limit of 0, an upper limit of the whole mass) are left out.
 */
export function rulesOf(
  problem: BlendProblem,
  materials: readonly EngineMaterial[],
): { rules: Rule[]; general: number } {
  const place = new Map(materials.map((material, index) => [material.id, index]));
  const dense = (amount: (material: EngineMaterial) => number) => Float64Array.from(materials, amount);
  const rules: Rule[] = [];
  const add = (
    rule: string,
    kind: Rule['kind'],
    limit: number,
    amounts: Rule['amounts'],
    per: Rule['per'] = 'mass',
  ) => {
    if (kind === 'min' && limit === 0) return;
    const scale = limit > 0 ? limit : 1;
    const isFraction = /^(minNatural$|group:|kept:|required:|share:)/.test(rule);
    rules.push({ rule, side: kind === 'min' ? 'min' : 'max', kind, per, limit, isFraction, scale, amounts });
  };
  const { budgetPerKg, costPerImpact, minStrength = 0, minNatural = 0, limits = [], groups = [], kept = [] } = problem;
  if (budgetPerKg !== undefined)
    add(
      'budgetPerKg',
      'max',
      budgetPerKg,
      dense((m) => m.costPerKg),
    );
  if (costPerImpact !== undefined)
    add(
      'costPerImpact',
      'max',
      costPerImpact,
      dense((m) => m.costPerKg),
      'impact',
    );
  add(
    'minStrength',
    'min',
    minStrength,
    dense((m) => m.strength),
  );
  add(
    'minNatural',
    'min',
    minNatural,
    dense((m) => m.natural ?? 0),
  );
  for (const limit of limits) add(`limit:${limit.id}`, 'max', limit.max, constituentSum(limit.terms, materials));
  for (const { id, members, min = 0, max = 1 } of groups) {
    const amounts = { at: members.map((member) => place.get(member)!), amount: 1 };
    add(`group:${id}`, 'min', min, amounts);
    if (max < 1) add(`group:${id}`, 'max', max, amounts);
  }
  for (const { id, share } of kept) add(`kept:${id}`, 'exact', share, { at: [place.get(id)!], amount: 1 });
  for (const id of problem.required ?? []) {
    const index = place.get(id)!;
    const least = Math.max(materials[index]!.minShare ?? 0, problem.minDose ?? LEAST_REQUIRED_SHARE);
    add(`required:${id}`, 'min', least, { at: [index], amount: 1 });
  }
  for (const [index, { id, minShare = 0 }] of materials.entries()) {
    if (minShare > 0) add(`share:${id}`, 'min', minShare, { at: [index], amount: 1 });
  }
  const keptIds = new Set(kept.map((line) => line.id));
  for (const [index, { id }] of materials.entries()) {
    if (!problem.minDose || keptIds.has(id)) continue;
    add('minDose', 'min', problem.minDose, { at: [index], amount: 1 });
    rules[rules.length - 1]!.doseOf = index;
  }
  const general = rules.length;
  for (const [index, { id, maxShare = 1 }] of materials.entries()) {
    if (maxShare < 1) add(`share:${id}`, 'max', maxShare, { at: [index], amount: 1 });
  }
  return { rules, general };
}

/** sum_j g_j q_ij of every material: what the limit counts, in the worst case of each composition. */
function constituentSum(
  terms: readonly { constituentId: string; factor: number }[],
  materials: readonly EngineMaterial[],
): Float64Array {
  const factors = new Map<string, number>();
  for (const { constituentId, factor } of terms) {
    factors.set(constituentId, (factors.get(constituentId) ?? 0) + factor);
  }
  return Float64Array.from(materials, ({ constituents = [] }) => {
    let sum = 0;
    for (const { id, max } of constituents) sum += (factors.get(id) ?? 0) * max;
    return sum;
  });
}

/** The problem with one rule's limit at another value. */
export function withLimit(problem: BlendProblem, { rule, kind }: Rule, to: number): BlendProblem {
  const id = rule.slice(rule.indexOf(':') + 1);
  const swap = <T extends { id: string }>(list: readonly T[] | undefined, change: Partial<T>): T[] =>
    (list ?? []).map((one) => (one.id === id ? { ...one, ...change } : one));
  if (rule.startsWith('limit:')) return { ...problem, limits: swap(problem.limits, { max: to }) };
  if (rule.startsWith('group:')) return { ...problem, groups: swap(problem.groups, { [kind]: to }) };
  if (rule.startsWith('kept:')) return { ...problem, kept: swap(problem.kept, { share: to }) };
  if (rule.startsWith('share:')) {
    return { ...problem, candidates: swap(problem.candidates, kind === 'min' ? { minShare: to } : { maxShare: to }) };
  }
  return { ...problem, [rule]: to };
}

/** A rule's amounts as one list; `count` may be 0 where only the values matter and not whose they are. */
export function amountsOf({ amounts }: Rule, count: number): Float64Array {
  if (amounts instanceof Float64Array) return amounts;
  const list = new Float64Array(Math.max(count, 1 + Math.max(-1, ...amounts.at)));
  for (const i of amounts.at) list[i] = amounts.amount;
  return list;
}
