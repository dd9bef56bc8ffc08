import { and, count, eq, inArray } from 'drizzle-orm';
import type { MySqlColumn, MySqlTable } from 'drizzle-orm/mysql-core';
import { expect, it } from 'vitest';
import {
  constituents,
  facets,
  limitMaxima,
  limitSets,
  limits,
  limitTerms,
  materialCas,
  materialFacets,
  materialParts,
  materials,
  membershipRoles,
  offers,
  qualities,
  qualityConstituents,
  suppliers,
  teams,
} from '@/db/schema';
import { transaction } from '@/db/transaction';
import { memberOfToken } from '@/lib/auth/session';
import { newId } from '@/lib/id';
import { readDemoLibrary } from '@/lib/library/demo-files';
import { makeDemoHouse } from '@/lib/library/demo-house';
import { loadLibrary } from '@/lib/library/load-library';
import { signUp } from '@/lib/people/commands';
import { db, makeTeam } from '../../support/database';

const library = readDemoLibrary();
const LONGEST_LOAD_MS = 5000;

async function rowsOf(table: MySqlTable & { teamId: MySqlColumn }, teamId: string): Promise<number> {
  const [row] = await db.select({ rows: count() }).from(table).where(eq(table.teamId, teamId));
  return row!.rows;
}

it('puts the whole sample library into a house, row for row, in less than five seconds', async () => {
  const { id: teamId } = await makeTeam();
  const begun = performance.now();
  await transaction((tx) => loadLibrary(tx, { teamId, begin: 'sample', currency: 'EUR' }));
  expect(performance.now() - begun).toBeLessThan(LONGEST_LOAD_MS);

  const sum = <T>(items: T[], size: (item: T) => number) => items.reduce((total, item) => total + size(item), 0);
  const allLimits = library.limitSets.flatMap((set) => set.limits);
  expect(await rowsOf(facets, teamId)).toBe(library.facets.length);
  expect(await rowsOf(materials, teamId)).toBe(library.materials.length);
  expect(await rowsOf(materialCas, teamId)).toBe(sum(library.materials, (m) => m.cas.length));
  expect(await rowsOf(materialParts, teamId)).toBe(sum(library.materials, (m) => m.madeOf?.length ?? 0));
  expect(await rowsOf(materialFacets, teamId)).toBe(
    sum(library.materials, (m) => sum([m.profile, ...Object.values(m.phases ?? {})], (p) => Object.keys(p).length)),
  );
  expect(await rowsOf(constituents, teamId)).toBe(library.constituents.length);
  expect(await rowsOf(suppliers, teamId)).toBe(library.suppliers.length);
  expect(await rowsOf(qualities, teamId)).toBe(library.qualities.length);
  expect(await rowsOf(qualityConstituents, teamId)).toBe(sum(library.qualities, (q) => q.constituents.length));
  expect(await rowsOf(offers, teamId)).toBe(sum(library.qualities, (q) => q.offers.length));
  expect(await rowsOf(limitSets, teamId)).toBe(library.limitSets.length);
  expect(await rowsOf(limits, teamId)).toBe(allLimits.length);
  expect(await rowsOf(limitTerms, teamId)).toBe(sum(allLimits, (l) => l.terms.length));
  expect(await rowsOf(limitMaxima, teamId)).toBe(sum(allLimits, (l) => Object.keys(l.maxPctByCategory).length));
});

it('keeps the digits of prices, ranges and limits', async () => {
  const { id: teamId } = await makeTeam();
  const ids = await transaction((tx) => loadLibrary(tx, { teamId, begin: 'sample', currency: 'EUR' }));
  const quality = library.qualities.find((q) => q.material === 'rose-oil' && q.preferred)!;
  const qualityId = ids.qualityIds.get(quality.key)!;

  const packs = await db
    .select()
    .from(offers)
    .where(and(eq(offers.teamId, teamId), eq(offers.qualityId, qualityId)));
  expect(packs.map((p) => [p.packAmount, p.price]).sort()).toEqual(
    quality.offers.map((o) => [`${o.packAmount}.000000`, `${o.price}00`]).sort(),
  );
  const [citronellol] = await db
    .select()
    .from(qualityConstituents)
    .where(
      and(
        eq(qualityConstituents.teamId, teamId),
        eq(qualityConstituents.qualityId, qualityId),
        eq(qualityConstituents.constituentId, ids.constituentIds.get('citronellol')!),
      ),
    );
  expect(citronellol).toMatchObject({
    minFraction: '0.20000000',
    typicalFraction: '0.27000000',
    maxFraction: '0.34000000',
  });
  expect(citronellol?.source).toBe('ISO 9842:2003, Bulgarian type (memory, confidence medium)');
  const [methylEugenol] = await db
    .select({ max: limitMaxima.maxFraction })
    .from(limitMaxima)
    .innerJoin(limits, and(eq(limits.teamId, limitMaxima.teamId), eq(limits.id, limitMaxima.limitId)))
    .innerJoin(limitSets, and(eq(limitSets.teamId, limits.teamId), eq(limitSets.id, limits.setId)))
    .where(
      and(
        eq(limitMaxima.teamId, teamId),
        eq(limitSets.slug, 'eu-cosmetics'),
        eq(limits.slug, 'methyl-eugenol'),
        eq(limitMaxima.category, '5A'),
      ),
    );
  expect(methylEugenol?.max).toBe('0.00000200');
});

it('gives a house that wants only words its facets, constituents and limits, and nothing to buy', async () => {
  const { id: teamId } = await makeTeam();
  await transaction((tx) => loadLibrary(tx, { teamId, begin: 'facets', currency: 'EUR' }));
  expect(await rowsOf(facets, teamId)).toBe(library.facets.length);
  expect(await rowsOf(limitSets, teamId)).toBe(library.limitSets.length);
  expect(await rowsOf(materials, teamId)).toBe(0);
  expect(await rowsOf(suppliers, teamId)).toBe(0);
});

it('fills the house of somebody who signs up with what they chose to begin with', async () => {
  const person = { name: 'Ilse Varn', password: 'an iris under seven lamps', currency: 'EUR' as const };
  for (const begin of ['sample', 'facets'] as const) {
    const token = await signUp({ ...person, houseName: 'Quiet Moss', email: `${newId()}@house.example`, begin });
    const owner = await memberOfToken(token);
    expect(await rowsOf(limits, owner!.teamId)).toBe(library.limitSets.flatMap((set) => set.limits).length);
    expect(await rowsOf(materials, owner!.teamId)).toBe(begin === 'sample' ? library.materials.length : 0);
  }
});

it('leaves nothing behind when the transaction around it fails', async () => {
  const { id: teamId } = await makeTeam();
  const work = transaction(async (tx) => {
    await loadLibrary(tx, { teamId, begin: 'sample', currency: 'EUR' });
    throw new Error('after all');
  });
  await expect(work).rejects.toThrow('after all');
  expect(await rowsOf(facets, teamId)).toBe(0);
  expect(await rowsOf(materials, teamId)).toBe(0);
});

it('makes one demo house with a person for every role, however often it is asked', async () => {
  const made = await Promise.all([makeDemoHouse(), makeDemoHouse()]);
  expect(made.filter(Boolean)).toHaveLength(1);
  expect(await makeDemoHouse()).toBe(false);
  const houses = await db.select().from(teams).where(eq(teams.isDemo, true));
  expect(houses.map((house) => house.name)).toEqual(['Hollin & Wray']);
  const roles = await db
    .select({ role: membershipRoles.role })
    .from(membershipRoles)
    .where(
      inArray(
        membershipRoles.teamId,
        houses.map((house) => house.id),
      ),
    );
  expect(roles.map((r) => r.role).sort()).toEqual(['buyer', 'evaluator', 'owner', 'perfumer', 'safety', 'student']);
  expect(await rowsOf(materials, houses[0]!.id)).toBe(library.materials.length);
});
