import { ActiveSet } from './active-set';
import { type Evidence, evidenceOf, liftOdourless, worstViolation } from './evidence';
import { type Forcing, forcedOut, raiseForcing } from './forced-out';
import { phaseOne, type Start } from './phase-one';
import type { Prepared } from './prepare';
import type { Point } from './working-set';

/** The answer to the convex problem: a blend with its evidence, or the weights of Farkas. */
export type Closest =
  | { kind: 'blend'; point: Point; evidence: Evidence; iterations: number }
  | { kind: 'none'; weights: Float64Array; iterations: number };

/** Amounts below this share of their scale are rounding, and no line of a formula. */
const NOTHING = 1e-13;
/** A near answer that breaks no rule by more than this can be gone on from. */
const STILL_KEPT = 1e-11;

export interface Around {
  /** 1 for the materials that may be used at all; all where missing. The bound holds among them. */
  among?: Uint8Array;
  /** 1 for the rules that are left aside; those asleep where missing. */
  left?: Uint8Array;
  /** An answer to a problem much like this one. */
  near?: Point;
}

/**
 * The closest blend under the linear rules: materials that a rule alone keeps out are set aside, phase one finds a
 * blend that keeps the rules or proves that there is none, the active set goes on to the closest one, and the evidence
 * is then worked out afresh from the data.
 */
export function closest(prepared: Prepared, { among, left = prepared.asleep, near }: Around = {}): Closest {
  const { allowed, steps } = forcedOut(prepared, among, left);
  const start = startFrom(prepared, { allowed, left }, near);
  if (!start.feasible) {
    return { kind: 'none', weights: farkas(prepared, start.weights, steps, allowed), iterations: start.iterations };
  }
  const set = new ActiveSet(prepared, { normal: prepared.strength, allowed, left });
  set.begin(start);
  set.run(50 * (prepared.general + prepared.facets + 50) + prepared.count);
  const lambda = new Float64Array(prepared.rules.length);
  for (const [place, r] of set.rows.entries()) {
    const value = 2 * set.multiplierOf(place);
    lambda[r] = prepared.rules[r]!.kind === 'exact' ? value : Math.max(0, value);
  }
  const point = pointOf(set);
  const evidence = evidenceOf(prepared, { ...point, lambda, steps, allowed, left, ...(among ? { among } : {}) });
  return { kind: 'blend', point, evidence, iterations: start.iterations + set.iterations };
}

/** The near answer where it keeps the rules as it is, or phase one from it; its materials that are out now are left. */
export function startFrom(prepared: Prepared, rules: { allowed: Uint8Array; left?: Uint8Array }, near?: Point): Start {
  const { allowed, left: aside } = rules;
  if (!near) return phaseOne(prepared, rules);
  const left = near.materials.map((_, k) => k).filter((k) => allowed[near.materials[k]!] === 1);
  const materials = left.map((k) => near.materials[k]!);
  const grams = left.map((k) => near.grams[k]!);
  if (!materials.some((i) => prepared.strength[i]! > 0)) return phaseOne(prepared, rules);
  const kept =
    left.length === near.materials.length && worstViolation(prepared, { materials, grams }, aside) <= STILL_KEPT;
  if (kept) return { feasible: true, materials, grams, rows: near.rows, iterations: 0 };
  return phaseOne(prepared, { ...rules, near: { materials, grams } });
}

function pointOf(set: ActiveSet): Point {
  const kept = set.materials.map((_, k) => k).filter((k) => set.u[k]! > NOTHING);
  const impact = kept.reduce((sum, k) => sum + set.impactOf(k), 0);
  return {
    materials: kept.map((k) => set.materials[k]!),
    grams: kept.map((k) => set.gramsOf(k) / impact),
    rows: [...set.rows],
  };
}

/** Phase one's weights, scaled so that (G'lambda)_i >= s_i, and with the forcing rules' own weights put in. */
function farkas(
  prepared: Prepared,
  weights: Float64Array,
  steps: readonly Forcing[],
  allowed: Uint8Array,
): Float64Array {
  const { strength, start, row, entry, base } = prepared;
  liftOdourless(prepared, weights, allowed);
  let lift = 0;
  for (let r = 0; r < weights.length; r++) lift += weights[r]! * base[r]!;
  let most = 0;
  for (let i = 0; i < prepared.count; i++) {
    if (allowed[i] === 0 || strength[i] === 0) continue;
    let sum = lift;
    for (let at = start[i]!; at < start[i + 1]!; at++) sum += weights[row[at]!]! * entry[at]!;
    if (sum > 0) most = Math.max(most, strength[i]! / sum);
  }
  const scaled = weights.map((weight) => weight * (most || 1) * (1 + 1e-9));
  raiseForcing(prepared, steps, scaled, (i) => -strength[i]!);
  return scaled;
}
