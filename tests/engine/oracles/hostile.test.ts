import { Matrix } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import * as engine from '@/engine';
import { seededRandom } from '@/tests/support/arbitraries/random';
import { spoilt } from '@/tests/support/hostile';

const rose: engine.EngineMaterial = {
  id: 'rose',
  profile: [5, 1, 0],
  profileSd: [1, 0.5, 0],
  stageProfiles: [
    [5, 1, 0],
    [3, 1, 0],
  ],
  strength: 2,
  costPerKg: 900,
  constituents: [{ id: 'citronellol', max: 0.4, typical: 0.3 }],
  natural: 1,
  minShare: 0,
  maxShare: 0.9,
  evaporation: 0.3,
};
const wood = { ...rose, id: 'wood', profile: [0, 2, 6], strength: 0.2, costPerKg: 60, natural: 0 };
const solvent = { id: 'solvent', profile: [0, 0, 0], strength: 0, costPerKg: 3 };

const problem: engine.BlendProblem = {
  target: [4, 2, 1],
  weights: [1, 2, 1],
  candidates: [rose, wood, solvent],
  budgetPerKg: 800,
  costPerImpact: 600,
  minStrength: 0.1,
  minNatural: 0.1,
  limits: [{ id: 'sensitisers', terms: [{ constituentId: 'citronellol', factor: 1 }], max: 0.35 }],
  groups: [{ id: 'heart', members: ['rose', 'wood'], min: 0.1, max: 1 }],
  kept: [{ id: 'wood', share: 0.1 }],
  required: ['rose'],
  stages: [
    { hours: 0, weight: 1, target: [4, 2, 1] },
    { hours: 2, weight: 0.5, target: [2, 1, 1] },
  ],
};
const counting: engine.BlendProblem = { ...problem, maxMaterials: 2, minDose: 0.01 };
const lines = [
  { material: rose, share: 0.4 },
  { material: wood, share: 0.6 },
];
const run = { timeLimitMs: 50, now: () => 0, onBetter: () => {} };
const shares = lines.map(({ material, share }) => ({ id: material.id, share }));
const facets = ['rosy', 'woody', 'smoky'].map((id) => ({ id, family: `${id} things` }));

/** Sound arguments for every function that the engine exports. One without a sample here fails below. */
const SOUND: Record<string, readonly (readonly unknown[])[]> = {
  agreement: [
    [
      [
        [1, 2],
        [3, 5],
        [2, 2],
      ],
    ],
  ],
  alternativeBlends: [[problem, 2, run]],
  blendProfile: [[lines, 0.43]],
  certify: [
    [problem, engine.solveBlend(problem)],
    [counting, engine.solveBlend(counting)],
  ],
  estimateEvaporation: [[{ vapourPressurePa: 20, noteClass: 'top' }], [{ noteClass: 'base' }]],
  estimateStrength: [[{ vapourPressurePa: 20, thresholdsUgPerM3: [1, 2] }], [{ strengthClass: 'weak' }]],
  evaporate: [[lines, [0, 1, 5], { exponent: 0.5, carrier: 1 }]],
  facetHues: [
    [
      facets,
      [
        [1, 2, 0],
        [0, 3, 1],
      ],
    ],
  ],
  nnls: [
    [
      new Matrix([
        [1, 2],
        [0, 1],
        [3, 1],
      ]),
      [1, 2, 3],
    ],
  ],
  preDilution: [[0.02, 0.1]],
  profileAngle: [
    [
      [1, 2, 3],
      [3, 2, 1],
      [1, 1, 2],
    ],
  ],
  relatedMaterials: [[[rose, wood, solvent], { top: 2, minSimilarity: 0.1, by: 'facets' }]],
  roundToBalance: [[shares, 10, 0.01]],
  smallestWeighing: [[{ readabilityGrams: 0.01, repeatabilityGrams: 0.02 }, 0.01]],
  solveBlend: [
    [problem, run],
    [counting, run],
  ],
  traceFrontier: [
    [problem, 3],
    [problem, [700, 800]],
  ],
  trianglePower: [[24, 0.3]],
  triangleSimilarity: [[24, 8]],
  triangleTest: [[24, 13]],
  twoDigits: [[12.34]],
};

const exported = Object.entries(engine).filter(([name]) => /^[a-z]/.test(name)) as [
  string,
  (...args: never[]) => unknown,
][];
/** At least 50,000 spoilt calls in all. */
const CALLS = Math.ceil(50_000 / exported.length);

describe('hostile input', () => {
  it.each(exported)('gets an answer or an EngineInputError from %s, nothing else', (name, call) => {
    const random = seededRandom(name.length * 1000 + name.charCodeAt(0));
    const samples = SOUND[name];
    if (!samples) throw new Error(`${name} needs a sound sample here.`);
    for (const sample of samples) expect(() => call(...(sample as never[]))).not.toThrow();
    let refused = 0;
    for (let index = 0; index < CALLS; index++) {
      const args = spoilt(random, random.pick(samples));
      try {
        call(...(args as never[]));
      } catch (fault) {
        refused++;
        if (!(fault instanceof engine.EngineInputError)) {
          expect.fail(`${name} threw ${(fault as Error).stack} for ${shown(args)}`);
        }
      }
    }
    expect(refused).toBeGreaterThan(CALLS / 4);
  });
});

function shown(args: unknown[]): string {
  return JSON.stringify(args, (_, value) =>
    typeof value === 'number' || typeof value === 'bigint' ? String(value) : value,
  );
}
