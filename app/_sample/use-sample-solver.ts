import { startTransition, useCallback, useEffect, useRef, useState } from 'react';
import type { SampleAnswer } from './sample-answer';

/**
 * Solves the sample in the visitor's browser. The worker starts with the first question; while it works, only the
 * newest price waits, so a drag is never behind by more than one solve.
 */
export function useSampleSolver(first: SampleAnswer): [answer: SampleAnswer, solve: (price: number) => void] {
  const [answer, setAnswer] = useState(first);
  const worker = useRef<Worker | null>(null);
  const busy = useRef(false);
  const waiting = useRef<number | null>(null);

  const ask = useCallback((price: number) => {
    busy.current = true;
    worker.current ??= start((next) => {
      // The thumb comes first: drawing the answer may be put off for it.
      startTransition(() => setAnswer(next));
      busy.current = false;
      const newest = waiting.current;
      waiting.current = null;
      if (newest !== null && newest !== next.price) ask(newest);
    });
    worker.current.postMessage(price);
  }, []);

  const solve = useCallback(
    (price: number) => {
      if (busy.current) waiting.current = price;
      else ask(price);
    },
    [ask],
  );

  useEffect(
    () => () => {
      worker.current?.terminate();
      worker.current = null;
      busy.current = false;
    },
    [],
  );
  return [answer, solve];
}

function start(onAnswer: (answer: SampleAnswer) => void): Worker {
  const worker = new Worker(new URL('./blend.worker.ts', import.meta.url), { type: 'module' });
  worker.addEventListener('message', ({ data }: MessageEvent<SampleAnswer>) => onAnswer(data));
  return worker;
}
