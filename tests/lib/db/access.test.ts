import { beforeAll, describe, expect, it, vi } from 'vitest';
import { SESSION_COOKIE } from '@/lib/auth/session';
import { newId } from '@/lib/id';
import { may, ROLES } from '@/lib/shared/permissions';
import { apiRoutes, type Route } from '../../support/api-routes';
import { type CanaryHouse, canaryHouse, PRICE_CANARIES, SUPPLIER_CANARIES } from '../../support/canary-house';
import { ACCESS, type Access, type Asked } from '../access-matrix';

const jar = vi.hoisted(() => ({ token: undefined as string | undefined }));
vi.mock('next/headers', () => ({
  cookies: async () => ({
    get: (name: string) => (name === SESSION_COOKIE && jar.token ? { value: jar.token } : undefined),
  }),
}));

const OWN_ORIGIN = { 'sec-fetch-site': 'same-origin' };
let own: CanaryHouse;
let other: CanaryHouse;
let routes: Route[];

beforeAll(async () => {
  routes = await apiRoutes();
});

/** Two houses of its own for each line: what one call changes can't spoil the next line. */
async function openHouses() {
  own = await canaryHouse('House of Moss');
  other = await canaryHouse('House of Salt');
}

interface Sent {
  token?: string;
  headers?: Record<string, string>;
}

async function send(line: Access, asked: Asked, { token, headers = OWN_ORIGIN }: Sent) {
  jar.token = token;
  const handler = routes.find(({ method, path }) => method === line.method && path === line.path)?.handler;
  if (!handler) throw new Error(`There is no ${line.method} ${line.path}.`);
  const path = line.path.replace(/\[(\w+)\]/g, (_, name) => asked.params?.[name] ?? '');
  const url = new URL(`https://stillroom.example${path}`);
  for (const [name, value] of Object.entries(asked.query ?? {})) url.searchParams.set(name, value);
  const body = asked.body === undefined ? undefined : JSON.stringify(asked.body);
  const all = { 'content-type': 'application/json', 'idempotency-key': newId(), ...headers };
  const request = new Request(url, { method: line.method, headers: all, body });
  const response = await handler(request, { params: Promise.resolve(asked.params ?? {}) });
  return { status: response.status, text: await response.text() };
}

describe.each(ACCESS)('$method $path', (line) => {
  beforeAll(openHouses);

  const success = () => routes.find(({ handler }) => handler.operation.id === line.operation)?.handler.operation.status;
  const permitted = () => own.tokens[line.roles[0] ?? 'owner'];

  it.each(ROLES)('answers %s as its line says', async (role) => {
    const { status, text } = await send(line, await line.ask(own), { token: own.tokens[role] });
    const expected = line.roles.includes(role) ? (success() ?? 200) : 403;
    expect(status, text).toBe(expected);
  });

  it('asks nobody’s visitor to sign in, and a stale cookie too', async () => {
    const asked = await line.ask(own);
    expect((await send(line, asked, {})).status).toBe(401);
    expect((await send(line, asked, { token: 'x'.repeat(43) })).status).toBe(401);
  });

  it('tells prices and suppliers only to roles that may know them', async () => {
    for (const role of ROLES) {
      const { text } = await send(line, await line.ask(own), { token: own.tokens[role] });
      if (!may([role], 'price.read')) expect(found(text, PRICE_CANARIES), `${role}: ${text}`).toEqual([]);
      if (!may([role], 'supplier.read')) expect(found(text, SUPPLIER_CANARIES), `${role}: ${text}`).toEqual([]);
    }
  });

  it('answers an id of another house as one that never was', async () => {
    const foreign = await line.ask(other);
    for (const path of line.ids ?? []) {
      const unknownId = newId();
      const theirs = await send(line, swap(await line.ask(own), path, at(foreign, path)), { token: permitted() });
      const nobodys = await send(line, swap(await line.ask(own), path, unknownId), { token: permitted() });
      expect(theirs.status, theirs.text).toBeGreaterThanOrEqual(400);
      if (path.startsWith('params.')) expect(theirs.status).toBe(404);
      expect(theirs.text.replaceAll(at(foreign, path), '·')).toBe(nobodys.text.replaceAll(unknownId, '·'));
      expect(theirs.status).toBe(nobodys.status);
    }
  });

  it('holds no id of another house', async () => {
    const { text } = await send(line, await line.ask(own), { token: permitted() });
    expect(found(text, [other.team.id, other.supplier, ...other.materials, ...other.qualities])).toEqual([]);
  });
});

const FOREIGN_ORIGINS: Record<string, string>[] = [
  {},
  { 'sec-fetch-site': 'cross-site' },
  { 'sec-fetch-site': 'same-site' },
  { origin: 'https://elsewhere.example' },
];

describe('over all lines', () => {
  beforeAll(openHouses);

  it('searches for what somebody may know: the price and the supplier do reach those who may have them', async () => {
    const seen = { owner: '', safety: '' };
    for (const line of ACCESS.filter(({ method }) => method === 'GET')) {
      for (const role of ['owner', 'safety'] as const) {
        seen[role] += (await send(line, await line.ask(own), { token: own.tokens[role] })).text;
      }
    }
    expect(found(seen.owner, PRICE_CANARIES)).toContain(PRICE_CANARIES[0]);
    expect(found(seen.owner, SUPPLIER_CANARIES)).toEqual(SUPPLIER_CANARIES);
    expect(found(seen.safety, SUPPLIER_CANARIES)).toEqual(SUPPLIER_CANARIES);
  });

  it('refuses every change that doesn’t come from our own pages', async () => {
    for (const line of ACCESS.filter(({ method }) => method !== 'GET')) {
      for (const headers of FOREIGN_ORIGINS) {
        const token = own.tokens[line.roles[0] ?? 'owner'];
        const { status } = await send(line, await line.ask(own), { token, headers });
        expect(status, `${line.method} ${line.path} from ${JSON.stringify(headers)}`).toBe(403);
      }
    }
  });
});

const found = (text: string, canaries: readonly string[]) =>
  canaries.filter((canary) => text.toLowerCase().includes(canary.toLowerCase()));

/** The value at a dotted path of what is sent. */
function at(asked: Asked, path: string): string {
  const value = path.split('.').reduce<unknown>((each, key) => (each as Record<string, unknown>)?.[key], asked);
  if (typeof value !== 'string') throw new Error(`Nothing is sent at ${path}.`);
  return value;
}

function swap(asked: Asked, path: string, id: string): Asked {
  at(asked, path); // fails where the line names a place that isn't there
  const copy = structuredClone(asked);
  const keys = path.split('.');
  const last = keys.pop() as string;
  const holder = keys.reduce<Record<string, unknown>>((each, key) => each[key] as never, copy as never);
  holder[last] = id;
  return copy;
}
