import type { Run } from '../contract';
import { EngineInputError } from '../errors';
import { checkObject, checkOptional, NOT_NEGATIVE } from './fields';

/** Throws an `EngineInputError` unless a run is limited by a number, and its clock and listener are functions. */
export function checkRun(run: Run | undefined): void {
  if (run === undefined) return;
  checkObject(run, 'run');
  checkOptional(run.timeLimitMs, 'run.timeLimitMs', { ...NOT_NEGATIVE, max: Number.POSITIVE_INFINITY });
  for (const name of ['now', 'onBetter'] as const) {
    if (run[name] === undefined || typeof run[name] === 'function') continue;
    throw new EngineInputError(`run.${name}`, `run.${name} must be a function.`);
  }
}
