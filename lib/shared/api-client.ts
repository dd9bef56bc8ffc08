import { eventsOf } from './event-stream';

/** What the API answers when it refuses (RFC 9457): a sentence, and one for each field at fault. */
export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';
  constructor(
    readonly status: number,
    sentence: string,
    readonly fields: Readonly<Record<string, string>> = {},
    /** On a conflict: what stands now. */
    readonly current?: unknown,
    readonly reference?: string,
  ) {
    super(sentence);
  }
}

const UNREACHED = 'The server was not reached. What you entered is still here; try again when the connection is back.';

/** Asks our own API. @throws ApiProblem, also when the network fails (status 0). */
export async function callApi<T>(path: string, init: RequestInit = {}): Promise<T> {
  let response: Response;
  try {
    response = await fetch(path, { ...init, headers: { accept: 'application/json', ...init.headers } });
  } catch (cause) {
    if (init.signal?.aborted) throw cause;
    throw new ApiProblem(0, UNREACHED);
  }
  const body: unknown = await response.json().catch(() => null);
  if (response.ok) return body as T;
  throw problemOf(response.status, body);
}

function problemOf(status: number, body: unknown): ApiProblem {
  const problem = (body ?? {}) as Record<string, unknown>;
  return new ApiProblem(
    status,
    typeof problem.detail === 'string' ? problem.detail : 'The server gave no reason.',
    (problem.errors as Record<string, string> | undefined) ?? {},
    problem.current,
    problem.requestId as string | undefined,
  );
}

/** Sends JSON. `key` makes a repeat of the same request safe: the server answers it as the first time. */
export function sendApi<T>(method: 'POST' | 'PUT' | 'DELETE', path: string, body?: unknown, key?: string): Promise<T> {
  return callApi<T>(path, {
    method,
    headers: { 'content-type': 'application/json', ...(key && { 'idempotency-key': key }) },
    ...(body !== undefined && { body: JSON.stringify(body) }),
  });
}

interface Watched {
  key?: string;
  signal: AbortSignal;
  onProgress: (progress: unknown) => void;
}

/**
 * Sends JSON for work that may take long: the server reports on the way and ends with its answer. Giving up through
 * `signal` ends the work on the server too.
 *
 * @throws ApiProblem, also when the line breaks before the answer; what `signal` throws when it was given up.
 */
export async function watchApi<T>(path: string, body: unknown, { key, signal, onProgress }: Watched): Promise<T> {
  let response: Response;
  try {
    response = await fetch(path, {
      method: 'POST',
      signal,
      headers: {
        accept: 'text/event-stream',
        'content-type': 'application/json',
        ...(key && { 'idempotency-key': key }),
      },
      body: JSON.stringify(body),
    });
    if (response.ok && response.body) {
      for await (const { name, data } of eventsOf(response.body)) {
        if (name === 'progress') onProgress(data);
        if (name === 'done') return (data as { body: T }).body;
        if (name === 'failed') throw problemOf((data as { status: number }).status, data);
      }
      throw new ApiProblem(0, UNREACHED);
    }
  } catch (cause) {
    if (signal.aborted || cause instanceof ApiProblem) throw cause;
    throw new ApiProblem(0, UNREACHED);
  }
  throw problemOf(response.status, await response.json().catch(() => null));
}
