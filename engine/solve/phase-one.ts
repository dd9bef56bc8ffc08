import { GrowingQR } from './householder';
import type { Prepared } from './prepare';

export type Start =
  | { feasible: true; materials: number[]; grams: number[]; rows: number[]; iterations: number }
  /** Weights of the rows, as `prepare` has them, that no blend can stand up to. */
  | { feasible: false; weights: Float64Array; iterations: number };

export interface PhaseOneOptions {
  /** 1 for the materials that may be used; all where missing. */
  allowed?: Uint8Array;
  /** 1 for the rules that are left aside; those asleep where missing. */
  left?: Uint8Array;
  /** Where to begin: a blend that is thought to be near. */
  near?: { materials: number[]; grams: number[] };
}

/** A blend this near to keeping every rule, relative to its limit, is taken to keep them. */
const KEPT = 2e-10;
const ROUNDING = 1e-13;
const DEPENDENCE = 1e-13;

/**
 * A blend that keeps every rule, or a proof that there is none: the least distance problem of Lawson & Hanson (1974,
 * chapter 23) in grams, with rows divided by their limits.
 *
 *     min |G x + t|^2 + (n'x - 1)^2    over x >= 0, t >= 0,    n_i = 1 for a material that smells, 0 for a solvent
 *
 * If the least value is 0, x is such a blend. If not, the residual rho = G x + t is Farkas' vector: rho >= 0 and
 * (G'rho)_i >= n_i (1 - n'x) > 0. Being non-negative least squares it makes progress at every step, however many rows
 * meet in one corner. Slacks in use leave their rows out of the fit, so that only the rows that bind are ever factored.
 */
export function phaseOne(prepared: Prepared, options: PhaseOneOptions = {}): Start {
  const search = new FeasibleSearch(prepared, options);
  search.begin(options.near);
  const limit = 20 * (prepared.general + 20) + prepared.count;
  while (search.iterations < limit) {
    search.settle(limit);
    if (search.excess() <= KEPT || !search.enter()) break;
  }
  return search.outcome();
}

class FeasibleSearch {
  iterations = 0;
  private materials: number[] = [];
  private x: number[] = [];
  /** Rows whose slack is out of use, so that they are fitted. */
  private rows: number[] = [];
  private readonly fitted: Uint8Array;
  private readonly used: Uint8Array;
  /** Left out by the guard until something else has moved. */
  private readonly barred = new Set<number>();
  private rho: Float64Array = new Float64Array(0);
  private rest = 1;

  constructor(
    private readonly prepared: Prepared,
    private readonly options: PhaseOneOptions,
  ) {
    this.fitted = new Uint8Array(prepared.rules.length);
    this.used = new Uint8Array(prepared.count);
  }

  begin(near: { materials: number[]; grams: number[] } | undefined): void {
    if (near) {
      const sum = near.materials.reduce((total, i, k) => total + this.normal(i) * near.grams[k]!, 0);
      for (const [k, i] of near.materials.entries()) this.addMaterial(i, near.grams[k]! / sum);
    } else {
      const first = this.leastBroken();
      if (first >= 0) this.addMaterial(first, 1);
    }
    for (const [r, rule] of this.prepared.rules.entries()) {
      if (this.isLeft(r)) continue;
      if (rule.kind === 'exact' || this.valueOf(r, this.x) > 0) this.addRow(r);
    }
  }

  /** The length of what is still broken. */
  excess(): number {
    return Math.hypot(this.rest, ...this.rho);
  }

  /** To the least squares fit of the materials and rows in use; amounts and slacks that reach 0 on the way leave. */
  settle(limit: number): void {
    for (;;) {
      this.iterations++;
      const wanted = this.fit();
      const block = this.firstBlock(wanted);
      for (let k = 0; k < this.x.length; k++) this.x[k]! += block.part * (wanted[k]! - this.x[k]!);
      if (block.material < 0 && block.row < 0) break;
      if (this.iterations >= limit) break;
      this.barred.clear();
      if (block.material >= 0) this.removeMaterial(block.material);
      else this.addRow(block.row);
    }
    this.rho = Float64Array.from(this.rows, (r) => this.valueOf(r, this.x));
    this.rest = 1 - this.materials.reduce((sum, i, k) => sum + this.normal(i) * this.x[k]!, 0);
  }

  /** Takes in the material, or the slack, that mends most; false if nothing mends anything. */
  enter(): boolean {
    const { prepared } = this;
    for (;;) {
      let slack = -1;
      let best = -1;
      let most = ROUNDING * this.excess();
      for (const [place, r] of this.rows.entries()) {
        if (prepared.rules[r]!.kind !== 'exact' && -this.rho[place]! > most && !this.barred.has(-1 - r)) {
          [slack, most] = [place, -this.rho[place]!];
        }
      }
      const gains = this.gains();
      for (let i = 0; i < prepared.count; i++) {
        if (gains[i]! > most && !this.barred.has(i)) [best, most] = [i, gains[i]!];
      }
      if (best < 0 && slack < 0) return false;
      if (best < 0) {
        const r = this.rows[slack]!;
        this.rows.splice(slack, 1);
        this.fitted[r] = 0;
        this.barred.add(-1 - r);
        return true;
      }
      this.addMaterial(best, 0);
      if (this.fit()[this.x.length - 1]! > 0) {
        this.barred.clear();
        return true;
      }
      this.removeMaterial(this.x.length - 1);
      this.barred.add(best);
    }
  }

  outcome(): Start {
    const { materials, rows, iterations } = this;
    const used = this.x.map((_, k) => k).filter((k) => this.x[k]! > 0);
    const smells = used.some((k) => this.prepared.strength[materials[k]!]! > 0);
    if (smells && this.excess() <= KEPT) {
      return {
        feasible: true,
        materials: used.map((k) => materials[k]!),
        grams: used.map((k) => this.x[k]!),
        rows: [...rows],
        iterations,
      };
    }
    const weights = new Float64Array(this.prepared.rules.length);
    for (const [place, r] of rows.entries()) {
      weights[r] = this.prepared.rules[r]!.kind === 'exact' ? this.rho[place]! : Math.max(0, this.rho[place]!);
    }
    return { feasible: false, weights, iterations };
  }

  private normal(i: number): number {
    return this.prepared.strength[i]! > 0 ? 1 : 0;
  }

  private isLeft(r: number): boolean {
    return (this.options.left ?? this.prepared.asleep)[r] === 1;
  }

  private isAllowed(i: number): boolean {
    const { allowed } = this.options;
    return this.used[i] === 0 && (!allowed || allowed[i] === 1);
  }

  /** The material that smells and breaks least by itself: a short way to go. */
  private leastBroken(): number {
    const { prepared } = this;
    let best = -1;
    let least = Number.POSITIVE_INFINITY;
    for (let i = 0; i < prepared.count; i++) {
      if (!this.isAllowed(i) || prepared.strength[i] === 0) continue;
      let broken = 0;
      for (let at = prepared.start[i]!; at < prepared.start[i + 1]!; at++) {
        const r = prepared.row[at]!;
        const base = prepared.base[r]!;
        if (!this.isLeft(r)) broken += over(prepared.entry[at]! + base) - over(base);
      }
      if (broken < least) [best, least] = [i, broken];
    }
    return best;
  }

  /** n_i rest - (G'rho)_i for the materials outside: what each would mend. */
  private gains(): Float64Array {
    const { prepared } = this;
    const weights = new Float64Array(prepared.rules.length);
    let lift = 0;
    for (const [place, r] of this.rows.entries()) {
      weights[r] = this.rho[place]!;
      lift += this.rho[place]! * prepared.base[r]!;
    }
    const gains = new Float64Array(prepared.count);
    for (let i = 0; i < prepared.count; i++) {
      if (!this.isAllowed(i)) continue;
      let sum = lift;
      for (let at = prepared.start[i]!; at < prepared.start[i + 1]!; at++) {
        sum += weights[prepared.row[at]!]! * prepared.entry[at]!;
      }
      gains[i] = this.normal(i) * this.rest - sum;
    }
    return gains;
  }

  private fit(): Float64Array {
    const height = this.rows.length + 1;
    const right = new Float64Array(height);
    right[height - 1] = 1;
    const qr = new GrowingQR(height, right);
    for (const [k, i] of this.materials.entries()) {
      const column = Float64Array.from({ length: height }, (_, place) =>
        place < height - 1 ? this.coefficient(this.rows[place]!, i) : this.normal(i),
      );
      qr.add(k, column, DEPENDENCE);
    }
    const wanted = Float64Array.from(this.x);
    const solved = qr.solve();
    for (const [place, k] of qr.order.entries()) wanted[k] = solved[place]!;
    if (qr.size < wanted.length) for (let k = 0; k < wanted.length; k++) if (!qr.order.includes(k)) wanted[k] = 0;
    return wanted;
  }

  private firstBlock(wanted: Float64Array): { part: number; material: number; row: number } {
    const block = { part: 1, material: -1, row: -1 };
    for (let k = 0; k < this.x.length; k++) {
      if (wanted[k]! > 0) continue;
      const fall = this.x[k]! - wanted[k]!;
      const part = fall > 0 ? this.x[k]! / fall : 0;
      if (part < block.part || block.material < 0) [block.part, block.material] = [Math.min(part, block.part), k];
    }
    for (const [r, rule] of this.prepared.rules.entries()) {
      if (this.fitted[r] === 1 || rule.kind === 'exact' || this.isLeft(r)) continue;
      const then = this.valueOf(r, wanted);
      if (!(then > 0)) continue;
      const now = Math.min(0, this.valueOf(r, this.x));
      const part = -now / (then - now);
      if (part < block.part || (block.material < 0 && block.row < 0)) {
        block.part = part;
        block.material = -1;
        block.row = r;
      }
    }
    return block;
  }

  private addMaterial(i: number, amount: number): void {
    this.materials.push(i);
    this.x.push(amount);
    this.used[i] = 1;
  }

  private removeMaterial(k: number): void {
    this.used[this.materials[k]!] = 0;
    this.materials.splice(k, 1);
    this.x.splice(k, 1);
  }

  private addRow(r: number): void {
    this.rows.push(r);
    this.fitted[r] = 1;
  }

  private valueOf(r: number, x: ArrayLike<number>): number {
    let sum = 0;
    for (let k = 0; k < this.materials.length; k++) sum += this.coefficient(r, this.materials[k]!) * x[k]!;
    return sum;
  }

  private coefficient(r: number, i: number): number {
    const { prepared } = this;
    let entry = prepared.base[r]!;
    for (let at = prepared.start[i]!; at < prepared.start[i + 1]!; at++) {
      if (prepared.row[at] === r) entry += prepared.entry[at]!;
    }
    return entry;
  }
}

function over(value: number): number {
  return value > 0 ? value * value : 0;
}
