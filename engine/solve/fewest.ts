import type { BlendProblem, BlendSolution, Run } from '../contract';
import { answerOf, answerWithout, PROMISED } from './answer';
import { searchBlend } from './branch';
import { closest } from './closest';
import { describe } from './describe';
import { onlyRules, ruleNames } from './only';
import { type Prepared, prepare } from './prepare';

/** Nodes that one question about a clash may cost: why there is no blend must not take longer than finding one. */
const NODES_PER_QUESTION = 400;
/** How many materials more are tried, one by one. */
const MORE_MATERIALS = 20;

/** The closest blend under rules that count materials, with the bound of the search; or why there is none. */
export function describeFewest(prepared: Prepared, run: Run | undefined): BlendSolution {
  const convex = closest(prepared);
  if (convex.kind === 'none') return describe(prepared, convex);
  const found = searchBlend(prepared, run);
  const counts = { nodes: found.nodes, iterations: found.iterations };
  if (found.best) {
    const { point, evidence } = found.best;
    const answer = answerOf(prepared, point, { ...evidence, bound: Math.min(found.bound, evidence.objective) }, counts);
    return found.complete
      ? answer
      : { ...answer, status: provenEnough(answer, prepared), warnings: [...answer.warnings, OUT_OF_TIME] };
  }
  if (!found.complete) {
    return {
      ...answerWithout({ status: 'stopped', bound: Math.max(0, found.bound) }, counts),
      warnings: [OUT_OF_TIME],
    };
  }
  const conflict = clash(prepared.problem);
  const relax = relaxCounting(prepared.problem, conflict);
  return answerWithout({ status: 'infeasible', bound: null as unknown as number, conflict, relax }, counts);
}

const OUT_OF_TIME =
  'The search ended before every choice of materials was ruled out: there may be a closer blend, but none below the bound.';

function provenEnough({ objective, bound }: BlendSolution, { targetSize }: Prepared): 'optimal' | 'stopped' {
  return objective - bound <= PROMISED * Math.max(objective, targetSize) ? 'optimal' : 'stopped';
}

/** Rules of any kind that clash, by leaving each out in turn: it stays out where the rest still allow nothing. */
function clash(problem: BlendProblem): string[] {
  let names = ruleNames(problem);
  for (const name of [...names]) {
    const others = names.filter((one) => one !== name);
    if (outlook(onlyRules(problem, new Set(others))) === 'none') names = others;
  }
  return names;
}

function outlook(problem: BlendProblem): 'blend' | 'none' | 'unknown' {
  const prepared = prepare(problem);
  const { best, complete } = searchBlend(prepared, {}, NODES_PER_QUESTION);
  return best ? 'blend' : complete ? 'none' : 'unknown';
}

/** How many materials, or what smallest dose, would do alone. Each is tried; the linear rules are left as they are. */
function relaxCounting(problem: BlendProblem, conflict: readonly string[]): NonNullable<BlendSolution['relax']> {
  const relax: NonNullable<BlendSolution['relax']> = [];
  const { maxMaterials, minDose } = problem;
  if (maxMaterials !== undefined && conflict.includes('maxMaterials')) {
    for (let to = maxMaterials + 1; to <= maxMaterials + MORE_MATERIALS; to++) {
      if (outlook({ ...problem, maxMaterials: to }) !== 'blend') continue;
      relax.push({ rule: 'maxMaterials', side: 'max', from: maxMaterials, to });
      break;
    }
  }
  if (minDose !== undefined && conflict.includes('minDose')) {
    const { best } = searchBlend(prepare({ ...problem, minDose: 0 }), {}, NODES_PER_QUESTION);
    const to = best ? Math.min(...sharesOf(best.point.grams)) * (1 - 1e-9) : 0;
    if (best && to < minDose && outlook({ ...problem, minDose: to }) === 'blend') {
      relax.push({ rule: 'minDose', side: 'min', from: minDose, to });
    }
  }
  return relax;
}

function sharesOf(grams: readonly number[]): number[] {
  const mass = grams.reduce((sum, z) => sum + z, 0);
  return grams.map((z) => z / mass);
}
