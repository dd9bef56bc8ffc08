import type { BlendSolution, RulePrice } from '@/engine/contract';
import { listed, percent, pointsOf, pricePerKg, roundStep } from './blend-figures';
import { type AskedRule, askedRule, largestShare, type RuleContext } from './blend-rule';

/** What a little more room in one rule would bring, by the slope at this blend: exact for small steps only. */
export interface Relief {
  /** The engine's id of the rule. */
  rule: string;
  kind: AskedRule['kind'];
  /** Points closer on the 0-10 facet scale. */
  closer: number;
  /** "10 EUR/kg more would bring it about 0.08 points closer on the 0-10 facet scale." */
  words: string;
  /** "The price ceiling" */
  what: string;
}

/** Under half a hundredth of a point nobody would call it held back. */
const WORTH_SAYING = 0.005;
const SCALE = 'points closer on the 0–10 facet scale';

/** The rules that hold the blend back, the one that costs most first. */
export function reliefs(solution: BlendSolution, context: RuleContext): Relief[] {
  return solution.prices
    .flatMap((price) => {
      const rule = askedRule(price.rule, context.built);
      const relief = rule && price.perUnit ? reliefOf(rule, price, context) : null;
      return relief && relief.closer >= WORTH_SAYING ? [{ ...relief, rule: price.rule, kind: rule!.kind }] : [];
    })
    .sort((a, b) => b.closer - a.closer || (a.rule < b.rule ? -1 : 1));
}

function reliefOf(
  rule: AskedRule,
  price: RulePrice,
  context: RuleContext,
): Pick<Relief, 'closer' | 'words' | 'what'> | null {
  const { request, built, currency } = context;
  const slope = price.perUnit ?? 0;
  switch (rule.kind) {
    case 'price per kg':
    case 'price at equal strength': {
      const step = roundStep(Number(request.ceiling?.amount ?? 1) * 0.1);
      const perUnit = rule.kind === 'price per kg' ? slope : slope / built.target.referenceStrength;
      return relief('The price ceiling', `${pricePerKg(step, currency)} more`, -perUnit * step);
    }
    case 'strength': {
      const part = Math.min(0.05, request.minStrength ?? 0);
      const less = slope * part * built.target.referenceStrength;
      return relief(
        'The strength asked for',
        `${percent(part)} less of ${built.target.material ? 'the target’s' : 'linalool’s'} strength`,
        -less,
      );
    }
    case 'natural': {
      const step = Math.min(0.05, request.minNatural ?? 0);
      return relief('The natural share', `${percent(step)} less of it`, slope * -step);
    }
    case 'limit': {
      const max = rule.limit.maxFraction / built.concentrate;
      const thinner = built.concentrate * 0.9;
      const room = rule.limit.maxFraction / thinner - max;
      const what = `The limit on ${rule.limit.name}`;
      return relief(
        what,
        `a concentrate of ${percent(thinner)} in the product instead of ${percent(built.concentrate)}`,
        -slope * room,
      );
    }
    case 'largest share': {
      const step = roundStep(largestShare(rule.id, context) * 0.2);
      return relief(`The largest share of ${rule.name}`, `${percent(step)} more of it`, -slope * step);
    }
    case 'kept': {
      const share = request.kept.find(({ materialId }) => materialId === rule.id)?.share ?? 0;
      const step = Math.min(0.01, Math.max(share * 0.2, 1e-4));
      const words = `${percent(step)} ${slope < 0 ? 'more' : 'less'} of it`;
      return relief(`${rule.name}, kept at ${percent(share)},`, words, Math.abs(slope) * step);
    }
    default:
      return null;
  }
}

function relief(what: string, step: string, closer: number): Pick<Relief, 'closer' | 'words' | 'what'> {
  const sentence = `${step} would bring it about ${pointsOf(closer)} ${SCALE}.`;
  return { what, closer, words: sentence.charAt(0).toUpperCase() + sentence.slice(1) };
}

/** Said also where a rule bites so little that nobody would smell it. */
const NOTHING_HOLDS =
  'Your rules cost next to nothing: a little more room in any of them would not bring it noticeably closer.';

/** "The price ceiling is what holds you back: 10 EUR/kg more would bring it about 0.08 points closer on ..." */
export function heldBackBy(found: readonly Relief[]): string[] {
  const [first, ...others] = found;
  if (!first) return [NOTHING_HOLDS];
  const sentence = `${first.what} is what holds you back: ${first.words.charAt(0).toLowerCase()}${first.words.slice(1)}`;
  const more = others.slice(0, 2).map(({ what }) => what.charAt(0).toLowerCase() + what.slice(1).replace(/,$/, ''));
  return more.length > 0 ? [sentence, `After that ${more.length > 1 ? 'come' : 'comes'} ${listed(more)}.`] : [sentence];
}
