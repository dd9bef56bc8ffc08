import { describe, expect, it } from 'vitest';
import { emphasisOf, labelOrder } from '@/app/(house)/map/_client/emphasis';
import { answerInWords, mapInWords } from '@/app/(house)/map/_client/in-words';
import { listOf } from '@/app/(house)/map/_client/list-entries';
import type { MapState } from '@/app/(house)/map/_client/map-state';
import { materialsOf, viewOf } from '@/app/(house)/map/_client/model';
import { tableRows } from '@/app/(house)/map/_client/table-rows';
import type { RelatedMap } from '@/lib/shared/related';

const facet = (slug: string, family: string) => ({
  ...{ id: slug, slug, name: slug.charAt(0).toUpperCase() + slug.slice(1), family },
  ...{ description: '', hueDeg: 0, lightness: 0.7 },
});
const node = (id: string, natural: number, rosy: number, woody: number) => ({
  ...{ id, name: id, botanicalName: null, kind: 'synthetic', natural, smell: '', phases: {} },
  profile: [[0, rosy] as [number, number], [1, woody] as [number, number]].filter(([, intensity]) => intensity > 0),
});
const link = (a: string, b: string, similarity: number) => ({ a, b, similarity, shared: ['Rosy'] });

const MAP: RelatedMap = {
  by: 'facets',
  facets: [facet('rosy', 'Floral'), facet('woody', 'Woody'), facet('minty', 'Aromatic')],
  nodes: [
    node('Bark', 1, 0, 9),
    node('Petal', 1, 8, 0),
    node('Pink', 0, 7, 2),
    node('Rosewood', 1, 5, 4),
    node('Twig', 0, 0, 6),
  ],
  links: [
    link('Petal', 'Pink', 0.95),
    link('Pink', 'Rosewood', 0.85),
    link('Rosewood', 'Bark', 0.8),
    link('Bark', 'Twig', 0.6),
  ],
};
const PLAIN: MapState = {
  ...{
    by: 'facets',
    alike: null,
    smells: [],
    family: [],
    nature: 'all',
    focus: null,
    at: null,
    view: 'graph',
    sort: 'name',
  },
};
const view = (state: Partial<MapState> = {}) => viewOf(MAP, materialsOf(MAP), { ...PLAIN, ...state });
const shown = (state: Partial<MapState>) => view(state).materials.map(({ id }) => id);

describe('what the map shows', () => {
  it('links what is alike enough, and everything that is asked for by hand', () => {
    expect(view().links).toHaveLength(3);
    expect(view({ alike: 0.5 }).links).toHaveLength(4);
    expect(view({ alike: 0.9 }).links).toHaveLength(1);
    expect(mapInWords(view({ alike: 0.9 }), 'facets')).toBe('5 materials, 1 link by shared facets');
  });

  it('filters by origin and by the family of the strongest facet', () => {
    expect(shown({ nature: 'synthetic' })).toEqual(['Pink', 'Twig']);
    expect(shown({ family: ['Woody'] })).toEqual(['Bark', 'Twig']);
    expect(view({ family: ['Woody'] }).links).toEqual([]);
  });

  it('shows one material and its kin, whatever the filters say of that one', () => {
    expect(shown({ focus: 'Pink' })).toEqual(['Petal', 'Pink', 'Rosewood']);
    expect(shown({ focus: 'Pink', nature: 'natural' })).toEqual(['Petal', 'Pink', 'Rosewood']);
    expect(shown({ focus: 'Twig' })).toEqual(['Twig']);
  });

  it('lights who shares the facets, and the kin of what is pointed at', () => {
    expect(emphasisOf(view(), null).lit).toBeNull();
    expect([...(emphasisOf(view({ smells: ['rosy', 'woody'] }), null).lit ?? [])]).toEqual(['Rosewood', 'Pink']);
    const emphasis = emphasisOf(view(), 'Bark');
    expect([...(emphasis.lit ?? [])]).toEqual(['Bark', 'Rosewood']);
    expect(labelOrder(view(), emphasis)).toEqual(['Bark', 'Rosewood']);
  });
});

describe('the answer to a learner', () => {
  const told = (...smells: string[]) => answerInWords(view({ smells }));

  it('counts who smells of one facet', () => {
    expect(told('rosy')).toBe('3 materials smell plainly of rosy.');
    expect(told('minty')).toBe('No material smells plainly of minty.');
  });

  it('names the balance and the leaning of two', () => {
    expect(told('rosy', 'woody')).toBe(
      '2 materials share rosy and woody. 1 holds both in balance and so bridges the two; 1 leans to rosy.',
    );
  });

  it('shows the shortest step across where nobody shares both', () => {
    const without = { ...MAP, nodes: MAP.nodes.filter(({ id }) => id !== 'Pink' && id !== 'Rosewood') };
    const apart = { ...without, links: [link('Bark', 'Petal', 0.76)] };
    const answer = answerInWords(viewOf(apart, materialsOf(apart), { ...PLAIN, smells: ['rosy', 'woody'] }));
    expect(answer).toBe(
      'No material smells plainly of rosy and woody at once. The shortest step across is from Petal to Bark, 0.76 alike.',
    );
  });
});

describe('the list and the table', () => {
  it('list everything by its links, the sharers with the bridge first, or the kin of what was picked', () => {
    expect(listOf(view()).entries.map(({ material }) => material.id)).toEqual([
      'Pink',
      'Rosewood',
      'Bark',
      'Petal',
      'Twig',
    ]);
    expect(listOf(view({ smells: ['rosy', 'woody'] })).entries.map(({ note }) => note)).toEqual([
      'in balance; linked to 1 rosy, 1 woody',
      'leans to rosy: rosy 7, woody 2',
    ]);
    const kin = listOf(view({ at: 'Pink' }));
    expect(kin.title).toBe('Linked to Pink');
    expect(kin.entries.map(({ material, note }) => [material.id, note])).toEqual([
      ['Petal', '0.95 alike: rosy'],
      ['Rosewood', '0.85 alike: rosy'],
    ]);
  });

  it('hold the same materials, sorted either way, ties by name', () => {
    const ids = (sort: string, state: Partial<MapState> = {}) =>
      tableRows(view(state), sort).map(({ material }) => material.id);
    expect(ids('name')).toEqual(['Bark', 'Petal', 'Pink', 'Rosewood', 'Twig']);
    expect(ids('-links')).toEqual(['Pink', 'Rosewood', 'Bark', 'Petal', 'Twig']);
    expect(ids('likeness')[0]).toBe('Twig');
    expect(ids('-woody', { smells: ['rosy', 'woody'] })).toEqual(['Rosewood', 'Pink']);
    expect(ids('woody', { smells: ['rosy', 'woody'] })).toEqual(['Pink', 'Rosewood']);
  });
});
