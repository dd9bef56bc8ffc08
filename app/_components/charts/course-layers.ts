import { area, curveMonotoneX, stack } from 'd3-shape';
import type { FacetTone } from '@/lib/shared/facet';

/** How it smells at one time: intensities in the order of the facets, already scaled by how much there is to smell. */
export interface CoursePoint {
  hours: number;
  profile: ArrayLike<number>;
}

export interface CourseLayer {
  /** Null is all the small ones together. */
  facet: FacetTone | null;
  values: number[];
  path: string;
  /** Where the layer is thickest, in the drawing's units: room for its word. */
  label: { x: number; y: number; thickness: number };
}

export interface CourseSize {
  width: number;
  height: number;
}

/** Hours on a logarithmic axis, 0..1. Times before the first one shown lie on its edge. */
export function logHours(points: readonly CoursePoint[]): (hours: number) => number {
  const times = points.map((point) => point.hours).filter((hours) => hours > 0);
  const first = Math.log(Math.min(...times));
  const span = Math.log(Math.max(...times)) - first || 1;
  return (hours) => (hours <= 0 ? 0 : Math.min(1, Math.max(0, (Math.log(hours) - first) / span)));
}

/** The `most` facets that are smelt most over the whole course, largest at the ground, and the rest as one layer. */
export function courseLayers(
  points: readonly CoursePoint[],
  facets: readonly FacetTone[],
  most: number,
  size: CourseSize,
): CourseLayer[] {
  const series = topSeries(points, facets, most);
  const stacked = stack<number, number>()
    .keys(series.map((_, index) => index))
    .value((row, key) => series[key]?.values[row] ?? 0)(points.map((_, index) => index));
  const top = Math.max(1e-9, ...(stacked.at(-1)?.map((band) => band[1]) ?? []));
  const along = logHours(points);
  const x = points.map((point) => along(point.hours) * size.width);
  const y = (value: number) => size.height - (value / top) * size.height;
  const shape = area<[number, number]>()
    .x((_, index) => x[index] ?? 0)
    .y0((band) => y(band[0]))
    .y1((band) => y(band[1]))
    .curve(curveMonotoneX);
  return series.map((one, index) => {
    const bands = (stacked[index] ?? []).map((band): [number, number] => [band[0], band[1]]);
    return { ...one, path: shape(bands) ?? '', label: thickest(bands, x, y, size) };
  });
}

function topSeries(points: readonly CoursePoint[], facets: readonly FacetTone[], most: number) {
  const all = facets
    .map((facet, index) => ({
      facet: facet as FacetTone | null,
      values: points.map((point) => point.profile[index] ?? 0),
    }))
    .map((one) => ({ ...one, sum: one.values.reduce((a, b) => a + b, 0) }))
    .filter((one) => one.sum > 0)
    .sort((a, b) => b.sum - a.sum);
  const small = all.slice(most);
  if (small.length === 0) return all;
  const rest = points.map((_, row) => small.reduce((sum, one) => sum + (one.values[row] ?? 0), 0));
  return [...all.slice(0, most), { facet: null, values: rest, sum: 0 }];
}

/** The middle of a layer where it is thickest, away from both ends so that a word fits. */
function thickest(bands: [number, number][], x: number[], y: (value: number) => number, { width }: CourseSize) {
  let best = { x: 0, y: 0, thickness: 0 };
  for (const [index, [low, high]] of bands.entries()) {
    const at = x[index] ?? 0;
    const thickness = y(low) - y(high);
    if (at > width * 0.08 && at < width * 0.86 && thickness > best.thickness)
      best = { x: at, y: (y(low) + y(high)) / 2, thickness };
  }
  return best;
}
