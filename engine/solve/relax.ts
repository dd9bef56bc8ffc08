import type { BlendSolution } from '../contract';
import { type BestLimit, bestLimit, workingLimit } from './best-limit';
import type { Prepared } from './prepare';

type Relaxation = NonNullable<BlendSolution['relax']>[number];

/**
 * What each rule of a conflict would have to become, alone, to allow a blend. Rules outside the conflict cannot help:
 * the conflict would remain. Each value is tried by solving again before it is named; a rule that does not suffice
 * alone, or whose limit is no number of its own (`required`), is left out.
 */
export function relaxations(prepared: Prepared, conflict: readonly string[]): Relaxation[] {
  const found: Relaxation[] = [];
  for (const [r, rule] of prepared.rules.entries()) {
    if (!conflict.includes(rule.rule) || rule.rule.startsWith('required:')) continue;
    for (const value of candidatesFor(prepared, r)) {
      const to = workingLimit(prepared, r, value);
      if (to === null) continue;
      const side = rule.kind === 'exact' ? {} : { side: rule.side! };
      found.push({ rule: rule.rule, ...side, from: rule.limit, to });
      break;
    }
  }
  return found;
}

/** The nearest limits to try: one end for a limit; for a kept line the nearer end of what the others allow, then the other. */
function candidatesFor(prepared: Prepared, r: number): BestLimit[] {
  const { kind, limit } = prepared.rules[r]!;
  const ends = kind === 'exact' ? (['least', 'most'] as const) : ([kind === 'max' ? 'least' : 'most'] as const);
  const values = ends.map((end) => bestLimit(prepared, r, end)).filter((value) => value !== null);
  return values.sort((a, b) => Math.abs(a.value - limit) - Math.abs(b.value - limit));
}
