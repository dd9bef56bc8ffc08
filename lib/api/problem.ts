import 'server-only';
import { randomUUID } from 'node:crypto';
import { isUnreachable } from '@/db/database-error';
import { DatabaseBusy } from '@/db/transaction';
import { EngineInputError } from '@/engine/errors';
import { Conflict, Forbidden, Invalid, NotFound, TooMany } from '@/lib/errors';
import { log } from '@/lib/log';

/** RFC 9457: `errors` holds a sentence for each field at fault, `current` what stands now. */
export interface Problem {
  status: number;
  title: string;
  detail: string;
  errors?: Record<string, string>;
  current?: unknown;
  requestId?: string;
}

/** When to try again after the database was busy or away, in seconds. */
const RETRY_S = 5;

/** The one place that turns a refusal into a response. Anything unforeseen is a 500 whose text stays in the log. */
export function problemResponse(error: unknown): Response {
  const problem = problemOf(error);
  const headers = new Headers({ 'content-type': 'application/problem+json', 'cache-control': 'no-store' });
  if (error instanceof TooMany) headers.set('retry-after', String(error.retryAfterS));
  if (problem.status === 503) headers.set('retry-after', String(RETRY_S));
  return new Response(JSON.stringify({ type: 'about:blank', ...problem }), { status: problem.status, headers });
}

/** What is told of an error, and of anything unforeseen only a reference. */
export function problemOf(error: unknown): Problem {
  if (error instanceof Invalid)
    return { status: 422, title: 'Something in it needs correcting', detail: error.message, errors: error.fields };
  if (error instanceof EngineInputError)
    return {
      status: 422,
      title: 'Something in it needs correcting',
      detail: error.message,
      errors: { [error.path]: error.message },
    };
  if (error instanceof NotFound)
    return { status: 404, title: 'Not found', detail: 'There is nothing here by that id.' };
  if (error instanceof Forbidden) return { status: 403, title: 'Not allowed', detail: error.message };
  if (error instanceof Conflict)
    return { status: 409, title: 'Changed meanwhile', detail: error.message, current: error.current };
  if (error instanceof TooMany) return { status: 429, title: 'Too often', detail: error.message };
  if (error instanceof DatabaseBusy || isUnreachable(error)) {
    log.warn({ event: 'database_unavailable', err: error });
    return {
      status: 503,
      title: 'Not now',
      detail: 'The house’s records can’t be written at this moment. Try again soon.',
    };
  }
  const requestId = randomUUID();
  log.error({ event: 'unexpected_error', requestId, err: error });
  return {
    status: 500,
    title: 'Something failed here',
    detail: `It is not your doing. Reference ${requestId}.`,
    requestId,
  };
}

/** A plain refusal at the door, before any code of a route runs. */
export function refusal(status: number, title: string, detail: string): Response {
  return new Response(JSON.stringify({ type: 'about:blank', status, title, detail }), {
    status,
    headers: { 'content-type': 'application/problem+json', 'cache-control': 'no-store' },
  });
}
