import type { BlendSolution } from '@/engine/contract';
import { percent, pricePerKg, roundOut } from './blend-figures';
import type { BlendRequest } from './blend-input';
import { type AskedRule, askedRule, type RuleContext, ruleInWords, strengthInWords } from './blend-rule';
import { Decimal } from './decimal';

/** One way out: what it would have to become, in words, and the request with just that changed. */
export interface WayOut {
  words: string;
  request: BlendRequest;
  isAboutPrice: boolean;
}

export interface Clash {
  /** Rules that cannot all be kept; with any one of them gone the others can. */
  rules: string[];
  ways: WayOut[];
}

/** Why nothing fits, and what would make it fit. Figures are rounded to the loose side so that applying them works. */
export function clashOf(solution: BlendSolution, context: RuleContext): Clash | null {
  if (solution.status !== 'infeasible') return null;
  const asked = (solution.conflict ?? []).flatMap((id) => askedRule(id, context.built) ?? []);
  const loosened = (solution.relax ?? []).flatMap(({ rule, to }) => {
    const found = askedRule(rule, context.built);
    return (found && loosen(found, to, context)) ?? [];
  });
  const dropped = asked.flatMap((rule) => drop(rule, context) ?? []);
  return { rules: asked.map((rule) => ruleInWords(rule, context)), ways: [...loosened, ...dropped] };
}

/** Nobody doses a material at more than this many times its largest advisable share: no way out for a nose. */
const BEARABLE = 3;

function loosen(rule: AskedRule, to: number, { request, built, currency }: RuleContext): WayOut | null {
  const way = (words: string, change: Partial<BlendRequest>, isAboutPrice = false): WayOut => ({
    words,
    request: { ...request, ...change },
    isAboutPrice,
  });
  switch (rule.kind) {
    case 'price per kg':
    case 'price at equal strength': {
      if (!request.ceiling) return null;
      const amount = roundOut(rule.kind === 'price per kg' ? to : to * built.target.referenceStrength, 'up');
      const basis = rule.kind === 'price per kg' ? '' : ' at equal strength';
      return way(
        `Raise the price ceiling to ${pricePerKg(amount, currency)}${basis}`,
        {
          ceiling: { ...request.ceiling, amount: new Decimal(amount).toFixed() },
        },
        true,
      );
    }
    case 'strength': {
      const part = roundOut(to / built.target.referenceStrength, 'down');
      return way(`Ask for ${strengthInWords(part, built)} only`, { minStrength: part });
    }
    case 'natural': {
      const part = roundOut(to, 'down');
      return way(`Ask for ${percent(part)} natural only`, { minNatural: part });
    }
    case 'limit': {
      if (!request.product || !(rule.limit.maxFraction > 0) || !(to > 0)) return null;
      const concentrate = roundOut((rule.limit.maxFraction / to) * 100, 'down');
      return way(
        `Put ${percent(concentrate / 100)} concentrate into the product instead of ${percent(built.concentrate)}, for ${rule.limit.name}`,
        {
          product: { ...request.product, concentratePct: new Decimal(concentrate).toFixed() },
        },
      );
    }
    case 'largest share': {
      const share = Math.min(1, roundOut(to, 'up'));
      if (share > BEARABLE * (built.materials.get(rule.id)?.maxShare ?? 1)) return null;
      const others = request.maxShares.filter(({ materialId }) => materialId !== rule.id);
      return way(`Allow ${percent(share)} of ${rule.name}`, { maxShares: [...others, { materialId: rule.id, share }] });
    }
    case 'kept': {
      const from = request.kept.find(({ materialId }) => materialId === rule.id)?.share ?? 0;
      const share = roundOut(to, to < from ? 'down' : 'up');
      const kept = request.kept.map((line) => (line.materialId === rule.id ? { ...line, share } : line));
      return way(`Keep ${rule.name} at ${percent(share)}`, { kept });
    }
    case 'most materials': {
      const count = Math.ceil(to - 1e-9);
      return way(`Allow ${count} materials`, { maxMaterials: count });
    }
    case 'least dose': {
      const dose = roundOut(to, 'down');
      return way(`Allow lines down to ${percent(dose)}`, { minDose: dose });
    }
    default:
      return null;
  }
}

/** Rules with no figure to loosen can be taken back as a whole. */
function drop(rule: AskedRule, { request }: RuleContext): WayOut | null {
  if (rule.kind === 'required') {
    const required = request.required.filter((id) => id !== rule.id);
    return { words: `Do without ${rule.name}`, request: { ...request, required }, isAboutPrice: false };
  }
  if (rule.kind === 'kept') {
    const kept = request.kept.filter(({ materialId }) => materialId !== rule.id);
    return { words: `Leave the share of ${rule.name} open`, request: { ...request, kept }, isAboutPrice: false };
  }
  return null;
}
