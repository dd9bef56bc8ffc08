import type { BlendProblem } from '../contract';
import { ActiveSet } from './active-set';
import { startFrom } from './closest';
import { forcedOut } from './forced-out';
import { phaseOne } from './phase-one';
import { type Prepared, prepare } from './prepare';
import { amountsOf } from './rows';
import { withLimit } from './rules';

export interface BestLimit {
  value: number;
  /** False where only solvent alone would reach it: blends come as near as one likes, and never there. */
  reached: boolean;
}

/**
 * The least (or the most) that rule r's amount can be, per gram or per unit of impact, when the rule itself is left
 * aside and all others hold; null where the others clash anyway. A linear programme, by the same active set.
 */
export function bestLimit(prepared: Prepared, r: number, wanted: 'least' | 'most'): BestLimit | null {
  const rule = prepared.rules[r]!;
  const left = prepared.asleep.slice();
  left[r] = 1;
  const start = phaseOne(prepared, { left });
  if (!start.feasible) return null;
  const amounts = amountsOf(prepared, r);
  const linear = amounts.map((amount) => (wanted === 'least' ? amount : -amount));
  const normal = rule.per === 'mass' ? new Float64Array(prepared.count).fill(1) : prepared.strength;
  const set = new ActiveSet(prepared, { normal, linear, left });
  set.begin({ ...start, rows: start.rows.filter((row) => row !== r) });
  set.run(100 * (prepared.general + 50) + 4 * prepared.count);
  let value = 0;
  let sum = 0;
  for (const [k, i] of set.materials.entries()) {
    value += amounts[i]! * set.gramsOf(k);
    sum += normal[i]! * set.gramsOf(k);
  }
  const smells = set.materials.some((i, k) => prepared.strength[i]! > 0 && set.gramsOf(k) > 1e-9 * sum);
  return { value: value / sum, reached: smells };
}

/** How far past the best value a limit is put, relative to it, until a blend is really there: a corner is a hair wide. */
const MARGINS = [0, 1e-9, 1e-7, 1e-5, 1e-3];
const MARGINS_UNREACHED = [1e-4, 1e-2];

/** The limit nearest to the best value for which solving finds a blend, or null. */
export function workingLimit(prepared: Prepared, r: number, { value, reached }: BestLimit): number | null {
  const rule = prepared.rules[r]!;
  const up = rule.kind === 'max' || (rule.kind === 'exact' && value < rule.limit);
  const size = Math.max(value, 1e-3 * amountsOf(prepared, r).reduce((most, amount) => Math.max(most, amount), 0));
  for (const margin of reached ? MARGINS : MARGINS_UNREACHED) {
    const past = Math.max(0, up ? value + margin * size : value * (1 - margin));
    const to = rule.isFraction ? Math.min(1, past) : past;
    if (hasBlend(withLimit(prepared.problem, rule, to))) return to;
  }
  return null;
}

function hasBlend(problem: BlendProblem): boolean {
  const prepared = prepare(problem);
  return startFrom(prepared, { allowed: forcedOut(prepared).allowed }).feasible;
}
