import 'server-only';
import type { BlendSolution, Certificate } from '@/engine/contract';
import type { Member } from '@/lib/auth/member';
import { type AnswerLine, answerOfSolution, type BlendAnswer } from '@/lib/shared/blend-answer';
import type { Candidate } from '@/lib/shared/blend-candidate';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { AskedBlend } from '@/lib/shared/blend-problem';
import { heldBackBy } from '@/lib/shared/blend-relief';
import type { SolvedBlendView } from '@/lib/shared/blend-view';
import { Decimal } from '@/lib/shared/decimal';
import type { FacetView } from '@/lib/shared/facet';
import { may } from '@/lib/shared/permissions';
import { exactCost } from './money';
import { storedShares } from './shares';

export interface Solution {
  request: BlendRequest;
  asked: AskedBlend;
  limitsWithoutFigure: string[];
  facets: FacetView[];
  currency: string;
  solution: BlendSolution;
  certificate: Certificate;
}

/** What a role may see of a solution: everything, or everything but prices and what gives them away. */
export function solvedView(ctx: Pick<Member, 'roles'>, solved: Solution): SolvedBlendView {
  const { request, asked, facets, currency, solution, certificate } = solved;
  const answer = answerOfSolution(solution, { request, built: asked, currency }, certificate);
  const seesPrices = may(ctx.roles, 'price.read');
  const shares = new Map(
    storedShares(solution.lines.map(({ share }) => share)).map((share, index) => [solution.lines[index]?.id, share]),
  );
  const lines = answer.lines.map((line) => lineView(line, shares.get(line.material.id) ?? '0', seesPrices));
  const hasBlend = lines.length > 0;
  return {
    status: answer.status,
    facets,
    target: targetView(asked, seesPrices),
    lines,
    profile: answer.profile,
    distance: hasBlend ? answer.distance : null,
    expectedDistance: hasBlend ? answer.expectedDistance : null,
    strengthOfTarget: hasBlend ? answer.strengthOfTarget : null,
    natural: hasBlend ? answer.natural : null,
    money: seesPrices && hasBlend ? moneyView(solved, answer, shares) : null,
    verdicts: answer.verdicts.map(({ limit: { terms: _, ...limit }, ...verdict }) => ({ ...limit, ...verdict })),
    limitsWithoutFigure: solved.limitsWithoutFigure,
    heldBack: seesPrices ? answer.heldBack : heldBackWithoutPrices(answer),
    proof: answer.proof,
    cautions: answer.cautions,
    clash: answer.clash && {
      // Rules and ways out are told in figures of price.
      rules: seesPrices ? answer.clash.rules : [],
      ways: seesPrices ? answer.clash.ways.map(({ words, request: changed }) => ({ words, request: changed })) : [],
    },
    certificate: finite(certificate),
  };
}

function lineView({ material, share: _, ...line }: AnswerLine, share: string, seesPrices: boolean) {
  const { id, name, kind, profile, phases, strength, natural, completeness, costPerKg } = material;
  const part = new Decimal(share).times(costPerKg ?? 0);
  return {
    ...{ materialId: id, name, kind, profile, phases, strength, natural, completeness, share, impact: line.impact },
    price: seesPrices && costPerKg ? { costPerKg, part: part.toFixed(6), offer: offerInWords(material) } : null,
  };
}

function targetView({ target }: AskedBlend, seesPrices: boolean): SolvedBlendView['target'] {
  const { name, profile, material } = target;
  return {
    name,
    profile,
    materialId: material?.id ?? null,
    phases: material?.phases ?? {},
    strength: material?.strength ?? null,
    natural: material?.natural ?? null,
    costPerKg: seesPrices ? (material?.costPerKg ?? null) : null,
  };
}

function moneyView(
  { request, asked, currency }: Solution,
  answer: BlendAnswer,
  shares: Map<string | undefined, string>,
) {
  const cost = exactCost(
    answer.lines.map(({ material }) => ({
      share: shares.get(material.id) ?? '0',
      costPerKg: material.costPerKg ?? '0',
      strength: material.strength,
    })),
    asked.target.referenceStrength,
  );
  return {
    currency,
    packGrams: request.packGrams,
    costPerKg: cost.perKg.toFixed(6),
    costAtEqualStrength: cost.atEqualStrength.toFixed(6),
    ceiling: request.ceiling,
  };
}

/** Saying that nothing holds it back would be untrue where a price does. */
function heldBackWithoutPrices({ reliefs }: BlendAnswer): string[] {
  const shown = reliefs.filter(({ kind }) => kind !== 'price per kg' && kind !== 'price at equal strength');
  return reliefs.length > 0 && shown.length === 0 ? [] : heldBackBy(shown);
}

const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'long', year: 'numeric', timeZone: 'UTC' });

/** "100 g at 25.00 EUR from a supplier, its grade, of a day". */
export function offerInWords({ offer }: Pick<Candidate, 'offer'>): string | null {
  if (!offer) return null;
  const pack = new Decimal(offer.packAmount).toFixed();
  return `${pack} ${offer.packUnit} at ${new Decimal(offer.price).toFixed(2)} ${offer.currency}, ${offer.supplier}, ${offer.grade}, ${day.format(new Date(offer.offeredOn))}`;
}

/** JSON has no infinity. */
function finite(certificate: Certificate): SolvedBlendView['certificate'] {
  const number = (value: number | null) => (value !== null && Number.isFinite(value) ? value : null);
  return {
    ...certificate,
    worstViolation: number(certificate.worstViolation),
    objective: number(certificate.objective),
    bound: number(certificate.bound),
    gap: number(certificate.gap),
  };
}

/** The request without what a role without prices must not see. */
export function requestView(ctx: Pick<Member, 'roles'>, request: BlendRequest): BlendRequest {
  return may(ctx.roles, 'price.read') ? request : { ...request, ceiling: null };
}
