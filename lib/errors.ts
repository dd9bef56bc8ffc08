import 'server-only';

/** The five kinds of refusal. lib/api/problem.ts is the one place that turns them into responses. */

/** Input at fault: a sentence for each field. */
export class Invalid extends Error {
  override readonly name = 'Invalid';
  constructor(readonly fields: Record<string, string>) {
    super(Object.values(fields).join(' '));
  }
}

/** No such row in this house; a row of another house answers the same. */
export class NotFound extends Error {
  override readonly name = 'NotFound';
}

/** Signed in, and the roles held do not allow it. */
export class Forbidden extends Error {
  override readonly name = 'Forbidden';
}

/** The row changed meanwhile: `current` is what stands now. */
export class Conflict extends Error {
  override readonly name = 'Conflict';
  constructor(
    sentence: string,
    readonly current?: unknown,
  ) {
    super(sentence);
  }
}

/** Too often; may be tried again after so many seconds. */
export class TooMany extends Error {
  override readonly name = 'TooMany';
  constructor(
    sentence: string,
    readonly retryAfterS: number,
  ) {
    super(sentence);
  }
}
