import type { BlendProblem, BlendSolution } from '../contract';
import { EngineInputError } from '../errors';
import { checkId, checkKnown, checkList, checkNumber, checkObject, checkUnique } from '../input/fields';
import type { ClaimedMultiplier } from './multipliers';

const FINITE = { min: -Number.MAX_VALUE, max: Number.MAX_VALUE };
const STATUSES: readonly string[] = ['optimal', 'stopped', 'infeasible'];
const SIDES: readonly unknown[] = [undefined, 'min', 'max'];

/** What an answer says of its blend in numbers; null where it has none. */
const NUMBERS = ['distance', 'expectedDistance', 'angle', 'costPerKg', 'costPerImpact', 'strength', 'natural'] as const;
const PROOF_NUMBERS = ['objective', 'bound'] as const;

/** Throws an `EngineInputError` unless the answer has the shape of one to this problem. */
export function checkSolution(problem: BlendProblem, solution: BlendSolution): void {
  checkObject(solution, 'solution');
  if (!STATUSES.includes(solution.status)) {
    throw new EngineInputError('solution.status', `solution.status must be one of ${STATUSES.join(', ')}.`);
  }
  const known = new Set(problem.candidates.map((candidate) => candidate.id));
  const lines = checkList(solution.lines, 'solution.lines');
  for (const [index, line] of lines.entries()) {
    checkObject(line, `solution.lines[${index}]`);
    checkKnown(line.id, known, `solution.lines[${index}].id`);
    checkNumber(line.share, `solution.lines[${index}].share`, { min: -1e15, max: 1e15 });
  }
  checkUnique(
    lines.map((line) => line.id),
    'solution.lines',
  );
  for (const name of [...NUMBERS, ...PROOF_NUMBERS]) {
    const value: unknown = solution[name];
    if (typeof value === 'number' || value === null) continue;
    throw new EngineInputError(`solution.${name}`, `solution.${name} must be a number, or null without a blend.`);
  }
  checkMultipliers(solution.prices, 'solution.prices');
  if (solution.farkas !== undefined) checkMultipliers(solution.farkas, 'solution.farkas');
}

function checkMultipliers(claims: readonly ClaimedMultiplier[], path: string): void {
  for (const [index, claim] of checkList(claims, path).entries()) {
    checkObject(claim, `${path}[${index}]`);
    checkId(claim.rule, `${path}[${index}].rule`);
    checkNumber(claim.multiplier, `${path}[${index}].multiplier`, FINITE);
    if (!SIDES.includes(claim.side)) {
      throw new EngineInputError(`${path}[${index}].side`, `${path}[${index}].side must be "min" or "max".`);
    }
  }
}
