import { useCallback, useEffect, useRef, useState } from 'react';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { BlendInputs } from '@/lib/shared/blend-problem';
import type { OtherBlend } from './messages';
import { Solver } from './solver';

const LIMIT_MS = 30_000;

/** Other good blends, looked for when asked; a changed request makes them stale and ends the search. */
export function useOthers(inputs: BlendInputs, request: BlendRequest) {
  const [blends, setBlends] = useState<OtherBlend[] | null>(null);
  const [isSearching, setSearching] = useState(false);
  const solver = useRef<Solver | null>(null);
  const stop = useCallback(() => {
    solver.current?.end();
    solver.current = null;
    setSearching(false);
  }, []);
  // biome-ignore lint/correctness/useExhaustiveDependencies: a changed request makes what was found stale
  useEffect(() => {
    setBlends(null);
    return stop;
  }, [request, inputs, stop]);
  const search = useCallback(() => {
    setSearching(true);
    solver.current = new Solver(
      inputs,
      (answer) => {
        if (answer.kind === 'better') return;
        setBlends(answer.kind === 'others' ? answer.blends : []);
        stop();
      },
      stop,
    );
    solver.current.ask('others', request, LIMIT_MS);
  }, [inputs, request, stop]);
  return { blends, isSearching, search, stop };
}
