import { useEffect, useState } from 'react';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { BlendInputs } from '@/lib/shared/blend-problem';
import type { Solved } from './messages';
import { Solver } from './solver';

/** A search that goes on beside the screen: the best distance so far, and how to stop it. */
export interface Search {
  best: number | null;
  stop: () => void;
}

const QUIET_MS = 500;
const LONG_MS = 30_000;

/** Goes on looking when the quick answer was not proven to be the closest; a new request or `stop` ends it. */
export function useLongSearch(
  inputs: BlendInputs,
  request: BlendRequest | null,
  solved: Solved | null,
  tell: (solved: Solved) => void,
): Search | null {
  const [search, setSearch] = useState<Search | null>(null);
  const [given, setGiven] = useState<BlendRequest | null>(null);
  const isOpen = solved !== null && solved.request === request && solved.solution.status === 'stopped';
  useEffect(() => {
    if (!isOpen || !request || given === request) return;
    let solver: Solver | null = null;
    const end = () => {
      solver?.end();
      setGiven(request);
      setSearch(null);
    };
    const timer = setTimeout(() => {
      setSearch({ best: null, stop: end });
      solver = new Solver(
        inputs,
        (answer) => {
          if (answer.kind === 'better') setSearch({ best: answer.distance, stop: end });
          else end();
          // The worker got a copy: the answer must be known as the answer to this very request.
          if (answer.kind === 'solved') tell({ ...answer.solved, request });
        },
        end,
      );
      solver.ask('solve', request, LONG_MS);
    }, QUIET_MS);
    return () => {
      clearTimeout(timer);
      solver?.end();
      setSearch(null);
    };
  }, [isOpen, request, given, inputs, tell]);
  return search;
}
