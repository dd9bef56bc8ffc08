import type { BlendLine, EngineMaterial } from '../contract';
import { EngineInputError } from '../errors';
import {
  ANY,
  checkFractionOfSums,
  checkId,
  checkList,
  checkNumber,
  checkObject,
  checkOptional,
  checkUnique,
  checkVector,
  checkZeroOrSizeable,
  FRACTION,
  NOT_NEGATIVE,
} from './fields';

/** Throws an `EngineInputError` unless the material is one that the engine can reckon with, on `facets` facets. */
export function checkMaterial(material: EngineMaterial, path: string, facets?: number): void {
  checkObject(material, path);
  checkId(material.id, `${path}.id`);
  const size = checkVector(material.profile, `${path}.profile`, ANY, facets);
  if (material.profileSd !== undefined) checkVector(material.profileSd, `${path}.profileSd`, NOT_NEGATIVE, size);
  checkZeroOrSizeable(material.strength, `${path}.strength`);
  checkNumber(material.costPerKg, `${path}.costPerKg`, NOT_NEGATIVE);
  checkOptional(material.natural, `${path}.natural`, FRACTION);
  if (material.evaporation !== undefined) checkZeroOrSizeable(material.evaporation, `${path}.evaporation`);
  checkRange(material.minShare, material.maxShare, path, ['minShare', 'maxShare']);
  if (material.constituents !== undefined) checkConstituents(material.constituents, `${path}.constituents`);
}

/** Throws unless the lines are a blend: at least one, on the same facets, no share negative, not all of them 0. */
export function checkLines(lines: readonly BlendLine[], path: string): void {
  let facets: number | undefined;
  let total = 0;
  for (const [index, line] of checkList(lines, path).entries()) {
    checkObject(line, `${path}[${index}]`);
    checkMaterial(line.material, `${path}[${index}].material`, facets);
    total += checkNumber(line.share, `${path}[${index}].share`, NOT_NEGATIVE);
    facets = line.material.profile.length;
  }
  if (!(total > 0)) throw new EngineInputError(path, `${path} must hold a line with a share above 0.`);
}

/** Two optional fractions of the mass, the first not above the second. */
export function checkRange(min: unknown, max: unknown, path: string, names: [min: string, max: string]): void {
  checkOptional(min, `${path}.${names[0]}`, FRACTION);
  checkOptional(max, `${path}.${names[1]}`, FRACTION);
  if (typeof min === 'number' && typeof max === 'number' && min > max) {
    throw new EngineInputError(
      `${path}.${names[0]}`,
      `${path}.${names[0]} must not be above ${names[1]}; ${min} is above ${max}.`,
    );
  }
}

function checkConstituents(constituents: NonNullable<EngineMaterial['constituents']>, path: string): void {
  const list = checkList(constituents, path);
  for (const [index, constituent] of list.entries()) {
    checkObject(constituent, `${path}[${index}]`);
    checkId(constituent.id, `${path}[${index}].id`);
    checkFractionOfSums(constituent.max, `${path}[${index}].max`);
    if (constituent.typical !== undefined) checkFractionOfSums(constituent.typical, `${path}[${index}].typical`);
  }
  checkUnique(
    list.map((constituent) => constituent.id),
    path,
  );
}
