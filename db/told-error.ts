import { inspect } from 'node:util';
import { DrizzleQueryError } from 'drizzle-orm';

export interface ToldError {
  type: string;
  message: string;
  code?: string;
  errno?: number;
  /** Places in the code, without the message on top. */
  stack: string[];
  cause?: ToldError;
}

/**
 * An error as a log may hold it: where it happened and which statement failed, never the values of the statement. A
 * failed query of Drizzle's carries them in its message (addresses, hashes, prices, a formula), the driver's own error
 * in its message and in `sql`.
 */
export function toldError(error: unknown): ToldError {
  if (!(error instanceof Error)) return { type: typeof error, message: 'Not an error was thrown.', stack: [] };
  const { code, errno } = error as { code?: unknown; errno?: unknown };
  return {
    type: error.name === 'Error' ? error.constructor.name : error.name,
    message: messageOf(error),
    ...(typeof code === 'string' && { code }),
    ...(typeof errno === 'number' && { errno }),
    stack: (error.stack ?? '').split('\n').flatMap((line) => (/^\s+at /.test(line) ? [line.trim()] : [])),
    ...(error.cause !== undefined && { cause: toldError(error.cause) }),
  };
}

function messageOf(error: Error): string {
  if (error instanceof DrizzleQueryError) return `Failed query: ${error.query}`;
  return 'sqlState' in error ? 'Refused by the database.' : error.message;
}

/** Next prints what a page or an action throws by itself: then too without the values. */
export function hideValuesOfFailedQueries(): void {
  Object.defineProperty(DrizzleQueryError.prototype, inspect.custom, {
    configurable: true,
    value(this: DrizzleQueryError) {
      return inspect(toldError(this), { depth: 6 });
    },
  });
}
