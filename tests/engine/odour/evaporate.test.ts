import fc from 'fast-check';
import { expect, it } from 'vitest';
import type { BlendLine } from '@/engine/contract';
import { evaporate } from '@/engine/odour/evaporate';

function lines(rates: number[], shares: number[] = rates.map(() => 1)): BlendLine[] {
  return rates.map((evaporation, index) => ({
    material: {
      id: `m${index}`,
      profile: rates.map((_, i) => Number(i === index)),
      strength: 1,
      costPerKg: 1,
      evaporation,
    },
    share: shares[index]!,
  }));
}

/** K = k (sum n_0 + n_R): the table's K = (10, 1, 0.1) as rates per hour of a fresh blend. */
const tableLines = (carrier: number) => lines([10, 1, 0.1].map((rate) => rate / (3 + carrier)));

/** Amounts left of (1, 1, 1), from the closed form and from a stiff integrator at 1e-11, both computed with SciPy. */
const table: [carrier: number, hours: number, left: [number, number, number]][] = [
  [0, 0.5, [0.11316765, 0.80421511, 0.97844681]],
  [0, 1, [0.00594614, 0.59899539, 0.950041]],
  [0, 2, [3.3777255e-6, 0.28370203, 0.88162976]],
  [0, 5, [3.04e-22, 0.0070514, 0.60929486]],
  [3, 1, [0.15456079, 0.82967868, 0.98150156]],
  [3, 5, [2.15943818e-5, 0.34153411, 0.8981387]],
];

it.each(table)('agrees with a stiff integrator, carrier %d at %d h', (carrier, hours, expected) => {
  const [found] = evaporate(tableLines(carrier), [hours], { carrier });
  for (const [line, left] of expected.entries()) expect(Math.abs(found!.left[line]! - left)).toBeLessThan(1e-8);
});

it('is all gone at the end time, 11.1 h, and not before', () => {
  const [before, end, after] = evaporate(tableLines(0), [11.1 - 1e-9, 11.1 + 1e-12, 20]);
  expect(before!.left[2]).toBeGreaterThan(0);
  expect(end).toMatchObject({ intensity: 0, left: Float64Array.of(0, 0, 0), profile: Float64Array.of(0, 0, 0) });
  expect(after!.intensity).toBe(0);
});

/** Plain first order, y (.3, .4, .3), k (1.5, .3, .03): total impact and first share, computed by the exponentials. */
it.each([
  [0.25, 0.875043, 0.235631],
  [1, 0.6544, 0.102291],
  [4, 0.387297, 0.00192],
  [24, 0.146324, 0],
])('becomes first order with much carrier, at %d h', (hours, total, firstShare) => {
  const [found] = evaporate(lines([1.5, 0.3, 0.03], [0.3, 0.4, 0.3]), [hours], { carrier: 1e9 });
  expect(found!.intensity).toBeCloseTo(total, 6);
  expect(found!.profile[0]).toBeCloseTo(firstShare, 6);
});

it('lets one pure material go in a straight line, not exponentially', () => {
  const found = evaporate(lines([0.5], [1]), [0, 0.5, 1, 1.9, 2]);
  expect(found.map((at) => at.left[0])).toEqual([1, 0.75, 0.5, expect.closeTo(0.05, 12), 0]);
});

const rate = fc.double({ min: 1e-3, max: 100, noNaN: true });
const blend = fc
  .array(fc.tuple(rate, fc.double({ min: 0.01, max: 1, noNaN: true })), { minLength: 1, maxLength: 6 })
  .map((parts) => lines(...(parts[0]!.map((_, side) => parts.map((part) => part[side]!)) as [number[], number[]])));
const carrier = fc.constantFrom<number>(0, 0.1, 10);
const time = fc.double({ min: 0, max: 50, noNaN: true });

it('keeps n_i / n_i0 = (n_j / n_j0)^(k_i / k_j) at every time', () => {
  fc.assert(
    fc.property(blend, carrier, time, (mixture, n, hours) => {
      const [{ left } = { left: new Float64Array() }] = evaporate(mixture, [hours], { carrier: n });
      for (const [i, { material }] of mixture.entries()) {
        const expected = left[0]! ** (material.evaporation! / mixture[0]!.material.evaporation!);
        if (left[0]! > 1e-100) expect(left[i]).toBeCloseTo(expected, 9);
      }
    }),
  );
});

it('comes to the same after two steps as after one', () => {
  fc.assert(
    fc.property(blend, fc.constantFrom<number>(0.1, 10), time, time, (mixture, n, first, second) => {
      const [half, whole] = evaporate(mixture, [first, first + second], { carrier: n });
      const amount = (list: BlendLine[]) => list.reduce((sum, line) => sum + line.share, n);
      if (half!.intensity < 1e-12) return;
      const rest = mixture.map((line, i) => ({ ...line, share: line.share * half!.left[i]! }));
      // The rates are those of the fresh blend: what is left is smaller, and evaporates as fast.
      const faster = amount(mixture) / amount(rest);
      const renewed = rest.map((line) => ({
        ...line,
        material: { ...line.material, evaporation: line.material.evaporation! * faster },
      }));
      const [end] = evaporate(renewed, [second], { carrier: n });
      for (let i = 0; i < rest.length; i++) expect(half!.left[i]! * end!.left[i]!).toBeCloseTo(whole!.left[i]!, 9);
    }),
  );
});

it('balances the time: what left over its own rate sums to the hours passed', () => {
  fc.assert(
    fc.property(blend, carrier, time, (mixture, n, hours) => {
      const total = mixture.reduce((sum, line) => sum + line.share, n);
      const [found] = evaporate(mixture, [hours], { carrier: n });
      const exposure = -Math.log(found!.left[0]!) / (mixture[0]!.material.evaporation! * total);
      if (!(exposure < 1e3)) return;
      const passed = mixture.reduce(
        (sum, line, i) => sum + (line.share * (1 - found!.left[i]!)) / (line.material.evaporation! * total),
        n * exposure,
      );
      expect(Math.abs(passed - hours)).toBeLessThan(1e-6 * (1 + hours));
    }),
  );
});

it('leaves what has no rate, as carrier', () => {
  const [found] = evaporate(lines([5, 0], [0.5, 0.5]), [1e6]);
  expect(found!.left).toEqual(Float64Array.of(0, 1));
  expect(found!.intensity).toBe(0.5);
});
