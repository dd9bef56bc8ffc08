import { EngineInputError } from '../errors';

/**
 * Checks of single fields, shared by every door of the engine. Each throws an `EngineInputError` whose path is the
 * field and whose message is one sentence: what the field must be, and what it was.
 */

/** Squares and products of four such numbers still fit into a double, so nothing inside overflows unseen. */
const LARGEST = 1e15;
const SMALLEST_SIZE = 1e-15;
/** A fraction that was summed from others may exceed 1 by its rounding. */
const FRACTION_ROUNDING = 1e-9;

export interface Span {
  min: number;
  max: number;
}

export const ANY: Span = { min: -LARGEST, max: LARGEST };
export const NOT_NEGATIVE: Span = { min: 0, max: LARGEST };
/** A price per impact: the quotient of two numbers that are themselves in range. */
export const QUOTIENT: Span = { min: 0, max: LARGEST * LARGEST };
export const FRACTION: Span = { min: 0, max: 1 };
const FRACTION_OF_SUMS: Span = { min: 0, max: 1 + FRACTION_ROUNDING };

export function checkNumber(value: unknown, path: string, span: Span): number {
  if (typeof value === 'number' && value >= span.min && value <= span.max) return value;
  throw new EngineInputError(path, `${path} must be a number from ${span.min} to ${span.max}; it was ${shown(value)}.`);
}

export function checkOptional(value: unknown, path: string, span: Span): void {
  if (value !== undefined) checkNumber(value, path, span);
}

export function checkFractionOfSums(value: unknown, path: string): void {
  checkNumber(value, path, FRACTION_OF_SUMS);
}

export function checkWhole(value: unknown, path: string, span: Span): number {
  if (Number.isInteger(value)) return checkNumber(value, path, span);
  throw new EngineInputError(path, `${path} must be a whole number; it was ${shown(value)}.`);
}

/** Strengths and rates are divided by: none is so small that the quotient would overflow. */
export function checkZeroOrSizeable(value: unknown, path: string): void {
  const size = checkNumber(value, path, NOT_NEGATIVE);
  if (size === 0 || size >= SMALLEST_SIZE) return;
  throw new EngineInputError(path, `${path} must be 0 or at least ${SMALLEST_SIZE}; it was ${size}.`);
}

export function checkId(value: unknown, path: string): string {
  if (typeof value === 'string' && value !== '') return value;
  throw new EngineInputError(path, `${path} must be a non-empty text; it was ${shown(value)}.`);
}

/** Throws at the first id that comes a second time. */
export function checkUnique(ids: readonly string[], path: string): void {
  const seen = new Set<string>();
  for (const [index, id] of ids.entries()) {
    if (seen.has(id)) throw new EngineInputError(`${path}[${index}]`, `${path} names ${shown(id)} twice.`);
    seen.add(id);
  }
}

export function checkKnown(id: unknown, known: ReadonlySet<string>, path: string): void {
  if (!known.has(checkId(id, path))) throw new EngineInputError(path, `${path} names ${shown(id)}, which is unknown.`);
}

export function checkList<T>(value: readonly T[] | undefined, path: string): readonly T[] {
  if (Array.isArray(value)) return value;
  throw new EngineInputError(path, `${path} must be a list; it was ${shown(value)}.`);
}

export function checkObject(value: unknown, path: string): void {
  if (typeof value === 'object' && value !== null) return;
  throw new EngineInputError(path, `${path} must be an object; it was ${shown(value)}.`);
}

/** A vector of numbers of a known length; `length` undefined accepts any length from 1. */
export function checkVector(value: unknown, path: string, span: Span, length?: number): number {
  checkObject(value, path);
  const vector = value as ArrayLike<unknown>;
  const size = checkWhole(vector.length, `${path}.length`, { min: 1, max: 0xffff_ffff });
  if (length !== undefined && size !== length) {
    throw new EngineInputError(path, `${path} must have ${length} numbers, one per facet; it had ${size}.`);
  }
  const fault = firstOutside(vector, size, span);
  if (fault < size) checkNumber(vector[fault], `${path}[${fault}]`, span);
  return size;
}

/** The first place that holds no number of the span. A library holds a million numbers: paths are written for faults only. */
function firstOutside(vector: ArrayLike<unknown>, size: number, { min, max }: Span): number {
  for (let index = 0; index < size; index++) {
    const value = vector[index];
    if (!(typeof value === 'number' && value >= min && value <= max)) return index;
  }
  return size;
}

function shown(value: unknown): string {
  if (typeof value === 'string') return `"${value.slice(0, 60)}"`;
  if (typeof value === 'number' || value === undefined || value === null) return String(value);
  return Array.isArray(value) ? 'a list' : `a ${typeof value}`;
}
