import type { BlendProblem, FrontierPoint } from '../contract';
import { EngineInputError } from '../errors';
import { checkNumber, checkWhole, NOT_NEGATIVE } from '../input/fields';
import { checkProblem } from '../input/problem';
import { bestLimit, workingLimit } from './best-limit';
import { closest } from './closest';
import { confirmed } from './confirmed';
import { describe } from './describe';
import { hasDiscreteRules } from './discrete';
import { prepare } from './prepare';
import { renewLimit } from './rows';
import { solveBlend } from './solve-blend';
import type { Point } from './working-set';

/** More points than anybody could tell apart on a screen are a slip of the caller. */
const MOST_POINTS = 1000;
/** The highest ceiling is put above the price that needs none by this, relative to it, so that it does not bind. */
const LOOSE = 1e-6;

/**
 * The curve of price against closeness: the closest blend at each ceiling, in the order asked for.
 *
 * The ceilings are the price per kg; where the problem has a `costPerImpact` and no `budgetPerKg`, they are the price at
 * equal strength. The problem's own ceiling of that kind is left aside. A number asks for that many, evenly from the
 * cheapest price at which there is a blend up to where the price no longer binds; none where the other rules clash.
 *
 * Every answer starts from the one before (ceilings in rising order, so that it still keeps the rules), which leaves a
 * few steps each, and carries its own proof. With rules that count materials every point is solved by itself.
 *
 * @throws EngineInputError if the problem is badly put or a ceiling is not a number from 0.
 */
export function traceFrontier(problem: BlendProblem, ceilings: number[] | number): FrontierPoint[] {
  checkProblem(problem);
  const field =
    problem.costPerImpact !== undefined && problem.budgetPerKg === undefined ? 'costPerImpact' : 'budgetPerKg';
  const wanted = typeof ceilings === 'number' ? evenCeilings(problem, field, ceilings) : checked(ceilings);
  if (hasDiscreteRules(problem)) {
    return wanted.map((ceiling) => pointOf(ceiling, solveBlend({ ...problem, [field]: ceiling })));
  }
  const points = new Map<number, FrontierPoint>();
  const rising = [...new Set(wanted)].sort((a, b) => a - b);
  const positive = rising.find((ceiling) => ceiling > 0);
  const prepared = positive === undefined ? null : prepare({ ...problem, [field]: positive });
  let near: Point | undefined;
  for (const ceiling of rising) {
    if (!prepared || ceiling === 0) {
      points.set(ceiling, pointOf(ceiling, solveBlend({ ...problem, [field]: ceiling })));
      continue;
    }
    renewLimit(prepared, field, ceiling);
    const found = closest(prepared, near ? { near } : {});
    if (found.kind === 'blend') near = found.point;
    const answer = describe(prepared, found);
    points.set(ceiling, pointOf(ceiling, confirmed({ ...problem, [field]: ceiling }, answer, prepared.targetSize)));
  }
  return wanted.map((ceiling) => points.get(ceiling)!);
}

function checked(ceilings: number[]): number[] {
  if (!Array.isArray(ceilings))
    throw new EngineInputError('ceilings', 'ceilings must be a list of numbers, or how many.');
  for (const [index, ceiling] of ceilings.entries()) checkNumber(ceiling, `ceilings[${index}]`, NOT_NEGATIVE);
  return ceilings;
}

/** From the cheapest price that the other rules allow to that of the blend which no ceiling holds back. */
function evenCeilings(problem: BlendProblem, field: 'budgetPerKg' | 'costPerImpact', count: number): number[] {
  checkWhole(count, 'ceilings', { min: 1, max: MOST_POINTS });
  const dearest = Math.max(...problem.candidates.map(({ costPerKg }) => costPerKg));
  const weakest = Math.min(...problem.candidates.map(({ strength }) => strength || Number.POSITIVE_INFINITY));
  const prepared = prepare({ ...problem, [field]: (field === 'budgetPerKg' ? dearest : dearest / weakest) || 1 });
  const r = prepared.rules.findIndex(({ rule }) => rule === field);
  const least = bestLimit(prepared, r, 'least');
  if (least === null) return [];
  const free = solveBlend({ ...problem, [field]: undefined });
  const most = (field === 'budgetPerKg' ? free.costPerKg : free.costPerImpact) * (1 + LOOSE);
  const lowest = workingLimit(prepared, r, least) ?? most;
  if (count === 1 || !(most > lowest)) return count === 1 ? [most] : Array.from({ length: count }, () => most);
  return Array.from({ length: count }, (_, index) => lowest + ((most - lowest) * index) / (count - 1));
}

function pointOf(ceiling: number, solution: FrontierPoint['solution']): FrontierPoint {
  const { costPerKg, distance, expectedDistance } = solution;
  return { ceiling, costPerKg, distance, expectedDistance, solution };
}
