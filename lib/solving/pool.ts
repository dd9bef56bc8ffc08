import 'server-only';
import { availableParallelism } from 'node:os';
import path from 'node:path';
import { MessageChannel } from 'node:worker_threads';
import Piscina from 'piscina';
import type { BetterBlend, BlendProblem, BlendSolution, Certificate } from '@/engine/contract';
import { EngineInputError } from '@/engine/errors';
import { TooMany } from '@/lib/errors';
import { log } from '@/lib/log';

/** Solves that wait beyond those at work; one more is refused. */
export const MAX_QUEUE = 16;
const THREAD_MB = 512;
const RETRY_S = 10;

export interface Solved {
  solution: BlendSolution;
  certificate: Certificate;
}

export interface SolveOptions {
  timeLimitMs: number;
  /** Ends the solve at once, wherever it is. */
  signal?: AbortSignal;
  /** Told of every better blend on the way, in order. */
  onBetter?: (better: BetterBlend) => void;
}

/** One pool a process, kept over hot reloads. */
const kept = globalThis as { stillroomSolvers?: Piscina };

function pool(): Piscina {
  if (kept.stillroomSolvers) return kept.stillroomSolvers;
  const solvers = new Piscina({
    filename: path.join(process.cwd(), 'lib/solving/worker.mjs'),
    minThreads: 0,
    maxThreads: Math.max(1, availableParallelism() - 1),
    idleTimeout: 60_000,
    maxQueue: MAX_QUEUE,
    resourceLimits: { maxOldGenerationSizeMb: THREAD_MB },
  });
  // A thread may answer in the very moment in which its solve is given up; unheard, that error would end the process.
  // Its text holds the answer, a formula, and so stays out of the log.
  solvers.on('error', () => log.warn({ event: 'solver_thread_error' }));
  kept.stillroomSolvers = solvers;
  return solvers;
}

/**
 * Solves off the main thread, so that the server keeps answering; the answer comes with its certificate.
 *
 * @throws TooMany when the queue is full; EngineInputError for a fault in the problem; an
 * AbortError when `signal` ended it.
 */
export async function solveInPool(problem: BlendProblem, options: SolveOptions): Promise<Solved> {
  const solvers = pool();
  if (solvers.queueSize >= MAX_QUEUE)
    throw new TooMany('Many blends are being solved at this moment. Try again in a few seconds.', RETRY_S);
  const { port1, port2 } = new MessageChannel();
  port1.on('message', (better: BetterBlend) => options.onBetter?.(better));
  try {
    const answer: Solved | { fault: { path: string; sentence: string } } = await solvers.run(
      { problem, timeLimitMs: options.timeLimitMs, port: port2 },
      { transferList: [port2], signal: options.signal },
    );
    if ('fault' in answer) throw new EngineInputError(answer.fault.path, answer.fault.sentence);
    return answer;
  } finally {
    port1.close();
  }
}

/** Ends the threads; for tests and for the end of the process. */
export async function closePool(): Promise<void> {
  await kept.stillroomSolvers?.destroy();
  kept.stillroomSolvers = undefined;
}
