import { EigenvalueDecomposition, Matrix } from 'ml-matrix';

/** Coordinates come in blocks of four; behind each block stands what is left of the row's length after it. */
export const BLOCK = 4;
export const STRIDE = BLOCK + 1;
const MOST_BLOCKS = 6;

/** The rows' coordinates along the principal axes of their second moments, the heaviest axis first. */
export function principalCoordinates(
  vectors: Float64Array,
  width: number,
): { coordinates: Float64Array; blocks: number } {
  const axes = principalAxes(vectors, width);
  const blocks = Math.min(MOST_BLOCKS, Math.max(1, Math.ceil(axes.length / BLOCK)));
  const count = width === 0 ? 0 : vectors.length / width;
  const coordinates = new Float64Array(count * blocks * STRIDE);
  for (let row = 0; row < count; row++) {
    const vector = vectors.subarray(row * width, (row + 1) * width);
    let left = dot(vector, vector);
    for (let block = 0; block < blocks; block++) {
      const from = (row * blocks + block) * STRIDE;
      for (let place = 0; place < BLOCK; place++) {
        const axis = axes[block * BLOCK + place];
        const coordinate = axis ? dot(vector, axis) : 0;
        coordinates[from + place] = coordinate;
        left -= coordinate * coordinate;
      }
      coordinates[from + BLOCK] = Math.sqrt(Math.max(0, left));
    }
  }
  return { coordinates, blocks };
}

/** The library may be large: a part of it, evenly taken, shows the axes well enough, and any axes are right. */
const MOST_ROWS = 2000;

function principalAxes(vectors: Float64Array, width: number): Float64Array[] {
  const moments = Matrix.zeros(width, width);
  const step = width * Math.max(1, Math.floor(vectors.length / width / MOST_ROWS));
  const rows = Array.from({ length: width }, () => new Float64Array(width));
  for (let from = 0; from < vectors.length; from += step) {
    for (const [i, row] of rows.entries()) {
      const value = vectors[from + i]!;
      if (value !== 0) for (let j = 0; j < width; j++) row[j]! += value * vectors[from + j]!;
    }
  }
  for (const [i, row] of rows.entries()) for (const [j, value] of row.entries()) moments.set(i, j, value);
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(moments, { assumeSymmetric: true });
  return realEigenvalues
    .map((weight, column) => ({ weight, axis: Float64Array.from(eigenvectorMatrix.getColumn(column)) }))
    .sort((a, b) => b.weight - a.weight)
    .map(({ axis }) => axis);
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i]! * b[i]!;
  return sum;
}
