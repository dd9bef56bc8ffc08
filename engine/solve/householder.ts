/**
 * A QR factor of a few columns that is grown and shrunk one column at a time, by Householder reflections on the
 * data itself (Golub & Van Loan, Matrix Computations, section 5.2). It never forms A'A, whose condition is the
 * square of that of A: on NIST's Filip data that would leave no digit at all.
 *
 * Column k of `reflectors` holds the k-th reflector below and on the diagonal; R is kept apart, in `r`.
 */
export class GrowingQR {
  size = 0;
  readonly order: number[] = [];
  private readonly reflectors: Float64Array[] = [];
  private readonly scales: number[] = [];
  private readonly r: Float64Array[] = [];
  /** Q'b for the right-hand side given; its tail after `size` entries is the residual, rotated. */
  readonly rotated: Float64Array;

  constructor(
    private readonly rows: number,
    private readonly b: Float64Array,
  ) {
    this.rotated = b.slice();
  }

  /** Adds a column under a name. False, and nothing changed, where it depends on those already in. */
  add(name: number, column: Float64Array, dependence: number): boolean {
    const k = this.size;
    if (k >= this.rows) return false;
    const work = column.slice();
    let whole = 0;
    for (let i = 0; i < this.rows; i++) whole = Math.max(whole, Math.abs(work[i]!));
    for (let j = 0; j < k; j++) reflect(this.reflectors[j]!, this.scales[j]!, j, work);
    const tail = norm(work, k);
    if (!(tail > dependence * whole)) return false;
    const pivot = work[k]! > 0 ? -tail : tail;
    const reflector = work.slice();
    reflector[k] = work[k]! - pivot;
    this.scales[k] = -1 / (pivot * reflector[k]!);
    work[k] = pivot;
    this.reflectors[k] = reflector;
    this.r[k] = work;
    this.order[k] = name;
    this.size = k + 1;
    reflect(reflector, this.scales[k]!, k, this.rotated);
    return true;
  }

  /** Takes the columns from `place` on out again; their names come back, in their order. */
  truncate(place: number): number[] {
    const names = this.order.splice(place);
    this.size = place;
    this.rotated.set(this.b);
    for (let j = 0; j < place; j++) reflect(this.reflectors[j]!, this.scales[j]!, j, this.rotated);
    return names;
  }

  /** The least squares solution over the columns that are in, in their order. */
  solve(): Float64Array {
    const x = new Float64Array(this.size);
    for (let k = this.size - 1; k >= 0; k--) {
      let sum = this.rotated[k]!;
      for (let j = k + 1; j < this.size; j++) sum -= this.r[j]![k]! * x[j]!;
      x[k] = sum / this.r[k]![k]!;
    }
    return x;
  }

  /** b - A x at the least squares solution, with its length: the tail of Q'b, turned back. */
  residual(): { vector: Float64Array; length: number } {
    const vector = this.rotated.slice();
    vector.fill(0, 0, this.size);
    const length = norm(vector, this.size);
    for (let j = this.size - 1; j >= 0; j--) reflect(this.reflectors[j]!, this.scales[j]!, j, vector);
    return { vector, length };
  }
}

/** v := (I - scale h h') v, where h starts at entry `from`. */
function reflect(h: Float64Array, scale: number, from: number, v: Float64Array): void {
  let sum = 0;
  for (let i = from; i < v.length; i++) sum += h[i]! * v[i]!;
  sum *= scale;
  for (let i = from; i < v.length; i++) v[i] = v[i]! - sum * h[i]!;
}

/** Euclidean length of the entries from `from` on, scaled so that neither tiny nor huge entries are lost. */
export function norm(v: Float64Array, from = 0): number {
  let largest = 0;
  for (let i = from; i < v.length; i++) largest = Math.max(largest, Math.abs(v[i]!));
  if (largest === 0) return 0;
  let sum = 0;
  for (let i = from; i < v.length; i++) sum += (v[i]! / largest) ** 2;
  return largest * Math.sqrt(sum);
}
