import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fuzzyFilter, fuzzyScore } from '@/lib/shared/fuzzy';

const names = ['Rose oil', 'Rose absolute', 'Geranium oil', 'Phenethyl alcohol', 'Néroli oil', 'Tuberose absolute'];
const find = (query: string) => fuzzyFilter(query, names, (name) => name);

describe('fuzzyFilter', () => {
  it('puts the beginning of a word before its middle', () => {
    expect(find('rose')).toEqual(['Rose oil', 'Rose absolute', 'Tuberose absolute']);
  });

  it('finds first letters of words, and does not mind accents', () => {
    expect(find('pa')[0]).toBe('Phenethyl alcohol');
    expect(find('neroli')).toEqual(['Néroli oil']);
  });

  it('lets one letter be left out, and no more', () => {
    expect(find('gernium')).toEqual(['Geranium oil']);
    expect(fuzzyScore('rose', 'Castoreum resinoid')).toBeNull();
  });

  it('leaves out what does not hold the letters in order', () => {
    expect(find('zz')).toEqual([]);
    expect(fuzzyScore('eso', 'rose')).toBeNull();
  });

  it('finds every name by itself, first', () => {
    fc.assert(
      fc.property(fc.constantFrom(...names), (name) => {
        expect(find(name)[0]).toBe(name);
      }),
    );
  });
});
