import type { BlendSolution, RulePrice } from '../contract';
import { profileAngle } from '../odour/angle';
import type { Evidence } from './evidence';
import type { Prepared } from './prepare';
import type { Rule } from './rules';
import type { Point } from './working-set';

/** 'optimal' promises this of the gap, relative to max(objective, sum w t^2), and of the worst relative excess. */
export const PROMISED = 1e-9;
/** Below this largest impact share a blend smells of everything and nothing (Weiss et al. 2012: olfactory white). */
const FLAT = 0.15;

/** The answer that a blend and its evidence make. */
export function answerOf(
  prepared: Prepared,
  point: Point,
  evidence: Evidence,
  counts: { nodes: number; iterations: number },
): BlendSolution {
  const { problem, materials, strength, cost, totalWeight } = prepared;
  const mass = point.grams.reduce((sum, grams) => sum + grams, 0);
  const lines = point.materials
    .map((i, k) => ({ i, share: point.grams[k]! / mass, impact: point.grams[k]! * strength[i]! }))
    .sort((a, b) => a.i - b.i);
  const profile = new Array<number>(problem.target.length).fill(0);
  let costPerKg = 0;
  let natural = 0;
  for (const { i, share, impact } of lines) {
    costPerKg += share * cost[i]!;
    natural += share * (materials[i]!.natural ?? 0);
    for (let f = 0; f < profile.length; f++) profile[f]! += impact * materials[i]!.profile[f]!;
  }
  const expectedDistance = Math.sqrt(evidence.objective / totalWeight);
  return {
    status: isExact(prepared, evidence) ? 'optimal' : 'stopped',
    lines: lines.map(({ i, share, impact }) => ({ id: materials[i]!.id, share, impact })),
    profile,
    distance: Math.sqrt(evidence.far / totalWeight),
    expectedDistance,
    angle: angleOf(prepared, lines),
    costPerKg,
    costPerImpact: costPerKg * mass,
    strength: 1 / mass,
    natural,
    exponent: 1,
    objective: evidence.objective,
    bound: evidence.bound,
    kktResidual: evidence.kktResidual,
    prices: pricesOf(prepared, point, evidence, { mass, expectedDistance }),
    warnings: warningsOf(lines),
    ...counts,
  };
}

function isExact(prepared: Prepared, { objective, bound, worstViolation }: Evidence): boolean {
  return objective - bound <= PROMISED * Math.max(objective, prepared.targetSize) && worstViolation <= PROMISED;
}

/** The angle between the blend's profile and the target under the weights, all stages together. */
function angleOf(prepared: Prepared, lines: readonly { i: number; impact: number }[]): number | null {
  const { facets, vectors, target } = prepared;
  const profile = new Float64Array(facets);
  for (const { i, impact } of lines) {
    for (let f = 0; f < facets; f++) profile[f]! += impact * vectors[i * facets + f]!;
  }
  return profileAngle(profile, target);
}

/**
 * What each rule leaves over, in its own unit, and what it costs: with L = E + sum lambda row, dE/d(limit) is -lambda
 * sum z for an upper limit or a kept line, + lambda sum z for a lower one, -lambda for the price at equal strength.
 * `perUnit` is that for the expected distance. Upper limits of single materials are listed where they are used or cost.
 */
function pricesOf(
  prepared: Prepared,
  point: Point,
  { lambda }: Evidence,
  { mass, expectedDistance }: { mass: number; expectedDistance: number },
): RulePrice[] {
  const { rules, general, totalWeight } = prepared;
  const values = ruleValues(prepared, point, mass);
  const used = new Set(point.materials);
  const prices: RulePrice[] = [];
  for (let r = 0; r < rules.length; r++) {
    const rule = rules[r]!;
    if (rule.doseOf !== undefined) continue;
    if (r >= general && lambda[r] === 0 && !used.has(onlyMaterial(rule))) continue;
    const multiplier = lambda[r]! / rule.scale;
    const slack = rule.kind === 'min' ? values[r]! - rule.limit : rule.limit - values[r]!;
    const price: RulePrice = { rule: rule.rule, slack, multiplier };
    if (rule.side && rule.kind !== 'exact') price.side = rule.side;
    const change = multiplier * (rule.per === 'mass' ? mass : 1) * (rule.kind === 'min' ? 1 : -1);
    if (expectedDistance > 0) price.perUnit = (change || 0) / (2 * totalWeight * expectedDistance);
    prices.push(price);
  }
  return prices;
}

function onlyMaterial(rule: Rule): number {
  return typeof rule.counts === 'object' && 'members' in rule.counts ? rule.counts.members[0]! : -1;
}

/** What each rule limits, of this blend: per gram, or per unit of impact. */
export function ruleValues(prepared: Prepared, { materials, grams }: Point, mass: number): Float64Array {
  const { rules, start, row, entry, cost } = prepared;
  const values = new Float64Array(rules.length);
  for (let k = 0; k < materials.length; k++) {
    const i = materials[k]!;
    for (let at = start[i]!; at < start[i + 1]!; at++) {
      const rule = rules[row[at]!]!;
      const amount = rule.counts === 'cost' ? cost[i]! : Math.abs(entry[at]!) * rule.scale;
      values[row[at]!]! += (amount * grams[k]!) / (rule.per === 'mass' ? mass : 1);
    }
  }
  return values;
}

function warningsOf(lines: readonly { impact: number }[]): string[] {
  if (lines.some(({ impact }) => impact > FLAT)) return [];
  return ['No material carries more than 15 % of the impact: such a blend smells of everything and nothing.'];
}

/** No blend, and why: the numbers that a blend would have are null, as the contract says. */
export function answerWithout(
  found: Pick<BlendSolution, 'status' | 'bound' | 'farkas' | 'conflict' | 'relax'>,
  counts: { nodes: number; iterations: number },
): BlendSolution {
  const none = null as unknown as number;
  return {
    lines: [],
    profile: null as unknown as number[],
    distance: none,
    expectedDistance: none,
    angle: null,
    costPerKg: none,
    costPerImpact: none,
    strength: none,
    natural: none,
    exponent: 1,
    objective: none,
    kktResidual: none,
    prices: [],
    warnings: [],
    ...found,
    ...counts,
  };
}

/** Farkas' weights as the contract lists them: per unit of the rule's own row. */
export function farkasOf(prepared: Prepared, weights: Float64Array): NonNullable<BlendSolution['farkas']> {
  const listed: NonNullable<BlendSolution['farkas']> = [];
  for (let r = 0; r < weights.length; r++) {
    if (weights[r] === 0) continue;
    const { rule, side, kind, scale } = prepared.rules[r]!;
    listed.push({ rule, ...(side && kind !== 'exact' ? { side } : {}), multiplier: weights[r]! / scale });
  }
  return listed;
}
