import type { BlendProblem, ConstituentLimit } from '../contract';
import { EngineInputError } from '../errors';
import {
  ANY,
  checkId,
  checkKnown,
  checkList,
  checkNumber,
  checkObject,
  checkOptional,
  checkUnique,
  checkVector,
  checkWhole,
  FRACTION,
  NOT_NEGATIVE,
  QUOTIENT,
} from './fields';
import { checkMaterial, checkRange } from './material';

/**
 * Throws an `EngineInputError` that names the field unless the problem is well put: a caller's fault is told apart
 * here, once, from a problem that merely has no answer.
 */
export function checkProblem(problem: BlendProblem): void {
  checkObject(problem, 'problem');
  const facets = checkVector(problem.target, 'target', ANY);
  if (problem.weights !== undefined) {
    checkVector(problem.weights, 'weights', NOT_NEGATIVE, facets);
    needsPositive(Array.from(problem.weights), 'weights');
  }
  if (problem.stages !== undefined) checkStages(problem.stages, facets);
  checkCandidates(problem, facets);
  checkCeilings(problem);
  for (const [index, limit] of optionalList(problem.limits, 'limits').entries()) checkLimit(limit, `limits[${index}]`);
  checkUnique(idsOf(problem.limits), 'limits');
  checkNamedMaterials(problem, new Set(idsOf(problem.candidates)));
}

function checkStages(stages: NonNullable<BlendProblem['stages']>, facets: number): void {
  for (const [index, stage] of checkList(stages, 'stages').entries()) {
    checkObject(stage, `stages[${index}]`);
    checkNumber(stage.hours, `stages[${index}].hours`, NOT_NEGATIVE);
    checkNumber(stage.weight, `stages[${index}].weight`, NOT_NEGATIVE);
    checkVector(stage.target, `stages[${index}].target`, ANY, facets);
  }
  needsPositive(
    stages.map((stage) => stage.weight),
    'stages',
  );
}

function checkCandidates(problem: BlendProblem, facets: number): void {
  const candidates = checkList(problem.candidates, 'candidates');
  for (const [index, candidate] of candidates.entries()) {
    const path = `candidates[${index}]`;
    checkMaterial(candidate, path, facets);
    if (problem.stages && candidate.stageProfiles !== undefined) {
      checkStageProfiles(candidate.stageProfiles, `${path}.stageProfiles`, problem.stages.length, facets);
    }
  }
  checkUnique(idsOf(candidates), 'candidates');
  if (!candidates.some((candidate) => candidate.strength > 0)) {
    throw new EngineInputError('candidates', 'candidates must hold a material with a strength above 0.');
  }
}

function checkStageProfiles(profiles: ArrayLike<number>[], path: string, stages: number, facets: number): void {
  if (checkList(profiles, path).length !== stages) {
    throw new EngineInputError(path, `${path} must have ${stages} vectors, one per stage; it had ${profiles.length}.`);
  }
  for (const [stage, profile] of profiles.entries()) checkVector(profile, `${path}[${stage}]`, ANY, facets);
}

function checkCeilings(problem: BlendProblem): void {
  checkOptional(problem.budgetPerKg, 'budgetPerKg', NOT_NEGATIVE);
  checkOptional(problem.costPerImpact, 'costPerImpact', QUOTIENT);
  checkOptional(problem.minStrength, 'minStrength', NOT_NEGATIVE);
  checkOptional(problem.minNatural, 'minNatural', FRACTION);
  checkOptional(problem.minDose, 'minDose', FRACTION);
  if (problem.maxMaterials !== undefined) checkWhole(problem.maxMaterials, 'maxMaterials', { min: 1, max: 1e9 });
}

function checkLimit(limit: ConstituentLimit, path: string): void {
  checkObject(limit, path);
  checkId(limit.id, `${path}.id`);
  checkNumber(limit.max, `${path}.max`, NOT_NEGATIVE);
  for (const [index, term] of checkList(limit.terms, `${path}.terms`).entries()) {
    checkObject(term, `${path}.terms[${index}]`);
    checkId(term.constituentId, `${path}.terms[${index}].constituentId`);
    checkNumber(term.factor, `${path}.terms[${index}].factor`, NOT_NEGATIVE);
  }
}

function checkNamedMaterials(problem: BlendProblem, known: ReadonlySet<string>): void {
  for (const [index, group] of optionalList(problem.groups, 'groups').entries()) {
    const path = `groups[${index}]`;
    checkObject(group, path);
    checkId(group.id, `${path}.id`);
    checkRange(group.min, group.max, path, ['min', 'max']);
    const members = checkList(group.members, `${path}.members`);
    for (const [place, id] of members.entries()) checkKnown(id, known, `${path}.members[${place}]`);
    checkUnique(members, `${path}.members`);
  }
  for (const [index, line] of optionalList(problem.kept, 'kept').entries()) {
    checkObject(line, `kept[${index}]`);
    checkKnown(line.id, known, `kept[${index}].id`);
    checkNumber(line.share, `kept[${index}].share`, FRACTION);
  }
  const required = optionalList(problem.required, 'required');
  for (const [index, id] of required.entries()) checkKnown(id, known, `required[${index}]`);
  checkUnique(idsOf(problem.groups), 'groups');
  checkUnique(idsOf(problem.kept), 'kept');
  checkUnique(required, 'required');
}

function needsPositive(values: readonly number[], path: string): void {
  if (!values.some((value) => value > 0)) {
    throw new EngineInputError(path, `${path} must hold a weight above 0.`);
  }
}

function optionalList<T>(value: readonly T[] | undefined, path: string): readonly T[] {
  return value === undefined ? [] : checkList(value, path);
}

function idsOf(list: readonly { id: string }[] | undefined): string[] {
  return (list ?? []).map((item) => item.id);
}
