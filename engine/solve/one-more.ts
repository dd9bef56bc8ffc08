import { liftOf } from './forced-out';
import type { Prepared } from './prepare';
import { product } from './triangle';

/**
 * For a set S of materials, a bound on how close S and one more could come: the least E over all weights of S and j that
 * sum to 1, of either sign, with the rules priced at multipliers lambda >= 0 instead of kept. One factor of S serves
 * every j and every lambda, so that a set costs microseconds.
 *
 *     h_i = a_i.t - (G'lambda)_i / (2 s_i),   y of S and the price mu from [H 1; 1' 0],
 *     slope_j = H_jS y - h_j + mu,   room_j = H_jj - [H_jS 1] M^-1 [H_Sj; 1]
 *     E(S + j) >= E(S) - slope_j^2 / room_j
 *
 * Any lambda gives a bound; good ones are those of a set much like this one.
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

  /** The bounds for S and each material in `free`, in its order, at the prices of any number of lambdas. */
  beside(chosen: readonly number[], free: readonly number[]): (lambda?: Float64Array) => Float64Array {
    const inverse = this.inverse(chosen);
    if (!inverse) return () => new Float64Array(free.length);
    const factor = this.factor(chosen, free, inverse);
    return (lambda) => {
      const start = this.start(factor, lambda);
      return Float64Array.from(free, (_, k) => {
        const slope = start?.slopes[k] ?? Number.NaN;
        const room = factor.room[k]!;
        return start && room > 0 && !Number.isNaN(slope) ? start.own - (slope * slope) / room : 0;
      });
    };
  }

  private factor(chosen: readonly number[], free: readonly number[], inverse: Float64Array): Factor {
    const size = chosen.length;
    const columns = new Float64Array(free.length * size);
    const column = new Float64Array(size + 1).fill(1);
    const room = Float64Array.from(free, (j, k) => {
      for (let a = 0; a < size; a++) column[a] = this.inner(chosen[a]!, j);
      columns.set(column.subarray(0, size), k * size);
      const left = this.inner(j, j) - quadratic(inverse, column, size + 1);
      return left > 1e-9 * this.inner(j, j) ? left : 0;
    });
    return { chosen, free, inverse, columns, room };
  }

  /** The least E over the weights of S alone at these prices, and its slope towards each material; null for no bound. */
  private start({ chosen, free, inverse, columns }: Factor, lambda?: Float64Array): Start | null {
    const size = chosen.length;
    const lift = lambda ? liftOf(this.prepared, lambda) : 0;
    const price = (i: number) => (lambda ? this.priceOf(i, lambda, lift) : 0);
    const pull = Float64Array.from(chosen, (i) => this.pull[i]! - price(i) / 2);
    if (pull.some(Number.isNaN)) return null;
    const weights = new Float64Array(size + 1);
    for (let a = 0; a <= size; a++) {
      for (let b = 0; b <= size; b++) weights[a]! += inverse[a * (size + 1) + b]! * (b < size ? pull[b]! : 1);
    }
    let own = this.constant - weights[size]!;
    let terms = this.constant + Math.abs(weights[size]!);
    for (let a = 0; a < size; a++) {
      own -= weights[a]! * pull[a]!;
      terms += Math.abs(weights[a]! * pull[a]!);
    }
    const slopes = Float64Array.from(free, (j, k) => {
      let slope = weights[size]! - this.pull[j]! + price(j) / 2;
      for (let a = 0; a < size; a++) slope += columns[k * size + a]! * weights[a]!;
      return slope;
    });
    return { own: own - ROUNDING * terms, slopes };
  }

  /** (G'lambda)_i / s_i; a solvent has no impact, and must only not be paid for: NaN where it is. */
  private priceOf(i: number, lambda: Float64Array, lift: number): number {
    const { strength, start, row, entry } = this.prepared;
    let sum = lift;
    for (let at = start[i]!; at < start[i + 1]!; at++) sum += lambda[row[at]!]! * entry[at]!;
    return strength[i]! > 0 ? sum / strength[i]! : sum >= 0 ? 0 : Number.NaN;
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

/** What is known of a set, whatever the prices are. */
interface Factor {
  chosen: readonly number[];
  free: readonly number[];
  inverse: Float64Array;
  columns: Float64Array;
  room: Float64Array;
}

interface Start {
  own: number;
  slopes: Float64Array;
}

/** A bound gives this share of its terms to rounding. */
const ROUNDING = 1e-13;
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
