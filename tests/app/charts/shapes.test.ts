import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { courseLayers, logHours } from '@/app/_components/charts/course-layers';
import { roundScale } from '@/app/_components/charts/frontier-scale';
import { petals } from '@/app/_components/charts/petals';
import { profileRows } from '@/app/_components/charts/profile-rows';

const facets = ['a', 'b', 'c', 'd', 'e'].map((id, index) => ({
  id,
  name: id,
  family: 'f',
  hueDeg: (index * 149) % 360,
  lightness: 0.7,
}));
const intensity = fc.double({ min: 0, max: 10, noNaN: true });
const profile = fc.array(intensity, { minLength: 5, maxLength: 5 });

describe('profileRows', () => {
  it('sorts by what is missing and drops only what neither side smells of', () => {
    fc.assert(
      fc.property(profile, profile, (target, blend) => {
        const rows = profileRows(facets, target, blend);
        for (const [index, row] of rows.entries())
          expect(row.missing).toBeLessThanOrEqual(rows[index - 1]?.missing ?? 10);
        const drawn = new Set(rows.map((row) => row.facet.id));
        for (const [index, facet] of facets.entries())
          expect(drawn.has(facet.id)).toBe(Math.max(target[index] ?? 0, blend[index] ?? 0) >= 0.05);
      }),
    );
  });
});

describe('petals', () => {
  it('stand evenly around and in the order of the hues', () => {
    const flower = petals(facets, [1, 2, 3, 4, 5]);
    expect(flower.map((petal) => petal.angle)).toEqual([0, 72, 144, 216, 288]);
    const hues = flower.map((petal) => petal.facet.hueDeg);
    expect(hues).toEqual(hues.toSorted((a, b) => a - b));
  });
});

describe('roundScale', () => {
  it('holds every value between its round ends, with few ticks', () => {
    const value = fc.double({ min: 0, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(fc.array(value, { minLength: 1, maxLength: 20 }), (values) => {
        const scale = roundScale(values, 4);
        for (const one of values) {
          expect(scale.at(one)).toBeGreaterThanOrEqual(-1e-6);
          expect(scale.at(one)).toBeLessThanOrEqual(100 + 1e-6);
        }
        expect(scale.ticks.length).toBeGreaterThanOrEqual(2);
        expect(scale.ticks.length).toBeLessThanOrEqual(8);
      }),
    );
  });

  it('has the ticks one would draw by hand', () => {
    expect(roundScale([0.55, 3.1], 4, true).ticks).toEqual([0, 1, 2, 3, 4]);
    expect(roundScale([120, 1400], 4).ticks).toEqual([0, 500, 1000, 1500]);
  });
});

describe('courseLayers', () => {
  const size = { width: 100, height: 50 };

  it('keeps the sum of all facets at every time, whatever is gathered under other', () => {
    fc.assert(
      fc.property(
        fc.array(profile, { minLength: 2, maxLength: 6 }),
        fc.integer({ min: 1, max: 5 }),
        (profiles, most) => {
          const points = profiles.map((one, index) => ({ hours: 2 ** index, profile: one }));
          const layers = courseLayers(points, facets, most, size);
          expect(layers.length).toBeLessThanOrEqual(most + 1);
          for (const [row, point] of points.entries()) {
            const drawn = layers.reduce((sum, layer) => sum + (layer.values[row] ?? 0), 0);
            expect(drawn).toBeCloseTo(
              point.profile.reduce((a, b) => a + b, 0),
              6,
            );
          }
        },
      ),
    );
  });

  it('gives each doubling of time the same room', () => {
    const along = logHours([1, 2, 4, 8].map((hours) => ({ hours, profile: [] })));
    expect([1, 2, 4, 8].map(along).map((v) => Number(v.toFixed(9)))).toEqual([0, 0.333333333, 0.666666667, 1]);
    expect(along(0)).toBe(0);
  });
});
