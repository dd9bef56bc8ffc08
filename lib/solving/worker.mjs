import { performance } from 'node:perf_hooks';
import { register } from 'tsx/esm/api';

/** One thread of the solving pool: plain JavaScript, so that Node can start it from any build; the engine stays TypeScript. */
register();
const { certify, solveBlend } = await import('../../engine/index.ts');

/**
 * @param {{ problem: import('../../engine/contract').BlendProblem, timeLimitMs: number, port: MessagePort | null }} task
 *   `port` is told of every better blend on the way.
 */
export default function solve({ problem, timeLimitMs, port }) {
  try {
    const solution = solveBlend(problem, {
      timeLimitMs,
      now: () => performance.now(),
      onBetter: (better) => port?.postMessage(better),
    });
    return { solution, certificate: certify(problem, solution) };
  } catch (error) {
    // An error's own fields don't cross between threads: a fault in the problem goes back as data.
    if (error.name !== 'EngineInputError') throw error;
    return { fault: { path: error.path, sentence: error.message } };
  } finally {
    port?.close();
  }
}
