/** A place in per cent of the width and of the height, so that it holds on a phone as on a desk. */
export interface Place {
  x: number;
  y: number;
}

const CROWDED = 7;

/**
 * Places for so many around the middle: evenly turned, beginning at the top right so that the first two don't hide
 * behind the middle's name. When it gets crowded every other one stands further in.
 */
export function ringPlaces(count: number): Place[] {
  return Array.from({ length: count }, (_, index) => {
    const turn = -Math.PI / 2 + ((index + 0.5) / count) * 2 * Math.PI;
    const reach = count > CROWDED && index % 2 === 1 ? 0.66 : 1;
    return { x: 50 + 39 * reach * Math.cos(turn), y: 50 + 38 * reach * Math.sin(turn) };
  });
}

/**
 * How strips of different weight are told apart: area goes with the impact, within what can be read.
 * @returns the factor on the strip's full length.
 */
export function lengthOfImpact(impact: number, largest: number): number {
  return largest > 0 ? Math.max(0.42, Math.sqrt(Math.max(0, impact) / largest)) : 0.42;
}
