import type { BlendProblem, EngineMaterial } from '../contract';
import { exponential } from '../portable/exponential';
import { type Rule, rulesOf } from './rules';

/**
 * A blend problem as flat arrays, its materials sorted by id: what the hot loops work on.
 *
 * Half the objective is  1/2 |sum_i y_i a_i - t|^2 + 1/2 sum_i v_i y_i^2  with every facet already multiplied by the
 * root of its weight. Row r of the rules is  sum_i (entry_ri + base_r) z_i;  entries are kept by material, because a
 * rule names few materials, or a material few rules.
 */
export interface Prepared {
  problem: BlendProblem;
  materials: EngineMaterial[];
  count: number;
  /** Facets times stages. */
  facets: number;
  vectors: Float64Array;
  target: Float64Array;
  variance: Float64Array;
  /** |a_i|^2 + v_i: the curvature of half the objective along y_i. */
  curvature: Float64Array;
  strength: Float64Array;
  cost: Float64Array;
  totalWeight: number;
  targetSize: number;
  rules: Rule[];
  general: number;
  base: Float64Array;
  start: Int32Array;
  row: Int32Array;
  entry: Float64Array;
  /** 1 for rules that are left aside until a search turns them on: the smallest doses. */
  asleep: Uint8Array;
  /** Rows per impact are divided by this strength. */
  strengthScale: number;
}

export function prepare(problem: BlendProblem): Prepared {
  const materials = sortedById(problem.candidates);
  const stages = problem.stages ?? [{ hours: 0, weight: 1, target: problem.target }];
  const width = problem.target.length;
  const facets = width * stages.length;
  const prepared: Prepared = {
    problem,
    materials,
    count: materials.length,
    facets,
    vectors: new Float64Array(materials.length * facets),
    target: new Float64Array(facets),
    variance: new Float64Array(materials.length),
    curvature: new Float64Array(materials.length),
    strength: Float64Array.from(materials, (material) => material.strength),
    cost: Float64Array.from(materials, (material) => material.costPerKg),
    totalWeight: 0,
    targetSize: 0,
    ...rowsByMaterial(problem, materials),
  };
  for (const [index, stage] of stages.entries()) addStage(prepared, stage, index);
  for (let i = 0; i < materials.length; i++) {
    let sum = prepared.variance[i]!;
    for (let f = i * facets; f < (i + 1) * facets; f++) sum += prepared.vectors[f]! ** 2;
    prepared.curvature[i] = sum;
  }
  return prepared;
}

function sortedById(candidates: readonly EngineMaterial[]): EngineMaterial[] {
  return [...candidates].sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : 0));
}

/** What one stage of the evaporation adds to the rows and to the variance; without stages there is one, at once. */
function addStage(
  prepared: Prepared,
  stage: { hours: number; weight: number; target: ArrayLike<number> },
  index: number,
): void {
  const { problem, materials, facets, vectors, variance } = prepared;
  const width = problem.target.length;
  const weights = Float64Array.from({ length: width }, (_, f) => stage.weight * (problem.weights?.[f] ?? 1));
  const roots = weights.map(Math.sqrt);
  for (let f = 0; f < width; f++) {
    prepared.target[index * width + f] = roots[f]! * stage.target[f]!;
    prepared.totalWeight += weights[f]!;
    prepared.targetSize += weights[f]! * stage.target[f]! ** 2;
  }
  for (let i = 0; i < materials.length; i++) {
    const material = materials[i]!;
    const profile = (problem.stages && material.stageProfiles?.[index]) || material.profile;
    const left = stage.hours === 0 ? 1 : exponential(-(material.evaporation ?? 0) * stage.hours);
    scaleInto(vectors, i * facets + index * width, profile, { roots, left });
    if (material.profileSd) variance[i]! += left * left * weightedSquares(material.profileSd, weights);
  }
}

function scaleInto(
  vectors: Float64Array,
  at: number,
  profile: ArrayLike<number>,
  { roots, left }: { roots: Float64Array; left: number },
): void {
  for (let f = 0; f < roots.length; f++) vectors[at + f] = roots[f]! * left * profile[f]!;
}

function weightedSquares(values: ArrayLike<number>, weights: Float64Array): number {
  let sum = 0;
  for (let f = 0; f < weights.length; f++) sum += weights[f]! * values[f]! * values[f]!;
  return sum;
}

/** A coefficient this near to 0, in roundings of its two parts, is 0: a material that meets a limit exactly. */
const SAME = 4 * Number.EPSILON;

function rowsByMaterial(problem: BlendProblem, materials: readonly EngineMaterial[]) {
  const { rules, general } = rulesOf(problem, materials);
  const strengthScale = middleStrength(materials);
  for (const rule of rules) if (rule.per === 'impact') rule.scale *= strengthScale;
  const base = Float64Array.from(rules, baseOf);
  const sizes = new Int32Array(materials.length + 1);
  eachEntry(rules, materials, (i) => sizes[i + 1]!++);
  const start = sizes;
  for (let i = 0; i < materials.length; i++) start[i + 1]! += start[i]!;
  const next = start.slice(0, materials.length);
  const row = new Int32Array(start[materials.length]!);
  const entry = new Float64Array(row.length);
  eachEntry(rules, materials, (i, r, value) => {
    const at = next[i]!++;
    row[at] = r;
    entry[at] = Math.abs(value + base[r]!) <= SAME ? -base[r]! : value;
  });
  const asleep = Uint8Array.from(rules, ({ doseOf }) => (doseOf === undefined ? 0 : 1));
  return { rules, general, base, start, row, entry, asleep, strengthScale };
}

/** Gives a price rule another ceiling above 0, in place: the rows of a frontier differ in nothing else. */
export function renewLimit(prepared: Prepared, name: 'budgetPerKg' | 'costPerImpact', limit: number): void {
  const { rules, base, start, row, entry, cost, strength, strengthScale } = prepared;
  const r = rules.findIndex(({ rule }) => rule === name);
  const rule = rules[r]!;
  rule.limit = limit;
  rule.scale = rule.per === 'impact' ? limit * strengthScale : limit;
  for (let i = 0; i < prepared.count; i++) {
    for (let at = start[i]!; at < start[i + 1]!; at++) {
      if (row[at] !== r) continue;
      const value = cost[i]! / rule.scale;
      if (rule.per === 'impact') entry[at] = impactPrice(value, strength[i]! / strengthScale);
      else entry[at] = Math.abs(value + base[r]!) <= SAME ? -base[r]! : value;
    }
  }
}

function baseOf(rule: Rule): number {
  if (rule.limit === 0 || rule.per === 'impact') return 0;
  return rule.kind === 'min' ? 1 : -1;
}

function eachEntry(
  rules: readonly Rule[],
  materials: readonly EngineMaterial[],
  visit: (material: number, rule: number, value: number) => void,
): void {
  for (const [r, rule] of rules.entries()) {
    const factor = (rule.kind === 'min' ? -1 : 1) / rule.scale;
    if (!(rule.amounts instanceof Float64Array)) {
      for (const i of rule.amounts.at) visit(i, r, rule.amounts.amount * factor);
      continue;
    }
    const perImpact = rule.per === 'impact' && rule.limit > 0;
    const unit = perImpact ? rule.scale / rule.limit : 1;
    for (let i = 0; i < materials.length; i++) {
      const value = perImpact
        ? impactPrice(rule.amounts[i]! * factor, materials[i]!.strength / unit)
        : rule.amounts[i]! * factor;
      if (value !== 0 || perImpact) visit(i, r, value);
    }
  }
}

function impactPrice(costPerCeiling: number, strength: number): number {
  const value = costPerCeiling - strength;
  return Math.abs(value) <= SAME * strength ? 0 : value;
}

/** A strength in the middle of those there are: the price at equal strength is a row in strengths, and needs a scale. */
function middleStrength(materials: readonly EngineMaterial[]): number {
  const strengths = materials.map((material) => material.strength).filter((strength) => strength > 0);
  return strengths.sort((a, b) => a - b)[strengths.length >> 1]!;
}
