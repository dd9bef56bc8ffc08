import fc from 'fast-check';
import { expect, it } from 'vitest';
import { lengthOfImpact, ringPlaces } from '@/app/_components/map-around/ring';

/** A desk and a phone, in px, and the room that a strip with its name needs there. */
const SCREENS = [
  { width: 1000, height: 432, need: 70 },
  { width: 350, height: 544, need: 62 },
];

it('keeps everything inside and apart, whether one material or fourteen stand around the target', () => {
  for (let count = 1; count <= 14; count++) {
    const places = ringPlaces(count);
    expect(places).toHaveLength(count);
    for (const { width, height, need } of SCREENS) {
      const spots = [...places, { x: 50, y: 50 }].map(({ x, y }) => ({ x: (x * width) / 100, y: (y * height) / 100 }));
      for (const [i, a] of spots.entries()) {
        expect(a.x).toBeGreaterThan(0);
        expect(a.y).toBeLessThan(height);
        for (const b of spots.slice(i + 1)) expect(Math.hypot(a.x - b.x, a.y - b.y)).toBeGreaterThan(need);
      }
    }
  }
});

it('draws the strongest in full and nothing so small that it can’t be seen', () => {
  const impact = fc.double({ min: 0, max: 1, noNaN: true });
  fc.assert(
    fc.property(impact, impact, (a, b) => {
      const largest = Math.max(a, b);
      const [one, other] = [lengthOfImpact(a, largest), lengthOfImpact(b, largest)];
      expect(Math.min(one, other)).toBeGreaterThanOrEqual(0.42);
      if (largest > 0) expect(Math.max(one, other)).toBe(1);
      if (a <= b) expect(one).toBeLessThanOrEqual(other);
    }),
  );
});
