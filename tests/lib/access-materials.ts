import { and, eq } from 'drizzle-orm';
import { materials, qualities } from '@/db/schema';
import { newId } from '@/lib/id';
import { ROLES, type Role } from '@/lib/shared/permissions';
import type { CanaryHouse } from '../support/canary-house';
import { db } from '../support/database';
import type { Access } from './access-matrix';

/* Who may call what of the materials, their qualities and what belongs to them. */

export function newMaterial(facetId?: string) {
  return {
    ...{ name: `Material ${newId()}`, kind: 'synthetic' as const, cas: ['106-22-9'], smell: 'Clean rose.' },
    ...{ naturalShare: '0', strength: 1.5, strengthClass: 'medium' as const, strengthSource: 'estimate' },
    facets: facetId ? [{ facetId, phase: 'all' as const, intensity: 7.5, sd: 1 }] : [],
  };
}

export function newQuality({ supplier, constituent }: { supplier: string; constituent: string }) {
  return {
    ...{ supplierId: supplier, code: newId(), grade: 'usual', completeness: 'full' as const },
    ...{ compositionSource: 'Invented', densityGPerMl: '0.9', form: 'mobile liquid' as const },
    constituents: [{ constituentId: constituent, minFraction: '0.1', maxFraction: '0.3', source: 'Invented' }],
    offers: [newOffer()],
  };
}

const newOffer = () => ({ packAmount: '100', packUnit: 'g', price: '7316', currency: 'EUR', offeredOn: '2026-11-02' });

const revisionOf = async (table: typeof materials | typeof qualities, teamId: string, id: string) =>
  (
    await db
      .select()
      .from(table)
      .where(and(eq(table.teamId, teamId), eq(table.id, id)))
  )[0]?.revision;

/** A row of its own to be deleted, so that the house keeps those that the other lines need. */
async function spareMaterial({ team }: CanaryHouse): Promise<string> {
  const { facets: _, cas: __, ...row } = newMaterial();
  const id = newId();
  await db.insert(materials).values({ ...row, teamId: team.id, id, strengthSpread: 1 });
  return id;
}

async function spareQuality(house: CanaryHouse): Promise<string> {
  const { constituents: _, offers: __, ...row } = newQuality(house);
  const id = newId();
  await db.insert(qualities).values({ ...row, teamId: house.team.id, id, materialId: house.materials[1] });
  return id;
}

const writers: Role[] = ['owner', 'perfumer'];
const [material, quality] = ['/api/v1/materials/[id]', '/api/v1/qualities/[id]'];

export const MATERIAL_ACCESS: readonly Access[] = [
  {
    ...{ method: 'GET', path: '/api/v1/materials', operation: 'materials.list', roles: ROLES },
    ask: () => ({ query: { q: 'e', facets: 'rosy:1' } }),
  },
  {
    ...{ method: 'POST', path: '/api/v1/materials', operation: 'materials.create', roles: writers },
    ask: (house) => ({ body: newMaterial(house.facets[0]) }),
    ids: ['body.facets.0.facetId'],
  },
  {
    ...{ method: 'GET', path: material, operation: 'materials.get', roles: ROLES },
    ask: (house) => ({ params: { id: house.materials[0] } }),
    ids: ['params.id'],
  },
  {
    ...{ method: 'PUT', path: material, operation: 'materials.update', roles: writers },
    ask: async (house) => ({
      params: { id: house.materials[1] },
      body: {
        revision: await revisionOf(materials, house.team.id, house.materials[1]),
        material: newMaterial(house.facets[0]),
      },
    }),
    ids: ['params.id', 'body.material.facets.0.facetId'],
  },
  {
    ...{ method: 'DELETE', path: material, operation: 'materials.delete', roles: writers },
    ask: async (house) => ({ params: { id: await spareMaterial(house) } }),
    ids: ['params.id'],
  },
  {
    ...{ method: 'GET', path: `${material}/related`, operation: 'materials.related', roles: ROLES },
    ask: (house) => ({ params: { id: house.materials[0] } }),
    ids: ['params.id'],
  },
  {
    ...{ method: 'POST', path: `${material}/qualities`, operation: 'qualities.create', roles: writers },
    ask: (house) => ({ params: { id: house.materials[1] }, body: newQuality(house) }),
    ids: ['params.id', 'body.supplierId', 'body.constituents.0.constituentId'],
  },
  {
    ...{ method: 'GET', path: quality, operation: 'qualities.get', roles: ROLES },
    ask: (house) => ({ params: { id: house.qualities[0] } }),
    ids: ['params.id'],
  },
  {
    ...{ method: 'PUT', path: quality, operation: 'qualities.update', roles: writers },
    ask: async (house) => ({
      params: { id: house.qualities[1] },
      body: {
        revision: await revisionOf(qualities, house.team.id, house.qualities[1]),
        quality: newQuality(house),
      },
    }),
    ids: ['params.id', 'body.quality.supplierId', 'body.quality.constituents.0.constituentId'],
  },
  {
    ...{ method: 'DELETE', path: quality, operation: 'qualities.delete', roles: writers },
    ask: async (house) => ({ params: { id: await spareQuality(house) } }),
    ids: ['params.id'],
  },
  {
    ...{
      method: 'PUT',
      path: `${quality}/offers`,
      operation: 'qualities.offers',
      roles: ['owner', 'perfumer', 'buyer'],
    },
    ask: async (house) => ({
      params: { id: house.qualities[1] },
      body: { revision: await revisionOf(qualities, house.team.id, house.qualities[1]), offers: [newOffer()] },
    }),
    ids: ['params.id'],
  },
  {
    ...{ method: 'PUT', path: `${quality}/constituents`, operation: 'qualities.constituents' },
    roles: ['owner', 'perfumer', 'safety'],
    ask: async (house) => {
      const { constituents } = newQuality(house);
      const revision = await revisionOf(qualities, house.team.id, house.qualities[1]);
      return {
        params: { id: house.qualities[1] },
        body: { revision, completeness: 'declared', compositionSource: 'Invented', constituents },
      };
    },
    ids: ['params.id', 'body.constituents.0.constituentId'],
  },
  {
    ...{ method: 'GET', path: '/api/v1/suppliers', operation: 'suppliers.list' },
    roles: ['owner', 'perfumer', 'buyer', 'safety'],
    ask: () => ({}),
  },
  {
    ...{
      method: 'POST',
      path: '/api/v1/suppliers',
      operation: 'suppliers.create',
      roles: ['owner', 'perfumer', 'buyer'],
    },
    ask: () => ({ body: { name: `Supplier ${newId()}` } }),
  },
  {
    ...{ method: 'GET', path: '/api/v1/constituents', operation: 'constituents.list', roles: ROLES },
    ask: () => ({}),
  },
  {
    ...{ method: 'POST', path: '/api/v1/constituents', operation: 'constituents.create' },
    roles: ['owner', 'perfumer', 'safety'],
    ask: () => ({ body: { name: `Constituent ${newId()}`, cas: '106-22-9' } }),
  },
];
