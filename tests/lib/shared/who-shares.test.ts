import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { RelatedLink } from '@/lib/shared/related';
import { neighboursOf } from '@/lib/shared/related-links';
import { PLAINLY, whoShares } from '@/lib/shared/who-shares';

const [ROSY, WOODY] = [0, 1];
const node = (name: string, rosy: number, woody: number) => ({
  id: name,
  name,
  profile: [[ROSY, rosy] as [number, number], [WOODY, woody] as [number, number], [2, 5] as [number, number]],
});
const link = (a: string, b: string, similarity = 0.8): RelatedLink => ({ a, b, similarity, shared: [] });

const petal = node('petal', 8, 0);
const bud = node('bud', 6, 1);
const bark = node('bark', 0, 9);
const root = node('root', 1, 7);
const rosewood = node('rosewood', 5, 4);
const pink = node('pink', 7, 2);
const all = [petal, bud, bark, root, rosewood, pink];

describe('who shares', () => {
  it('names those that smell plainly of every chosen facet, the fullest first', () => {
    const { sharers } = whoShares(all, [], [ROSY, WOODY]);
    expect(sharers.map(({ id }) => id)).toEqual(['rosewood', 'pink']);
    expect(whoShares(all, [], [WOODY]).sharers.map(({ id }) => id)).toEqual(['bark', 'root', 'rosewood', 'pink']);
  });

  it('says to which of two facets a material leans, and of three says nothing', () => {
    const [balanced, leaning] = whoShares(all, [], [ROSY, WOODY]).sharers;
    expect(balanced?.leansTo).toBeNull();
    expect(leaning?.leansTo).toBe(0);
    expect(whoShares(all, [], [ROSY, WOODY, 2]).sharers.every(({ leansTo }) => leansTo === null)).toBe(true);
  });

  it('calls a bridge only what is linked to both sides', () => {
    const onOneSide = [link('rosewood', 'petal'), link('rosewood', 'bud'), link('pink', 'rosewood')];
    expect(whoShares(all, onOneSide, [ROSY, WOODY]).bridges).toEqual([]);
    const { bridges } = whoShares(all, [...onOneSide, link('bark', 'rosewood')], [ROSY, WOODY]);
    expect(bridges).toMatchObject([{ id: 'rosewood', between: [2, 1] }]);
  });

  it('finds the shortest step across where nobody shares both', () => {
    const apart = [petal, bud, bark, root];
    const links = [link('petal', 'bud', 0.99), link('bark', 'petal', 0.5), link('bud', 'root', 0.6)];
    expect(whoShares(apart, links, [ROSY, WOODY])).toEqual({
      sharers: [],
      bridges: [],
      step: { a: 'bud', b: 'root', similarity: 0.6 },
    });
    expect(whoShares(apart, links, [WOODY, ROSY]).step).toMatchObject({ a: 'root', b: 'bud' });
  });

  it('holds by its definition for any materials', () => {
    const intensity = fc.double({ min: 0, max: 10, noNaN: true });
    const materials = fc
      .array(fc.tuple(intensity, intensity), { maxLength: 12 })
      .map((pairs) => pairs.map(([rosy, woody], index) => node(`m${index}`, rosy, woody)));
    fc.assert(
      fc.property(materials, (nodes) => {
        const links = nodes.flatMap((a, i) => nodes.slice(i + 1).map((b) => link(a.id, b.id)));
        const plainly = (place: number) =>
          new Set(nodes.filter(({ profile }) => (profile[place]?.[1] ?? 0) >= PLAINLY).map(({ id }) => id));
        const [rosy, woody] = [plainly(ROSY), plainly(WOODY)];
        const both = [...rosy].filter((id) => woody.has(id));
        const { sharers, bridges } = whoShares(nodes, links, [ROSY, WOODY]);
        expect(new Set(sharers.map(({ id }) => id))).toEqual(new Set(both));
        // Everything is linked to everything here, so each sharer bridges as soon as both sides have somebody.
        expect(bridges.length).toBe(rosy.size > both.length && woody.size > both.length ? both.length : 0);
      }),
    );
  });
});

it('lists the neighbours of both ends of a link, the most alike first', () => {
  const neighbours = neighboursOf([link('a', 'b', 0.6), link('c', 'a', 0.9)]);
  expect(neighbours.get('a')?.map(({ id }) => id)).toEqual(['c', 'b']);
  expect(neighbours.get('c')).toEqual([{ id: 'a', similarity: 0.9, shared: [] }]);
  expect(neighbours.has('z')).toBe(false);
});
