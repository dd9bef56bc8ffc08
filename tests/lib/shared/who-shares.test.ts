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

  it('calls a bridge what holds both in balance, and counts its links to either side', () => {
    const links = [
      link('rosewood', 'petal'),
      link('rosewood', 'bud'),
      link('pink', 'rosewood'),
      link('bark', 'rosewood'),
    ];
    const { bridges } = whoShares(all, links, [ROSY, WOODY]);
    expect(bridges).toMatchObject([{ id: 'rosewood', between: [3, 1] }]);
    expect(whoShares(all, links, [WOODY, ROSY]).bridges).toMatchObject([{ id: 'rosewood', between: [1, 3] }]);
  });

  it('puts the bridge with links to both sides before a fuller one that stands alone', () => {
    const cabinet = node('cabinet', 8, 8);
    const links = [link('rosewood', 'petal'), link('rosewood', 'bark'), link('cabinet', 'bark')];
    const { sharers, bridges } = whoShares([...all, cabinet], links, [ROSY, WOODY]);
    expect(sharers[0]?.id).toBe('cabinet');
    expect(bridges.map(({ id }) => id)).toEqual(['rosewood', 'cabinet']);
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
        const { sharers, bridges, step } = whoShares(nodes, links, [ROSY, WOODY]);
        expect(new Set(sharers.map(({ id }) => id))).toEqual(new Set(both));
        for (const { intensities, between } of bridges) {
          expect(2 * Math.min(...intensities)).toBeGreaterThanOrEqual(Math.max(...intensities));
          expect(between[0] + between[1]).toBeLessThan(nodes.length);
        }
        if (both.length > 0) expect(step).toBeNull();
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
