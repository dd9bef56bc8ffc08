import fc from 'fast-check';
import { expect, it } from 'vitest';
import { exactCost, keepsCeiling } from '@/lib/blends/money';
import { storedShares } from '@/lib/blends/shares';
import { Decimal } from '@/lib/shared/decimal';

const shares = fc.array(fc.double({ min: 1e-9, max: 1, noNaN: true }), { minLength: 1, maxLength: 40 }).map((list) => {
  const sum = list.reduce((total, share) => total + share, 0);
  return list.map((share) => share / sum);
});

it('stores shares that sum to exactly 1, none off by more than a unit of its column', () => {
  fc.assert(
    fc.property(shares, (list) => {
      const stored = storedShares(list);
      expect(stored.reduce((sum, share) => sum.plus(share), new Decimal(0)).toFixed()).toBe('1');
      for (const [index, share] of stored.entries()) {
        expect(share).toMatch(/^[01]\.\d{14}$/);
        expect(Math.abs(Number(share) - list[index]!)).toBeLessThan(1.1e-14);
      }
    }),
  );
});

it('costs a blend exactly', () => {
  const lines = [
    { share: '0.10000000000000', costPerKg: '0.3', strength: 2 },
    { share: '0.90000000000000', costPerKg: '0.1', strength: 1 },
  ];
  const cost = exactCost(lines, 2);
  expect(cost.perKg.toFixed()).toBe('0.12');
  expect(cost.atEqualStrength.toFixed(6)).toBe('0.218182');
});

it('holds a ceiling to a billionth', () => {
  const cost = exactCost([{ share: '1.00000000000000', costPerKg: '100.0000002', strength: 1 }], 1);
  expect(keepsCeiling(cost, { basis: 'per kg', amount: '100' })).toBe(false);
  expect(keepsCeiling(cost, { basis: 'per kg', amount: '100.0000001' })).toBe(true);
  expect(keepsCeiling(cost, null)).toBe(true);
});

it('ends at once for a blend without lines', () => {
  expect(storedShares([])).toEqual([]);
});
