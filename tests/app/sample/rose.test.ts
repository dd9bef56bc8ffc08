import { describe, expect, it } from 'vitest';
import library from '@/app/_sample/rose.json';
import facetFile from '@/db/demo/facets.json';
import { roseSample } from '../../support/rose-sample';

/** JSON has no undefined. */
const asWritten = (value: unknown) => JSON.parse(JSON.stringify(value));

describe('the sample that the public page carries', () => {
  it('is part of the sample library, to the last figure', () => {
    const { target, candidates } = asWritten(roseSample());
    expect(library.target).toEqual(target);
    expect(library.candidates).toEqual(candidates);
  });

  it('has the facets of the sample library, in their order', () => {
    const words = ({ id, name, family }: { id: string; name: string; family: string }) => ({ id, name, family });
    expect(library.facets.map(words)).toEqual(facetFile.facets.map(words));
  });
});
