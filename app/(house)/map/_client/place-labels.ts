/** A label that wants a place: the middle of its strip and half the strip's size, in px; it is `width` wide. */
export interface WantedLabel {
  x: number;
  y: number;
  halfWidth: number;
  halfHeight: number;
  width: number;
  /** It may lie over strips: what somebody points at must have its name. */
  important?: boolean;
}

export interface PlacedLabel {
  /** Which of the wanted labels it is. */
  index: number;
  /** Left edge and middle line of the text. */
  x: number;
  y: number;
}

export interface Box {
  left: number;
  top: number;
  right: number;
  bottom: number;
}

export const LABEL_HEIGHT = 15;
const GAP = 4;
const CELL = 64;

interface Sheet {
  /** No label crosses the edge. */
  width: number;
  height: number;
  /** Strips, which only important labels may cover. */
  strips: readonly Box[];
  most: number;
}

/**
 * Gives places to as many labels as fit without touching each other, greedily in the order given: beside the strip to
 * the right, to the left, below, above, or not at all. What is taken is looked up in square cells.
 */
export function placeLabels(wanted: readonly WantedLabel[], { width, height, strips, most }: Sheet): PlacedLabel[] {
  const labels = new Cells();
  const marks = new Cells();
  for (const strip of strips) marks.add(strip);
  const placed: PlacedLabel[] = [];
  for (const [index, label] of wanted.entries()) {
    if (placed.length >= most) break;
    const isFree = (spot: Box) =>
      spot.left >= 0 && spot.top >= 0 && spot.right <= width && spot.bottom <= height && !labels.touches(spot, GAP);
    const box = spots(label).find((spot) => isFree(spot) && (label.important || !marks.touches(spot, 0)));
    if (!box) continue;
    labels.add(box);
    placed.push({ index, x: box.left, y: box.top + LABEL_HEIGHT / 2 });
  }
  return placed;
}

function spots({ x, y, halfWidth, halfHeight, width }: WantedLabel): Box[] {
  const boxAt = (left: number, middle: number): Box => ({
    ...{ left, right: left + width },
    ...{ top: middle - LABEL_HEIGHT / 2, bottom: middle + LABEL_HEIGHT / 2 },
  });
  const below = y + halfHeight + LABEL_HEIGHT / 2 + 1;
  const above = y - halfHeight - LABEL_HEIGHT / 2 - 1;
  return [
    boxAt(x + halfWidth + GAP, y),
    boxAt(x - halfWidth - GAP - width, y),
    boxAt(x - width / 2, below),
    boxAt(x - width / 2, above),
  ];
}

/** Boxes by the square cells they lie in, so that only near ones are compared. */
class Cells {
  readonly #boxes = new Map<string, Box[]>();

  add(box: Box): void {
    for (const cell of cellsOf(box)) {
      const here = this.#boxes.get(cell);
      if (here) here.push(box);
      else this.#boxes.set(cell, [box]);
    }
  }

  touches(box: Box, gap: number): boolean {
    return cellsOf(box).some((cell) => this.#boxes.get(cell)?.some((other) => touch(other, box, gap)));
  }
}

function cellsOf({ left, top, right, bottom }: Box): string[] {
  const cells: string[] = [];
  for (let column = Math.floor((left - GAP) / CELL); column <= Math.floor((right + GAP) / CELL); column++) {
    for (let row = Math.floor(top / CELL); row <= Math.floor(bottom / CELL); row++) cells.push(`${column} ${row}`);
  }
  return cells;
}

const touch = (a: Box, b: Box, gap: number): boolean =>
  a.left < b.right + gap && b.left < a.right + gap && a.top < b.bottom && b.top < a.bottom;
