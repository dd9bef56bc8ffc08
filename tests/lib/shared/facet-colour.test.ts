import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  chromaInGamut,
  facetColour,
  facetHatching,
  facetLch,
  HATCHINGS,
  oklchToLinearSrgb,
} from '@/lib/shared/facet-colour';

const tone = fc.record({
  hueDeg: fc.double({ min: -720, max: 720, noNaN: true }),
  lightness: fc.double({ min: 0, max: 1, noNaN: true }),
});

describe('facetColour', () => {
  it('is a colour that every sRGB screen can show, on both grounds', () => {
    fc.assert(
      fc.property(tone, fc.constantFrom('light' as const, 'dark' as const), (facet, ground) => {
        const { l, c, h } = facetLch(facet, ground);
        for (const channel of oklchToLinearSrgb(l, c, h)) {
          expect(channel).toBeGreaterThan(-1e-3);
          expect(channel).toBeLessThan(1 + 1e-3);
        }
        expect(c).toBeGreaterThan(0.05);
      }),
    );
  });

  it('keeps the hue and never swaps the order of two lightnesses', () => {
    fc.assert(
      fc.property(tone, fc.double({ min: 0, max: 1, noNaN: true }), (facet, other) => {
        const a = facetLch(facet, 'light');
        const b = facetLch({ ...facet, lightness: other }, 'light');
        expect(a.h).toBeCloseTo(((facet.hueDeg % 360) + 360) % 360, 9);
        expect(Math.sign(a.l - b.l) * Math.sign(facet.lightness - other)).toBeGreaterThanOrEqual(0);
      }),
    );
  });

  it('follows the theme by itself', () => {
    expect(facetColour({ hueDeg: 5, lightness: 0.78 })).toMatch(
      /^light-dark\(oklch\(0\.815 0\.\d{3} 5\.0\), oklch\(0\.840 0\.\d{3} 5\.0\)\)$/,
    );
  });

  // CSS Color 4 prints sRGB red as oklch(0.62796 0.25768 29.234): its edge of the gamut lies there.
  it('finds the edge of sRGB where it is known to be', () => {
    expect(chromaInGamut(0.62796, 29.234)).toBeCloseTo(0.2577, 2);
    const [r, g, b] = oklchToLinearSrgb(0.62796, 0.25768, 29.234);
    expect(r).toBeCloseTo(1, 3);
    expect(g).toBeCloseTo(0, 3);
    expect(b).toBeCloseTo(0, 3);
  });

  it('hatches neighbours on the circle of families unlike', () => {
    for (let tenth = 0; tenth < 10; tenth++) {
      const here = facetHatching({ hueDeg: tenth * 36 + 1, lightness: 0.7 });
      const next = facetHatching({ hueDeg: tenth * 36 + 37, lightness: 0.7 });
      expect(HATCHINGS).toContain(here);
      expect(here).not.toBe(next);
    }
  });
});
