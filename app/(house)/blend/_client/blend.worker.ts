import '@/lib/shared/zod-without-eval';
import { alternativeBlends, certify, EngineInputError, solveBlend } from '@/engine';
import { type BlendRequest, RequestFault } from '@/lib/shared/blend-input';
import { type BlendInputs, buildBlendProblem } from '@/lib/shared/blend-problem';
import { frontierSteps } from './frontier-steps';
import type { FromWorker, OtherBlend, Solved, ToWorker } from './messages';

/** Solves beside the screen, so that a slider never waits for an answer. It knows only what `load` brought it. */
let inputs: BlendInputs | null = null;

const scope = self as unknown as {
  onmessage: ((event: MessageEvent<ToWorker>) => void) | null;
  postMessage: (message: FromWorker) => void;
};

scope.onmessage = ({ data }) => {
  if (data.kind === 'load') inputs = data.inputs;
  else if (inputs) scope.postMessage(answer(data, inputs));
};

function answer(question: Exclude<ToWorker, { kind: 'load' }>, known: BlendInputs): FromWorker {
  const { turn, request } = question;
  try {
    if (question.kind === 'solve') return { kind: 'solved', turn, solved: solve(question, known) };
    if (question.kind === 'others') return { kind: 'others', turn, blends: others(question, known) };
    return { kind: 'frontier', turn, steps: frontierSteps(request, known) };
  } catch (error) {
    if (error instanceof RequestFault) return { kind: 'fault', turn, fields: error.fields };
    if (error instanceof EngineInputError) return { kind: 'fault', turn, fields: { [error.path]: error.message } };
    throw error;
  }
}

interface Question {
  turn: number;
  request: BlendRequest;
  limitMs: number;
}

function solve({ turn, request, limitMs }: Question, known: BlendInputs): Solved {
  const { problem, materials: _, limitsWithoutFigure, leftOut, ...asked } = buildBlendProblem(request, known);
  const solution = solveBlend(problem, {
    timeLimitMs: limitMs,
    now: () => performance.now(),
    onBetter: ({ distance }) => scope.postMessage({ kind: 'better', turn, distance }),
  });
  // Checking takes longer than solving, and the server checks again what is saved. Only where materials are counted
  // does the sentence about the proof depend on it.
  const isCounted = request.maxMaterials !== null || request.minDose !== null;
  const certificate = isCounted ? certify(problem, solution) : null;
  return { request, solution, certificate, asked, limitsWithoutFigure, leftOut };
}

const OTHERS = 4;

/** The first is the blend itself. */
function others({ request, limitMs }: Question, known: BlendInputs): OtherBlend[] {
  const { problem } = buildBlendProblem(request, known);
  const found = alternativeBlends(problem, OTHERS + 1, { timeLimitMs: limitMs, now: () => performance.now() });
  return found.slice(1).map(({ distance, costPerKg, lines }) => ({
    ...{ distance, costPerKg },
    lines: lines.map(({ id, impact }) => ({ id, impact })),
  }));
}
