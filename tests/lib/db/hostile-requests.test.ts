import { eq } from 'drizzle-orm';
import { beforeAll, expect, it, vi } from 'vitest';
import { materials, suppliers } from '@/db/schema';
import { SESSION_COOKIE } from '@/lib/auth/session';
import { newId } from '@/lib/id';
import { apiRoutes, type Route } from '../../support/api-routes';
import { type CanaryHouse, canaryHouse } from '../../support/canary-house';
import { db } from '../../support/database';

/* What a member with a tool in hand may send. Nothing of it may end in a 500, change a row or take long. */

const jar = vi.hoisted(() => ({ token: undefined as string | undefined }));
vi.mock('next/headers', () => ({
  cookies: async () => ({
    get: (name: string) => (name === SESSION_COOKIE && jar.token ? { value: jar.token } : undefined),
  }),
}));

let house: CanaryHouse;
let routes: Route[];
beforeAll(async () => {
  house = await canaryHouse('House of Moss');
  routes = await apiRoutes();
});

interface Sent {
  id?: string;
  search?: string;
  body?: BodyInit;
  headers?: Record<string, string>;
}

async function send({ method, path, handler }: Route, { id = '', search = '', body, headers = {} }: Sent) {
  jar.token = house.tokens.owner;
  const url = `https://stillroom.example${path.replace('[id]', encodeURIComponent(id))}${search}`;
  const own = { 'sec-fetch-site': 'same-origin', 'content-type': 'application/json', 'idempotency-key': newId() };
  const request = new Request(url, { method, body, headers: { ...own, ...headers }, duplex: 'half' } as RequestInit);
  const start = process.cpuUsage();
  const response = await handler(request, { params: Promise.resolve(id ? { id } : {}) });
  const text = await response.text();
  const { user, system } = process.cpuUsage(start);
  return { status: response.status, text, cpuMs: (user + system) / 1000 };
}

const route = (id: string) => routes.find(({ handler }) => handler.operation.id === id) as Route;
const createSupplier = (sent: Sent) => send(route('suppliers.create'), sent);

const deep = (depth: number, open: string, close: string) => open.repeat(depth) + close.repeat(depth);
const MEGABYTE = 1_000_000;
/** Of the processor, so that a busy machine changes nothing. */
const MOST_CPU_MS = 1500;
const BODIES: Record<string, BodyInit> = {
  nothing: '',
  'no JSON': '{"name":',
  null: 'null',
  'a number too large': '{"name":1e999}',
  'a list nested 400,000 deep': deep(400_000, '[', ']'),
  'objects nested 100,000 deep': `${'{"name":'.repeat(100_000)}1${'}'.repeat(100_000)}`,
  'a polluted prototype': '{"__proto__":{"polluted":true},"name":"Ana Stills"}',
  'a constructor': '{"constructor":{"prototype":{"polluted":true}},"name":"Ana Stills"}',
  'keys of the server': '{"name":"Ana Stills","teamId":"x","id":"x","createdBy":"x","role":"owner"}',
  '60,000 unknown keys': JSON.stringify(Object.fromEntries(Array.from({ length: 60_000 }, (_, i) => [`k${i}`, 1]))),
  'bytes that are no text': new Uint8Array([0x22, 0xff, 0xfe, 0x22]),
  'a megabyte and more': `{"name":"${'x'.repeat(MEGABYTE)}"}`,
};

it.each(Object.keys(BODIES))('refuses %s with a sentence, at once, on every route with a body', async (name) => {
  const before = [await db.select().from(suppliers), await db.select().from(materials)];
  for (const each of routes.filter(({ handler }) => handler.operation.body)) {
    const { status, text, cpuMs } = await send(each, { id: house.materials[0], body: BODIES[name] });
    expect(status, `${each.method} ${each.path}: ${text.slice(0, 300)}`).toBe(422);
    expect(JSON.parse(text).detail.length).toBeGreaterThan(10);
    expect(cpuMs).toBeLessThan(MOST_CPU_MS);
  }
  expect([await db.select().from(suppliers), await db.select().from(materials)]).toEqual(before);
  expect(({} as Record<string, unknown>).polluted).toBeUndefined();
});

it('names at most fifty faults, whatever a body holds', async () => {
  const target = { kind: 'material', materialId: house.materials[0] };
  const importance = Object.fromEntries(Array.from({ length: 20_000 }, (_, i) => [`facet-${i}`, 99]));
  const body = JSON.stringify({ request: { target, importance } });
  const { status, text } = await send(route('blends.preview'), { body });
  expect(status).toBe(422);
  expect(Object.keys(JSON.parse(text).errors)).toHaveLength(50);
});

it('stops reading a body that goes on after its megabyte, and one that lies about its length', async () => {
  let sent = 0;
  const endless = new ReadableStream<Uint8Array>({
    pull: (stream) => {
      sent += 65_536;
      stream.enqueue(new Uint8Array(65_536).fill(0x20));
    },
  });
  expect((await createSupplier({ body: endless })).status).toBe(422);
  expect(sent).toBeLessThan(2 * MEGABYTE);
  const lying = await createSupplier({ body: '{"name":"Ana Stills"}', headers: { 'content-length': '9999999' } });
  expect(lying.status).toBe(422);
});

it.each(['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data', 'application/jsonp', ''])(
  'takes no body that calls itself %j: a form of another site could send it',
  async (type) => {
    const { status } = await createSupplier({ body: '{"name":"Ana Stills"}', headers: { 'content-type': type } });
    expect(status).toBe(422);
  },
);

const IDS = ['é', '🜁'.repeat(13), "' or 1=1 -- ", '%', '_'.repeat(26), '\u0000', '..', '__proto__', 'x'.repeat(5000)];

it.each(IDS)('answers 404 for the id %j on every route with an id', async (id) => {
  for (const each of routes.filter(({ path, method }) => path.includes('[id]') && method !== 'POST')) {
    const bodies: Record<string, unknown> = {
      'qualities.offers': { revision: 1, offers: [] },
      'qualities.constituents': { revision: 1, completeness: 'unknown', compositionSource: 'x', constituents: [] },
    };
    const { id: operation, body } = each.handler.operation;
    if (body && !bodies[operation]) continue; // needs a whole material; its id goes the same way
    const { status, text } = await send(each, { id, body: body && JSON.stringify(bodies[operation]) });
    expect(status, `${each.method} ${each.path}: ${text}`).toBe(404);
  }
});

const SEARCHES = [
  `?q=${encodeURIComponent("%' or '1'='1")}`,
  `?q=${encodeURIComponent('\\')}`,
  `?q=${encodeURIComponent('%_%'.repeat(60))}`,
  `?q=${encodeURIComponent('a '.repeat(99))}`,
  '?sort=name;drop',
  '?sort=__proto__',
  '?order=asc,sleep(5)',
  '?cursor=x',
  `?cursor=${Buffer.from('["name","asc",{"a":1},"x"]').toString('base64url')}`,
  `?cursor=${Buffer.from('["name","asc","\' or 1=1 -- ","é"]').toString('base64url')}`,
  `?sort=updated&cursor=${Buffer.from('["updated","desc","no day","x"]').toString('base64url')}`,
  `?sort=price&cursor=${Buffer.from('["price","asc","1e999","x"]').toString('base64url')}`,
  '?limit=1e9',
  '?limit=-1',
  '?limit=NaN',
  '?pack=1e3',
  '?pack=0.00000000000001',
  '?minPrice=&maxPrice=5',
  '?natural=1e-9',
  `?facets=${'rosy:1,'.repeat(1000)}`,
  '?facets=rosy:1e999',
  '?__proto__=1',
  '?constructor=1',
  '?teamId=x',
  '?packGrams=1e3',
  '?after=éééééééééééééééééééééééééé',
  '?by=prices',
  '?min=-1&top=1e9',
  '?focus=é',
];

it.each(SEARCHES)('answers %s on every list without a failure of its own', async (search) => {
  for (const each of routes.filter(({ method, path }) => method === 'GET' && !path.includes('[id]'))) {
    const { status, text, cpuMs } = await send(each, { search });
    expect([200, 404, 422], `${each.path}: ${text.slice(0, 300)}`).toContain(status);
    expect(cpuMs).toBeLessThan(MOST_CPU_MS);
  }
});

it('takes the signs of a pattern as signs', async () => {
  const list = async (q: string) =>
    JSON.parse((await send(route('materials.list'), { search: `?q=${encodeURIComponent(q)}` })).text).total;
  expect(await list('rose')).toBe(1);
  for (const pattern of ['%', '_', 'r%e', 'r_se', '\\', "'"]) expect(await list(pattern), pattern).toBe(0);
});

it.each(['é', 'a'.repeat(129), ' ', '🜁'.repeat(20)])('survives the idempotency key %j', async (key) => {
  const headers = { 'idempotency-key': encodeLatin(key) };
  const { status, text } = await createSupplier({ body: JSON.stringify({ name: newId() }), headers });
  expect([201, 422], text).toContain(status);
});

/** Headers carry bytes, not letters. */
const encodeLatin = (text: string) => Buffer.from(text).toString('latin1');

it('keeps a key for one address: the same body for another material is another request', async () => {
  const body = JSON.stringify({
    ...{ supplierId: house.supplier, code: newId(), grade: 'usual', completeness: 'unknown', form: 'mobile liquid' },
  });
  const key = { 'idempotency-key': newId() };
  const first = await send(route('qualities.create'), { id: house.materials[0], body, headers: key });
  expect(first.status, first.text).toBe(201);
  const repeat = await send(route('qualities.create'), { id: house.materials[0], body, headers: key });
  expect(repeat.text).toBe(first.text);
  const other = await send(route('qualities.create'), { id: house.materials[1], body, headers: key });
  expect(other.status).toBe(422);
});

it('asks a repeat for its rights again: a role that was taken away answers nothing any more', async () => {
  const { membershipRoles } = await import('@/db/schema');
  const { makeMember } = await import('../../support/database');
  const { startSession } = await import('@/lib/auth/session');
  const buyer = await makeMember(house.team, 'buyer');
  const token = await startSession(buyer.userId, house.team.id);
  const sent = { body: JSON.stringify({ name: newId() }), headers: { 'idempotency-key': newId() } };
  const before = house.tokens.owner;
  house.tokens.owner = token;
  expect((await createSupplier(sent)).status).toBe(201);
  expect((await createSupplier(sent)).status).toBe(201);
  await db.delete(membershipRoles).where(eq(membershipRoles.userId, buyer.userId));
  expect((await createSupplier(sent)).status).toBe(401);
  await db.insert(membershipRoles).values({ teamId: house.team.id, userId: buyer.userId, role: 'student' });
  expect((await createSupplier(sent)).status).toBe(403);
  house.tokens.owner = before;
});

it('answers HEAD as it answers GET, without asking where it comes from', async () => {
  jar.token = house.tokens.owner;
  const request = new Request('https://stillroom.example/api/v1/facets', { method: 'HEAD' });
  expect((await route('facets.list').handler(request, { params: Promise.resolve({}) })).status).toBe(200);
});
