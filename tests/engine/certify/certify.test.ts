import { expect, it } from 'vitest';
import { certify } from '@/engine/certify/certify';
import type { BlendProblem, BlendSolution, EngineMaterial } from '@/engine/contract';
import { EngineInputError } from '@/engine/errors';

/**
 * Two facets, one material for each; a ceiling on the price per kg. Solved by hand: the impact share a of the first is
 * (B - 2) / ((10 - B)/4 + B - 2), E = 2 (a - 1/2)^2. At B = 3: a = 4/11, distance 3/22, slope of the distance -32/121.
 */
const first: EngineMaterial = { id: 'a', profile: [1, 0], strength: 4, costPerKg: 10 };
const second: EngineMaterial = { id: 'b', profile: [0, 1], strength: 1, costPerKg: 2 };
const byHand: BlendProblem = { target: [0.5, 0.5], candidates: [first, second], budgetPerKg: 3 };
const sumZ = 8 / 11;
const objective = 2 * (3 / 22) ** 2;

const answer: BlendSolution = {
  status: 'optimal',
  lines: [
    { id: 'a', share: 1 / 8, impact: 4 / 11 },
    { id: 'b', share: 7 / 8, impact: 7 / 11 },
  ],
  profile: [4 / 11, 7 / 11],
  distance: 3 / 22,
  expectedDistance: 3 / 22,
  angle: Math.atan2(7, 4) - Math.PI / 4,
  costPerKg: 3,
  costPerImpact: 3 / (11 / 8),
  strength: 11 / 8,
  natural: 0,
  exponent: 1,
  objective,
  bound: objective,
  kktResidual: 0,
  prices: [{ rule: 'budgetPerKg', side: 'max', slack: 0, multiplier: (2 * 2 * (3 / 22) * (32 / 121)) / sumZ }],
  warnings: [],
  nodes: 0,
  iterations: 0,
};

const none: BlendSolution = {
  ...answer,
  status: 'infeasible',
  lines: [],
  prices: [],
  ...({ objective: null, bound: null, distance: null } as unknown as Partial<BlendSolution>),
};

it('confirms the blend that was solved by hand, and its bound', () => {
  const found = certify(byHand, answer);
  expect(found).toMatchObject({ feasible: true, boundProven: true, infeasibilityProven: false, agrees: true });
  expect(found.objective).toBeCloseTo(0.03719008, 8);
  expect(Math.abs(found.gap)).toBeLessThan(1e-15);
  expect(found.worstViolation).toBeLessThan(1e-15);
});

it('confirms the inverse-variance weights of two materials with the same profile', () => {
  const candidates = [
    { id: 'a', profile: [1], profileSd: [1], strength: 1, costPerKg: 1 },
    { id: 'b', profile: [1], profileSd: [2], strength: 1, costPerKg: 1 },
  ];
  const solution = {
    ...answer,
    lines: [
      { id: 'a', share: 0.8, impact: 0.8 },
      { id: 'b', share: 0.2, impact: 0.2 },
    ],
    ...{
      profile: [1],
      distance: 0,
      expectedDistance: Math.sqrt(0.8),
      angle: 0,
      prices: [],
      objective: 0.8,
      bound: 0.8,
    },
    ...{ costPerKg: 1, costPerImpact: 1, strength: 1 },
  };
  expect(certify({ target: [1], candidates }, solution)).toMatchObject({ boundProven: true, agrees: true });
});

const wrong: [what: string, change: Partial<BlendSolution>][] = [
  ['a multiplier that proves no bound', { prices: [] }],
  ['a bound above the optimum', { bound: objective * 1.1 }],
  ['another objective', { objective: objective * 1.01 }],
  ['another distance', { distance: 0.13 }],
  ['another expected distance', { expectedDistance: 0.13 }],
  ['another price', { costPerKg: 2.9 }],
  ['another price at equal strength', { costPerImpact: 2 }],
  ['another strength', { strength: 1.4 }],
  ['another natural share', { natural: 0.1 }],
  ['another angle', { angle: 0.3 }],
  ['no angle', { angle: null }],
  ['another profile', { profile: [0.5, 0.5] }],
  ['another impact', { lines: [answer.lines[0]!, { ...answer.lines[1]!, impact: 0.5 }] }],
  ['shares that do not sum to 1', { lines: answer.lines.map((line) => ({ ...line, share: line.share * 1.001 })) }],
  ['numbers that are missing', { distance: Number.NaN }],
];

it.each(wrong)('does not agree with %s', (_, change) => {
  expect(certify(byHand, { ...answer, ...change }).agrees).toBe(false);
});

it('says by how much a rule is broken, relative to its limit', () => {
  const found = certify({ ...byHand, budgetPerKg: 2.5 }, answer);
  expect(found.feasible).toBe(false);
  expect(found.worstViolation).toBeCloseTo(0.2, 12);
});

it('sees a rule that counts materials broken, and claims no proof for such rules', () => {
  expect(certify({ ...byHand, maxMaterials: 1 }, answer)).toMatchObject({ feasible: false, boundProven: false });
  expect(certify({ ...byHand, minDose: 0.2 }, answer).worstViolation).toBeCloseTo(1 - 0.125 / 0.2, 12);
  expect(certify({ ...byHand, minDose: 0.1, maxMaterials: 2 }, answer)).toMatchObject({
    feasible: true,
    boundProven: false,
    agrees: true,
  });
});

it('lets a kept line be smaller than the smallest dose', () => {
  const kept = [{ id: 'a', share: 1 / 8 }];
  expect(certify({ ...byHand, kept, minDose: 0.5 }, answer).feasible).toBe(true);
});

it('proves by a Farkas vector that nothing is cheap enough', () => {
  const problem = { ...byHand, budgetPerKg: 1 };
  const farkas = [{ rule: 'budgetPerKg', multiplier: 1 }];
  expect(certify(problem, { ...none, farkas })).toMatchObject({ infeasibilityProven: true, agrees: true });
  expect(certify(problem, none)).toMatchObject({ infeasibilityProven: false, agrees: false });
  expect(certify(byHand, { ...none, farkas }).infeasibilityProven).toBe(false);
});

it('takes a negative multiplier from a kept line only', () => {
  const kept = [{ id: 'a', share: 0.5 }];
  const groups = [{ id: 'g', members: ['a'], max: 0.2 }];
  const farkas = (sign: number) => [
    { rule: 'kept:a', multiplier: -10 },
    { rule: 'group:g', side: 'max' as const, multiplier: sign * 15 },
  ];
  const problem = { ...byHand, kept, groups };
  expect(certify(problem, { ...none, farkas: farkas(1) }).infeasibilityProven).toBe(true);
  expect(certify(problem, { ...none, farkas: farkas(-1) }).infeasibilityProven).toBe(false);
});

it('asks an odourless material to be outweighed too before it calls anything impossible', () => {
  const water: EngineMaterial = { id: 'water', profile: [0, 0], strength: 0, costPerKg: 0.5 };
  const problem = { ...byHand, budgetPerKg: 1, candidates: [first, second, water] };
  const farkas = [{ rule: 'budgetPerKg', multiplier: 1 }];
  expect(certify(problem, { ...none, farkas }).infeasibilityProven).toBe(false);
});

it('refuses an answer to another problem', () => {
  const lines = [{ id: 'c', share: 1, impact: 1 }];
  expect(() => certify(byHand, { ...answer, lines })).toThrow(EngineInputError);
  expect(() => certify(byHand, { ...answer, prices: [{ rule: 'limit:x', slack: 0, multiplier: 1 }] })).toThrow(
    EngineInputError,
  );
});
