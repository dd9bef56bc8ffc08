import type { Candidate } from '@/lib/shared/blend-candidate';
import { type BlendRequest, blendRequest } from '@/lib/shared/blend-input';
import type { BlendInputs } from '@/lib/shared/blend-problem';
import type { LimitTables } from '@/lib/shared/limit-view';

/** A small library for tests: three facets, a dear target, and materials that can stand in for it. */
export const FACETS = ['rosy', 'honeyed', 'green'];

export function candidate(id: string, over: Partial<Candidate> = {}): Candidate {
  return {
    id,
    name: id.charAt(0).toUpperCase() + id.slice(1),
    botanicalName: null,
    kind: 'synthetic',
    profile: [0, 0, 0],
    sd: [0, 0, 0],
    phases: {},
    strength: 1,
    natural: 0,
    maxShare: null,
    evaporation: null,
    costPerKg: '20',
    costReason: null,
    offer: null,
    completeness: 'full',
    constituents: [],
    ...over,
  };
}

export const absolute = candidate('absolute', {
  kind: 'absolute',
  profile: [8, 4, 1],
  strength: 6,
  natural: 1,
  costPerKg: '6000',
});

export const LIBRARY: Candidate[] = [
  absolute,
  candidate('alcohol', {
    profile: [8, 0, 1],
    strength: 1,
    costPerKg: '20',
    constituents: [{ id: 'c1', max: 1, typical: 0.97 }],
  }),
  candidate('honey', { profile: [1, 9, 0], strength: 4, natural: 1, costPerKg: '900', completeness: 'declared' }),
  candidate('leaf', { profile: [0, 0, 9], strength: 8, costPerKg: '60', maxShare: 0.02 }),
  candidate('oil', {
    profile: [8, 2, 2],
    strength: 5,
    natural: 1,
    costPerKg: '3000',
    constituents: [{ id: 'c1', max: 0.3, typical: 0.2 }],
  }),
  candidate('solvent', { strength: 0, costPerKg: '5' }),
  candidate('unpriced', { profile: [8, 4, 1], costPerKg: null, costReason: 'Its preferred quality has no offer.' }),
];

export const TABLES: LimitTables = {
  categories: [
    { code: '4', name: 'Fine fragrance', exposure: 'leave-on', source: 'invented for tests' },
    { code: '9', name: 'Soap', exposure: 'rinse-off', source: 'invented for tests' },
  ],
  constituents: [{ id: 'c1', name: 'Constituent one' }],
  sets: [
    {
      id: 's1',
      title: 'Trial limits',
      edition: 'First',
      datedOn: '2026-01-01',
      scope: 'for tests',
      source: 'invented for tests',
      inForce: true,
      limits: [
        {
          id: 'l1',
          name: 'One',
          kind: 'restriction',
          source: 'invented for tests',
          via: 'memory',
          note: null,
          terms: [{ constituentId: 'c1', factor: 1 }],
          maxima: { '4': '0.05' },
        },
      ],
    },
  ],
};

export const INPUTS: BlendInputs = { facetIds: FACETS, candidates: LIBRARY, limits: TABLES };

export function request(over: Partial<BlendRequest> = {}): BlendRequest {
  return { ...blendRequest.parse({ target: { kind: 'material', materialId: 'absolute' } }), ...over };
}
