import { useEffect, useMemo, useRef, useState } from 'react';
import { answerOfSolution, type BlendAnswer } from '@/lib/shared/blend-answer';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { AskedBlend, BlendInputs } from '@/lib/shared/blend-problem';
import type { FrontierStep, Solved } from './messages';
import { Solver } from './solver';
import { type Search, useLongSearch } from './use-long-search';

export interface SolvedState {
  /** The latest answer; it may be of the request before, for the moment that a solve takes. */
  solved: Solved | null;
  asked: AskedBlend | null;
  answer: BlendAnswer | null;
  faults: Record<string, string>;
  /** The worker itself failed, which is our fault. */
  isBroken: boolean;
  /** While a long search goes on. */
  search: Search | null;
}

/** Rules that count materials can take long; a drag gets the best that is found by then. */
const LIVE_MS = 400;
const FRONTIER_MS = 20_000;

/** The answer to a request, solved beside the screen each time it changes. */
export function useSolved(inputs: BlendInputs, request: BlendRequest | null, currency: string): SolvedState {
  const [solved, setSolved] = useState<Solved | null>(null);
  const [faults, setFaults] = useState<Record<string, string>>({});
  const [isBroken, setBroken] = useState(false);
  const solver = useRef<Solver | null>(null);
  const latest = useRef(request);
  latest.current = request;
  useEffect(() => {
    const own = new Solver(
      inputs,
      (answer) => {
        if (answer.kind === 'fault') setFaults(answer.fields);
        if (answer.kind !== 'solved') return;
        setFaults({});
        setSolved(ownOf(answer.solved, latest.current));
      },
      () => setBroken(true),
    );
    solver.current = own;
    return () => {
      own.end();
      solver.current = null;
    };
  }, [inputs]);
  // After the effect above, so that a new worker gets the present question too.
  // biome-ignore lint/correctness/useExhaustiveDependencies: a new worker (new inputs) must be asked again
  useEffect(() => {
    if (request) solver.current?.ask('solve', request, LIVE_MS);
  }, [request, inputs]);
  const materials = useMemo(() => new Map(inputs.candidates.map((one) => [one.id, one])), [inputs]);
  const asked = useMemo(() => (solved ? { ...solved.asked, materials } : null), [solved, materials]);
  const answer = useMemo(
    () =>
      solved && asked
        ? answerOfSolution(solved.solution, { request: solved.request, built: asked, currency }, solved.certificate)
        : null,
    [solved, asked, currency],
  );
  const search = useLongSearch(inputs, request, solved, setSolved);
  return { solved: request ? solved : null, asked, answer: request ? answer : null, faults, isBroken, search };
}

/** The worker answers about a copy: an answer to the present request is known by the request itself. */
function ownOf(solved: Solved, request: BlendRequest | null): Solved {
  return request && JSON.stringify(solved.request) === JSON.stringify(request) ? { ...solved, request } : solved;
}

/** A hand that is still dragging needs no curve yet. */
const QUIET_MS = 350;

/** The curve of price against closeness, drawn by a worker of its own once the request has come to rest. */
export function useFrontier(inputs: BlendInputs, request: BlendRequest | null) {
  const [steps, setSteps] = useState<FrontierStep[] | null>(null);
  // The curve does not depend on where on it one stands; with materials counted, each point would be a long search.
  const asked =
    request &&
    JSON.stringify({
      ...request,
      ceiling: { basis: request.ceiling?.basis ?? 'equal strength', amount: '1' },
      ...{ maxMaterials: null, minDose: null },
    });
  useEffect(() => {
    if (!asked) return;
    let solver: Solver | null = null;
    const timer = setTimeout(() => {
      solver = new Solver(
        inputs,
        (answer) => {
          setSteps(answer.kind === 'frontier' ? answer.steps : []);
          solver?.end();
        },
        () => setSteps([]),
      );
      solver.ask('frontier', JSON.parse(asked) as BlendRequest, FRONTIER_MS);
    }, QUIET_MS);
    return () => {
      clearTimeout(timer);
      solver?.end();
    };
  }, [asked, inputs]);
  return steps;
}
