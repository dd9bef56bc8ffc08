import { addTo, backward, forward, product, reflectColumns, reflectOne, turnColumns } from './triangle';

/**
 * The equality problem over the materials in use and the rows that bind, kept ready to solve:
 *
 *     min 1/2 d'K d + g'd   so that   E d = c          K d + g + E'nu = 0
 *
 * K is the Gram matrix of the materials in use plus a little of the identity, K = L L'; L grows and shrinks with them
 * (Cholesky, Givens: Golub & Van Loan, section 6.5). The rows enter through Y = L^-1 E', factored by Householder, as
 * in Goldfarb & Idnani 1983: forming E K^-1 E' instead squares the condition, and with near-parallel rows the active
 * set then goes round in circles.
 */
export class WorkingFactor {
  size = 0;
  rows = 0;
  private capacity = 32;
  private rowCapacity = 16;
  private l = new Float64Array(32 * 32);
  /** Row r of E, and its column of Y, each `capacity` apart. */
  private e = new Float64Array(16 * 32);
  private y = new Float64Array(16 * 32);
  private q = new Float64Array(16 * 32);
  private diagonal = new Float64Array(16);
  private factored = false;
  private readonly turn = new Float64Array(2);
  /** The step, and the multipliers of the rows, of the latest `solve`. */
  step = new Float64Array(32);
  nu = new Float64Array(16);

  clear(): void {
    this.size = 0;
    this.rows = 0;
    this.factored = false;
  }

  /** Row r of E over the materials in use starts here in `coefficients`. */
  rowAt(r: number): number {
    return r * this.capacity;
  }

  get coefficients(): Float64Array {
    return this.e;
  }

  /** Adds a material: its products with those in use, its own curvature (at least `least` stays), its entries in the rows. */
  addMaterial(gram: Float64Array, own: number, least: number, entries: Float64Array): void {
    if (this.size + 1 > this.capacity) this.grow(2 * this.capacity, this.rowCapacity);
    const k = this.size;
    const at = k * this.capacity;
    for (let j = 0; j < k; j++) this.l[at + j] = gram[j]!;
    forward(this.l, this.capacity, k, this.l, at);
    const rest = own - product(this.l, at, this.l, at, k);
    const pivot = Math.sqrt(Math.max(rest, least));
    this.l[at + k] = pivot;
    for (let r = 0; r < this.rows; r++) {
      const row = r * this.capacity;
      this.e[row + k] = entries[r]!;
      this.y[row + k] = (entries[r]! - product(this.l, at, this.y, row, k)) / pivot;
    }
    this.size = k + 1;
    this.factored = false;
  }

  removeMaterial(k: number): void {
    const { l, e, y, capacity, turn } = this;
    const last = this.size - 1;
    l.copyWithin(k * capacity, (k + 1) * capacity, (last + 1) * capacity);
    for (let r = 0; r < this.rows; r++) {
      e.copyWithin(r * capacity + k, r * capacity + k + 1, r * capacity + last + 1);
    }
    for (let j = k; j < last; j++) {
      turnColumns(l, capacity, j, last, turn);
      const [c, s] = [turn[0]!, turn[1]!];
      for (let at = j; at < this.rows * capacity; at += capacity) {
        const p = y[at]!;
        const q = y[at + 1]!;
        y[at] = c * p + s * q;
        y[at + 1] = c * q - s * p;
      }
    }
    this.size = last;
    this.factored = false;
  }

  addRow(entries: Float64Array): void {
    if (this.rows + 1 > this.rowCapacity) this.grow(this.capacity, 2 * this.rowCapacity);
    const at = this.rows * this.capacity;
    for (let k = 0; k < this.size; k++) {
      this.e[at + k] = entries[k]!;
      this.y[at + k] = entries[k]!;
    }
    forward(this.l, this.capacity, this.size, this.y, at);
    this.rows++;
    this.factored = false;
  }

  removeRow(r: number): void {
    const { e, y, capacity } = this;
    e.copyWithin(r * capacity, (r + 1) * capacity, this.rows * capacity);
    y.copyWithin(r * capacity, (r + 1) * capacity, this.rows * capacity);
    this.rows--;
    this.factored = false;
  }

  /** The first row that depends on the ones before it to within `dependence` of its length, or -1. */
  dependentRow(dependence: number, from = 0): number {
    this.factor();
    const { q, diagonal, capacity } = this;
    for (let r = from; r < this.rows; r++) {
      const own = diagonal[r]! * diagonal[r]!;
      const length = Math.sqrt(own + product(q, r * capacity, q, r * capacity, r)); // of R's column, and so of Y's
      if (!(Math.abs(diagonal[r]!) > dependence * length)) return r;
    }
    return -1;
  }

  /** Fills `step` and `nu` for the gradient g and the right-hand side c of the rows. */
  solve(g: Float64Array, c: Float64Array): void {
    this.factor();
    const { q, diagonal, capacity, size, rows, step, nu, l } = this;
    for (let k = 0; k < size; k++) step[k] = g[k]!;
    forward(l, capacity, size, step, 0);
    for (let r = 0; r < rows; r++) reflectOne(q, r * capacity, r, size, step, 0);
    // R' w = c, then nu = -R^-1 (Q1'g + w); in the rotated frame the step is (w, -Q2'g)
    for (let r = 0; r < rows; r++) {
      let sum = c[r]!;
      for (let i = 0; i < r; i++) sum -= q[r * capacity + i]! * nu[i]!;
      nu[r] = sum / diagonal[r]!;
    }
    for (let r = 0; r < rows; r++) {
      const w = nu[r]!;
      nu[r] = -(step[r]! + w);
      step[r] = w;
    }
    for (let k = rows; k < size; k++) step[k] = -step[k]!;
    for (let r = rows - 1; r >= 0; r--) {
      nu[r] = nu[r]! / diagonal[r]!;
      addTo(nu, 0, -nu[r]!, q, r * capacity, r);
    }
    for (let r = rows - 1; r >= 0; r--) reflectOne(q, r * capacity, r, size, step, 0);
    backward(l, capacity, size, step);
  }

  private factor(): void {
    if (this.factored) return;
    for (let r = 0; r < this.rows; r++) {
      const at = r * this.capacity;
      for (let k = at; k < at + this.size; k++) this.q[k] = this.y[k]!;
    }
    reflectColumns(this.q, this.capacity, this.size, this.rows, this.diagonal);
    this.factored = true;
  }

  private grow(capacity: number, rowCapacity: number): void {
    const restride = (from: Float64Array, rows: number) => {
      const to = new Float64Array(rows * capacity);
      for (let r = 0; r * this.capacity < from.length; r++) {
        to.set(from.subarray(r * this.capacity, (r + 1) * this.capacity), r * capacity);
      }
      return to;
    };
    this.l = restride(this.l, capacity);
    this.e = restride(this.e, rowCapacity);
    this.y = restride(this.y, rowCapacity);
    this.q = new Float64Array(rowCapacity * capacity);
    this.diagonal = new Float64Array(rowCapacity);
    this.step = new Float64Array(capacity);
    this.nu = new Float64Array(rowCapacity);
    this.capacity = capacity;
    this.rowCapacity = rowCapacity;
    this.factored = false;
  }
}
