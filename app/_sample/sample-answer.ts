import { solveBlend } from '@/engine';
import { SAMPLE } from './sample';
import { sampleProblem } from './sample-problem';

/** What the public page shows of one solved blend. */
export interface SampleAnswer {
  price: number;
  /** Largest impact first. */
  lines: { key: string; share: number; impact: number }[];
  profile: number[];
  distance: number;
  /** Of the blend itself, and of what replaces a kilogram of the target. */
  costPerKg: number;
  costReplaced: number;
  /** Change of the expected distance for 100 EUR more; null where the price does not bind. */
  per100More: number | null;
  /** Proven: nothing closer exists in this model by more than this. */
  gap: number;
}

/** A share that no balance would show is not drawn. */
const SMALLEST = 1e-5;

/** Solves the sample for one price: on the server for the first sight, in the visitor's worker for every other. */
export function sampleAnswer(price: number): SampleAnswer {
  const solution = solveBlend(sampleProblem(price));
  const { strength } = SAMPLE.target;
  const rule = solution.prices.find((one) => one.rule === 'costPerImpact');
  const binds = rule?.perUnit !== undefined && rule.multiplier > 0;
  return {
    price,
    lines: solution.lines
      .filter((line) => line.share >= SMALLEST)
      .map(({ id, share, impact }) => ({ key: id, share, impact }))
      .sort((a, b) => b.impact - a.impact),
    profile: solution.profile,
    distance: solution.distance,
    costPerKg: solution.costPerKg,
    costReplaced: solution.costPerImpact * strength,
    per100More: binds ? ((rule.perUnit ?? 0) * 100) / strength : null,
    gap: solution.objective - solution.bound,
  };
}
