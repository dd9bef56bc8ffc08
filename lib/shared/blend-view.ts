import { z } from 'zod';
import { blendRequest } from './blend-input';
import { facetView } from './facet';

/*
 * What leaves the server of a solved or saved blend. Everything about money stands in `money` and `price` fields, so
 * that one place takes it away from a role that sees no price.
 */

const vector = z.array(z.number());
const phases = z.partialRecord(z.enum(['opening', 'heart', 'dry']), vector);

export const limitVerdictView = z.strictObject({
  id: z.string(),
  name: z.string(),
  setTitle: z.string(),
  edition: z.string(),
  source: z.string(),
  via: z.string(),
  note: z.string().nullable(),
  verdict: z.enum(['met', 'exceeded', 'unknown']),
  /** Mass fractions of the finished product. */
  maxFraction: z.number(),
  worst: z.number(),
  typical: z.number(),
  margin: z.number(),
  unknownBecause: z.array(z.string()),
  from: z.array(z.strictObject({ name: z.string(), worst: z.number() })),
});
export type LimitVerdictView = z.output<typeof limitVerdictView>;

const lineView = z.strictObject({
  materialId: z.string(),
  name: z.string(),
  kind: z.string(),
  profile: vector,
  phases,
  strength: z.number(),
  natural: z.number(),
  completeness: z.enum(['full', 'declared', 'unknown']).nullable(),
  /** Mass share with 14 digits; the shares of a blend sum to exactly 1. */
  share: z.string(),
  impact: z.number(),
  price: z.strictObject({ costPerKg: z.string(), part: z.string(), offer: z.string().nullable() }).nullable(),
});

const targetView = z.strictObject({
  name: z.string(),
  materialId: z.string().nullable(),
  profile: vector,
  phases,
  strength: z.number().nullable(),
  natural: z.number().nullable(),
  costPerKg: z.string().nullable(),
});

const clashView = z.strictObject({
  rules: z.array(z.string()),
  ways: z.array(z.strictObject({ words: z.string(), request: blendRequest })),
});

/** What a solve found. Without a blend, `lines` is empty, the numbers are null and `clash` says why. */
export const solvedBlendView = z.strictObject({
  status: z.enum(['optimal', 'stopped', 'infeasible']),
  facets: z.array(facetView),
  target: targetView,
  lines: z.array(lineView),
  profile: vector,
  distance: z.number().nullable(),
  expectedDistance: z.number().nullable(),
  strengthOfTarget: z.number().nullable(),
  natural: z.number().nullable(),
  money: z
    .strictObject({
      currency: z.string(),
      packGrams: z.string(),
      costPerKg: z.string(),
      /** What it costs to smell as strong as 1 kg of the target. */
      costAtEqualStrength: z.string(),
      ceiling: blendRequest.shape.ceiling.unwrap(),
    })
    .nullable(),
  verdicts: z.array(limitVerdictView),
  limitsWithoutFigure: z.array(z.string()),
  heldBack: z.array(z.string()),
  proof: z.string(),
  cautions: z.array(z.string()),
  clash: clashView.nullable(),
  certificate: z.strictObject({
    feasible: z.boolean(),
    worstViolation: z.number().nullable(),
    objective: z.number().nullable(),
    bound: z.number().nullable(),
    gap: z.number().nullable(),
    boundProven: z.boolean(),
    infeasibilityProven: z.boolean(),
    agrees: z.boolean(),
  }),
});
export type SolvedBlendView = z.output<typeof solvedBlendView>;

export const savedBlendView = z.strictObject({
  id: z.string(),
  name: z.string(),
  note: z.string().nullable(),
  createdAt: z.iso.datetime(),
  createdBy: z.string(),
  request: blendRequest,
  solved: solvedBlendView,
  /** What is otherwise today, in sentences. */
  changes: z.array(z.string()),
});
export type SavedBlendView = z.output<typeof savedBlendView>;

export const savedBlendItem = z.strictObject({
  id: z.string(),
  name: z.string(),
  targetName: z.string(),
  distance: z.number(),
  costPerKg: z.string().nullable(),
  currency: z.string(),
  materials: z.array(z.string()),
  profile: vector,
  createdAt: z.iso.datetime(),
  createdBy: z.string(),
});
export type SavedBlendItem = z.output<typeof savedBlendItem>;

export const savedBlendQuery = z.strictObject({ after: z.string().length(26).optional() });
export const savedBlendList = z.strictObject({ items: z.array(savedBlendItem), next: z.string().nullable() });
export type SavedBlendList = z.output<typeof savedBlendList>;
export const blendParams = z.strictObject({ id: z.string() });
export const previewBlendInput = z.strictObject({ request: blendRequest });

/** While a long solve goes on: how far the best blend so far is from the target, and what none can go below. */
export const solveProgress = z.object({ distance: z.number(), bound: z.number() });
export type SolveProgress = z.infer<typeof solveProgress>;
