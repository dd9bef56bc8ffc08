import 'server-only';
import { cookies } from 'next/headers';
import type { z } from 'zod';
import { demand, type Member } from '@/lib/auth/member';
import { isSameOrigin } from '@/lib/auth/origin';
import { memberOfToken, SESSION_COOKIE } from '@/lib/auth/session';
import { Invalid } from '@/lib/errors';
import type { Permission } from '@/lib/shared/permissions';
import { eventAnswer, type Settled, wantsEvents } from './event-answer';
import { answerOnce } from './idempotency';
import { problemResponse, refusal } from './problem';

/** The largest JSON body taken, in bytes. */
const MAX_BODY_BYTES = 1_000_000;

/** Next answers HEAD with the handler of GET. */
const READS = new Set(['GET', 'HEAD']);
/** More faults than this help nobody, and one body could hold a hundred thousand. */
const MAX_FAULTS = 50;

/** What a route is, as data: the access test and the documents read it. */
export interface Operation {
  id: string;
  permission: Permission;
  params?: z.ZodType;
  query?: z.ZodType;
  body?: z.ZodType;
  result: z.ZodType;
  /** The status of success: 200 unless said. */
  status?: 200 | 201;
  /** A POST that creates: the client must send an Idempotency-Key, and a repeat gets the first answer. */
  once?: boolean;
  /** What is reported on the way, for a client that asks for events (Accept: text/event-stream). */
  progress?: z.ZodType;
}

/** How the work learns that nobody waits any more, and tells how far it is. */
export interface Work<O extends Operation> {
  signal: AbortSignal;
  report: (progress: O['progress'] extends z.ZodType ? z.input<O['progress']> : never) => void;
}

type Parsed<T> = T extends z.ZodType ? z.output<T> : undefined;
export interface Input<O extends Operation> {
  params: Parsed<O['params']>;
  query: Parsed<O['query']>;
  body: Parsed<O['body']>;
}

interface RouteContext {
  params: Promise<Record<string, string | string[] | undefined>>;
}
export type RouteHandler = ((request: Request, route: RouteContext) => Promise<Response>) & { operation: Operation };

/**
 * The one wrapper of all routes: own origin, signed in, permitted, parsed; then one function of lib; then its answer,
 * through the result's schema so that nothing leaves that the schema does not name.
 */
export function teamRoute<const O extends Operation>(
  operation: O,
  handler: (ctx: Member, input: Input<O>, work: Work<O>) => Promise<z.input<O['result']>>,
): RouteHandler {
  const route = async (request: Request, { params }: RouteContext): Promise<Response> => {
    try {
      if (!READS.has(request.method) && !isSameOrigin(request.headers))
        return refusal(403, 'Not from here', 'A change must come from Stillroom’s own pages.');
      const ctx = await memberOfRequest();
      if (!ctx) return refusal(401, 'Not signed in', 'Sign in to go on.');
      demand(ctx, operation.permission);
      const text = operation.body ? await bodyText(request) : '';
      const input = {
        params: parse(operation.params, await params),
        query: parse(operation.query, Object.fromEntries(new URL(request.url).searchParams)),
        body: parse(operation.body, operation.body ? json(text) : undefined),
      } as Input<O>;
      const key = request.headers.get('idempotency-key');
      const asked = `${new URL(request.url).pathname} ${text}`;
      const settle = async (report: (progress: unknown) => void): Promise<Settled> => {
        const work = async () => operation.result.parse(await handler(ctx, input, { signal: request.signal, report }));
        const status = operation.status ?? 200;
        if (!operation.once) return { status, answer: await work() };
        return answerOnce({ ctx, operation: operation.id, key, request: asked, status }, work);
      };
      const { progress } = operation;
      if (progress && wantsEvents(request.headers))
        return eventAnswer((report) => settle((reported) => report(progress.parse(reported))));
      const { status, answer } = await settle(() => undefined);
      return Response.json(answer, { status, headers: { 'cache-control': 'no-store' } });
    } catch (error) {
      return problemResponse(error);
    }
  };
  return Object.assign(route, { operation });
}

async function memberOfRequest(): Promise<Member | null> {
  const token = (await cookies()).get(SESSION_COOKIE)?.value;
  return token ? memberOfToken(token) : null;
}

async function bodyText(request: Request): Promise<string> {
  const type = request.headers.get('content-type') ?? '';
  if (!/^application\/json\s*(;|$)/i.test(type))
    throw new Invalid({ body: 'The body must be JSON (application/json).' });
  const bytes = await bodyBytes(request);
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    throw new Invalid({ body: 'The body is not text in UTF-8.' });
  }
}

/** Stops reading at the limit, so that nobody fills the memory by sending on. */
async function bodyBytes(request: Request): Promise<Uint8Array> {
  const tooLarge = new Invalid({ body: 'The body is larger than 1 MB.' });
  if (Number(request.headers.get('content-length') ?? 0) > MAX_BODY_BYTES) throw tooLarge;
  const parts: Uint8Array[] = [];
  let size = 0;
  for await (const part of request.body ?? []) {
    size += part.byteLength;
    if (size > MAX_BODY_BYTES) throw tooLarge;
    parts.push(part);
  }
  return Buffer.concat(parts);
}

function json(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (cause) {
    throw new Invalid({ body: `The body is not JSON: ${(cause as Error).message}.` });
  }
}

/** @throws Invalid with one sentence for each field at fault. */
function parse(schema: z.ZodType | undefined, value: unknown): unknown {
  if (!schema) return undefined;
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  const fields: Record<string, string> = Object.create(null); // a field may be called “constructor”
  for (const issue of result.error.issues.slice(0, MAX_FAULTS)) {
    const path = issue.path.map(String).join('.') || 'body';
    fields[path] ??= issue.message;
  }
  throw new Invalid(fields);
}
