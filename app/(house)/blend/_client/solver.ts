import type { BlendRequest } from '@/lib/shared/blend-input';
import type { BlendInputs } from '@/lib/shared/blend-problem';
import type { FromWorker, ToWorker } from './messages';

type Task = 'solve' | 'frontier' | 'others';

/**
 * One worker that is asked one thing at a time, and always the latest: while it works, newer questions replace each
 * other, so a drag never queues up. Ending it is how a long task is cancelled.
 */
export class Solver {
  private readonly worker: Worker;
  private turn = 0;
  private isBusy = false;
  private waiting: { task: Task; request: BlendRequest; limitMs: number } | null = null;

  constructor(inputs: BlendInputs, tell: (answer: FromWorker) => void, fail: () => void) {
    this.worker = new Worker(new URL('./blend.worker.ts', import.meta.url), { type: 'module' });
    this.worker.onmessage = ({ data }: MessageEvent<FromWorker>) => {
      if (data.kind === 'better') return tell(data);
      this.isBusy = false;
      // An answer that a newer question has overtaken is still the freshest picture there is.
      tell(data);
      const next = this.waiting;
      this.waiting = null;
      if (next) this.ask(next.task, next.request, next.limitMs);
    };
    this.worker.onerror = fail;
    this.send({ kind: 'load', inputs });
  }

  ask(task: Task, request: BlendRequest, limitMs: number): void {
    if (this.isBusy) {
      this.waiting = { task, request, limitMs };
      return;
    }
    this.isBusy = true;
    this.send({ kind: task, turn: ++this.turn, request, limitMs });
  }

  end(): void {
    this.worker.terminate();
  }

  private send(message: ToWorker): void {
    this.worker.postMessage(message);
  }
}
