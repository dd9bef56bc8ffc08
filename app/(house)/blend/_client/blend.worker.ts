import { certify, EngineInputError, solveBlend } from '@/engine';
import { type BlendRequest, RequestFault } from '@/lib/shared/blend-input';
import { type BlendInputs, buildBlendProblem } from '@/lib/shared/blend-problem';
import { frontierSteps } from './frontier-steps';
import type { FromWorker, Solved, ToWorker } from './messages';

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
    return question.kind === 'solve'
      ? { kind: 'solved', turn, solved: solve(request, known) }
      : { kind: 'frontier', turn, steps: frontierSteps(request, known) };
  } catch (error) {
    if (error instanceof RequestFault) return { kind: 'fault', turn, fields: error.fields };
    if (error instanceof EngineInputError) return { kind: 'fault', turn, fields: { [error.path]: error.message } };
    throw error;
  }
}

function solve(request: BlendRequest, known: BlendInputs): Solved {
  const { problem, materials: _, limitsWithoutFigure, leftOut, ...asked } = buildBlendProblem(request, known);
  const solution = solveBlend(problem, { timeLimitMs: 5_000, now: () => performance.now() });
  return { request, solution, certificate: certify(problem, solution), asked, limitsWithoutFigure, leftOut };
}
