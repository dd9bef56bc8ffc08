import type { BlendSolution, Certificate } from '@/engine/contract';
import type { Candidate } from './blend-candidate';
import { type Clash, clashOf } from './blend-clash';
import { pointsOf } from './blend-figures';
import { heldBackBy, type Relief, reliefs } from './blend-relief';
import type { RuleContext } from './blend-rule';
import { byUrgency, type LimitVerdict, limitVerdicts } from './limit-verdict';

export interface AnswerLine {
  material: Candidate;
  share: number;
  impact: number;
  /** What this line adds to the price of a kilogram of the blend. */
  costPart: number;
}

/** What a solution means for the person who asked: the same on the screen, while dragging, and on a saved blend. */
export interface BlendAnswer {
  status: BlendSolution['status'];
  /** Most impact first. */
  lines: AnswerLine[];
  profile: number[];
  distance: number;
  expectedDistance: number;
  costPerKg: number;
  /** What it costs to smell as strong as 1 kg of the target. */
  costAtEqualStrength: number;
  /** As a part of the target's strength. */
  strengthOfTarget: number;
  natural: number;
  verdicts: LimitVerdict[];
  reliefs: Relief[];
  heldBack: string[];
  proof: string;
  cautions: string[];
  clash: Clash | null;
}

/** @throws nothing: a solution without a blend gives an answer without lines, and says why. */
export function answerOfSolution(
  solution: BlendSolution,
  context: RuleContext,
  certificate?: Certificate | null,
): BlendAnswer {
  const { built } = context;
  const lines = answerLines(solution, context);
  const found = reliefs(solution, context);
  const hasBlend = lines.length > 0;
  return {
    status: solution.status,
    lines,
    profile: solution.profile ?? [],
    distance: solution.distance,
    expectedDistance: solution.expectedDistance,
    costPerKg: solution.costPerKg,
    costAtEqualStrength: solution.costPerImpact * built.target.referenceStrength,
    strengthOfTarget: solution.strength / built.target.referenceStrength,
    natural: solution.natural,
    verdicts: hasBlend ? byUrgency(limitVerdicts(built.limits, lines, built.concentrate)) : [],
    reliefs: found,
    heldBack: hasBlend ? heldBackBy(found) : [],
    proof: proofInWords(solution, built.totalWeight, certificate),
    cautions: hasBlend ? cautionsOf(lines) : [],
    clash: clashOf(solution, context),
  };
}

function answerLines(solution: BlendSolution, { built }: RuleContext): AnswerLine[] {
  return solution.lines
    .flatMap(({ id, share, impact }) => {
      const material = built.materials.get(id);
      return material ? [{ material, share, impact, costPart: share * Number(material.costPerKg) }] : [];
    })
    .sort((a, b) => b.impact - a.impact || (a.material.id < b.material.id ? -1 : 1));
}

/** Below this share of the impact in its strongest line a blend has no voice of its own: common practice. */
export const NO_VOICE = 0.15;

function cautionsOf(lines: readonly AnswerLine[]): string[] {
  const strongest = lines[0]?.impact ?? 0;
  return strongest > NO_VOICE
    ? []
    : ['No material carries more than 15 % of the smell: such a blend smells of everything and nothing.'];
}

/** A gap this small is rounding, not distance: a millionth of a point. */
const NOTHING = 1e-6;

/** How it is known, in one sentence. The bound is on the expected distance, which counts the noses' spread in. */
export function proofInWords(solution: BlendSolution, totalWeight: number, certificate?: Certificate | null): string {
  if (solution.status === 'infeasible')
    return certificate && !certificate.infeasibilityProven
      ? 'No blend was found that keeps all these rules; that there is none is not proven.'
      : 'Proven: no blend of these materials keeps all these rules.';
  const bound = certificate?.boundProven ? certificate.bound : solution.bound;
  const closest = Math.sqrt(Math.max(0, bound) / totalWeight);
  const gap = solution.expectedDistance - closest;
  const within = gap < NOTHING ? 'a millionth of a point' : `${gap.toPrecision(1)} points`;
  if (solution.status === 'stopped')
    return `Not proven to be the closest: no blend within these rules comes closer than ${pointsOf(closest)} points, the spread between noses counted in, and this one is at ${pointsOf(solution.expectedDistance)}.`;
  const known =
    certificate && !certificate.boundProven
      ? 'Found by looking through all of them, not checked a second time'
      : 'Proven';
  return `${known}: no blend of these materials within these rules comes closer than ${pointsOf(closest)} points, the spread between noses counted in; this one is within ${within} of that.`;
}
