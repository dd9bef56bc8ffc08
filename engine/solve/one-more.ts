import type { Prepared } from './prepare';
import { product } from './triangle';

/**
 * For a set S of materials, a bound on how close S and one more could come: the least E over all weights of S and j that
 * sum to 1, of either sign and without rules. One factor of S serves every j, so that a set costs microseconds.
 *
 *     y of S and the price mu from [H 1; 1' 0],  slope_j = H_jS y - h_j + mu,  room_j = H_jj - [H_jS 1] M^-1 [H_Sj; 1]
 *     E(S + j) >= E(S) - slope_j^2 / room_j
 */
export class OneMore {
  private readonly pull: Float64Array;
  private readonly constant: number;
  private readonly gram: Float64Array | null;

  constructor(private readonly prepared: Prepared) {
    const { count, facets, vectors, target } = prepared;
    this.pull = Float64Array.from({ length: count }, (_, i) => product(vectors, i * facets, target, 0, facets));
    this.constant = product(target, 0, target, 0, facets);
    this.gram = count <= GRAM_UP_TO ? new Float64Array(count * count).fill(Number.NaN) : null;
  }

  /** The bound for each material in `free`, in its order; the smallest first costs nothing more than a sort. */
  bounds(chosen: readonly number[], free: readonly number[]): Float64Array {
    const size = chosen.length;
    const inverse = this.inverse(chosen);
    if (!inverse) return new Float64Array(free.length);
    const weights = new Float64Array(size + 1);
    for (let a = 0; a <= size; a++) {
      for (let b = 0; b <= size; b++) {
        weights[a]! += inverse[a * (size + 1) + b]! * (b < size ? this.pull[chosen[b]!]! : 1);
      }
    }
    let own = this.constant - weights[size]!;
    for (let a = 0; a < size; a++) own -= weights[a]! * this.pull[chosen[a]!]!;
    const column = new Float64Array(size + 1);
    return Float64Array.from(free, (j) => {
      let slope = weights[size]! - this.pull[j]!;
      for (let a = 0; a < size; a++) {
        column[a] = this.inner(chosen[a]!, j);
        slope += column[a]! * weights[a]!;
      }
      column[size] = 1;
      const room = this.inner(j, j) - quadratic(inverse, column, size + 1);
      return room > 1e-9 * this.inner(j, j) ? own - (slope * slope) / room : 0;
    });
  }

  private inner(i: number, j: number): number {
    const { count, facets, vectors, variance } = this.prepared;
    const known = this.gram ? this.gram[i * count + j]! : Number.NaN;
    if (!Number.isNaN(known)) return known;
    const value = product(vectors, i * facets, vectors, j * facets, facets) + (i === j ? variance[i]! : 0);
    if (this.gram) {
      this.gram[i * count + j] = value;
      this.gram[j * count + i] = value;
    }
    return value;
  }

  /** Of [H 1; 1' 0] over the chosen, by Gauss and Jordan with pivoting; null where it has none to speak of. */
  private inverse(chosen: readonly number[]): Float64Array | null {
    const n = chosen.length + 1;
    const work = new Float64Array(2 * n * n);
    for (let a = 0; a < n; a++) {
      for (let b = 0; b < n; b++) {
        const edge = a === n - 1 || b === n - 1;
        work[a * 2 * n + b] = edge ? (a === b ? 0 : 1) : this.inner(chosen[a]!, chosen[b]!);
      }
      work[a * 2 * n + n + a] = 1;
    }
    if (!eliminate(work, n)) return null;
    const inverse = new Float64Array(n * n);
    for (let a = 0; a < n; a++) inverse.set(work.subarray(a * 2 * n + n, (a + 1) * 2 * n), a * n);
    return inverse;
  }
}

/** Up to here all inner products are kept; above, the table would not fit a browser's memory. */
const GRAM_UP_TO = 2000;

function eliminate(work: Float64Array, n: number): boolean {
  const width = 2 * n;
  for (let k = 0; k < n; k++) {
    let pivot = k;
    for (let a = k + 1; a < n; a++) {
      if (Math.abs(work[a * width + k]!) > Math.abs(work[pivot * width + k]!)) pivot = a;
    }
    const value = work[pivot * width + k]!;
    if (Math.abs(value) < 1e-10) return false;
    for (let b = 0; b < width; b++) {
      const kept = work[k * width + b]!;
      work[k * width + b] = work[pivot * width + b]! / value;
      if (pivot !== k) work[pivot * width + b] = kept;
    }
    for (let a = 0; a < n; a++) {
      const factor = a === k ? 0 : work[a * width + k]!;
      if (factor !== 0) for (let b = 0; b < width; b++) work[a * width + b]! -= factor * work[k * width + b]!;
    }
  }
  return true;
}

function quadratic(matrix: Float64Array, v: Float64Array, n: number): number {
  let sum = 0;
  for (let a = 0; a < n; a++) {
    let row = 0;
    for (let b = 0; b < n; b++) row += matrix[a * n + b]! * v[b]!;
    sum += row * v[a]!;
  }
  return sum;
}
