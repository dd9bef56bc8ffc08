import type { Matrix } from 'ml-matrix';
import { EngineInputError } from '../errors';
import { GrowingQR, norm } from './householder';

export interface NonNegativeFit {
  status: 'optimal' | 'stopped';
  x: Float64Array;
  residualNorm: number;
  /** A'(b - A x): 0 where x > 0, not above 0 where x = 0. */
  dual: Float64Array;
  iterations: number;
}

/** A gain below this many roundings of |a_j| |b| is no gain: it is the rounding of the dual itself. */
const GAIN_ROUNDINGS = 16;
/** A column whose part outside the others is below this share of it would be solved from its rounding. */
const DEPENDENCE = 4 * Number.EPSILON;

/**
 * The weights x >= 0 for which A x comes closest to b (least squares).
 *
 * Lawson and Hanson's active set (1974, chapter 23), with Householder QR on the columns in use: the column that
 * would help most, for its length, enters next; one that would be needed in a negative amount leaves. It ends when
 * no column left out would improve the fit by more than its rounding, or after 3 (rows + columns) + 30 steps, and
 * then says 'stopped'. Lengths are taken out first, so that scaling a column only scales its weight.
 *
 * @throws EngineInputError if A and b differ in rows or hold a value that is not finite: a fault of the caller.
 */
export function nnls(a: Matrix, b: ArrayLike<number>): NonNegativeFit {
  const { columns, lengths, rightSide } = unitColumns(a, b);
  const fit = new ActiveSet(columns, rightSide);
  const limit = 3 * (a.rows + a.columns) + 30;
  let status: NonNegativeFit['status'] = 'stopped';
  while (fit.iterations < limit) {
    if (!fit.enterBest()) {
      status = 'optimal';
      break;
    }
    fit.settle(limit);
  }
  const { vector, length } = fit.qr.residual();
  const x = fit.x.map((value, j) => (lengths[j]! > 0 ? value / lengths[j]! : 0));
  const dual = Float64Array.from(columns, (column, j) => (fit.uses(j) ? 0 : dot(column, vector) * lengths[j]!));
  return { status, x, residualNorm: length, dual, iterations: fit.iterations };
}

class ActiveSet {
  readonly qr: GrowingQR;
  readonly x: Float64Array;
  iterations = 0;
  private readonly used: Uint8Array;
  private readonly least: number;

  constructor(
    private readonly columns: Float64Array[],
    b: Float64Array,
  ) {
    this.qr = new GrowingQR(b.length, b);
    this.x = new Float64Array(columns.length);
    this.used = new Uint8Array(columns.length);
    this.least = GAIN_ROUNDINGS * Number.EPSILON * norm(b);
  }

  uses(j: number): boolean {
    return this.used[j] === 1;
  }

  /** Takes in the column with the largest gain whose weight then comes out positive; false if there is none. */
  enterBest(): boolean {
    const { vector } = this.qr.residual();
    const gains = this.columns.map((column, j) => ({ j, gain: this.uses(j) ? 0 : dot(column, vector) }));
    const helpful = gains.filter(({ gain }) => gain > this.least).sort((p, q) => q.gain - p.gain || p.j - q.j);
    for (const { j } of helpful) {
      if (!this.qr.add(j, this.columns[j]!, DEPENDENCE)) continue;
      this.used[j] = 1;
      if (this.qr.solve()[this.qr.size - 1]! > 0) return true;
      this.used[j] = 0; // Lawson and Hanson's guard: its gain was rounding, and would go round in circles
      this.qr.truncate(this.qr.size - 1);
    }
    return false;
  }

  /** Moves to the least squares solution of the columns in use, dropping those that reach 0 on the way. */
  settle(limit: number): void {
    for (;;) {
      this.iterations++;
      const wanted = this.qr.solve();
      const { step, blocked } = this.firstZero(wanted);
      for (const [place, j] of this.qr.order.entries()) this.x[j]! += step * (wanted[place]! - this.x[j]!);
      if (blocked < 0 || this.iterations >= limit) return;
      this.drop(blocked);
    }
  }

  private firstZero(wanted: Float64Array): { step: number; blocked: number } {
    let step = 1;
    let blocked = -1;
    for (const [place, j] of this.qr.order.entries()) {
      if (wanted[place]! > 0) continue;
      const ratio = this.x[j]! / (this.x[j]! - wanted[place]!);
      if (blocked < 0 || ratio < step) [step, blocked] = [Math.min(1, Number.isNaN(ratio) ? 0 : ratio), place];
    }
    return { step, blocked };
  }

  private drop(place: number): void {
    const [gone, ...later] = this.qr.truncate(place);
    this.used[gone!] = 0;
    this.x[gone!] = 0;
    for (const j of later) {
      // A column that has become dependent without the dropped one has nothing to add: it waits outside.
      if (this.x[j]! > 0 && this.qr.add(j, this.columns[j]!, DEPENDENCE)) continue;
      this.used[j] = 0;
      this.x[j] = 0;
    }
  }
}

function unitColumns(a: Matrix, b: ArrayLike<number>) {
  if (typeof a?.get !== 'function') throw new EngineInputError('a', 'a must be a Matrix of ml-matrix.');
  if (typeof b !== 'object' || b === null || a.rows !== b.length)
    throw new EngineInputError('b', `b must have ${a.rows} numbers, as A has rows.`);
  const rightSide = Float64Array.from({ length: a.rows }, (_, i) => (typeof b[i] === 'number' ? b[i] : Number.NaN));
  const bad = rightSide.findIndex((value) => !Number.isFinite(value));
  if (bad >= 0) throw new EngineInputError(`b[${bad}]`, `b[${bad}] must be finite; it was ${rightSide[bad]}.`);
  const lengths = new Float64Array(a.columns);
  const columns = Array.from(lengths, (_, j) => {
    const column = Float64Array.from({ length: a.rows }, (_, i) => a.get(i, j));
    const length = norm(column);
    if (!Number.isFinite(length))
      throw new EngineInputError(`a[${j}]`, `Column ${j} of A must hold finite numbers only.`);
    lengths[j] = length;
    return length > 0 ? column.map((value) => value / length) : column;
  });
  return { columns, lengths, rightSide };
}

function dot(u: Float64Array, v: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < u.length; i++) sum += u[i]! * v[i]!;
  return sum;
}
