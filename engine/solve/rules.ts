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
  /** What is counted per gram: a property, constituents by their factors, or the mass of some materials itself. */
  counts: Counted;
  /** The material whose smallest dose this is: a rule only while a search takes it to be used. */
  doseOf?: number;
}

export type Counted =
  | 'cost'
  | 'strength'
  | 'natural'
  | { terms: readonly { constituentId: string; factor: number }[] }
  | { members: readonly number[] };

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
  const place = problem.groups || problem.kept || problem.required ? placesOf(materials) : new Map<string, number>();
  const rules: Rule[] = [];
  const add = (rule: string, kind: Rule['kind'], limit: number, counts: Counted) => {
    if (kind === 'min' && limit === 0) return;
    const per = rule === 'costPerImpact' ? 'impact' : 'mass';
    const scale = limit > 0 ? limit : 1;
    const isFraction = typeof counts === 'object' ? 'members' in counts : counts === 'natural';
    rules.push({ rule, side: kind === 'min' ? 'min' : 'max', kind, per, limit, isFraction, scale, counts });
  };
  const { budgetPerKg, costPerImpact, minStrength = 0, minNatural = 0, limits = [], groups = [], kept = [] } = problem;
  if (budgetPerKg !== undefined) add('budgetPerKg', 'max', budgetPerKg, 'cost');
  if (costPerImpact !== undefined) add('costPerImpact', 'max', costPerImpact, 'cost');
  add('minStrength', 'min', minStrength, 'strength');
  add('minNatural', 'min', minNatural, 'natural');
  for (const limit of limits) add(`limit:${limit.id}`, 'max', limit.max, { terms: limit.terms });
  for (const { id, members, min = 0, max = 1 } of groups) {
    const counts = { members: members.map((member) => place.get(member)!) };
    add(`group:${id}`, 'min', min, counts);
    if (max < 1) add(`group:${id}`, 'max', max, counts);
  }
  for (const { id, share } of kept) add(`kept:${id}`, 'exact', share, { members: [place.get(id)!] });
  for (const id of problem.required ?? []) {
    const index = place.get(id)!;
    const least = Math.max(materials[index]!.minShare ?? 0, problem.minDose ?? LEAST_REQUIRED_SHARE);
    add(`required:${id}`, 'min', least, { members: [index] });
  }
  for (let index = 0; index < materials.length; index++) {
    const { id, minShare = 0 } = materials[index]!;
    if (minShare > 0) add(`share:${id}`, 'min', minShare, { members: [index] });
  }
  const keptIds = new Set(kept.map((line) => line.id));
  for (let index = 0; index < materials.length && problem.minDose; index++) {
    if (keptIds.has(materials[index]!.id)) continue;
    add('minDose', 'min', problem.minDose, { members: [index] });
    rules[rules.length - 1]!.doseOf = index;
  }
  const general = rules.length;
  for (let index = 0; index < materials.length; index++) {
    const { id, maxShare = 1 } = materials[index]!;
    if (maxShare < 1) add(`share:${id}`, 'max', maxShare, { members: [index] });
  }
  return { rules, general };
}

function placesOf(materials: readonly EngineMaterial[]): Map<string, number> {
  return new Map(materials.map((material, index) => [material.id, index]));
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
