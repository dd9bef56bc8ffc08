import { coefficientOf, type Forcing, liftOf, raiseForcing, rowSum } from './forced-out';
import type { Prepared } from './prepare';
import { addTo, product } from './triangle';

/** What can be said of grams z (sum s z = 1) and multipliers lambda, from the data alone. All for E, not half of it. */
export interface Evidence {
  objective: number;
  far: number;
  bound: number;
  worstViolation: number;
  kktResidual: number;
  lambda: Float64Array;
}

export interface Found {
  materials: readonly number[];
  grams: readonly number[];
  lambda: Float64Array;
  steps: readonly Forcing[];
  /** 1 for materials that neither a forcing rule nor the caller keeps out. */
  allowed: Uint8Array;
  /** 1 for the materials that the bound has to hold for; all where missing. */
  among?: Uint8Array;
  /** 1 for the rules that are left aside; those asleep where missing. */
  left?: Uint8Array;
}

/**
 * Weak duality: E lies above its tangent at y, the rules may be added with weights >= 0, and the least value of the
 * linear function that results is taken at a single material. So
 *
 *   E* >= E - gap,   gap = grad.y - min over s_i > 0 of (grad_i + (G'lambda)_i / s_i),   (G'lambda)_i >= 0 where s_i = 0
 *
 * whatever y and lambda are. One pass over the data; nothing of the method's own state goes into it.
 */
export function evidenceOf(prepared: Prepared, found: Found): Evidence {
  const { materials, grams, lambda, steps, allowed, among } = found;
  const { count, facets, vectors, strength, variance } = prepared;
  const residual = new Float64Array(facets);
  for (let f = 0; f < facets; f++) residual[f] = -prepared.target[f]!;
  const impact = new Float64Array(count);
  let spread = 0;
  for (let k = 0; k < materials.length; k++) {
    const i = materials[k]!;
    const y = strength[i]! * grams[k]!;
    impact[i] = y;
    spread += variance[i]! * y * y;
    addTo(residual, 0, y, vectors, i * facets, facets);
  }
  const far = product(residual, 0, residual, 0, facets);
  const slope = new Float64Array(count);
  let along = 0;
  for (let i = 0; i < count; i++) {
    if (strength[i]! === 0) continue;
    slope[i] = 2 * (product(vectors, i * facets, residual, 0, facets) + variance[i]! * impact[i]!);
    along += slope[i]! * impact[i]!;
  }
  liftOdourless(prepared, lambda, allowed);
  let lift = liftOf(prepared, lambda);
  const least = leastValue(prepared, { lambda, lift, slope }, allowed);
  raiseForcing(prepared, steps, lambda, (i) => strength[i]! * (slope[i]! - least));
  lift = liftOf(prepared, lambda);
  const objective = far + spread;
  const proven = leastValue(prepared, { lambda, lift, slope }, among);
  const bound = Math.min(objective, Math.max(0, objective - (along - proven)));
  const violation = worstViolation(prepared, found, found.left);
  const slopes = stationarity(prepared, { materials, grams, lambda, lift, slope, least: proven });
  return {
    objective,
    far,
    bound,
    worstViolation: violation,
    kktResidual: Math.max(violation, slopes),
    lambda,
  };
}

interface Priced {
  lambda: Float64Array;
  lift: number;
  slope: Float64Array;
}

function leastValue(prepared: Prepared, { lambda, lift, slope }: Priced, among?: Uint8Array): number {
  const { count, strength, start, row, entry } = prepared;
  let sizeOfLift = 0;
  for (let r = 0; r < lambda.length; r++) sizeOfLift += Math.abs(lambda[r]! * prepared.base[r]!);
  let least = Number.POSITIVE_INFINITY;
  for (let i = 0; i < count; i++) {
    if (among && among[i] === 0) continue;
    let sum = lift;
    let size = sizeOfLift;
    for (let at = start[i]!; at < start[i + 1]!; at++) {
      const term = lambda[row[at]!]! * entry[at]!;
      sum += term;
      size += Math.abs(term);
    }
    if (strength[i]! > 0) least = Math.min(least, slope[i]! + sum / strength[i]!);
    else if (sum < -ROUNDING * size) return Number.NEGATIVE_INFINITY;
  }
  return least;
}

/** Rounding of G'lambda, in terms of the size of what is summed. */
export const ROUNDING = 2e-14;

/**
 * A solvent in use has (G'lambda)_i = 0 but for rounding, and rounding below 0 would leave no bound at all. The rule
 * that charges it most is raised by just as much; being active, that costs the bound no more than rounding.
 */
export function liftOdourless(prepared: Prepared, lambda: Float64Array, allowed: Uint8Array): void {
  for (let round = 0; round < 3; round++) {
    let lifted = false;
    for (let i = 0; i < prepared.count; i++) {
      if (prepared.strength[i]! > 0 || allowed[i] === 0) continue;
      const short = rowSum(prepared, lambda, i);
      if (short < 0 && short < -0.5 * ROUNDING * rowSize(prepared, lambda, i))
        lifted = raiseDearest(prepared, lambda, { material: i, by: -2 * short }) || lifted;
    }
    if (!lifted) return;
  }
}

/** The size of what `rowSum` sums. */
export function rowSize({ base, start, row, entry }: Prepared, lambda: Float64Array, i: number): number {
  let size = 0;
  for (let r = 0; r < lambda.length; r++) size += Math.abs(lambda[r]! * base[r]!);
  for (let at = start[i]!; at < start[i + 1]!; at++) size += Math.abs(lambda[row[at]!]! * entry[at]!);
  return size;
}

function raiseDearest(
  prepared: Prepared,
  lambda: Float64Array,
  { material, by }: { material: number; by: number },
): boolean {
  let best = -1;
  let most = 0;
  for (let r = 0; r < lambda.length; r++) {
    if (lambda[r] === 0) continue;
    const charge = coefficientOf(prepared, r, material);
    const size = prepared.rules[r]!.kind === 'exact' ? Math.abs(charge) : charge;
    if (size > most) [best, most] = [r, size];
  }
  if (best < 0) return false;
  lambda[best]! += by / coefficientOf(prepared, best, material);
  return true;
}

/** Largest relative excess over any rule: of the mass, or of the impact for the price at equal strength. */
export function worstViolation(
  prepared: Prepared,
  { materials, grams }: Pick<Found, 'materials' | 'grams'>,
  left = prepared.asleep,
): number {
  const { rules, base, start, row, entry } = prepared;
  let mass = 0;
  for (let k = 0; k < materials.length; k++) mass += grams[k]!;
  const value = base.map((b) => b * mass);
  for (let k = 0; k < materials.length; k++) {
    const i = materials[k]!;
    for (let at = start[i]!; at < start[i + 1]!; at++) value[row[at]!]! += entry[at]! * grams[k]!;
  }
  let worst = 0;
  for (let r = 0; r < rules.length; r++) {
    if (left[r] === 1) continue;
    const excess = rules[r]!.kind === 'exact' ? Math.abs(value[r]!) : value[r]!;
    worst = Math.max(worst, rules[r]!.per === 'mass' ? excess / mass : excess * prepared.strengthScale);
  }
  return worst;
}

/** How far the materials in use are from equally worth while, relative to the steepest slope, and active rules from binding. */
function stationarity(
  prepared: Prepared,
  {
    materials,
    grams,
    lambda,
    lift,
    slope,
    least,
  }: Priced & { materials: readonly number[]; grams: readonly number[]; least: number },
): number {
  let steepest = 0;
  for (let i = 0; i < slope.length; i++) steepest = Math.max(steepest, Math.abs(slope[i]!));
  let worst = 0;
  for (let k = 0; k < materials.length; k++) {
    const i = materials[k]!;
    let sum = lift;
    for (let at = prepared.start[i]!; at < prepared.start[i + 1]!; at++) {
      sum += lambda[prepared.row[at]!]! * prepared.entry[at]!;
    }
    const off = prepared.strength[i]! * (slope[i]! - least) + sum;
    worst = Math.max(worst, (Math.abs(off) * grams[k]!) / (steepest || 1));
  }
  return worst;
}
