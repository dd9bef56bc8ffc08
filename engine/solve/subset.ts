import { type Closest, closest } from './closest';
import type { Prepared } from './prepare';

/**
 * The closest blend of a few named materials and no others. They are copied out first: the passes over all materials
 * would cost more than the solve.
 */
export function closestOf(prepared: Prepared, chosen: readonly number[], left: Uint8Array): Closest {
  const found = closest(subset(prepared, chosen), { left });
  if (found.kind === 'none') return found;
  const materials = found.point.materials.map((place) => chosen[place]!);
  return { ...found, point: { ...found.point, materials } };
}

function subset(prepared: Prepared, chosen: readonly number[]): Prepared {
  const { facets } = prepared;
  const vectors = new Float64Array(chosen.length * facets);
  const start = new Int32Array(chosen.length + 1);
  for (const [place, i] of chosen.entries()) {
    vectors.set(prepared.vectors.subarray(i * facets, (i + 1) * facets), place * facets);
    start[place + 1] = start[place]! + prepared.start[i + 1]! - prepared.start[i]!;
  }
  const row = new Int32Array(start[chosen.length]!);
  const entry = new Float64Array(row.length);
  for (const [place, i] of chosen.entries()) {
    row.set(prepared.row.subarray(prepared.start[i]!, prepared.start[i + 1]!), start[place]!);
    entry.set(prepared.entry.subarray(prepared.start[i]!, prepared.start[i + 1]!), start[place]!);
  }
  const pick = (values: Float64Array) => Float64Array.from(chosen, (i) => values[i]!);
  return {
    ...prepared,
    count: chosen.length,
    materials: chosen.map((i) => prepared.materials[i]!),
    vectors,
    variance: pick(prepared.variance),
    curvature: pick(prepared.curvature),
    strength: pick(prepared.strength),
    cost: pick(prepared.cost),
    start,
    row,
    entry,
  };
}
