import { solveBlend } from '@/engine';
import type { BlendRequest } from '@/lib/shared/blend-input';
import { type BlendInputs, buildBlendProblem } from '@/lib/shared/blend-problem';
import { Decimal } from '@/lib/shared/decimal';
import type { FrontierStep } from './messages';

const STEPS = 14;
/** How much cheaper than without a ceiling the cheapest point may be. */
const SPAN = 200;

/**
 * How close a blend can come at falling ceilings, from where the price no longer matters down to where nothing fits:
 * one solve each, in equal ratios, because a tenth more means the same at every price.
 */
export function frontierSteps(request: BlendRequest, inputs: BlendInputs): FrontierStep[] {
  const basis = request.ceiling?.basis ?? 'equal strength';
  const free = buildBlendProblem({ ...request, ceiling: null }, inputs);
  const dearest = solveBlend(free.problem);
  if (dearest.lines.length === 0) return [];
  const { referenceStrength } = free.target;
  const top = basis === 'per kg' ? dearest.costPerKg : dearest.costPerImpact * referenceStrength;
  const steps: FrontierStep[] = [{ ceiling: rounded(top), distance: dearest.distance }];
  for (let step = 1; step < STEPS; step++) {
    const ceiling = rounded(top * SPAN ** (-step / (STEPS - 1)));
    const problem =
      basis === 'per kg'
        ? { ...free.problem, budgetPerKg: ceiling }
        : { ...free.problem, costPerImpact: new Decimal(ceiling).div(referenceStrength).toNumber() };
    const solution = solveBlend(problem);
    if (solution.lines.length === 0) break;
    steps.unshift({ ceiling, distance: solution.distance });
  }
  return steps;
}

/** Up to three digits: a ceiling that a person would set. */
const rounded = (amount: number): number => {
  const step = 10 ** (Math.floor(Math.log10(amount)) - 2);
  return Number((Math.ceil(amount / step) * step).toPrecision(3));
};
