import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { Forbidden, Invalid } from '@/lib/errors';
import { createMaterial } from '@/lib/materials/commands';
import { listMaterials } from '@/lib/materials/list';
import { createQuality } from '@/lib/qualities/commands';
import type { MaterialRow } from '@/lib/shared/material';
import { MATERIAL_SORTS, materialListQuery } from '@/lib/shared/material-list';
import { makeMember } from '../../support/database';
import { aMaterial, anOffer, aQuality, type MaterialHouse, materialHouse } from '../../support/material-house';

let house: MaterialHouse;
const query = (asked: Record<string, string | undefined> = {}) => materialListQuery.parse(asked);
const names = async (asked: Record<string, string>) =>
  (await listMaterials(house.owner, query(asked))).items.map(({ name }) => name);

const STOCK = [
  { name: 'Vétiver oil', kind: 'oil', naturalShare: '1', strength: 2, botanicalName: 'Chrysopogon zizanioides' },
  { name: 'Citronellol', synonyms: ['3,7-dimethyloct-6-en-1-ol'], cas: ['106-22-9'], strength: 0.9 },
  { name: 'Rose absolute', kind: 'absolute', naturalShare: '1', strength: 5, synonyms: ['Absolue de rosé'] },
  { name: '100% base_one', kind: 'ready base', naturalShare: '0.35', strength: 5 },
  { name: 'Still solvent', kind: 'solvent', strength: 0, strengthClass: 'odourless' },
];
/** By name: offers of the preferred quality, and its density. */
const OFFERS: Record<string, { offers: object[]; densityGPerMl?: string }[]> = {
  'Vétiver oil': [{ offers: [anOffer({ price: '30' })] }],
  Citronellol: [{ offers: [anOffer({ price: '2' }), anOffer({ packAmount: '25', price: '1.5' })] }],
  'Rose absolute': [
    { offers: [anOffer({ packUnit: 'mL', packAmount: '10', price: '90' })], densityGPerMl: '0.9' },
    { offers: [anOffer({ price: '0.01' })] },
  ],
  '100% base_one': [{ offers: [anOffer({ packUnit: 'mL' })] }],
};

beforeAll(async () => {
  house = await materialHouse();
  for (const [place, material] of STOCK.entries()) {
    const facets = [
      { facetId: house.rosy, phase: 'all', intensity: place * 2, sd: 0 },
      { facetId: house.green, phase: 'dry', intensity: 8 - place, sd: 0 },
    ];
    const { id } = await createMaterial(house.owner, aMaterial({ ...material, facets }));
    for (const quality of OFFERS[material.name] ?? []) await createQuality(house.owner, id, aQuality(house, quality));
  }
});

describe('searching the list', () => {
  it.each([
    ['vetiver', ['Vétiver oil']],
    ['ROSÉ abs', ['Rose absolute']],
    ['zizan', ['Vétiver oil']],
    ['106-22', ['Citronellol']],
    ['dimethyloct', ['Citronellol']],
    ['100%', ['100% base_one']],
    ['e_o', ['100% base_one']],
    ['\\', []],
    ['rose vetiver', []],
  ])('finds by “%s”', async (q, expected) => {
    expect(await names({ q })).toEqual(expected);
  });

  it('cuts by kind, nature and facets together', async () => {
    expect(await names({ kind: 'oil,absolute' })).toEqual(['Rose absolute', 'Vétiver oil']);
    expect(await names({ natural: '0.35' })).toEqual(['100% base_one', 'Rose absolute', 'Vétiver oil']);
    expect(await names({ facets: 'rosy:4' })).toEqual(['100% base_one', 'Rose absolute', 'Still solvent']);
    expect(await names({ facets: 'rosy:4,green:5' })).toEqual(['100% base_one', 'Rose absolute']);
    expect(await names({ facets: 'unheard-of' })).toEqual([]);
  });

  it('cuts and orders by cost at the wanted pack, and puts what has no cost last', async () => {
    expect(await names({ sort: 'price' })).toEqual([
      ...['Citronellol', 'Vétiver oil', 'Rose absolute'],
      ...['100% base_one', 'Still solvent'],
    ]);
    expect(await names({ sort: 'equal', order: 'desc' })).toEqual([
      ...['Rose absolute', 'Vétiver oil', 'Citronellol'],
      ...['100% base_one', 'Still solvent'],
    ]);
    expect(await names({ minPrice: '20', maxPrice: '300' })).toEqual(['Citronellol', 'Vétiver oil']);
    expect(await names({ minPrice: '20.01', pack: '25' })).toEqual(['Citronellol', 'Rose absolute', 'Vétiver oil']);
    expect(await names({ maxEqual: '150' })).toEqual(['Citronellol', 'Vétiver oil']);
  });

  it('is refused by cost to those who may see none, and shows them none', async () => {
    const student = await makeMember(house.team, 'student');
    for (const asked of [{ sort: 'price' }, { sort: 'equal' }, { maxPrice: '1' }, { maxEqual: '1' }])
      await expect(listMaterials(student, query(asked))).rejects.toBeInstanceOf(Forbidden);
    const page = await listMaterials(student, query());
    expect(JSON.stringify(page)).not.toMatch(/cost|currency/i);
  });

  it('says in a sentence what is wrong with a question', () => {
    const fault = (asked: object) => materialListQuery.safeParse(asked).error?.issues[0]?.message;
    expect(fault({ facets: 'rosy:11' })).toBe('The intensity of rosy must be between 0 and 10; it was 11.');
    expect(fault({ kind: 'oil,gas' })).toContain('it was “gas”');
    expect(fault({ natural: '1.2' })).toBe('Natural share must be between 0 and 100 %; it was 120 %.');
    expect(fault({ maxPrice: '-1' })).toContain('at least 0');
    expect(fault({ pack: '0' })).toContain('above 0 g');
  });
});

describe('the pages of the list', () => {
  it.each(MATERIAL_SORTS.flatMap((sort) => ['asc', 'desc'].map((order) => ({ sort, order }))))(
    'hold every material once, in the order of $sort $order, whatever their length',
    async (asked) => {
      const whole = await listMaterials(house.owner, query(asked));
      expect(whole.items).toHaveLength(STOCK.length);
      for (const limit of ['1', '2', '3']) {
        const walked: MaterialRow[] = [];
        for (let cursor: string | null = ''; cursor !== null; ) {
          const page = await listMaterials(house.owner, query({ ...asked, limit, ...(cursor && { cursor }) }));
          expect(page.total).toBe(STOCK.length);
          walked.push(...page.items);
          cursor = page.nextCursor;
        }
        expect(walked).toEqual(whole.items);
      }
    },
  );

  it('refuse a cursor of another order, and one that is none', async () => {
    const { nextCursor } = await listMaterials(house.owner, query({ limit: '1' }));
    for (const asked of [{ cursor: nextCursor ?? '', sort: 'strength' }, { cursor: 'abc' }])
      await expect(listMaterials(house.owner, query(asked))).rejects.toBeInstanceOf(Invalid);
  });
});

describe('the order by cost', () => {
  const offer = fc.record({
    packAmount: fc.integer({ min: 1, max: 400_000 }).map((n) => (n / 1000).toFixed(3)),
    packUnit: fc.constantFrom('g', 'mL'),
    price: fc.integer({ min: 1, max: 900_000 }).map((n) => (n / 1000).toFixed(3)),
    currency: fc.constantFrom('EUR', 'EUR', 'USD'),
  });
  const quality = fc.record({
    densityGPerMl: fc.option(fc.integer({ min: 6000, max: 15_000 }).map((n) => (n / 10_000).toFixed(4))),
    offers: fc.array(offer, { maxLength: 4 }),
    preferred: fc.boolean(),
  });

  it('in the database is the order of the exact costs that are shown', async () => {
    const some = await materialHouse();
    for (const qualities of fc.sample(fc.array(quality, { maxLength: 3 }), 40)) {
      const { id } = await createMaterial(some.owner, aMaterial());
      for (const each of qualities)
        await createQuality(
          some.owner,
          id,
          aQuality(some, { ...each, offers: each.offers.map((terms) => anOffer(terms)) }),
        );
    }
    for (const pack of ['1', '25', '100', '333.333', '5000']) {
      const { items } = await listMaterials(some.owner, query({ sort: 'price', pack }));
      const costs = items.map(({ costPerKg }) => (costPerKg?.value ? Number(costPerKg.value) : Infinity));
      expect(costs.filter(Number.isFinite).length).toBeGreaterThan(10);
      expect(costs).toEqual(costs.toSorted((a, b) => a - b));
      const cheap = costs[5] ?? 0;
      const cut = await listMaterials(some.owner, query({ maxPrice: cheap.toFixed(4), pack }));
      expect(Math.abs(cut.total - costs.filter((cost) => cost <= cheap).length)).toBeLessThanOrEqual(1);
    }
  });
});
