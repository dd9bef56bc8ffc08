import { expect, it } from 'vitest';
import { changesSince } from '@/lib/shared/blend-changes';
import { limitsInForce, limitVerdicts } from '@/lib/shared/limit-verdict';
import { candidate, TABLES } from '../../support/blend-inputs';

const oil = candidate('oil', { costPerKg: '100', constituents: [{ id: 'c1', max: 0.2, typical: 0.1 }] });
const musk = candidate('musk', { costPerKg: '50' });
const lines = [
  { share: 0.5, material: oil },
  { share: 0.5, material: musk },
];
const limits = limitsInForce(TABLES, '4');
const then = { lines, verdicts: limitVerdicts(limits.applied, lines, 0.2), concentrate: 0.2, currency: 'EUR' };
const today = (oilToday: Partial<typeof oil> | null = {}, at = limits) =>
  changesSince(then, {
    candidates: new Map([['musk', musk] as const, ...(oilToday ? [['oil', { ...oil, ...oilToday }] as const] : [])]),
    limits: at,
  }).map(({ words }) => words);

it('says nothing when nothing has changed', () => {
  expect(today()).toEqual([]);
});

it('says by how much the blend and its materials are dearer', () => {
  expect(today({ costPerKg: '150' })).toEqual([
    'The blend would be dearer today: 100 EUR/kg instead of 75.00 EUR/kg (+33.3 %).',
    'Oil is dearer: 150 EUR/kg instead of 100 EUR/kg (+50 %).',
  ]);
});

it('names a material that is gone, and one without a price', () => {
  expect(today(null)).toEqual(['Oil is not in the library any more.']);
  expect(today({ costPerKg: null, costReason: 'Its preferred quality has no offer.' })).toEqual([
    'Oil has no price today. Its preferred quality has no offer.',
  ]);
});

it('says when a limit changed and what it would be today', () => {
  const tighter = { ...limits, applied: limits.applied.map((limit) => ({ ...limit, maxFraction: 0.01 })) };
  expect(today({}, tighter)).toEqual([
    'The limit on One (Trial limits) is 1 % in the product today instead of 5 %.',
    'The limit on One (Trial limits) would be exceeded today; it was met.',
  ]);
  expect(today({}, { applied: [], withoutFigure: [] })).toEqual([
    'The limit on One (Trial limits) is not in force any more.',
  ]);
});

it('says when a composition or a rating is stated otherwise', () => {
  expect(today({ profile: [1, 0, 0] })[0]).toMatch(/rated otherwise today/);
  expect(today({ completeness: 'declared' })).toEqual([
    'The composition of Oil is stated otherwise today.',
    'The limit on One (Trial limits) would be unknown today; it was met.',
  ]);
});
