import { expect, it } from 'vitest';
import type { BlendProblem, EngineMaterial } from '@/engine/contract';
import { EngineInputError } from '@/engine/errors';
import { checkProblem } from '@/engine/input/problem';

const rose: EngineMaterial = { id: 'rose', profile: [5, 1], strength: 2, costPerKg: 900 };
const solvent: EngineMaterial = { id: 'solvent', profile: [0, 0], strength: 0, costPerKg: 3 };
const sound: BlendProblem = { target: [4, 2], candidates: [rose, solvent] };

/** One fault each, and the field that the error must name. */
const faults: [field: string, change: Record<string, unknown>][] = [
  ['target', { target: null }],
  ['target.length', { target: [] }],
  ['target[1]', { target: [1, Number.NaN] }],
  ['weights', { weights: [1] }],
  ['weights[0]', { weights: [-1, 1] }],
  ['weights', { weights: [0, 0] }],
  ['candidates', { candidates: [solvent] }],
  ['candidates', { candidates: [] }],
  ['candidates[1]', { candidates: [rose, rose] }],
  ['candidates[0]', { candidates: [null] }],
  ['candidates[0].id', { candidates: [{ ...rose, id: '' }] }],
  ['candidates[0].profile', { candidates: [{ ...rose, profile: [1, 2, 3] }] }],
  ['candidates[0].profile[0]', { candidates: [{ ...rose, profile: [Number.POSITIVE_INFINITY, 2] }] }],
  ['candidates[0].profileSd[1]', { candidates: [{ ...rose, profileSd: [0, -1] }] }],
  ['candidates[0].strength', { candidates: [{ ...rose, strength: -1 }] }],
  ['candidates[0].strength', { candidates: [{ ...rose, strength: 1e-300 }] }],
  ['candidates[0].costPerKg', { candidates: [{ ...rose, costPerKg: '12' }] }],
  ['candidates[0].natural', { candidates: [{ ...rose, natural: 1.5 }] }],
  ['candidates[0].evaporation', { candidates: [{ ...rose, evaporation: -0.1 }] }],
  ['candidates[0].minShare', { candidates: [{ ...rose, minShare: 0.5, maxShare: 0.4 }] }],
  ['candidates[0].constituents[0].max', { candidates: [{ ...rose, constituents: [{ id: 'c', max: 30 }] }] }],
  ['budgetPerKg', { budgetPerKg: Number.NaN }],
  ['minNatural', { minNatural: 60 }],
  ['maxMaterials', { maxMaterials: 2.5 }],
  ['maxMaterials', { maxMaterials: 0 }],
  ['minDose', { minDose: -1 }],
  ['limits[0].max', { limits: [{ id: 'a', terms: [], max: -1 }] }],
  ['limits[0].terms[0].factor', { limits: [{ id: 'a', terms: [{ constituentId: 'c', factor: -1 }], max: 1 }] }],
  ['groups[0].members[0]', { groups: [{ id: 'g', members: ['nothing'] }] }],
  ['groups[0].min', { groups: [{ id: 'g', members: ['rose'], min: 0.5, max: 0.1 }] }],
  ['kept[0].id', { kept: [{ id: 'nothing', share: 0.1 }] }],
  [
    'kept[1]',
    {
      kept: [
        { id: 'rose', share: 0.1 },
        { id: 'rose', share: 0.1 },
      ],
    },
  ],
  ['required[0]', { required: ['nothing'] }],
  ['stages[0].hours', { stages: [{ hours: -1, weight: 1, target: [1, 1] }] }],
  ['stages', { stages: [{ hours: 1, weight: 0, target: [1, 1] }] }],
  [
    'candidates[0].stageProfiles',
    { stages: [{ hours: 1, weight: 1, target: [1, 1] }], candidates: [{ ...rose, stageProfiles: [] }] },
  ],
];

it('accepts a sound problem, typed arrays and a constituent that no candidate holds', () => {
  const terms = [{ constituentId: 'held by nobody', factor: 1 }];
  expect(() =>
    checkProblem({ ...sound, target: Float64Array.of(1, 2), limits: [{ id: 'a', terms, max: 0 }] }),
  ).not.toThrow();
});

it.each(faults)('names %s in a sentence (case %#)', (field, change) => {
  let fault: unknown;
  try {
    checkProblem({ ...sound, ...change } as BlendProblem);
  } catch (thrown) {
    fault = thrown;
  }
  expect(fault).toBeInstanceOf(EngineInputError);
  expect((fault as EngineInputError).path).toBe(field);
  expect((fault as EngineInputError).message).toMatch(/^[a-zA-Z].*\.$/);
});
