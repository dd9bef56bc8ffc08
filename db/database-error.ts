/** MariaDB's numbers for refusals that mean something to us. The driver misnames some, so the number is what counts. */
export const ERRNO = { duplicate: 1062, missingReference: 1452, stillReferenced: 1451, check: 4025 } as const;

/** MariaDB's error number, through whatever wraps it; undefined when the error is not the database's. */
export function errnoOf(error: unknown): number | undefined {
  for (let cause = error; cause instanceof Error; cause = cause.cause) {
    if ('errno' in cause && typeof cause.errno === 'number') return cause.errno;
  }
  return undefined;
}

/** What the driver says when the server is away or the line broke. */
const UNREACHABLE = new Set(['ECONNREFUSED', 'ECONNRESET', 'ETIMEDOUT', 'EPIPE', 'PROTOCOL_CONNECTION_LOST']);

/** Whether the database could not be reached, through whatever wraps the error. */
export function isUnreachable(error: unknown): boolean {
  for (let cause = error; cause instanceof Error; cause = cause.cause) {
    if ('code' in cause && typeof cause.code === 'string' && UNREACHABLE.has(cause.code)) return true;
  }
  return false;
}
