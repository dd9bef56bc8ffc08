import {
  constituents,
  facets,
  limitMaxima,
  limitSets,
  limits,
  limitTerms,
  materialFacets,
  materials,
  offers,
  productCategories,
  qualities,
  qualityConstituents,
  suppliers,
} from '@/db/schema';
import { startSession } from '@/lib/auth/session';
import { newId } from '@/lib/id';
import { ROLES, type Role } from '@/lib/shared/permissions';
import { db, makeMember, makeTeam } from './database';

/**
 * A house whose prices and suppliers can be told from anything else in an answer: nothing but the price holds the
 * digits 7316 or 8429, and nothing but the supplier's rows the word "heronmere".
 */
export const PRICE_CANARIES = ['7316', '8429'];
export const SUPPLIER_CANARIES = ['heronmere'];

const FIRST_PRICE = '7316.0000';
const SECOND_PRICE = '8429.0000';
const FACETS = ['rosy', 'green', 'woody'];

export type CanaryHouse = Awaited<ReturnType<typeof canaryHouse>>;

/** Two materials, one quality of each, one limit that bears on them; a member and a session for each role. */
export async function canaryHouse(name: string) {
  const team = await makeTeam({ name });
  const teamId = team.id;
  const ids = {
    facets: FACETS.map(() => newId()),
    materials: [newId(), newId()] as [string, string],
    qualities: [newId(), newId()] as [string, string],
    constituent: newId(),
    supplier: newId(),
    limitSet: newId(),
    limit: newId(),
  };
  await insertSmells(teamId, ids);
  await insertOffers(teamId, ids);
  await insertLimit(teamId, ids);
  const tokens = {} as Record<Role, string>;
  for (const role of ROLES) tokens[role] = await startSession((await makeMember(team, role)).userId, teamId);
  return { team, tokens, ...ids };
}

interface Ids {
  facets: string[];
  materials: [string, string];
  qualities: [string, string];
  constituent: string;
  supplier: string;
  limitSet: string;
  limit: string;
}

async function insertSmells(teamId: string, ids: Ids) {
  await db.insert(facets).values(
    FACETS.map((slug, position) => ({
      teamId,
      id: ids.facets[position] as string,
      slug,
      name: slug[0]?.toUpperCase() + slug.slice(1),
      family: 'Plants',
      description: `What smells ${slug}.`,
      position,
      hueDeg: String(position * 100),
      lightness: '0.700',
    })),
  );
  const material = (id: string, name: string) => ({
    ...{ teamId, id, name, kind: 'synthetic', smell: `${name}, as it smells.` },
    ...{ naturalShare: '0', strength: 2, strengthSpread: 2, strengthClass: 'medium', strengthSource: 'Invented' },
  });
  await db.insert(materials).values([material(ids.materials[0], 'Rosewater'), material(ids.materials[1], 'Stem')]);
  const smelt = (materialId: string, intensities: number[]) =>
    intensities.map((intensity, place) => ({
      ...{ teamId, materialId, facetId: ids.facets[place] as string, phase: 'all' },
      ...{ intensity: String(intensity), sd: '0.50' },
    }));
  await db
    .insert(materialFacets)
    .values([...smelt(ids.materials[0], [8, 3, 1]), ...smelt(ids.materials[1], [5, 6, 2])]);
}

async function insertOffers(teamId: string, ids: Ids) {
  await db
    .insert(suppliers)
    .values({ teamId, id: ids.supplier, name: 'Heronmere Stills', note: 'Ships from Heronmere.' });
  await db
    .insert(constituents)
    .values({ teamId, id: ids.constituent, slug: 'geraniol', name: 'Geraniol', cas: '106-24-1' });
  for (const [place, materialId] of ids.materials.entries()) {
    const qualityId = ids.qualities[place] as string;
    await db.insert(qualities).values({
      ...{ teamId, id: qualityId, materialId, supplierId: ids.supplier, code: `HERONMERE-${place}` },
      ...{ grade: 'usual', completeness: 'full', compositionSource: 'Heronmere analysis', form: 'mobile liquid' },
      densityGPerMl: '0.9000',
    });
    await db.insert(qualityConstituents).values({
      ...{ teamId, qualityId, constituentId: ids.constituent, source: 'Heronmere analysis' },
      ...{ minFraction: '0.1', typicalFraction: '0.2', maxFraction: '0.3' },
    });
    await db.insert(offers).values({
      ...{ teamId, id: newId(), qualityId, packAmount: '1000', packUnit: 'g', currency: 'EUR' },
      ...{ price: place === 0 ? FIRST_PRICE : SECOND_PRICE, offeredOn: '2026-11-02' },
    });
  }
}

async function insertLimit(teamId: string, ids: Ids) {
  await db
    .insert(productCategories)
    .values({ teamId, code: '4', name: 'Fine fragrance', exposure: 'leave-on', position: 0, source: 'Invented' });
  await db.insert(limitSets).values({
    ...{ teamId, id: ids.limitSet, slug: 'house', title: 'House rules', edition: 'first' },
    ...{ scope: 'All products', source: 'Invented' },
  });
  await db.insert(limits).values({
    ...{ teamId, id: ids.limit, setId: ids.limitSet, slug: 'geraniol', name: 'Geraniol' },
    ...{ kind: 'restriction', source: 'Invented', via: 'invented' },
  });
  await db.insert(limitTerms).values({ teamId, limitId: ids.limit, constituentId: ids.constituent, factor: '1' });
  await db.insert(limitMaxima).values({ teamId, limitId: ids.limit, category: '4', maxFraction: '0.05' });
}
