import 'server-only';
import { type IncomingMessage, Server, type ServerResponse } from 'node:http';
import { FIXED_HEADERS } from '@/lib/shared/fixed-headers';

const READ = ['GET', 'HEAD'];
/** Pages take POST for server actions. */
const PAGE = [...READ, 'POST'];
const API = [...READ, 'POST', 'PUT', 'PATCH', 'DELETE'];

/** The methods that a path could answer; which of them a route of the API has, Next knows. */
export function allowedMethods(url: string): string[] {
  const path = url.split('?')[0] ?? '';
  if (path.startsWith('/api/')) return API;
  const isFile = path.startsWith('/_next/') || /\.\w+$/.test(path);
  return isFile ? READ : PAGE;
}

/**
 * Answers 405 to every other method, before Next sees the request: it would answer TRACE with a 500, a changed file
 * likewise, and render a page for DELETE. Neither `proxy.ts` nor a route is asked early enough, and there is no
 * server of our own to ask, so the check goes in where Node hands out requests. The fixed headers go in at the same
 * place: Next's own redirects, of a slash at the end or two at the beginning, would leave without them.
 */
export function refuseMethods(): void {
  const emit = Server.prototype.emit as (event: string, ...args: unknown[]) => boolean;
  Server.prototype.emit = function (this: Server, event: string, ...args: unknown[]) {
    const [request, response] = args as [IncomingMessage, ServerResponse];
    if (event !== 'request') return emit.call(this, event, ...args);
    for (const [name, value] of Object.entries(FIXED_HEADERS)) response.setHeader(name, value);
    if (isAllowed(request)) return emit.call(this, event, ...args);
    const allow = allowedMethods(request.url ?? '').join(', ');
    response.writeHead(405, { Allow: allow, 'Cache-Control': 'no-store' }).end();
    return true;
  };
}

const isAllowed = ({ method = '', url = '' }: IncomingMessage) => allowedMethods(url).includes(method);
