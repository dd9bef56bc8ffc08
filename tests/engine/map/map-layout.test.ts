import { expect, it } from 'vitest';
import { EngineInputError } from '@/engine/errors';
import { mapLayout } from '@/engine/map/map-layout';

const ids = Array.from({ length: 20 }, (_, index) => `m${String(index).padStart(2, '0')}`);
const chain = (from: number, to: number) =>
  Array.from({ length: to - from }, (_, index) => ({
    a: ids[from + index]!,
    b: ids[from + index + 1]!,
    similarity: 0.9,
  }));
const relations = [...chain(0, 9), ...chain(10, 19)];

it('gives the same map for the same materials, in whatever order they come', () => {
  const map = mapLayout(ids, relations, { ticks: 100, seed: 1 });
  expect(mapLayout(ids, relations, { ticks: 100, seed: 1 })).toEqual(map);
  const reversed = mapLayout([...ids].reverse(), relations, { ticks: 100, seed: 1 });
  expect(reversed.reverse()).toEqual(map);
});

it('brings related materials nearer than unrelated ones', () => {
  const map = mapLayout(ids, relations, { ticks: 300, seed: 1 });
  const apart = (a: number, b: number) => Math.hypot(map[a]!.x - map[b]!.x, map[a]!.y - map[b]!.y);
  const linked = relations.map(({ a, b }) => apart(ids.indexOf(a), ids.indexOf(b)));
  const between = ids.slice(0, 10).flatMap((_, a) => ids.slice(10).map((_, b) => apart(a, b + 10)));
  const mean = (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
  expect(mean(between)).toBeGreaterThan(2 * mean(linked));
});

it('refuses a relation with a material that is not on the map', () => {
  const stray = [{ a: 'm00', b: 'elsewhere', similarity: 1 }];
  expect(() => mapLayout(ids, stray, { ticks: 1, seed: 1 })).toThrow(EngineInputError);
});
