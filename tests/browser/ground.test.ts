import { request } from 'node:http';
import { expect, it } from 'vitest';
import { browserForFile, houseUrl } from '../support/browser';
import { makeMember, makeTeam } from '../support/database';

const { visit } = browserForFile();

const PAGES = ['/', '/sign-in', '/no-such-page', '/materials'];
const ROUTES = ['/api/v1/facets', '/api/v1/no-such-route', '/icon.svg'];
const get = (path: string, headers: Record<string, string> = {}) =>
  fetch(houseUrl() + path, { headers, redirect: 'manual' });

it.each(PAGES)('gives every script of %s the nonce of that answer', async (path) => {
  const response = await fetch(houseUrl() + path);
  const nonce = response.headers.get('content-security-policy')?.match(/'nonce-([^']+)'/)?.[1];
  const scripts = (await response.text()).match(/<script\b[^>]*>/g) ?? [];
  expect(scripts.length).toBeGreaterThan(0);
  expect(scripts.filter((tag) => !tag.includes(`nonce="${nonce}"`))).toEqual([]);
});

it.each([...PAGES, ...ROUTES])('puts the fixed headers on %s and lets nobody keep it', async (path) => {
  const { headers } = await get(path);
  expect(headers.get('x-content-type-options')).toBe('nosniff');
  expect(headers.get('strict-transport-security')).toMatch(/max-age=\d{8,}; includeSubDomains/);
  for (const name of [
    'referrer-policy',
    'cross-origin-opener-policy',
    'cross-origin-resource-policy',
    'permissions-policy',
  ])
    expect(headers.has(name), name).toBe(true);
  expect(headers.has('x-powered-by')).toBe(false);
  expect(headers.get('cache-control')).toContain('no-store');
});

it('lets a browser keep built files, under the fixed headers too', async () => {
  const html = await (await get('/sign-in')).text();
  const { headers, status } = await get(html.match(/\/_next\/static\/[^"]+\.js/)?.[0] ?? '');
  expect(status).toBe(200);
  expect(headers.get('cache-control')).toContain('immutable');
  expect(headers.get('x-content-type-options')).toBe('nosniff');
});

it.each(['TRACE', 'OPTIONS', 'DELETE'])('refuses %s on a page', async (method) => {
  const status = await new Promise((resolve, reject) => {
    request(`${houseUrl()}/sign-in`, { method }, (response) => resolve(response.resume().statusCode))
      .on('error', reject)
      .end();
  });
  expect(status).toBe(405);
});

it.each([
  ['x-middleware-subrequest', 'proxy:proxy:proxy:proxy:proxy'],
  ['x-middleware-subrequest', 'middleware:middleware:middleware:middleware:middleware'],
  ['x-nextjs-data', '1'],
  ['next-resume', '1'],
  ['x-forwarded-host', 'elsewhere.example'],
  ['x-nonce', 'mine'],
])('answers a stranger who sends %s as it answers without', async (name, value) => {
  for (const path of [...PAGES, ...ROUTES]) {
    const [plain, forged] = await Promise.all([get(path), get(path, { [name]: value })]);
    expect([path, forged.status, forged.headers.get('location')]).toEqual([
      path,
      plain.status,
      plain.headers.get('location'),
    ]);
    expect(forged.headers.get('content-security-policy')).not.toContain('mine');
  }
});

it('serves no image optimiser', async () => {
  expect((await get('/_next/image?url=%2Ficon.svg&w=64&q=75')).status).toBe(404);
});

it('wakes up under its own policy, in both themes', async () => {
  for (const colorScheme of ['light', 'dark'] as const) {
    const page = await visit({ path: '/', colorScheme });
    await page.waitForFunction(() => document.documentElement.hasAttribute('data-theme'));
    expect(await page.evaluate(() => document.documentElement.dataset.theme)).toBe(colorScheme);
  }
});

it('knows a person by the cookie that signing in sets', async () => {
  const page = await visit({ as: await makeMember(await makeTeam(), 'perfumer') });
  const answer = await page.goto('/api/v1/facets');
  expect(answer?.status()).toBe(200);
});
