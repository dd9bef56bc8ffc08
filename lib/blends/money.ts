import 'server-only';
import type { BlendRequest } from '@/lib/shared/blend-input';
import { Decimal } from '@/lib/shared/decimal';

export interface PricedLine {
  /** Mass share, as stored. */
  share: string;
  costPerKg: string;
  strength: number;
}

export interface ExactCost {
  perKg: Decimal;
  /** What it costs to smell as strong as 1 kg of the reference. */
  atEqualStrength: Decimal;
}

/** What a blend costs, in decimals from the offers and the stored shares: nothing of it was ever binary. */
export function exactCost(lines: readonly PricedLine[], referenceStrength: number): ExactCost {
  let perKg = new Decimal(0);
  let strength = new Decimal(0);
  for (const line of lines) {
    perKg = perKg.plus(new Decimal(line.share).times(line.costPerKg));
    strength = strength.plus(new Decimal(line.share).times(line.strength));
  }
  return { perKg, atEqualStrength: perKg.div(strength).times(referenceStrength) };
}

/** The engine keeps its rules to this, relative; a ceiling is held to no less. */
const ALLOWED = new Decimal('1e-9');

export function keepsCeiling(cost: ExactCost, ceiling: BlendRequest['ceiling']): boolean {
  if (!ceiling) return true;
  const paid = ceiling.basis === 'per kg' ? cost.perKg : cost.atEqualStrength;
  return paid.lte(new Decimal(ceiling.amount).times(ALLOWED.plus(1)));
}
