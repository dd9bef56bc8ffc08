import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { Decimal } from '@/lib/shared/decimal';
import {
  bestPurchase,
  costAtEqualStrength,
  materialCost,
  type OfferTerms,
  offerCostPerKg,
  offerCostPerMl,
  preferredQuality,
} from '@/lib/shared/price';

const offer = (terms: Partial<OfferTerms> = {}): OfferTerms => ({
  id: 'A',
  packAmount: '100',
  packUnit: 'g',
  price: '20.0000',
  currency: 'EUR',
  ...terms,
});

const anyAmount = fc.integer({ min: 1, max: 5_000_000_000 }).map((n) => new Decimal(n).div(1_000_000).toFixed());
const anyPrice = fc.integer({ min: 1, max: 100_000_000 }).map((n) => new Decimal(n).div(10_000).toFixed());
const anyDensity = fc.integer({ min: 5000, max: 20_000 }).map((n) => new Decimal(n).div(10_000).toFixed());
const anyOffer = fc.record({
  id: fc.stringMatching(/^[A-Z]{4}$/),
  packAmount: anyAmount,
  packUnit: fc.constantFrom('g' as const, 'mL' as const),
  price: anyPrice,
  currency: fc.constantFrom('EUR', 'USD'),
});

describe('the cost of one offer', () => {
  it('is exact where binary floating point is not: 0.1 of a currency unit for 0.3 g is 333.33... per kg', () => {
    const cost = offerCostPerKg(offer({ packAmount: '0.3', price: '0.1' }), null).value;
    expect(cost?.times('0.3').toFixed(10)).toBe('100.0000000000');
    expect(offerCostPerKg(offer({ price: '1.10', packAmount: '1000' }), null).value?.toFixed()).toBe('1.1');
  });

  it('needs the density for a pack in mL, and never assumes one', () => {
    const bottle = offer({ packUnit: 'mL' });
    expect(offerCostPerKg(bottle, null)).toEqual({ value: null, reason: expect.stringContaining('density') });
    expect(offerCostPerKg(bottle, '0.8').value?.toFixed()).toBe('250');
    expect(offerCostPerMl(bottle, null).value?.toFixed()).toBe('0.2');
    expect(offerCostPerMl(offer(), null).value).toBeNull();
  });

  it('per mL and per kg differ by the density alone', () => {
    fc.assert(
      fc.property(anyOffer, anyDensity, (terms, density) => {
        const perKg = offerCostPerKg(terms, density).value;
        const perMl = offerCostPerMl(terms, density).value;
        const ratio = perKg
          ?.times(density)
          .div(1000)
          .div(perMl ?? 0);
        expect(ratio?.minus(1).abs().lt('1e-30')).toBe(true);
      }),
    );
  });
});

describe('the cheapest way to have so many grams', () => {
  it('is the small pack for a small need, although the drum has the better rate', () => {
    const offers = [
      offer({ id: 'S', packAmount: '25', price: '20' }),
      offer({ id: 'L', packAmount: '1000', price: '300' }),
    ];
    expect(bestPurchase(offers, null, '25', 'EUR')?.offer.id).toBe('S');
    expect(bestPurchase(offers, null, '1000', 'EUR')?.offer.id).toBe('L');
  });

  it('takes several packs where none is large enough or where they cost less than the larger one', () => {
    const offers = [
      offer({ id: 'S', packAmount: '20', price: '10' }),
      offer({ id: 'L', packAmount: '1000', price: '300' }),
    ];
    const purchase = bestPurchase(offers, null, '25', 'EUR');
    expect([purchase?.offer.id, purchase?.packs, purchase?.outlay.toFixed()]).toEqual(['S', 2, '20']);
  });

  it('gives at least what is wanted, at an outlay that no other usable offer undercuts', () => {
    fc.assert(
      fc.property(fc.array(anyOffer, { maxLength: 6 }), anyDensity, anyAmount, (offers, density, wanted) => {
        const best = bestPurchase(offers, density, wanted, 'EUR');
        const usable = offers.filter(({ currency }) => currency === 'EUR');
        expect(best === null).toBe(usable.length === 0);
        expect(best === null || best.grams.gte(wanted)).toBe(true);
        for (const { packAmount, packUnit, price } of usable) {
          const grams = packUnit === 'g' ? new Decimal(packAmount) : new Decimal(packAmount).times(density);
          const packs = new Decimal(wanted).div(grams).ceil();
          expect(best?.outlay.lte(packs.times(price))).toBe(true);
        }
      }),
    );
  });

  it('does not depend on the order of the offers', () => {
    const distinct = fc.uniqueArray(anyOffer, { maxLength: 6, selector: ({ id }) => id });
    fc.assert(
      fc.property(distinct, anyDensity, anyAmount, (offers, density, wanted) => {
        const ids = [offers, [...offers].reverse()].map(
          (some) => bestPurchase(some, density, wanted, 'EUR')?.offer.id ?? null,
        );
        expect(ids[0]).toBe(ids[1]);
      }),
    );
  });
});

describe('the cost of a material', () => {
  const quality = (id: string, position: number, offers: OfferTerms[], densityGPerMl: string | null = null) => ({
    id,
    position,
    densityGPerMl,
    offers,
  });

  it('is that of the preferred quality, even when another is cheaper', () => {
    const dear = quality('B', 0, [offer({ price: '90' })]);
    const cheap = quality('A', 1, [offer({ price: '10' })]);
    expect(materialCost({ strength: 2, qualities: [cheap, dear] }, 'EUR', '100').perKg.value?.toFixed()).toBe('900');
    expect(preferredQuality([cheap, quality('C', 0, []), dear])?.id).toBe('B');
    expect(preferredQuality([])).toBeNull();
  });

  it('at equal strength is the cost per kg divided by the strength: the dear strong one can be the cheaper', () => {
    expect(costAtEqualStrength(new Decimal(500), 100).value?.toFixed()).toBe('5');
    expect(costAtEqualStrength(new Decimal(20), 0.5).value?.toFixed()).toBe('40');
    expect(costAtEqualStrength(new Decimal(20), 0)).toEqual({ value: null, reason: expect.any(String) });
  });

  it('says why where there is none', () => {
    const reason = (qualities: ReturnType<typeof quality>[]) =>
      materialCost({ strength: 1, qualities }, 'EUR').perKg.reason;
    expect(reason([])).toMatch(/No quality/);
    expect(reason([quality('A', 0, [])])).toMatch(/no offer\./);
    expect(reason([quality('A', 0, [offer({ currency: 'USD' })])])).toMatch(/no offer in EUR/);
    expect(reason([quality('A', 0, [offer({ packUnit: 'mL' })])])).toMatch(/density/);
  });
});
