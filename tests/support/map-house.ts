import { facets } from '@/db/schema';
import { newId } from '@/lib/id';
import { createMaterial } from '@/lib/materials/commands';
import { db, makeMember, makeTeam } from './database';
import { aMaterial } from './material-house';

/** Name to intensities of rosy, woody and green. */
const SMELLS: Record<string, [number, number, number]> = {
  Petal: [8, 0, 2],
  Bud: [6, 0, 5],
  Bark: [0, 9, 1],
  Root: [0, 7, 3],
  Rosewood: [5, 4, 1],
  'Pink pepper': [7, 2, 2],
  Stem: [0, 0, 9],
};

/** A house for tests of the map: Rosewood holds rosy and woody in balance, Pink pepper leans to rosy. */
export async function mapHouse() {
  const team = await makeTeam({ name: 'House of Paths' });
  const ids = ['rosy', 'woody', 'green'].map((slug, position) => ({
    ...{ teamId: team.id, id: newId(), slug, name: `${slug[0]?.toUpperCase()}${slug.slice(1)}`, position },
    ...{ family: `${slug} things`, description: 'Plain.', hueDeg: String(position * 110), lightness: '0.7' },
  }));
  await db.insert(facets).values(ids);
  const perfumer = await makeMember(team, 'perfumer');
  for (const [name, smell] of Object.entries(SMELLS)) {
    const intensities = smell.map((intensity, place) => ({ facetId: ids[place]?.id ?? '', intensity }));
    await createMaterial(
      perfumer,
      aMaterial({
        name,
        smell: `${name} as one finds it.`,
        facets: intensities
          .filter(({ intensity }) => intensity > 0)
          .map((each) => ({ ...each, phase: 'all' as const, sd: 1 })),
      }),
    );
  }
  return { team, perfumer, student: await makeMember(team, 'student') };
}
