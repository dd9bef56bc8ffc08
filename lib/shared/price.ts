import { Decimal } from './decimal';

/*
 * What a material costs, exactly. One definition, used by every screen and by the solver's inputs:
 *
 *   cost per kg at a pack size W = the cost per kg of the cheapest way to have at least W grams from one offer, in
 *   whole packs, of the preferred quality, in the house's currency.
 *
 * "Cheapest" is by what must be paid now (packs x price), not by the rate: for 25 g nobody buys the drum. Ties go to
 * the offer that gives more, then to the smaller id. Packs are assumed never to be split, and shipping is not in it.
 */

export interface OfferTerms {
  id: string;
  packAmount: string;
  packUnit: 'g' | 'mL';
  price: string;
  currency: string;
}

export interface QualityTerms {
  id: string;
  position: number;
  densityGPerMl: string | null;
  offers: readonly OfferTerms[];
}

export interface MaterialTerms {
  /** Odour impact per gram; 0 for a solvent. */
  strength: number;
  qualities: readonly QualityTerms[];
}

/** The pack size that a cost is quoted at unless the person chooses another. */
export const USUAL_PACK_GRAMS = '100';

/** A decimal, or null with the reason as a sentence. */
export type Cost = { value: Decimal; reason: null } | { value: null; reason: string };
const known = (value: Decimal): Cost => ({ value, reason: null });
const unknown = (reason: string): Cost => ({ value: null, reason });

/** What a pack weighs. A pack in mL needs the density: it is never assumed. */
export function packGrams(offer: OfferTerms, densityGPerMl: string | null): Decimal | null {
  if (offer.packUnit === 'g') return new Decimal(offer.packAmount);
  return densityGPerMl === null ? null : new Decimal(offer.packAmount).times(densityGPerMl);
}

const NO_DENSITY = 'Sold by volume and the density is not known.';

export function offerCostPerKg(offer: OfferTerms, densityGPerMl: string | null): Cost {
  const grams = packGrams(offer, densityGPerMl);
  return grams ? known(new Decimal(offer.price).times(1000).div(grams)) : unknown(NO_DENSITY);
}

/** Per mL, for one who measures by volume; a pack in mL needs no density for it. */
export function offerCostPerMl(offer: OfferTerms, densityGPerMl: string | null): Cost {
  const { packAmount, packUnit, price } = offer;
  if (packUnit === 'mL') return known(new Decimal(price).div(packAmount));
  if (densityGPerMl === null) return unknown('The density is not known.');
  return known(new Decimal(price).times(densityGPerMl).div(packAmount));
}

/**
 * Cost at equal strength: per 1,000 units of odour impact, which is the cost per kg divided by the strength. A cheap
 * weak material can cost more than a dear strong one.
 */
export function costAtEqualStrength(costPerKg: Decimal, strength: number): Cost {
  return strength > 0 ? known(costPerKg.div(strength)) : unknown('It has no smell of its own.');
}

/** The quality that stands for its material: the lowest position, then the oldest. */
export function preferredQuality<Q extends Pick<QualityTerms, 'id' | 'position'>>(qualities: readonly Q[]): Q | null {
  const sorted = [...qualities].sort((a, b) => a.position - b.position || (a.id < b.id ? -1 : 1));
  return sorted[0] ?? null;
}

export interface Purchase<O extends OfferTerms = OfferTerms> {
  offer: O;
  packs: number;
  /** What the packs cost together. */
  outlay: Decimal;
  grams: Decimal;
  costPerKg: Decimal;
}

/** The cheapest way to have at least so many grams from one of the offers, in whole packs; null when none can be used. */
export function bestPurchase<O extends OfferTerms>(
  offers: readonly O[],
  densityGPerMl: string | null,
  wantedGrams: string,
  currency: string,
): Purchase<O> | null {
  let best: Purchase<O> | null = null;
  for (const offer of offers) {
    const pack = offer.currency === currency ? packGrams(offer, densityGPerMl) : null;
    if (!pack) continue;
    const packs = Decimal.max(1, new Decimal(wantedGrams).div(pack).ceil());
    const outlay = packs.times(offer.price);
    const costPerKg = new Decimal(offer.price).times(1000).div(pack);
    const purchase = { offer, packs: packs.toNumber(), outlay, grams: packs.times(pack), costPerKg };
    if (!best || isBetter(purchase, best)) best = purchase;
  }
  return best;
}

function isBetter(a: Purchase, b: Purchase): boolean {
  const by = a.outlay.cmp(b.outlay) || b.grams.cmp(a.grams);
  return by < 0 || (by === 0 && a.offer.id < b.offer.id);
}

export interface MaterialCost {
  perKg: Cost;
  perMl: Cost;
  atEqualStrength: Cost;
  purchase: Purchase | null;
}

/** What a material costs when bought for at least `wantedGrams`: of its preferred quality, in the house's currency. */
export function materialCost(
  material: MaterialTerms,
  currency: string,
  wantedGrams: string = USUAL_PACK_GRAMS,
): MaterialCost {
  const quality = preferredQuality(material.qualities);
  const purchase = quality ? bestPurchase(quality.offers, quality.densityGPerMl, wantedGrams, currency) : null;
  if (!quality || !purchase) {
    const reason = whyNoCost(quality, currency);
    return { perKg: unknown(reason), perMl: unknown(reason), atEqualStrength: unknown(reason), purchase: null };
  }
  return {
    perKg: known(purchase.costPerKg),
    perMl: offerCostPerMl(purchase.offer, quality.densityGPerMl),
    atEqualStrength: costAtEqualStrength(purchase.costPerKg, material.strength),
    purchase,
  };
}

function whyNoCost(quality: QualityTerms | null, currency: string): string {
  if (!quality) return 'No quality of it is entered.';
  if (quality.offers.length === 0) return 'Its preferred quality has no offer.';
  if (!quality.offers.some((offer) => offer.currency === currency))
    return `Its preferred quality has no offer in ${currency}.`;
  return NO_DENSITY;
}
