import type { BlendProblem, EngineMaterial } from '../contract';

/**
 * The expected squared distance E of a blend with impact shares y, from its definition:
 *
 *   E = sum over stages and facets of w (p_f - t_f)^2  +  sum_i variance_i y_i^2,    p = sum_i y_i a_i
 *
 * `weights` holds stage weight times facet weight, `totalWeight` their sum W, `targetSize` is sum w t^2: what E of an
 * odourless blend would be, and so the scale on which E is exact.
 */
export interface Closeness {
  weights: Float64Array;
  target: Float64Array;
  /** What each candidate adds to every stage's profile per unit of impact, stage after stage. */
  vectors: Float64Array[];
  variances: Float64Array;
  totalWeight: number;
  targetSize: number;
}

interface Stage {
  hours: number;
  weight: number;
  target: ArrayLike<number>;
}

export function closenessOf(problem: BlendProblem): Closeness {
  const { candidates } = problem;
  const stages: Stage[] = problem.stages ?? [{ hours: 0, weight: 1, target: problem.target }];
  const facetWeights = Float64Array.from(problem.target, (_, facet) => problem.weights?.[facet] ?? 1);
  const weights = stages.flatMap((stage) => Array.from(facetWeights, (weight) => stage.weight * weight));
  const target = Float64Array.from(stages.flatMap((stage) => Array.from(stage.target)));
  return {
    weights: Float64Array.from(weights),
    target,
    vectors: candidates.map((candidate) => stackedVector(candidate, stages, problem.stages !== undefined)),
    variances: Float64Array.from(candidates, (candidate) => variance(candidate, stages, facetWeights)),
    totalWeight: weights.reduce((sum, weight) => sum + weight, 0),
    targetSize: weights.reduce((sum, weight, row) => sum + weight * target[row]! ** 2, 0),
  };
}

function stackedVector(material: EngineMaterial, stages: readonly Stage[], staged: boolean): Float64Array {
  return Float64Array.from(
    stages.flatMap((stage, index) => {
      const left = Math.exp(-(material.evaporation ?? 0) * stage.hours);
      const profile = (staged ? material.stageProfiles?.[index] : undefined) ?? material.profile;
      return Array.from(profile, (intensity) => intensity * left);
    }),
  );
}

function variance(material: EngineMaterial, stages: readonly Stage[], facetWeights: Float64Array): number {
  let once = 0;
  for (const [facet, weight] of facetWeights.entries()) once += weight * (material.profileSd?.[facet] ?? 0) ** 2;
  let sum = 0;
  for (const stage of stages) sum += stage.weight * once * Math.exp(-2 * (material.evaporation ?? 0) * stage.hours);
  return sum;
}

/** The blend's profile, stage after stage. */
export function stackedProfile({ vectors, target }: Closeness, y: Float64Array): Float64Array {
  const profile = new Float64Array(target.length);
  for (const [index, impact] of y.entries()) {
    if (impact === 0) continue;
    const vector = vectors[index]!;
    for (let row = 0; row < profile.length; row++) profile[row]! += impact * vector[row]!;
  }
  return profile;
}

/** The two sums of E: how far the profile is from the target, and what the spread of the ratings adds. */
export function closenessParts(closeness: Closeness, y: Float64Array): { far: number; spread: number } {
  const profile = stackedProfile(closeness, y);
  let far = 0;
  for (const [row, weight] of closeness.weights.entries())
    far += weight * (profile[row]! - closeness.target[row]!) ** 2;
  let spread = 0;
  for (const [index, impact] of y.entries()) spread += closeness.variances[index]! * impact * impact;
  return { far, spread };
}

/** dE/dy_i for every candidate. */
export function closenessGradient(closeness: Closeness, y: Float64Array): Float64Array {
  const { weights, target, vectors, variances } = closeness;
  const pull = stackedProfile(closeness, y).map((value, row) => 2 * weights[row]! * (value - target[row]!));
  return Float64Array.from(vectors, (vector, index) => {
    let sum = 2 * variances[index]! * y[index]!;
    for (let row = 0; row < pull.length; row++) sum += vector[row]! * pull[row]!;
    return sum;
  });
}
