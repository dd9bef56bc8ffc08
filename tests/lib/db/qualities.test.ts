import { and, eq } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { activity } from '@/db/schema';
import { Conflict, Forbidden, Invalid } from '@/lib/errors';
import { createMaterial } from '@/lib/materials/commands';
import { getMaterial } from '@/lib/materials/queries';
import { createQuality, deleteQuality, updateComposition, updateOffers, updateQuality } from '@/lib/qualities/commands';
import { getQuality } from '@/lib/qualities/queries';
import { offerInput, qualityInput } from '@/lib/shared/quality';
import { db, makeMember } from '../../support/database';
import { aMaterial, anOffer, aQuality, materialHouse } from '../../support/material-house';

const range = (constituentId: string, min: string, max: string, typical: string | null = null) => ({
  ...{ constituentId, minFraction: min, maxFraction: max, typicalFraction: typical, source: 'SDS' },
});

async function qualityHouse(more: object = {}) {
  const house = await materialHouse();
  const material = await createMaterial(house.owner, aMaterial());
  const quality = await createQuality(house.owner, material.id, aQuality(house, more));
  return { house, material, quality };
}

describe('a composition', () => {
  const full = { completeness: 'full', compositionSource: 'SDS' };

  it('whose minima exceed 100 % is refused with their sum; maxima may exceed it', async () => {
    const { house, material } = await qualityHouse();
    const make = (constituents: object[]) =>
      createQuality(house.owner, material.id, aQuality(house, { ...full, constituents }));
    await expect(
      make([range(house.geraniol, '0.6', '0.9'), range(house.linalool, '0.41', '0.9')]),
    ).rejects.toMatchObject({ fields: { constituents: expect.stringContaining('add up to 101 %') } });
    const kept = await make([range(house.geraniol, '0.6', '0.9', '0.7'), range(house.linalool, '0.4', '0.9')]);
    expect(kept.constituents.map(({ minFraction }) => Number(minFraction)).sort()).toEqual([0.4, 0.6]);
  });

  it('counts a natural complex as a whole beside what it contains, not on top of it', async () => {
    const { house, material } = await qualityHouse();
    const constituents = [range(house.wholeRose, '1', '1'), range(house.geraniol, '0.2', '0.4')];
    const kept = await createQuality(house.owner, material.id, aQuality(house, { ...full, constituents }));
    expect(kept.constituents).toHaveLength(2);
  });

  it('says which bounds of a range clash', () => {
    const fault = (constituents: object[]) =>
      qualityInput
        .safeParse({
          ...{ supplierId: 'x'.repeat(26), code: 'A', form: 'paste', ...full, constituents },
        })
        .error?.issues.map(({ path, message }) => [path.join('.'), message]);
    const id = 'c'.repeat(26);
    expect(fault([range(id, '0.5', '0.4')])).toEqual([
      ['constituents.0.maxFraction', 'Maximum 40 % is below the minimum 50 %.'],
    ]);
    expect(fault([range(id, '0.1', '0.4', '0.5')])).toEqual([
      ['constituents.0.typicalFraction', 'Typical 50 % is above the maximum 40 %.'],
    ]);
    expect(fault([range(id, '0.1', '0.4'), range(id, '0', '1')])).toEqual([
      ['constituents.1.constituentId', 'This constituent is there twice.'],
    ]);
    expect(fault([range(id, '0', '1.01')])?.[0]?.[1]).toBe('Maximum must be between 0 and 100 %; it was 101 %.');
  });

  it('is kept by those who may write nothing else of the quality', async () => {
    const { house, quality } = await qualityHouse();
    const safety = await makeMember(house.team, 'safety');
    const input = {
      ...full,
      completeness: 'declared' as const,
      revision: 1,
      constituents: [range(house.geraniol, '0', '0.01')],
    };
    const kept = await updateComposition(safety, quality.id, input);
    expect(kept).toMatchObject({ completeness: 'declared', revision: 2 });
    await expect(updateOffers(safety, quality.id, { revision: 2, offers: [] })).rejects.toBeInstanceOf(Forbidden);
  });
});

describe('a quality', () => {
  it('names the field, the rule and what was given', () => {
    const fault = (more: object) =>
      qualityInput.safeParse({ supplierId: 'x'.repeat(26), code: 'A', form: 'paste', completeness: 'unknown', ...more })
        .error?.issues[0]?.message;
    expect(fault({ densityGPerMl: '-0.9' })).toBe('Density must be above 0 g/mL; it was -0.9.');
    expect(fault({ densityGPerMl: 'heavy' })).toBe('Density must be a number; it was “heavy”.');
    expect(fault({ densityGPerMl: '0.12345' })).toBe('Density is kept to 4 decimal places; it was 0.12345.');
    expect(fault({ teamId: 'x' })).toBe('There is no field “teamId” here.');
    expect(fault({ completeness: 'full' })).toContain('Name the document');
    expect(offerInput.safeParse(anOffer({ price: '0' })).error?.issues[0]?.message).toBe(
      'Price must be above 0; it was 0.',
    );
  });

  it('that is written over an older revision conflicts, and shows what stands', async () => {
    const { house, quality } = await qualityHouse({ colour: 'pale' });
    const write = (colour: string) =>
      updateQuality(house.owner, quality.id, {
        revision: 1,
        quality: aQuality(house, { colour, offers: [anOffer()] }),
      });
    const kept = await write('amber');
    const conflict = await write('brown').catch((error: unknown) => error);
    expect(conflict).toBeInstanceOf(Conflict);
    expect((conflict as Conflict).current).toEqual(kept);
    expect(await getQuality(house.owner, quality.id)).toEqual(kept);
  });

  it('made preferred stands for the material; the others keep their order behind it', async () => {
    const { house, material, quality: first } = await qualityHouse();
    const second = await createQuality(house.owner, material.id, aQuality(house));
    const third = await createQuality(house.owner, material.id, aQuality(house, { preferred: true }));
    const order = async () => (await getMaterial(house.owner, material.id)).qualities.map(({ id }) => id);
    expect(await order()).toEqual([third.id, first.id, second.id]);
    await updateQuality(house.owner, second.id, { revision: 1, quality: aQuality(house, { preferred: true }) });
    expect(await order()).toEqual([second.id, third.id, first.id]);
    await deleteQuality(house.owner, second.id);
    expect(await order()).toEqual([third.id, first.id]);
  });

  it('has one code and grade at its supplier', async () => {
    const { house, material } = await qualityHouse({ code: 'R-1', grade: 'fine' });
    const twice = createQuality(house.owner, material.id, aQuality(house, { code: 'R-1', grade: 'fine' }));
    await expect(twice).rejects.toMatchObject({ fields: { code: expect.stringContaining('already has a quality') } });
  });

  it('takes no supplier and no constituent of another house', async () => {
    const { house, material } = await qualityHouse();
    const other = await materialHouse();
    const make = (more: object) => createQuality(house.owner, material.id, aQuality(house, more));
    await expect(make({ supplierId: other.supplierId })).rejects.toMatchObject({
      fields: { supplierId: 'The house has no such supplier.' },
    });
    const constituents = [range(other.geraniol, '0', '1')];
    await expect(make({ completeness: 'full', compositionSource: 'SDS', constituents })).rejects.toBeInstanceOf(
      Invalid,
    );
  });
});

describe('offers', () => {
  it('keep their identity when changed, and go when left out', async () => {
    const { house, quality } = await qualityHouse({ offers: [anOffer(), anOffer({ packAmount: '500', price: '70' })] });
    const [small, large] = quality.offers ?? [];
    const buyer = await makeMember(house.team, 'buyer');
    const offers = [
      { id: large?.id, ...anOffer({ packAmount: '500', price: '65' }) },
      anOffer({ packAmount: '1000', price: '110' }),
    ] as never;
    const kept = await updateOffers(buyer, quality.id, { revision: 1, offers });
    expect(kept.offers?.map(({ price }) => Number(price))).toEqual([65, 110]);
    expect(kept.offers?.[0]?.id).toBe(large?.id);
    const gone = updateOffers(buyer, quality.id, { revision: 2, offers: [{ id: small?.id, ...anOffer() }] as never });
    await expect(gone).rejects.toBeInstanceOf(Invalid);
  });

  it('of another quality are not to be had', async () => {
    const { quality: theirs } = await qualityHouse({ offers: [anOffer()] });
    const { house, quality } = await qualityHouse();
    const offers = [{ id: theirs.offers?.[0]?.id, ...anOffer() }] as never;
    await expect(updateOffers(house.owner, quality.id, { revision: 1, offers })).rejects.toBeInstanceOf(Invalid);
    expect(await getQuality(house.owner, quality.id)).toMatchObject({ revision: 1, offers: [] });
  });

  it('leave a line in the log of their material, without the price', async () => {
    const { house, material, quality } = await qualityHouse();
    await updateOffers(house.owner, quality.id, {
      revision: 1,
      offers: [offerInput.parse(anOffer({ price: '9876.5' }))],
    });
    const rows = await db
      .select()
      .from(activity)
      .where(and(eq(activity.teamId, house.team.id), eq(activity.subjectId, material.id)));
    expect(rows.map(({ action }) => action)).toContain('quality.offers');
    expect(JSON.stringify(rows)).not.toContain('9876');
  });
});
