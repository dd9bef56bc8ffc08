import { percent, pricePerKg } from './blend-figures';
import type { BlendRequest } from './blend-input';
import type { AskedBlend } from './blend-problem';
import type { AppliedLimit } from './limit-verdict';

/** A rule of the engine's problem, read back: what the sentences and the buttons need to know of it. */
export type AskedRule =
  | { kind: 'price per kg' | 'price at equal strength' | 'strength' | 'natural' | 'most materials' | 'least dose' }
  | { kind: 'limit'; limit: AppliedLimit }
  | { kind: 'kept' | 'required' | 'largest share'; id: string; name: string }
  | { kind: 'group'; id: string };

const PLAIN: Record<string, AskedRule> = {
  budgetPerKg: { kind: 'price per kg' },
  costPerImpact: { kind: 'price at equal strength' },
  minStrength: { kind: 'strength' },
  minNatural: { kind: 'natural' },
  maxMaterials: { kind: 'most materials' },
  minDose: { kind: 'least dose' },
};
const NAMED = { kept: 'kept', required: 'required', share: 'largest share' } as const;

/** What one of the engine's rule ids stands for; null for one that this screen never asked for. */
export function askedRule(rule: string, built: Pick<AskedBlend, 'limits' | 'materials'>): AskedRule | null {
  const plain = PLAIN[rule];
  if (plain) return plain;
  const colon = rule.indexOf(':');
  const [kind, id] = [rule.slice(0, colon), rule.slice(colon + 1)];
  if (kind === 'limit') {
    const limit = built.limits.find((one) => one.id === id);
    return limit ? { kind: 'limit', limit } : null;
  }
  if (kind === 'group') return { kind: 'group', id };
  const name = built.materials.get(id)?.name;
  return name && kind in NAMED ? { kind: NAMED[kind as keyof typeof NAMED], id, name } : null;
}

export interface RuleContext {
  request: BlendRequest;
  built: AskedBlend;
  currency: string;
}

/** A rule as it is spoken of, with its figure: "the price ceiling of 400 EUR/kg at equal strength". */
export function ruleInWords(rule: AskedRule, { request, built, currency }: RuleContext): string {
  switch (rule.kind) {
    case 'price per kg':
    case 'price at equal strength': {
      const figure = pricePerKg(Number(request.ceiling?.amount ?? 0), currency);
      return `the price ceiling of ${figure}${rule.kind === 'price per kg' ? '' : ' at equal strength'}`;
    }
    case 'strength':
      return `at least ${strengthInWords(request.minStrength ?? 0, built)}`;
    case 'natural':
      return `at least ${percent(request.minNatural ?? 0)} natural`;
    case 'limit':
      return `the limit on ${rule.limit.name} (${rule.limit.setTitle})`;
    case 'kept': {
      const share = request.kept.find(({ materialId }) => materialId === rule.id)?.share ?? 0;
      return `${rule.name} kept at ${percent(share)}`;
    }
    case 'required':
      return `${rule.name} must be in it`;
    case 'largest share':
      return `at most ${percent(largestShare(rule.id, { request, built }))} of ${rule.name}${
        request.maxShares.some(({ materialId }) => materialId === rule.id) ? '' : ', its largest advisable share'
      }`;
    case 'most materials':
      return `at most ${request.maxMaterials} materials`;
    case 'least dose':
      return `no line below ${percent(request.minDose ?? 0)}`;
    case 'group':
      return 'a rule on a group of materials';
  }
}

export function largestShare(id: string, { request, built }: Pick<RuleContext, 'request' | 'built'>): number {
  return request.maxShares.find(({ materialId }) => materialId === id)?.share ?? built.materials.get(id)?.maxShare ?? 1;
}

/** "50 % as strong as Rose absolute"; a drawn profile has no strength, so linalool (strength 1) stands for it. */
export function strengthInWords(part: number, { target }: Pick<AskedBlend, 'target'>): string {
  return `${percent(part)} as strong as ${target.material ? target.name : 'linalool'}`;
}
