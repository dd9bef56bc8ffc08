import type { Prepared } from './prepare';

/** Materials that one rule by itself keeps out, given those that earlier steps left. */
export interface Forcing {
  row: number;
  /** -1 where the rule is an equality that all others fall short of. */
  sign: 1 | -1;
  materials: number[];
}

/**
 * Which materials no blend can hold: where a rule's coefficients are all >= 0 (a limit of 0, all of it natural, a
 * ceiling at the cheapest price), every material with a coefficient above 0 must stay out. Repeated until no rule does
 * so. Without this the blend would sit in a corner with no inside, where rounding decides.
 */
export function forcedOut(
  prepared: Prepared,
  among?: Uint8Array,
  left = prepared.asleep,
): { allowed: Uint8Array; steps: Forcing[] } {
  const allowed = among ? among.slice() : new Uint8Array(prepared.count).fill(1);
  const steps: Forcing[] = [];
  for (;;) {
    const found = forcingRows(prepared, allowed, left);
    if (found.length === 0) return { allowed, steps };
    for (const { row, sign } of found) {
      const materials: number[] = [];
      for (let i = 0; i < prepared.count; i++) {
        if (allowed[i] === 1 && coefficientOf(prepared, row, i) !== 0) materials.push(i);
      }
      for (const i of materials) allowed[i] = 0;
      if (materials.length > 0) steps.push({ row, sign, materials });
    }
  }
}

function forcingRows(prepared: Prepared, allowed: Uint8Array, left: Uint8Array): { row: number; sign: 1 | -1 }[] {
  const { rules, base, start, row, entry } = prepared;
  const above = new Int32Array(rules.length);
  const below = new Int32Array(rules.length);
  const named = new Int32Array(rules.length);
  let usable = 0;
  for (let i = 0; i < prepared.count; i++) {
    if (allowed[i] === 0) continue;
    usable++;
    for (let at = start[i]!; at < start[i + 1]!; at++) {
      const r = row[at]!;
      const value = entry[at]! + base[r]!;
      named[r]!++;
      if (value > 0) above[r]!++;
      else if (value < 0) below[r]!++;
    }
  }
  const found: { row: number; sign: 1 | -1 }[] = [];
  for (let r = 0; r < rules.length; r++) {
    if (left[r] === 1) continue;
    const others = usable - named[r]!;
    const positive = above[r]! + (base[r]! > 0 ? others : 0);
    const negative = below[r]! + (base[r]! < 0 ? others : 0);
    if (negative === 0 && positive > 0) found.push({ row: r, sign: 1 });
    else if (rules[r]!.kind === 'exact' && positive === 0 && negative > 0) found.push({ row: r, sign: -1 });
  }
  return found;
}

/**
 * The multipliers of the forcing rules, in reverse: each is raised until the materials it keeps out are worth nothing,
 * `worth(i)` being below 0 for one that the other rules would let in. No later raise can undo an earlier one.
 */
export function raiseForcing(
  prepared: Prepared,
  steps: readonly Forcing[],
  lambda: Float64Array,
  worth: (material: number) => number,
): void {
  for (let step = steps.length - 1; step >= 0; step--) {
    const { row, materials } = steps[step]!;
    for (const i of materials) {
      const short = worth(i) + rowSum(prepared, lambda, i);
      if (short < 0) lambda[row]! -= (short * (1 + 1e-12)) / coefficientOf(prepared, row, i);
    }
  }
}

export function coefficientOf(prepared: Prepared, r: number, i: number): number {
  for (let at = prepared.start[i]!; at < prepared.start[i + 1]!; at++) {
    if (prepared.row[at] === r) return prepared.entry[at]! + prepared.base[r]!;
  }
  return prepared.base[r]!;
}

/** (G' lambda)_i */
export function rowSum(prepared: Prepared, lambda: Float64Array, i: number): number {
  let sum = liftOf(prepared, lambda);
  for (let at = prepared.start[i]!; at < prepared.start[i + 1]!; at++) {
    sum += lambda[prepared.row[at]!]! * prepared.entry[at]!;
  }
  return sum;
}

/** What the rules charge every gram alike: sum lambda_r base_r. */
export function liftOf(prepared: Prepared, lambda: Float64Array): number {
  let lift = 0;
  for (let r = 0; r < lambda.length; r++) lift += lambda[r]! * prepared.base[r]!;
  return lift;
}
