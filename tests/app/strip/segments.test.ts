import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { spreadLabels, stripSegments } from '@/app/_components/strip/segments';

const facets = ['a', 'b', 'c', 'd', 'e'].map((id) => ({ id, name: id, family: 'f', hueDeg: 0, lightness: 0.7 }));
const profile = fc.array(fc.double({ min: 0.01, max: 10, noNaN: true }), { minLength: 5, maxLength: 5 });

describe('stripSegments', () => {
  it('fills the length from tip to end without a gap', () => {
    fc.assert(
      fc.property(profile, profile, fc.boolean(), (whole, dry, changes) => {
        const segments = stripSegments({ facets, profile: whole, phases: changes ? { dry } : undefined }, 300, 4);
        expect(segments).toHaveLength(changes ? 3 : 1);
        const bands = segments.flatMap((segment) => segment.bands);
        let end = 0;
        for (const band of bands) {
          expect(band.y).toBeCloseTo(end, 6);
          end = band.y + band.height;
        }
        expect(end).toBeCloseTo(300, 6);
      }),
    );
  });

  it('shows a phase that is not known apart as the whole', () => {
    const [opening, heart] = stripSegments(
      { facets, profile: [1, 2, 3, 4, 5], phases: { dry: [5, 0, 0, 0, 0] } },
      90,
      4,
    );
    expect(opening?.bands.map((b) => b.share)).toEqual(heart?.bands.map((b) => b.share));
  });
});

describe('spreadLabels', () => {
  it('keeps order and distance, and stays within the length where there is room', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: 0, max: 200, noNaN: true }), { maxLength: 10 }), (wanted) => {
        const sorted = wanted.toSorted((a, b) => a - b);
        const placed = spreadLabels(sorted, 15, 200);
        for (const [index, y] of placed.entries()) {
          expect(y).toBeLessThanOrEqual(200 + 1e-9);
          if (index > 0) expect(y - (placed[index - 1] ?? 0)).toBeGreaterThanOrEqual(15 - 1e-9);
        }
      }),
    );
  });
});
