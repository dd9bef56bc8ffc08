import type { BlendProblem, BlendSolution, Run } from '../contract';
import { checkWhole } from '../input/fields';
import { checkProblem } from '../input/problem';
import { checkRun } from '../input/run';
import { Heap } from './heap';
import { solveBlend } from './solve-blend';

/** A line that does this much of the impact makes a blend what it is: without it, it is another blend. */
const MATTERS = 0.05;
/** Solves that one alternative may cost. */
const TRIES = 200;

interface Trial {
  bound: number;
  serial: number;
  without: readonly string[];
  solution: BlendSolution;
}

/**
 * The best blend and others that are built differently, best first: each leaves out at least one material that matters
 * (an impact of 0.05 or more) in every earlier one.
 *
 * Best first over sets of materials left out (Lawler 1972): an answer that still has all that matters of an earlier
 * blend is split by leaving out one such material at a time, so the first that passes is the best of all that would.
 * Materials that the rules demand cannot be left out. Fewer than asked for come back where there are no more, or where
 * one would take more than 200 solves.
 *
 * @throws EngineInputError if the problem is badly put or `count` is not a whole number from 1.
 */
export function alternativeBlends(problem: BlendProblem, count: number, run?: Run): BlendSolution[] {
  checkProblem(problem);
  checkRun(run);
  checkWhole(count, 'count', { min: 1, max: 100 });
  const found: BlendSolution[] = [];
  const queue = new Heap<Trial>();
  const seen = new Set<string>();
  const fixed = demanded(problem);
  let serial = 0;
  const put = (without: readonly string[]) => {
    const key = JSON.stringify(without);
    if (seen.has(key)) return;
    seen.add(key);
    const candidates = problem.candidates.filter(({ id }) => !without.includes(id));
    if (!candidates.some(({ strength }) => strength > 0)) return;
    const solution = solveBlend(withoutMaterials(problem, candidates, without), run);
    if (solution.lines.length > 0) queue.push({ bound: solution.objective, serial: serial++, without, solution });
  };
  put([]);
  for (let tries = 0; found.length < count && tries < TRIES * count; tries++) {
    const trial = queue.pop();
    if (!trial) break;
    const same = found.find((earlier) => keepsAll(trial.solution, matters(earlier, fixed)));
    if (!same) found.push(trial.solution);
    const split = same ?? trial.solution;
    for (const id of matters(split, fixed)) put([...trial.without, id].sort());
  }
  return found;
}

function demanded(problem: BlendProblem): Set<string> {
  const ids = new Set(problem.required ?? []);
  for (const { id } of problem.kept ?? []) ids.add(id);
  for (const { id, minShare = 0 } of problem.candidates) if (minShare > 0) ids.add(id);
  return ids;
}

function matters({ lines }: BlendSolution, fixed: ReadonlySet<string>): string[] {
  return lines.filter(({ id, impact }) => impact >= MATTERS && !fixed.has(id)).map(({ id }) => id);
}

function keepsAll({ lines }: BlendSolution, ids: readonly string[]): boolean {
  const used = new Set(lines.map(({ id }) => id));
  return ids.every((id) => used.has(id));
}

function withoutMaterials(
  problem: BlendProblem,
  candidates: BlendProblem['candidates'],
  gone: readonly string[],
): BlendProblem {
  if (gone.length === 0) return problem;
  const groups = problem.groups?.map((group) => ({
    ...group,
    members: group.members.filter((id) => !gone.includes(id)),
  }));
  return { ...problem, candidates, ...(groups ? { groups } : {}) };
}
