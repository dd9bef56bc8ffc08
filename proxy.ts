import { type NextRequest, NextResponse } from 'next/server';
import { isSameOrigin } from '@/lib/auth/origin';
import { FIXED_HEADERS } from '@/lib/shared/fixed-headers';

/**
 * Runs before every page and route. It is a courtesy to the browser and no lock: who may do what is checked beside
 * the data, and everything stays closed when this file is emptied.
 *
 * It makes a nonce for each request. Next puts it on its own scripts, finding it in the policy that it is handed here;
 * `app/layout.tsx` reads it from `x-nonce` for the script of the theme. A page that was rendered at build time has no
 * nonce and would stay dead, so the root layout reads a header, which makes every page be rendered on request.
 */
export function proxy(request: NextRequest): NextResponse {
  const isApi = request.nextUrl.pathname.startsWith('/api/');
  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString('base64');
  const policy = isApi ? API_POLICY : pagePolicy(nonce);
  if (!READS.has(request.method) && !isSameOrigin(request.headers)) return notFromHere();
  const headers = new Headers(request.headers);
  headers.set('x-nonce', nonce); // whatever a stranger sent under these two names is gone
  headers.set('content-security-policy', policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('Content-Security-Policy', policy);
  response.headers.set('Cache-Control', NOT_KEPT);
  return response;
}

/** A change that comes from elsewhere is turned away before any action is decoded; routes and actions ask once more. */
function notFromHere(): NextResponse {
  const problem = { type: 'about:blank', status: 403, title: 'Not from here' };
  return new NextResponse(JSON.stringify({ ...problem, detail: 'A change must come from Stillroom’s own pages.' }), {
    status: 403,
    headers: {
      'content-type': 'application/problem+json',
      'content-security-policy': API_POLICY,
      'cache-control': NOT_KEPT,
      ...FIXED_HEADERS,
    },
  });
}

/** Built files hold nothing of a house, and may be kept by the browser. */
export const config = { matcher: ['/((?!_next/static/).*)'] };

const READS = new Set(['GET', 'HEAD']);
const NOT_KEPT = 'private, no-store';
/** An answer of the API is data: opened as a page, it may do nothing. */
const API_POLICY = "default-src 'none'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'";

/**
 * Scripts run only with this request's nonce, or when such a script loads them. Styles are looser: charts set `style`
 * attributes, and the graph of the map writes a `<style>` element without a nonce.
 */
function pagePolicy(nonce: string): string {
  // React tells where an error came from by `eval`, in development only; the reload of changed files uses a socket.
  const isDevelopment = process.env.NODE_ENV === 'development';
  return [
    "default-src 'self'",
    `script-src 'nonce-${nonce}' 'strict-dynamic'${isDevelopment ? " 'unsafe-eval'" : ''}`,
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    `connect-src 'self'${isDevelopment ? ' ws:' : ''}`,
    "worker-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
}
