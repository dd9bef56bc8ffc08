import { and, eq } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { activity, materialCas, materialFacets, materials, offers, qualities, qualityConstituents } from '@/db/schema';
import { Conflict, Invalid, NotFound } from '@/lib/errors';
import { newId } from '@/lib/id';
import { createMaterial, deleteMaterial, updateMaterial } from '@/lib/materials/commands';
import { getMaterial } from '@/lib/materials/queries';
import { listRelated } from '@/lib/materials/related';
import { createQuality } from '@/lib/qualities/commands';
import type { MaterialView } from '@/lib/shared/material-view';
import { db, makeMember } from '../../support/database';
import { aMaterial, anOffer, aQuality, materialHouse } from '../../support/material-house';

const activityOf = async (teamId: string, subjectId: string) =>
  db
    .select()
    .from(activity)
    .where(and(eq(activity.teamId, teamId), eq(activity.subjectId, subjectId)));

describe('a material', () => {
  it('comes back as it was written, with what a phase changes put into its profile', async () => {
    const { owner, rosy, green } = await materialHouse();
    const input = aMaterial({
      ...{ botanicalName: 'Rosa × damascena', synonyms: ['Otto', 'Attar'], cas: ['8007-01-0', '106-22-9'] },
      facets: [
        { facetId: rosy, phase: 'all', intensity: 8.25, sd: 0.5 },
        { facetId: green, phase: 'opening', intensity: 4, sd: 1 },
      ],
      cautions: [{ code: 'sensitiser', source: 'SDS' }],
    });
    const made = await createMaterial(owner, input);
    expect(made).toMatchObject({ name: input.name, synonyms: ['Otto', 'Attar'], cas: ['8007-01-0', '106-22-9'] });
    expect(made.profile).toEqual([8.25, 0]);
    expect(made.phases).toEqual({ opening: [8.25, 4] });
    expect(made.facets).toEqual(input.facets);
    expect(await getMaterial(owner, made.id)).toEqual(made);
    expect((await activityOf(owner.teamId, made.id)).map(({ action }) => action)).toEqual(['material.create']);
  });

  it('keeps its name to itself within the house, accents and case aside', async () => {
    const { owner } = await materialHouse();
    await createMaterial(owner, aMaterial({ name: 'Vétiver' }));
    const twice = createMaterial(owner, aMaterial({ name: 'vetiver' }));
    await expect(twice).rejects.toThrow('already has a material called “vetiver”');
    await expect(twice).rejects.toBeInstanceOf(Invalid);
  });

  it('of another house is as if it had never been, whatever is asked of it', async () => {
    const [own, other] = [await materialHouse(), await materialHouse()];
    const theirs = await createMaterial(other.owner, aMaterial());
    const answers = [theirs.id, newId(), 'not-an-id'].map(async (id) => {
      const asked = [
        getMaterial(own.owner, id),
        updateMaterial(own.owner, id, { revision: 1, material: aMaterial() }),
        deleteMaterial(own.owner, id),
        listRelated(own.owner, id),
        createQuality(own.owner, id, aQuality(own)),
      ];
      return (await Promise.allSettled(asked)).map((each) => each.status === 'rejected' && each.reason);
    });
    for (const errors of await Promise.all(answers)) {
      expect(errors.map((error) => error instanceof NotFound)).toEqual([true, true, true, true, true]);
      expect(errors.map((error) => (error as Error).message)).toEqual(['', '', '', '', '']);
    }
    expect((await getMaterial(other.owner, theirs.id)).revision).toBe(1);
  });

  it('takes no facet of another house', async () => {
    const [own, other] = [await materialHouse(), await materialHouse()];
    const input = aMaterial({ facets: [{ facetId: other.rosy, phase: 'all', intensity: 5, sd: 0 }] });
    await expect(createMaterial(own.owner, input)).rejects.toMatchObject({
      fields: { 'facets.0.facetId': 'The house has no such facet.' },
    });
  });
});

describe('a stale write', () => {
  it('overwrites nothing and is answered with what stands now', async () => {
    const { owner, rosy } = await materialHouse();
    const made = await createMaterial(owner, aMaterial({ smell: 'first' }));
    const facets = [{ facetId: rosy, phase: 'all', intensity: 3, sd: 0 }];
    await updateMaterial(owner, made.id, {
      revision: 1,
      material: aMaterial({ name: made.name, smell: 'hers', facets }),
    });
    const stale = updateMaterial(owner, made.id, {
      revision: 1,
      material: aMaterial({ name: made.name, smell: 'his' }),
    });
    const conflict = await stale.catch((error: unknown) => error);
    expect(conflict).toBeInstanceOf(Conflict);
    const current = (conflict as Conflict).current as MaterialView;
    expect(current).toMatchObject({ revision: 2, smell: 'hers', profile: [3, 0] });
    expect(await getMaterial(owner, made.id)).toEqual(current);
  });

  it('is refused to all but one of ten that read the same revision', async () => {
    const { owner } = await materialHouse();
    const made = await createMaterial(owner, aMaterial());
    const writes = Array.from({ length: 10 }, (_, nose) =>
      updateMaterial(owner, made.id, { revision: 1, material: aMaterial({ name: made.name, smell: `nose ${nose}` }) }),
    );
    const settled = await Promise.allSettled(writes);
    const [kept] = settled.filter((each) => each.status === 'fulfilled');
    expect(settled.filter((each) => each.status === 'fulfilled')).toHaveLength(1);
    expect(settled.flatMap((e) => (e.status === 'rejected' ? [e.reason instanceof Conflict] : []))).toEqual(
      Array(9).fill(true),
    );
    expect(await getMaterial(owner, made.id)).toEqual(kept?.value);
  });

  it('that is at fault leaves the row and the log untouched', async () => {
    const { owner } = await materialHouse();
    const first = await createMaterial(owner, aMaterial({ name: 'Taken' }));
    const second = await createMaterial(owner, aMaterial());
    const write = updateMaterial(owner, second.id, { revision: 1, material: aMaterial({ name: first.name }) });
    await expect(write).rejects.toBeInstanceOf(Invalid);
    expect(await getMaterial(owner, second.id)).toEqual(second);
    expect(await activityOf(owner.teamId, second.id)).toHaveLength(1);
  });
});

describe('deleting a material', () => {
  it('takes its lists, qualities, compositions and offers with it, and nothing else', async () => {
    const house = await materialHouse();
    const { owner, rosy, geraniol } = house;
    const lists = { cas: ['106-22-9'], facets: [{ facetId: rosy, phase: 'all', intensity: 1, sd: 0 }] };
    const [goes, stays] = [
      await createMaterial(owner, aMaterial(lists)),
      await createMaterial(owner, aMaterial(lists)),
    ];
    for (const { id } of [goes, stays])
      await createQuality(owner, id, {
        ...aQuality(house, { completeness: 'full', compositionSource: 'SDS' }),
        constituents: [
          { constituentId: geraniol, minFraction: '0', typicalFraction: null, maxFraction: '1', source: 'SDS' },
        ],
        offers: [anOffer() as never],
      });
    await deleteMaterial(owner, goes.id);
    await expect(getMaterial(owner, goes.id)).rejects.toBeInstanceOf(NotFound);
    for (const table of [materials, materialCas, materialFacets, qualities, qualityConstituents, offers])
      expect(await db.select().from(table).where(eq(table.teamId, owner.teamId))).toHaveLength(1);
    expect((await activityOf(owner.teamId, goes.id)).map(({ action }) => action)).toContain('material.delete');
  });
});

it('shows a material without its prices and suppliers to those who may not see them', async () => {
  const house = await materialHouse();
  const made = await createMaterial(house.owner, aMaterial());
  await createQuality(house.owner, made.id, aQuality(house, { offers: [anOffer()] }));
  const [full] = (await getMaterial(house.owner, made.id)).qualities;
  expect(full?.offers?.[0]?.costPerKg.value).toBe('200.0000');
  expect(full?.supplier?.name).toBe('Quiet Weir Oils');
  const student = await getMaterial(await makeMember(house.team, 'student'), made.id);
  for (const hidden of ['offers', 'supplier', 'code', 'compositionSource'])
    expect(student.qualities[0]).not.toHaveProperty(hidden);
  expect(student).not.toHaveProperty('currency');
  const safety = await getMaterial(await makeMember(house.team, 'safety'), made.id);
  expect(safety.qualities[0]).toHaveProperty('supplier');
  expect(safety.qualities[0]).not.toHaveProperty('offers');
});

it('lists what smells alike, closest first, with the facets that both have', async () => {
  const { owner, rosy, green } = await materialHouse();
  const smelling = (name: string, r: number, g: number) =>
    createMaterial(
      owner,
      aMaterial({
        name,
        facets: [
          { facetId: rosy, phase: 'all', intensity: r, sd: 0 },
          { facetId: green, phase: 'all', intensity: g, sd: 0 },
        ],
      }),
    );
  const rose = await smelling('Rose', 8, 1);
  await smelling('Near', 7, 1);
  await smelling('Further', 5, 5);
  await smelling('Leaf', 0, 9);
  const related = await listRelated(owner, rose.id);
  expect(related.map(({ name }) => name)).toEqual(['Near', 'Further']);
  expect(related[0]?.similarity).toBeCloseTo(57 / (Math.sqrt(65) * Math.sqrt(50)), 12);
  expect(related[0]?.sharedFacetIds).toEqual([rosy, green]);
});
