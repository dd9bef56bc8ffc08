import { saveBlend } from '@/lib/blends/commands';
import { blendRequest } from '@/lib/shared/blend-input';
import type { Role } from '@/lib/shared/permissions';
import type { CanaryHouse } from '../support/canary-house';
import { makeMember } from '../support/database';
import type { Access } from './access-matrix';

/* Who may call what of blends, and of the limits and candidates that they are made of. */

const requestIn = ({ materials }: CanaryHouse) =>
  blendRequest.parse({ target: { kind: 'material', materialId: materials[0] } });

const saved = new Map<string, Promise<string>>();

/** One saved blend a house. */
function savedBlend(house: CanaryHouse): Promise<string> {
  const id = saved.get(house.team.id) ?? save(house);
  saved.set(house.team.id, id);
  return id;
}

async function save(house: CanaryHouse): Promise<string> {
  const perfumer = await makeMember(house.team, 'perfumer');
  return (await saveBlend(perfumer, { name: 'Kept', note: '', request: requestIn(house) })).id;
}

const solvers: Role[] = ['owner', 'perfumer'];
const readers: Role[] = ['owner', 'perfumer', 'safety'];

export const BLEND_ACCESS: readonly Access[] = [
  {
    ...{ method: 'GET', path: '/api/v1/limits', operation: 'limits.list', roles: readers },
    ask: () => ({}),
  },
  {
    ...{ method: 'GET', path: '/api/v1/candidates', operation: 'candidates.list', roles: solvers },
    ask: () => ({ query: { packGrams: '100' } }),
  },
  {
    ...{ method: 'GET', path: '/api/v1/blends', operation: 'blends.list', roles: readers },
    ask: async (house) => {
      await savedBlend(house);
      return {};
    },
  },
  {
    ...{ method: 'POST', path: '/api/v1/blends', operation: 'blends.save', roles: solvers },
    ask: (house) => ({ body: { name: 'Rose for a cream', request: requestIn(house) } }),
    ids: ['body.request.target.materialId'],
  },
  {
    ...{ method: 'POST', path: '/api/v1/blends/preview', operation: 'blends.preview', roles: solvers },
    ask: (house) => ({ body: { request: requestIn(house) } }),
    ids: ['body.request.target.materialId'],
  },
  {
    ...{ method: 'GET', path: '/api/v1/blends/[id]', operation: 'blends.get', roles: readers },
    ask: async (house) => ({ params: { id: await savedBlend(house) } }),
    ids: ['params.id'],
  },
];
