import { constituents, facets, suppliers } from '@/db/schema';
import { newId } from '@/lib/id';
import { type MaterialInput, materialInput } from '@/lib/shared/material';
import { type QualityInput, qualityInput } from '@/lib/shared/quality';
import { db, makeMember, makeTeam } from './database';

/** A house with an owner, two facets, a supplier and three constituents, for tests of materials. */
export async function materialHouse() {
  const team = await makeTeam();
  const [rosy, green] = [newId(), newId()];
  const facet = { family: 'Plants', description: 'Plain.', hueDeg: '10', lightness: '0.7' };
  await db.insert(facets).values([
    { teamId: team.id, id: rosy, slug: 'rosy', name: 'Rosy', position: 0, ...facet },
    { teamId: team.id, id: green, slug: 'green', name: 'Green', position: 1, ...facet },
  ]);
  const supplierId = newId();
  await db.insert(suppliers).values({ teamId: team.id, id: supplierId, name: 'Quiet Weir Oils' });
  const words = ['geraniol', 'linalool', 'whole-rose-oil'].map((slug) => ({
    ...{ teamId: team.id, id: newId(), slug, name: slug },
  }));
  await db.insert(constituents).values(words);
  const [geraniol = '', linalool = '', wholeRose = ''] = words.map(({ id }) => id);
  const owner = await makeMember(team, 'owner');
  return { team, owner, rosy, green, supplierId, geraniol, linalool, wholeRose };
}
export type MaterialHouse = Awaited<ReturnType<typeof materialHouse>>;

export const aMaterial = (more: Partial<Parameters<typeof materialInput.parse>[0] & object> = {}): MaterialInput =>
  materialInput.parse({
    name: `Material ${newId()}`,
    ...{ kind: 'synthetic', naturalShare: '0', strength: 1, strengthClass: 'medium', strengthSource: 'estimate' },
    ...more,
  });

export const aQuality = (house: MaterialHouse, more: object = {}): QualityInput =>
  qualityInput.parse({
    ...{ supplierId: house.supplierId, code: newId(), form: 'mobile liquid', completeness: 'unknown' },
    ...more,
  });

export const anOffer = (more: object = {}) => ({
  ...{ packAmount: '100', packUnit: 'g', price: '20', currency: 'EUR', offeredOn: '2026-11-02' },
  ...more,
});
