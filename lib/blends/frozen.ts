import 'server-only';
import { z } from 'zod';
import { candidateView } from '@/lib/shared/blend-candidate';
import { blendRequest } from '@/lib/shared/blend-input';
import type { AskedBlend } from '@/lib/shared/blend-problem';
import { facetView } from '@/lib/shared/facet';
import type { SolvedRequest } from './solve';

const appliedLimit = z.object({
  id: z.string(),
  name: z.string(),
  setTitle: z.string(),
  edition: z.string(),
  source: z.string(),
  via: z.string(),
  note: z.string().nullable(),
  terms: z.array(z.object({ constituentId: z.string(), factor: z.number() })),
  maxFraction: z.number(),
});

/** Names, offers, ratings and limits of the day a blend was solved: all that showing it again needs. */
export const frozenContext = z.object({
  currency: z.string(),
  facets: z.array(facetView),
  target: z.object({
    name: z.string(),
    profile: z.array(z.number()),
    material: candidateView.nullable(),
    referenceStrength: z.number(),
  }),
  /** The materials of the lines. */
  materials: z.array(candidateView),
  limits: z.array(appliedLimit),
  limitsWithoutFigure: z.array(z.string()),
  concentrate: z.number(),
  totalWeight: z.number(),
});
export type FrozenContext = z.output<typeof frozenContext>;

export function freezeContext({ built, solution, facets, currency }: SolvedRequest): FrozenContext {
  const materials = solution.lines.flatMap(({ id }) => built.materials.get(id) ?? []);
  const { target, limits, limitsWithoutFigure, concentrate, totalWeight } = built;
  return { currency, facets, target, materials, limits, limitsWithoutFigure, concentrate, totalWeight };
}

export function askedBlend(context: FrozenContext): AskedBlend {
  const { target, limits, concentrate, totalWeight } = context;
  const materials = new Map(context.materials.map((material) => [material.id, material]));
  return { target, materials, limits, concentrate, totalWeight };
}

const number = z.number();
const none = z.number().nullable();

/** The engine's answer as it was stored. */
export const frozenSolution = z.object({
  status: z.enum(['optimal', 'stopped', 'infeasible']),
  lines: z.array(z.object({ id: z.string(), share: number, impact: number })),
  profile: z.array(number),
  distance: number,
  expectedDistance: number,
  angle: none,
  costPerKg: number,
  costPerImpact: number,
  strength: number,
  natural: number,
  exponent: z.literal(1),
  objective: number,
  bound: number,
  kktResidual: number,
  prices: z.array(
    z.object({
      rule: z.string(),
      side: z.enum(['min', 'max']).optional(),
      slack: number,
      multiplier: number,
      perUnit: number.optional(),
    }),
  ),
  warnings: z.array(z.string()),
  nodes: number,
  iterations: number,
});

/** JSON knows no infinity: a worst violation or gap that was infinite is stored as null. */
export const frozenCertificate = z.object({
  feasible: z.boolean(),
  worstViolation: none,
  objective: none,
  bound: none,
  gap: none,
  boundProven: z.boolean(),
  infeasibilityProven: z.boolean(),
  agrees: z.boolean(),
});

export const frozenRequest = blendRequest;
