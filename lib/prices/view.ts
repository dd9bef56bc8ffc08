import 'server-only';
import type { z } from 'zod';
import type { costView } from '@/lib/shared/material';
import type { OfferView } from '@/lib/shared/material-view';
import { type Cost, costAtEqualStrength, offerCostPerKg, offerCostPerMl } from '@/lib/shared/price';
import type { OfferRow } from './queries';

/** Costs leave with the digits of money, rounded here and nowhere before. */
const MONEY_DIGITS = 4;

export function viewCost(cost: Cost): z.infer<typeof costView> {
  return cost.value ? { value: cost.value.toFixed(MONEY_DIGITS), reason: null } : { value: null, reason: cost.reason };
}

export function viewOffer(offer: OfferRow, densityGPerMl: string | null, strength: number): OfferView {
  const perKg = offerCostPerKg(offer, densityGPerMl);
  const { id, packAmount, packUnit, price, currency, offeredOn } = offer;
  return {
    id,
    packAmount,
    packUnit,
    price,
    currency,
    offeredOn,
    costPerKg: viewCost(perKg),
    costPerMl: viewCost(offerCostPerMl(offer, densityGPerMl)),
    costAtEqualStrength: viewCost(perKg.value ? costAtEqualStrength(perKg.value, strength) : perKg),
  };
}
