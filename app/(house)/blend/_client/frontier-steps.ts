import { traceFrontier } from '@/engine';
import { roundOut } from '@/lib/shared/blend-figures';
import type { BlendRequest } from '@/lib/shared/blend-input';
import { type BlendInputs, buildBlendProblem } from '@/lib/shared/blend-problem';
import type { FrontierStep } from './messages';

const STEPS = 16;

/**
 * How close a blend can come at each ceiling, from the cheapest price at which there is a blend up to where the price
 * no longer matters; in equal ratios, because a tenth more means the same at every price.
 */
export function frontierSteps(request: BlendRequest, inputs: BlendInputs): FrontierStep[] {
  const basis = request.ceiling?.basis ?? 'equal strength';
  const { problem, target } = buildBlendProblem({ ...request, ceiling: { basis, amount: '1' } }, inputs);
  const unit = basis === 'per kg' ? 1 : target.referenceStrength;
  const [cheapest, dearest] = traceFrontier(problem, 2);
  if (!cheapest || !dearest || !(cheapest.ceiling > 0)) return [];
  const ratio = dearest.ceiling / cheapest.ceiling;
  const ceilings = Array.from({ length: STEPS }, (_, step) =>
    roundOut(cheapest.ceiling * unit * ratio ** (step / (STEPS - 1)), 'up'),
  );
  const wanted = [...new Set(ceilings)];
  return traceFrontier(
    problem,
    wanted.map((ceiling) => ceiling / unit),
  ).flatMap(({ distance, solution }, index) =>
    solution.lines.length > 0 ? [{ ceiling: wanted[index] ?? 0, distance }] : [],
  );
}
