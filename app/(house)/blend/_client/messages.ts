import type { BlendSolution, Certificate } from '@/engine/contract';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { AskedBlend, BlendInputs, BuiltProblem } from '@/lib/shared/blend-problem';

/** What the screen sends its worker. `turn` counts the questions, so that an answer finds its own. */
export type ToWorker =
  | { kind: 'load'; inputs: BlendInputs }
  | { kind: 'solve'; turn: number; request: BlendRequest; limitMs: number }
  | { kind: 'frontier'; turn: number; request: BlendRequest; limitMs: number }
  | { kind: 'others'; turn: number; request: BlendRequest; limitMs: number };

/** A solution with what explaining it needs; the materials stay on the screen's side. */
export interface Solved {
  request: BlendRequest;
  solution: BlendSolution;
  certificate: Certificate | null;
  asked: Omit<AskedBlend, 'materials'>;
  limitsWithoutFigure: string[];
  leftOut: BuiltProblem['leftOut'];
}

export interface FrontierStep {
  /** In the unit of the request's ceiling. */
  ceiling: number;
  distance: number;
}

/** A good blend that is built differently. */
export interface OtherBlend {
  distance: number;
  costPerKg: number;
  lines: { id: string; impact: number }[];
}

export type FromWorker =
  /** On the way: the best so far, and how close any could come. */
  | { kind: 'better'; turn: number; distance: number }
  | { kind: 'others'; turn: number; blends: OtherBlend[] }
  | { kind: 'solved'; turn: number; solved: Solved }
  | { kind: 'frontier'; turn: number; steps: FrontierStep[] }
  /** A sentence for each field of the request that is at fault. */
  | { kind: 'fault'; turn: number; fields: Record<string, string> };
