import { ROLES, type Role } from '@/lib/shared/permissions';
import type { Method } from '../support/api-routes';
import type { CanaryHouse } from '../support/canary-house';
import { BLEND_ACCESS } from './access-blends';
import { MATERIAL_ACCESS } from './access-materials';

/** What a member sends. Made anew for every call, so that one call can't spoil the next. */
export interface Asked {
  params?: Record<string, string>;
  query?: Record<string, string>;
  body?: unknown;
}

/** One line for each method of each route. A route without its line fails `access.test.ts`. */
export interface Access {
  method: Method;
  path: string;
  operation: string;
  /** Who is let in, written out here a second time on purpose: the table of permissions is checked against it. */
  roles: readonly Role[];
  ask: (house: CanaryHouse) => Asked | Promise<Asked>;
  /** Where ids of the house's rows stand in what is sent, such as `params.id` or `query.focus`. */
  ids?: readonly string[];
}

const everyone = ROLES;

export const ACCESS: readonly Access[] = [
  { method: 'GET', path: '/api/v1/facets', operation: 'facets.list', roles: everyone, ask: () => ({}) },
  {
    ...{ method: 'GET', path: '/api/v1/related', operation: 'related.map', roles: everyone },
    ask: (house) => ({ query: { by: 'constituents', focus: house.materials[0] } }),
    ids: ['query.focus'],
  },
  ...MATERIAL_ACCESS,
  ...BLEND_ACCESS,
];

/** Routes outside the API of a house, and why they may stand open. */
export const OPEN_ROUTES: Readonly<Record<string, string>> = {};
