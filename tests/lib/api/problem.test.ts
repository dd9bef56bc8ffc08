import { expect, it, vi } from 'vitest';
import { DatabaseBusy } from '@/db/transaction';
import { problemResponse } from '@/lib/api/problem';
import { Conflict, Forbidden, Invalid, NotFound, TooMany } from '@/lib/errors';
import { log } from '@/lib/log';

const body = async (error: unknown): Promise<{ status: number; headers: Headers; requestId?: string }> => {
  const response = problemResponse(error);
  return {
    status: response.status,
    headers: response.headers,
    ...((await response.json()) as Record<string, unknown>),
  };
};

it('gives every kind of refusal its status and its sentence', async () => {
  expect(await body(new Invalid({ density: 'Density must be above 0 g/mL; it was -0.9.' }))).toMatchObject({
    status: 422,
    errors: { density: 'Density must be above 0 g/mL; it was -0.9.' },
  });
  expect((await body(new NotFound())).status).toBe(404);
  expect((await body(new Forbidden('Not for this role.'))).status).toBe(403);
  expect(await body(new Conflict('It changed.', { revision: 3 }))).toMatchObject({
    status: 409,
    current: { revision: 3 },
  });
  const tooMany = await body(new TooMany('Wait.', 30));
  expect([tooMany.status, tooMany.headers.get('retry-after')]).toEqual([429, '30']);
});

it('says “not now” when the database is busy or away, however deep the reason lies', async () => {
  vi.spyOn(log, 'warn').mockImplementation(() => undefined);
  const refused = Object.assign(new Error('connect'), { code: 'ECONNREFUSED' });
  for (const error of [new DatabaseBusy('busy'), refused, new Error('query failed', { cause: refused })]) {
    const { status, headers } = await body(error);
    expect([status, headers.get('retry-after')]).toEqual([503, '5']);
  }
});

it('keeps the text of anything unforeseen in the log, and gives a reference to it', async () => {
  const logged = vi.spyOn(log, 'error').mockImplementation(() => undefined);
  const answer = await body(new Error('select secret from /var/lib/rows'));
  expect(answer.status).toBe(500);
  expect(JSON.stringify(answer)).not.toMatch(/secret|select|\/var|at .*:\d+/);
  expect(logged).toHaveBeenCalledWith(expect.objectContaining({ requestId: answer.requestId }));
});
