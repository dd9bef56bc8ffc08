import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { FacetTone } from '@/lib/shared/facet';
import { lastingInWords, smellInWords, stripBands } from '@/lib/shared/strip-bands';

const facet = (name: string): FacetTone => ({ id: name, name, family: 'f', hueDeg: 0, lightness: 0.7 });
const facets = ['Rosy', 'Honeyed', 'Green', 'Cedar', 'Musky', 'Waxy'].map(facet);
const profile = fc.array(fc.double({ min: 0, max: 10, noNaN: true }), { minLength: 6, maxLength: 6 });

describe('stripBands', () => {
  it('shares out the whole smell, largest first, the rest as other at the end', () => {
    fc.assert(
      fc.property(profile, fc.integer({ min: 1, max: 6 }), (intensities, most) => {
        const bands = stripBands(intensities, facets, most);
        const total = bands.reduce((sum, band) => sum + band.share, 0);
        if (intensities.some((v) => v > 0)) expect(total).toBeCloseTo(1, 9);
        else expect(bands).toEqual([]);
        const named = bands.filter((band) => band.facet);
        expect(named.length).toBeLessThanOrEqual(most);
        for (const [index, band] of named.entries())
          expect(band.share).toBeLessThanOrEqual(named[index - 1]?.share ?? 1);
        expect(bands.slice(0, -1).every((band) => band.facet !== null)).toBe(true);
      }),
    );
  });

  it('has no other where everything fits', () => {
    expect(stripBands([3, 1, 0, 0, 0, 0], facets, 4).map((band) => band.facet?.name)).toEqual(['Rosy', 'Honeyed']);
  });
});

describe('smellInWords', () => {
  it('says the three largest facets and how long', () => {
    expect(smellInWords([9, 5, 3, 1, 0, 0], facets, 24)).toBe('mostly rosy, honeyed and green; lasts a day');
  });

  it('says so where there is nothing to smell', () => {
    expect(smellInWords([0, 0, 0, 0, 0, 0], facets)).toBe('no smell');
  });

  it('never says a shorter word for a longer time', () => {
    const words = [0.2, 1, 4, 12, 24, 72, 168, 400].map(lastingInWords);
    expect(new Set(words).size).toBe(words.length);
  });
});
