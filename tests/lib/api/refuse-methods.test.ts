import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { refuseMethods } from '@/lib/api/refuse-methods';

const untouched = http.Server.prototype.emit;
const server = http.createServer((_, response) => response.end('reached'));

beforeAll(async () => {
  refuseMethods();
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
});
afterAll(() => {
  http.Server.prototype.emit = untouched;
  server.close();
});

function ask(method: string, path: string): Promise<http.IncomingMessage> {
  const { port } = server.address() as AddressInfo;
  return new Promise((resolve, reject) => {
    const request = http.request({ method, path, port, host: '127.0.0.1' }, (response) => resolve(response.resume()));
    request.on('error', reject).end();
  });
}

it.each([
  ['TRACE', '/'],
  ['DELETE', '/materials?q=rose'],
  ['OPTIONS', '/api/v1/materials'],
  ['TRACE', '/api/v1/materials'],
  ['POST', '/icon.svg'],
  ['POST', '/_next/static/chunks/a.js'],
])('refuses %s %s and says what is allowed', async (method, path) => {
  const response = await ask(method, path);
  expect(response.statusCode).toBe(405);
  expect(response.headers.allow?.split(', ')).not.toContain(method);
  expect(response.headers).toMatchObject({ 'x-content-type-options': 'nosniff', 'cache-control': 'no-store' });
  expect(response.headers).toHaveProperty('strict-transport-security');
});

it.each([
  ['GET', '/icon.svg'],
  ['POST', '/sign-in'],
  ['PATCH', '/api/v1/materials/1'],
  ['DELETE', '/api/v1/blends/1'],
])('hands on %s %s', async (method, path) => {
  const response = await ask(method, path);
  expect(response.statusCode).toBe(200);
  expect(response.headers).toHaveProperty('strict-transport-security');
});
