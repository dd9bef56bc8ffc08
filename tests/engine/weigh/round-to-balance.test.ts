import fc from 'fast-check';
import { expect, it } from 'vitest';
import { EngineInputError } from '@/engine/errors';
import { inGrams, roundToBalance } from '@/engine/weigh/round-to-balance';

const named = (shares: number[]) => shares.map((share, index) => ({ id: `line ${index}`, share }));
const gramsOf = (lines: { grams: number }[]) => lines.map((line) => line.grams);

it("gives Hamilton's example its seats, and says which line vanished", () => {
  // Published shape of the largest-remainder method, from memory; recomputed by hand.
  const lines = roundToBalance(named([47000, 16000, 15800, 12000, 6100, 3100]), 10, 1);
  expect(gramsOf(lines)).toEqual([5, 2, 1, 1, 1, 0]);
  expect(lines.map((line) => line.vanished)).toEqual([false, false, false, false, false, true]);
});

it('keeps the sum of a bench example where rounding each line alone gives 501 units', () => {
  const shares = [0.3333, 0.2777, 0.1111, 0.1111, 0.0999, 0.0444, 0.0225];
  const alone = shares.reduce((sum, share) => sum + Math.round(share * 500), 0);
  expect(alone).toBe(501);
  expect(gramsOf(roundToBalance(named(shares), 5, 0.01))).toEqual([1.67, 1.39, 0.56, 0.55, 0.5, 0.22, 0.11]);
});

const shares = fc.array(fc.oneof(fc.constant(0), fc.double({ min: 1e-9, max: 1, noNaN: true })), {
  minLength: 1,
  maxLength: 12,
});
const readability = fc.constantFrom(0.0001, 0.001, 0.002, 0.005, 0.01, 0.1, 1, 5);
const batch = fc.double({ min: 5, max: 5000, noNaN: true });

it('sums exactly, stays within one unit of every exact mass, and flags what vanished', () => {
  fc.assert(
    fc.property(shares, batch, readability, (parts, grams, step) => {
      const sum = parts.reduce((all, part) => all + part, 0);
      fc.pre(sum > 0);
      const lines = roundToBalance(named(parts), grams, step);
      const units = lines.map((line) => Math.round(line.grams / step));
      const all = Math.round(grams / step);
      expect(units.reduce((total, count) => total + count, 0)).toBe(all);
      for (const [index, line] of lines.entries()) {
        expect(line.grams).toBe(inGrams(units[index]!, step));
        expect(Math.abs(units[index]! - (parts[index]! / sum) * all)).toBeLessThan(1 + 1e-6);
        expect(line.vanished).toBe(parts[index]! > 0 && line.grams === 0);
        if (parts[index] === 0) expect(line.grams).toBe(0);
      }
    }),
  );
});

it('never gives more to a smaller share', () => {
  fc.assert(
    fc.property(shares, batch, readability, (parts, grams, step) => {
      fc.pre(parts.some((part) => part > 0));
      const sorted = [...parts].sort((a, b) => b - a);
      const masses = gramsOf(roundToBalance(named(sorted), grams, step));
      for (let index = 1; index < masses.length; index++) expect(masses[index]).toBeLessThanOrEqual(masses[index - 1]!);
    }),
  );
});

it('does not depend on the order of the lines: ties go to the first id', () => {
  const tied = ['c', 'a', 'b'].map((id) => ({ id, share: 1 }));
  expect(roundToBalance(tied, 1, 0.1).map((line) => `${line.id} ${line.grams}`)).toEqual(['c 0.3', 'a 0.4', 'b 0.3']);
});

it('writes masses without binary noise', () => {
  expect(gramsOf(roundToBalance(named([0.3, 0.7]), 1, 0.1))).toEqual([0.3, 0.7]);
  expect(inGrams(3, 1e-7)).toBe(3e-7);
});

it('refuses what cannot be weighed', () => {
  for (const [lines, grams, step] of [
    [[], 1, 0.1],
    [named([0, 0]), 1, 0.1],
    [named([1, -1]), 1, 0.1],
    [named([1]), 0.04, 0.1],
    [named([1]), 1, 0],
    [named([1]), Number.NaN, 0.1],
    [[...named([1]), ...named([1])], 1, 0.1],
  ] as const) {
    expect(() => roundToBalance([...lines], grams, step)).toThrow(EngineInputError);
  }
});
