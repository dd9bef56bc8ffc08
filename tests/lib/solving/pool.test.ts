import { afterAll, expect, it, vi } from 'vitest';
import type { BlendProblem } from '@/engine/contract';
import { EngineInputError } from '@/engine/errors';
import { solveBlend } from '@/engine/index';
import { TooMany } from '@/lib/errors';
import { log } from '@/lib/log';
import { closePool, MAX_QUEUE, solveInPool } from '@/lib/solving/pool';

afterAll(closePool);

const minute = { timeLimitMs: 60_000 };
const small: BlendProblem = {
  target: [0.5, 0.5],
  candidates: [
    { id: 'a', profile: [1, 0], strength: 4, costPerKg: 10 },
    { id: 'b', profile: [0, 1], strength: 1, costPerKg: 2 },
  ],
  budgetPerKg: 3,
};

it('gives the very answer that the engine gives here, with its certificate', async () => {
  const { solution, certificate } = await solveInPool(small, minute);
  expect(solution).toEqual(solveBlend(small));
  expect(certificate).toMatchObject({ feasible: true, agrees: true });
});

it('brings a fault in the problem back with its field', async () => {
  const fault = await solveInPool({ ...small, budgetPerKg: Number.NaN }, minute).catch((error: unknown) => error);
  expect(fault).toBeInstanceOf(EngineInputError);
  expect(fault).toMatchObject({ path: 'budgetPerKg' });
});

it('ends at once when asked to', async () => {
  const controller = new AbortController();
  const work = solveInPool(small, { ...minute, signal: controller.signal });
  controller.abort();
  await expect(work).rejects.toThrow(/abort/i);
  expect((await solveInPool(small, minute)).solution.status).toBe('optimal');
});

it('survives being given up at any moment, that of the answer too', async () => {
  const logged = vi.spyOn(log, 'warn').mockImplementation(() => undefined);
  for (let turn = 0; turn < 30; turn++) {
    const controller = new AbortController();
    const work = solveInPool(small, { ...minute, signal: controller.signal, onBetter: () => undefined });
    for (let wait = 0; wait < turn * 4; wait++) await new Promise((resolve) => setImmediate(resolve));
    controller.abort();
    await work.catch((error: unknown) => expect(String(error)).toMatch(/abort/i));
  }
  expect((await solveInPool(small, minute)).solution.status).toBe('optimal');
  expect(JSON.stringify(logged.mock.calls)).not.toContain('lines');
});

it('takes what a thread says too late as no reason to end', async () => {
  const logged = vi.spyOn(log, 'warn').mockImplementation(() => undefined);
  await solveInPool(small, minute);
  const pool = (globalThis as { stillroomSolvers?: { emit: (name: string, error: Error) => boolean } })
    .stillroomSolvers;
  pool?.emit('error', new Error('Unexpected message from Worker: { lines: [secret] }'));
  expect(logged).toHaveBeenCalledTimes(1);
  expect(JSON.stringify(logged.mock.calls)).not.toContain('secret');
});

it('refuses one more than the queue holds, and does the rest', async () => {
  const many = await Promise.allSettled(Array.from({ length: MAX_QUEUE + 12 }, () => solveInPool(small, minute)));
  const refused = many.filter((one) => one.status === 'rejected');
  expect(refused.length).toBeGreaterThan(0);
  for (const one of refused) expect(one.reason).toBeInstanceOf(TooMany);
  expect(many.length - refused.length).toBeGreaterThanOrEqual(MAX_QUEUE);
});
