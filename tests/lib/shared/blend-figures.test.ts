import fc from 'fast-check';
import { expect, it } from 'vitest';
import { percent, pricePerKg, roundOut, roundStep, shareInColumn } from '@/lib/shared/blend-figures';

it('rounds a loosened rule to its loose side, by less than two per cent', () => {
  fc.assert(
    fc.property(fc.double({ min: 1e-6, max: 1e7, noNaN: true }), (value) => {
      const [up, down] = [roundOut(value, 'up'), roundOut(value, 'down')];
      expect(up).toBeGreaterThan(value);
      expect(down).toBeLessThan(value);
      expect(up / down).toBeLessThan(1.021);
    }),
  );
});

it('steps by 1, 2 or 5', () => {
  expect([0.07, 3, 49, 60].map(roundStep)).toEqual([0.05, 2, 20, 50]);
});

it('never shows a trace as nothing', () => {
  fc.assert(
    fc.property(fc.double({ min: 1e-12, max: 1, noNaN: true }), (share) => {
      expect(shareInColumn(share)).not.toMatch(/^0(\.0+)?$/);
      expect(percent(share)).not.toMatch(/^0(\.0+)? %$/);
    }),
  );
});

it('writes a price with its unit', () => {
  expect([pricePerKg(1240.4, 'EUR'), pricePerKg(12.4, 'EUR')]).toEqual(['1,240 EUR/kg', '12.40 EUR/kg']);
});
