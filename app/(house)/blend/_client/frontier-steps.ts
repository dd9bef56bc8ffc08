import { traceFrontier } from '@/engine';
import { roundOut } from '@/lib/shared/blend-figures';
import type { BlendRequest } from '@/lib/shared/blend-input';
import { type BlendInputs, buildBlendProblem } from '@/lib/shared/blend-problem';
import type { FrontierStep } from './messages';

const STEPS = 24;

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
  const points = traceFrontier(
    problem,
    wanted.map((ceiling) => ceiling / unit),
  );
  return spacedOut(
    points.flatMap(({ distance, solution }, index) =>
      solution.lines.length > 0 ? [{ ceiling: wanted[index] ?? 0, distance }] : [],
    ),
  );
}

/** The drawing's size on a phone, and how far apart two points must be there for a finger. */
const PHONE = { width: 250, height: 180, apart: 30 };

/** Points that would lie on each other are left out; both ends stay. */
export function spacedOut(steps: readonly FrontierStep[]): FrontierStep[] {
  const last = steps.at(-1);
  if (!last) return [];
  const width = Math.max(...steps.map(({ ceiling }) => ceiling));
  const height = Math.max(...steps.map(({ distance }) => distance)) || 1;
  const areApart = (a: FrontierStep, b: FrontierStep) =>
    Math.hypot(((a.ceiling - b.ceiling) / width) * PHONE.width, ((a.distance - b.distance) / height) * PHONE.height) >=
    PHONE.apart;
  const kept: FrontierStep[] = [];
  for (const step of steps) {
    const before = kept.at(-1);
    if (!before || (areApart(step, before) && areApart(step, last))) kept.push(step);
  }
  return steps.length > 1 && kept.at(-1) !== last ? [...kept, last] : kept;
}
