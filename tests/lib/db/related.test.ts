import { expect, it } from 'vitest';
import { materials } from '@/db/schema';
import { Invalid, NotFound } from '@/lib/errors';
import { newId } from '@/lib/id';
import { relatedMapOf } from '@/lib/related/queries';
import { relatedMap, relatedQuery } from '@/lib/shared/related';
import { canaryHouse } from '../../support/canary-house';
import { db, makeMember, makeTeam } from '../../support/database';

const query = (asked: Record<string, string>) => relatedQuery.parse(asked);

async function studentOf(house: { team: { id: string; name: string; currency: string; isDemo: boolean } }) {
  return makeMember(house.team, 'student');
}

it('links materials by the facets they share, and names those', async () => {
  const house = await canaryHouse('House of Ferns');
  const answer = await relatedMapOf(await studentOf(house), query({}));
  expect(relatedMap.parse(answer)).toEqual(answer);
  expect(answer.nodes.map(({ name }) => name)).toEqual(['Rosewater', 'Stem']);
  // Rosewater (8, 3, 1), Stem (5, 6, 2): cosine = 60 / (sqrt 74 * sqrt 65); of each facet the lesser is shared.
  expect(answer.links).toHaveLength(1);
  expect(answer.links[0]?.similarity).toBeCloseTo(60 / Math.sqrt(74 * 65), 12);
  expect(answer.links[0]?.shared).toEqual(['Rosy', 'Green', 'Woody']);
});

it('links materials by the constituents they share', async () => {
  const house = await canaryHouse('House of Reeds');
  const { links } = await relatedMapOf(await studentOf(house), query({ by: 'constituents' }));
  expect(links).toMatchObject([{ similarity: 1, shared: ['Geraniol'] }]);
});

it('keeps only those that smell plainly of all chosen facets', async () => {
  const house = await canaryHouse('House of Sedge');
  const student = await studentOf(house);
  const names = async (facets: string) =>
    (await relatedMapOf(student, query({ facets }))).nodes.map(({ name }) => name);
  expect(await names('rosy,green')).toEqual(['Rosewater', 'Stem']);
  expect(await names('green,woody')).toEqual(['Stem']);
  await expect(names('rosy,mossy')).rejects.toThrow(Invalid);
});

it('shows one material with what it is linked to, and nothing for one that isn’t ours', async () => {
  const [house, other] = [await canaryHouse('House of Rush'), await canaryHouse('House of Cress')];
  const student = await studentOf(house);
  const focus = house.materials[0];
  expect((await relatedMapOf(student, query({ focus }))).nodes).toHaveLength(2);
  expect((await relatedMapOf(student, query({ focus, min: '1' }))).nodes.map(({ id }) => id)).toEqual([focus]);
  await expect(relatedMapOf(student, query({ focus: other.materials[0] }))).rejects.toThrow(NotFound);
  await expect(relatedMapOf(student, query({ focus: newId() }))).rejects.toThrow(NotFound);
});

it('leaves out what has no smell, and answers a house with nothing in it', async () => {
  const house = await canaryHouse('House of Glass');
  const id = newId();
  await db.insert(materials).values({
    ...{ teamId: house.team.id, id, name: 'Dipropylene glycol', kind: 'solvent', smell: 'None.', naturalShare: '0' },
    ...{ strength: 0, strengthSpread: 1, strengthClass: 'odourless', strengthSource: 'Invented' },
  });
  const student = await studentOf(house);
  expect((await relatedMapOf(student, query({}))).nodes.map((node) => node.id)).not.toContain(id);
  const empty = await makeMember(await makeTeam(), 'student');
  expect(await relatedMapOf(empty, query({}))).toEqual({ by: 'facets', facets: [], nodes: [], links: [] });
});
