/** MariaDB's numbers for refusals that mean something to us. The driver misnames some, so the number is what counts. */
export const ERRNO = { duplicate: 1062, missingReference: 1452, stillReferenced: 1451, check: 4025 } as const;

/** MariaDB's error number, through whatever wraps it; undefined when the error is not the database's. */
export function errnoOf(error: unknown): number | undefined {
  for (let cause = error; cause instanceof Error; cause = cause.cause) {
    if ('errno' in cause && typeof cause.errno === 'number') return cause.errno;
  }
  return undefined;
}
