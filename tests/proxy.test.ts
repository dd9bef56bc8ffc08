import { NextRequest } from 'next/server';
import { expect, it } from 'vitest';
import nextConfig from '@/next.config';
import { config, proxy } from '@/proxy';

const answer = (path: string, headers: Record<string, string> = {}) =>
  proxy(new NextRequest(`http://localhost${path}`, { headers })).headers;
const policyOf = (headers: Headers) => headers.get('content-security-policy') ?? '';
/** Next hands the request's own headers on under these names. */
const handedOn = (headers: Headers, name: string) => headers.get(`x-middleware-request-${name}`);

it('makes a new nonce for every request and hands it on in both places', () => {
  const seen = Array.from({ length: 50 }, () => {
    const headers = answer('/materials');
    const nonce = handedOn(headers, 'x-nonce') ?? '';
    expect(Buffer.from(nonce, 'base64')).toHaveLength(16);
    expect(policyOf(headers)).toContain(`script-src 'nonce-${nonce}' 'strict-dynamic';`);
    expect(handedOn(headers, 'content-security-policy')).toBe(policyOf(headers));
    return nonce;
  });
  expect(new Set(seen).size).toBe(50);
});

it('takes no nonce and no policy from a stranger', () => {
  const headers = answer('/', { 'x-nonce': 'mine', 'content-security-policy': "script-src 'nonce-mine'" });
  expect(handedOn(headers, 'x-nonce')).not.toBe('mine');
  expect(policyOf(headers)).not.toContain('mine');
});

it('runs no inline script, no eval, no plugin, no foreign frame or form', () => {
  const policy = policyOf(answer('/'));
  const scripts = policy.split('; ').find((each) => each.startsWith('script-src')) ?? '';
  expect(scripts).not.toMatch(/unsafe-(inline|eval)|'self'|https?:/);
  for (const part of ["object-src 'none'", "base-uri 'none'", "frame-ancestors 'none'", "form-action 'self'"]) {
    expect(policy).toContain(part);
  }
});

it('lets an answer of the API do nothing when it is opened as a page', () => {
  expect(policyOf(answer('/api/v1/materials'))).toMatch(/^default-src 'none'/);
});

it('keeps no answer but the built files', () => {
  expect(answer('/materials').get('cache-control')).toContain('no-store');
  expect(answer('/api/v1/materials').get('cache-control')).toContain('no-store');
  const [matcher] = config.matcher;
  expect('/materials').toMatch(new RegExp(`^${matcher}$`));
  expect('/_next/static/chunks/a.js').not.toMatch(new RegExp(`^${matcher}$`));
});

it('puts the fixed headers on every path, with a year of HTTPS', async () => {
  const [everywhere] = (await nextConfig.headers?.()) ?? [];
  const headers = new Map(everywhere?.headers.map(({ key, value }) => [key, value]));
  expect(everywhere?.source).toBe('/:path*');
  expect(headers.get('X-Content-Type-Options')).toBe('nosniff');
  expect(Number(headers.get('Strict-Transport-Security')?.match(/max-age=(\d+)/)?.[1])).toBeGreaterThanOrEqual(
    31_536_000,
  );
  for (const name of [
    'Referrer-Policy',
    'Cross-Origin-Opener-Policy',
    'Cross-Origin-Resource-Policy',
    'Permissions-Policy',
  ])
    expect(headers.has(name)).toBe(true);
});

it('optimises no image, caches no component, says nothing of itself', () => {
  expect(nextConfig).toMatchObject({ images: { unoptimized: true }, poweredByHeader: false });
  expect(nextConfig.cacheComponents).toBeUndefined();
  expect(nextConfig.rewrites ?? nextConfig.redirects).toBeUndefined();
});

it.each(['/sign-in', '/materials', '/api/v1/materials', '/no-such-page'])(
  'turns a change of %s away that does not come from our own pages',
  (path) => {
    const asked = (headers: Record<string, string>) =>
      proxy(new NextRequest(`http://localhost${path}`, { method: 'POST', headers: { host: 'localhost', ...headers } }));
    for (const headers of [
      {},
      { 'sec-fetch-site': 'cross-site' },
      { origin: 'https://elsewhere.example' },
      { origin: 'https://elsewhere.example', 'x-forwarded-host': 'elsewhere.example' },
      { 'x-middleware-subrequest': 'proxy:proxy:proxy:proxy:proxy' },
    ]) {
      const refused = asked(headers as Record<string, string>);
      expect(refused.status, JSON.stringify(headers)).toBe(403);
      expect(refused.headers.get('content-security-policy')).toContain("default-src 'none'");
      expect(refused.headers.get('cache-control')).toContain('no-store');
    }
    expect(asked({ 'sec-fetch-site': 'same-origin' }).status).toBe(200);
    expect(asked({ origin: 'http://localhost' }).status).toBe(200);
  },
);
