import fc from 'fast-check';
import { expect, it } from 'vitest';
import { byUrgency, limitsInForce, limitVerdicts } from '@/lib/shared/limit-verdict';
import { candidate, TABLES } from '../../support/blend-inputs';

const [limit] = limitsInForce(TABLES, '4').applied;
const holding = (max: number, typical = max / 2) => candidate('oil', { constituents: [{ id: 'c1', max, typical }] });
const opaque = candidate('opaque', { completeness: 'declared' });

const verdictOf = (lines: Parameters<typeof limitVerdicts>[1], concentrate: number) =>
  limitVerdicts([limit!], lines, concentrate)[0]!;

it('counts the worst case, in the product, and names what brings it', () => {
  const verdict = verdictOf([{ share: 0.5, material: holding(0.4, 0.3) }], 0.2);
  expect(verdict).toMatchObject({ verdict: 'met', from: [{ name: 'Oil' }], unknownBecause: [] });
  expect(verdict.worst).toBeCloseTo(0.04, 12);
  expect(verdict.typical).toBeCloseTo(0.03, 12);
  expect(verdict.margin).toBeCloseTo(0.01, 12);
});

it('says exceeded as soon as the worst case is above, though the usual case is below', () => {
  const verdict = verdictOf([{ share: 1, material: holding(0.3, 0.1) }], 0.2);
  expect(verdict.verdict).toBe('exceeded');
  expect(verdict.typical).toBeLessThan(limit!.maxFraction);
});

it('never says met while one composition is incomplete, however little of it there is', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 1e-9, max: 1, noNaN: true }),
      fc.double({ min: 0, max: 1, noNaN: true }),
      (share, max) => {
        const lines = [
          { share, material: opaque },
          { share: 1 - share, material: holding(max) },
        ];
        const verdict = verdictOf(lines, 0.1);
        expect(verdict.verdict).not.toBe('met');
        expect(verdict.unknownBecause).toEqual(['Opaque']);
      },
    ),
  );
});

it('lets what is known decide: an exceeded limit stays exceeded beside an incomplete composition', () => {
  const lines = [
    { share: 0.5, material: opaque },
    { share: 0.5, material: holding(1) },
  ];
  expect(verdictOf(lines, 0.2).verdict).toBe('exceeded');
});

it('meets a limit exactly at its figure', () => {
  expect(verdictOf([{ share: 1, material: holding(0.25) }], 0.2).verdict).toBe('met');
});

it('weighs sums of ratios by their factors', () => {
  const sum = { ...limit!, terms: [{ constituentId: 'c1', factor: 2 }] };
  expect(limitVerdicts([sum], [{ share: 1, material: holding(0.2) }], 0.2)[0]!.verdict).toBe('exceeded');
});

it('passes over sets that are not in force', () => {
  const sets = TABLES.sets.map((set) => ({ ...set, inForce: false }));
  expect(limitsInForce({ ...TABLES, sets }, '4')).toEqual({ applied: [], withoutFigure: [] });
});

it('puts what is exceeded first, then what is unknown', () => {
  const verdict = verdictOf([{ share: 1, material: holding(0.1) }], 0.2);
  const order = byUrgency([verdict, { ...verdict, verdict: 'unknown' }, { ...verdict, verdict: 'exceeded' }]);
  expect(order.map((each) => each.verdict)).toEqual(['exceeded', 'unknown', 'met']);
});
