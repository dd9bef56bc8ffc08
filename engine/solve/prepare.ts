import type { BlendProblem, EngineMaterial } from '../contract';
import { exponential } from '../portable/exponential';
import { rowsByMaterial } from './rows';
import type { Rule } from './rules';
import { product } from './triangle';

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
    strength: new Float64Array(materials.length),
    cost: new Float64Array(materials.length),
    totalWeight: 0,
    targetSize: 0,
    ...rowsByMaterial(problem, materials),
  };
  for (let i = 0; i < materials.length; i++) {
    prepared.strength[i] = materials[i]!.strength;
    prepared.cost[i] = materials[i]!.costPerKg;
  }
  for (const [index, stage] of stages.entries()) addStage(prepared, stage, index);
  for (let i = 0; i < materials.length; i++) {
    prepared.curvature[i] =
      prepared.variance[i]! + product(prepared.vectors, i * facets, prepared.vectors, i * facets, facets);
  }
  return prepared;
}

function sortedById(candidates: readonly EngineMaterial[]): EngineMaterial[] {
  let sorted = true;
  for (let i = 1; i < candidates.length && sorted; i++) sorted = candidates[i - 1]!.id < candidates[i]!.id;
  if (sorted) return [...candidates];
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
