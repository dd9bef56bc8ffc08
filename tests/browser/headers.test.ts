import { request as httpRequest, type IncomingHttpHeaders } from 'node:http';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { closePool } from '@/db/connection';
import { SESSION_COOKIE, startSession } from '@/lib/auth/session';
import { apiRoutes, type Route } from '../support/api-routes';
import { houseUrl } from '../support/browser';
import { canaryHouse, PRICE_CANARIES, SUPPLIER_CANARIES } from '../support/canary-house';
import { makeMember, makeTeam } from '../support/database';

/* What the served app says around its answers: to everybody, signed in or not, on pages and in every kind of failure. */

interface Answer {
  status: number;
  headers: IncomingHttpHeaders;
  text: string;
}

/** By Node itself: `fetch` would tidy the path and refuse TRACE and forged hosts. */
function ask(
  path: string,
  { method = 'GET', headers = {} }: { method?: string; headers?: Record<string, string> } = {},
) {
  const { hostname, port } = new URL(houseUrl());
  return new Promise<Answer>((resolve, reject) => {
    httpRequest({ hostname, port, path, method, headers }, (response) => {
      const parts: Buffer[] = [];
      response.on('data', (part: Buffer) => parts.push(part));
      response.on('end', () =>
        resolve({ status: response.statusCode ?? 0, headers: response.headers, text: Buffer.concat(parts).toString() }),
      );
    })
      .on('error', reject)
      .end();
  });
}

const cookies: Record<string, string> = {};
let routes: Route[];

beforeAll(async () => {
  routes = await apiRoutes();
  const house = await canaryHouse('House of Headers');
  for (const [role, token] of Object.entries(house.tokens)) cookies[role] = `${SESSION_COOKIE}=${token}`;
  const nobody = await makeMember(await makeTeam());
  cookies.roleless = `${SESSION_COOKIE}=${await startSession(nobody.userId, nobody.teamId)}`;
  cookies.stale = `${SESSION_COOKIE}=${'x'.repeat(43)}`;
  cookies.nobody = '';
});
afterAll(() => closePool());

const PAGES = ['/', '/sign-in', '/sign-up', '/materials', '/map', '/materials?sort=price', '/materials?limit=x'];
const FAILURES = ['/no-such-page', '/materials/no-such-material', '/sign-in/deeper', '/_next/no-such', '/%E0%A4%A'];
const OTHERS = ['/api/v1/facets', '/api/v1/no-such-route', '/icon.svg', '/no-such.svg', '//elsewhere.example', '/map/'];
const CALLERS = ['nobody', 'stale', 'roleless', 'student', 'owner'];
const RSC = { rsc: '1' };

describe.each(CALLERS)('to %s', (caller) => {
  const as = (headers: Record<string, string> = {}) => ({ headers: { ...headers, cookie: cookies[caller] ?? '' } });

  it.each([...PAGES, ...FAILURES, ...OTHERS])('says the fixed headers on %s, and lets nobody keep it', async (path) => {
    for (const headers of [{}, RSC]) {
      const answer = await ask(path, as(headers));
      expect(answer.status).toBeLessThan(500);
      expectFixedHeaders(answer);
      if (answer.status < 300 || answer.status >= 400) expect(answer.headers['cache-control']).toContain('no-store');
      expect(answer.text).not.toMatch(/\bat .+\.(ts|tsx|js):\d+:\d+|node_modules|Failed query|errno/);
    }
  });

  it.each([...PAGES, ...FAILURES])('gives every script of %s the nonce of that answer', async (path) => {
    const { headers, text, status } = await ask(path, as());
    if (!String(headers['content-type']).startsWith('text/html')) return expect(status).not.toBe(200);
    const policy = String(headers['content-security-policy']);
    const nonce = policy.match(/'nonce-([^']+)'/)?.[1] ?? 'none';
    const scripts = text.match(/<script\b[^>]*>/g) ?? [];
    if (policy.startsWith("default-src 'none'")) return;
    expect(scripts.filter((tag) => !tag.includes(`nonce="${nonce}"`))).toEqual([]);
    expect(policy).toMatch(/script-src 'nonce-[^']+' 'strict-dynamic';/);
  });
});

function expectFixedHeaders({ headers }: Answer) {
  expect(headers['x-content-type-options']).toBe('nosniff');
  expect(headers['strict-transport-security']).toMatch(/max-age=\d{8,}; includeSubDomains/);
  for (const name of [
    'referrer-policy',
    'cross-origin-opener-policy',
    'cross-origin-resource-policy',
    'permissions-policy',
    'x-frame-options',
  ])
    expect(headers, name).toHaveProperty(name);
  expect(headers).not.toHaveProperty('x-powered-by');
}

it('answers 405 to every method that a route does not have', async () => {
  const has = new Set(routes.map(({ method, path }) => `${method} ${path}`));
  for (const path of new Set(routes.map((route) => route.path))) {
    for (const method of ['POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS', 'TRACE'].filter(
      (m) => !has.has(`${m} ${path}`),
    )) {
      const headers = { cookie: cookies.owner ?? '', 'sec-fetch-site': 'same-origin' };
      const answer = await ask(path.replace('[id]', 'x'), { method, headers });
      expect(answer.status, `${method} ${path}`).toBe(405);
      expectFixedHeaders(answer);
    }
  }
});

it('turns away every change that comes from elsewhere, before it looks at it', async () => {
  const places = [...PAGES, ...routes.filter(({ method }) => method !== 'GET').map(({ path }) => path)];
  for (const path of places) {
    for (const headers of [
      {},
      { 'sec-fetch-site': 'cross-site' },
      { origin: 'https://elsewhere.example' },
      { origin: 'https://elsewhere.example', 'x-forwarded-host': 'elsewhere.example' },
      { 'next-action': '0'.repeat(42), 'content-type': 'text/plain;charset=UTF-8' },
    ] as Record<string, string>[]) {
      const method = routes.find((route) => route.path === path && route.method !== 'GET')?.method ?? 'POST';
      const answer = await ask(path.replace('[id]', 'x'), {
        method,
        headers: { ...headers, cookie: cookies.owner ?? '' },
      });
      expect(answer.status, `${method} ${path} ${JSON.stringify(headers)}`).toBe(403);
      expectFixedHeaders(answer);
    }
  }
});

const FORGED: Record<string, string>[] = [
  { 'x-middleware-subrequest': 'proxy:proxy:proxy:proxy:proxy' },
  { 'x-middleware-subrequest': 'middleware:middleware:middleware:middleware:middleware' },
  { 'x-middleware-rewrite': '/materials' },
  { 'x-middleware-next': '1' },
  { 'next-resume': '1' },
  { 'x-nextjs-data': '1' },
  { 'x-invoke-path': '/materials' },
  { 'x-matched-path': '/materials' },
  { 'x-original-url': '/materials' },
  { 'x-http-method-override': 'DELETE' },
  { 'x-forwarded-host': 'elsewhere.example', 'x-forwarded-proto': 'gopher', 'x-forwarded-for': '127.0.0.1' },
  { forwarded: 'host=elsewhere.example' },
  { 'x-nonce': 'mine', 'content-security-policy': "script-src 'nonce-mine'" },
];

it.each(FORGED)('answers a stranger with %j as it answers without', async (headers) => {
  for (const path of ['/', '/materials', '/map', '/api/v1/facets', '/api/v1/materials']) {
    const [plain, forged] = [await ask(path), await ask(path, { headers })];
    const told = ({ status, headers: { location } }: Answer) => [path, status, location];
    expect(told(forged)).toEqual(told(plain));
    expect(forged.text).not.toContain('elsewhere.example');
    expect(forged.headers['content-security-policy']).not.toContain('mine');
  }
});

const ELSEWHERE = [
  ...['//elsewhere.example', '//elsewhere.example/', '/\\elsewhere.example/', '/%2f%2felsewhere.example/'],
  ...['/%5celsewhere.example/', '/https://elsewhere.example/', '///elsewhere.example/..', '/%09/elsewhere.example/'],
  ...['/sign-in?next=//elsewhere.example', '/sign-in/?next=//elsewhere.example', '/materials/?to=//elsewhere.example'],
];

it.each(ELSEWHERE)('sends nobody away from here by %s', async (path) => {
  for (const caller of ['nobody', 'owner']) {
    for (const host of [undefined, 'elsewhere.example']) {
      const headers = { cookie: cookies[caller] ?? '', ...(host && { host }) };
      const { location } = (await ask(path, { headers })).headers;
      if (location) expect(new URL(location, 'https://here.example').origin).toBe('https://here.example');
    }
  }
});

it('shows no price and no supplier on a page, in HTML or in its data, to a role that may not know it', async () => {
  const seen = { prices: 0, suppliers: 0 };
  const { api, pages } = {
    api: ['/api/v1/materials', '/api/v1/related', '/api/v1/suppliers', '/api/v1/candidates', '/api/v1/blends'],
    pages: [
      '/materials',
      '/materials?sort=price',
      '/materials?sort=equal&maxPrice=9000',
      '/map',
      '/map?by=constituents',
    ],
  };
  for (const role of ['owner', 'evaluator', 'safety', 'student']) {
    for (const path of [...pages, ...api]) {
      for (const headers of [{}, RSC]) {
        const { text } = await ask(path, { headers: { ...headers, cookie: cookies[role] ?? '' } });
        const prices = PRICE_CANARIES.filter((canary) => text.includes(canary)).length;
        const suppliers = SUPPLIER_CANARIES.filter((canary) => text.toLowerCase().includes(canary)).length;
        if (role === 'owner') {
          seen.prices += prices;
          seen.suppliers += suppliers;
        } else {
          expect(prices, `a price to ${role} at ${path}`).toBe(0);
          if (role !== 'safety') expect(suppliers, `a supplier to ${role} at ${path}`).toBe(0);
        }
      }
    }
  }
  expect(Math.min(seen.prices, seen.suppliers)).toBeGreaterThan(0); // the owner sees them, or this test could not fail
});
