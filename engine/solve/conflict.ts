import { phaseOne } from './phase-one';
import type { Prepared } from './prepare';

/**
 * Rules that are impossible together and possible without any one of them, from Farkas' weights: those with a weight
 * clash; each is then left out in turn, and stays out where the rest still clash (deletion filter, Chinneck & Dravnieks
 * 1991). A rule's two sides count as one. It ends after as many phase ones as rules have a weight.
 */
export function irreducibleConflict(prepared: Prepared, weights: Float64Array): string[] {
  const { rules } = prepared;
  let conflict = [...new Set(rules.filter((_, r) => weights[r] !== 0).map(({ rule }) => rule))].sort();
  for (const rule of conflict) {
    const others = conflict.filter((one) => one !== rule);
    if (!phaseOne(prepared, { left: allBut(prepared, others) }).feasible) conflict = others;
  }
  return conflict;
}

/** 1 for every rule that is not named. */
export function allBut(prepared: Prepared, named: readonly string[]): Uint8Array {
  return Uint8Array.from(prepared.rules, ({ rule, doseOf }) => (doseOf === undefined && named.includes(rule) ? 0 : 1));
}
