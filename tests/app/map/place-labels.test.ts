import fc from 'fast-check';
import { expect, it } from 'vitest';
import { LABEL_HEIGHT, placeLabels, type WantedLabel } from '@/app/(house)/map/_client/place-labels';

const SHEET = { width: 600, height: 400 };
const label = fc.record({
  x: fc.integer({ min: 0, max: 600 }),
  y: fc.integer({ min: 0, max: 400 }),
  halfWidth: fc.constant(4),
  halfHeight: fc.constant(10),
  width: fc.integer({ min: 20, max: 160 }),
  important: fc.boolean(),
});
const stripOf = ({ x, y, halfWidth, halfHeight }: WantedLabel) => ({
  ...{ left: x - halfWidth, right: x + halfWidth, top: y - halfHeight, bottom: y + halfHeight },
});

it('lets no two labels touch, none cross the edge, and only important ones cover a strip', () => {
  fc.assert(
    fc.property(fc.array(label, { maxLength: 60 }), (wanted) => {
      const strips = wanted.map(stripOf);
      const boxes = placeLabels(wanted, { ...SHEET, strips, most: 40 }).map(({ index, x, y }) => ({
        wanted: wanted[index] as WantedLabel,
        ...{ left: x, right: x + (wanted[index]?.width ?? 0), top: y - LABEL_HEIGHT / 2, bottom: y + LABEL_HEIGHT / 2 },
      }));
      expect(boxes.length).toBeLessThanOrEqual(40);
      for (const [at, box] of boxes.entries()) {
        expect(box.left >= 0 && box.right <= SHEET.width && box.top >= 0 && box.bottom <= SHEET.height).toBe(true);
        const overlaps = (other: (typeof strips)[number]) =>
          box.left < other.right && other.left < box.right && box.top < other.bottom && other.top < box.bottom;
        expect(boxes.slice(at + 1).some(overlaps)).toBe(false);
        if (!box.wanted.important) expect(strips.some(overlaps)).toBe(false);
      }
    }),
  );
});

it('gives the first in order its place beside the strip, and the next what is left', () => {
  const wanted = [
    { x: 100, y: 100, halfWidth: 4, halfHeight: 10, width: 80 },
    { x: 130, y: 100, halfWidth: 4, halfHeight: 10, width: 80 },
  ];
  const placed = placeLabels(wanted, { ...SHEET, strips: [], most: 10 });
  expect(placed.map(({ index }) => index)).toEqual([0, 1]);
  expect(placed[0]).toMatchObject({ x: 108, y: 100 });
  expect(placed[1]?.y).not.toBe(100); // to the right it would touch the first, to the left as well
  expect(placeLabels(wanted, { ...SHEET, strips: [], most: 1 })).toHaveLength(1);
});
