import type { Prepared } from './prepare';
import { product } from './triangle';
import { WorkingFactor } from './working-factor';

/** What is minimised, over z >= 0 with sum normal_i z_i = 1 and the rows: half of E, or a linear cost. */
export interface Goal {
  normal: Float64Array;
  /** Cost per gram, in place of the distance. */
  linear?: Float64Array;
  /** Materials that may be used; all where missing. */
  allowed?: Uint8Array;
  /** 1 for the rules that are left aside; those asleep where missing. */
  left?: Uint8Array;
}

/** A point to start from: the materials in use with their grams z, and rows that may bind. */
export interface Point {
  materials: number[];
  grams: number[];
  rows: number[];
}

/**
 * The share of its own curvature that is added to every material's, so that L exists for any set of materials.
 * It damps the steps and leaves the answer alone: every step starts from the true gradient (proximal point,
 * Rockafellar 1976), and steps go on until nothing is left of it.
 */
const DAMPING = 1e-10;
/** And at least this share of the largest of all: a solvent has no curvature of its own. */
const FLOOR = 1e-12;
/** A row this near to its limit may be taken to bind. */
export const NEAR = 1e-9;
/** A row this dependent on the others in L^-1 E' says nothing that they do not. */
export const DEPENDENCE = 1e-13;
const DEPENDENT = 1e-14;
/** The scale of the amounts is renewed when the mass per unit of impact has changed by this factor. */
const RESCALE = 32;

/**
 * The materials in use with their amounts, and the rows that bind, with the factor of both kept up to date.
 *
 * Amounts are u_k = z_k / zeta_k with zeta_k = min(1 / s_k, grams per unit of impact): for a mighty material the impact
 * share, for a weak one the mass share. Strengths span decades, and a tolerance in y alone would mean nothing in grams:
 * a mass excess of 8e-3 can be 2e-9 in y.
 */
export class WorkingSet {
  readonly materials: number[] = [];
  readonly rows: number[] = [];
  readonly factor = new WorkingFactor();
  /** 1 for a material in use. */
  readonly used: Uint8Array;
  /** Grams per unit of the normal sum, for which the amounts are scaled. */
  grams = 1;
  u = new Float64Array(64);
  zeta = new Float64Array(64);
  /** 1 for a row of the working set, 2 for one left aside for now. */
  readonly inRows: Uint8Array;
  readonly damping: number;
  protected readonly facets: number;
  protected residualIsFresh = false;
  protected entries = new Float64Array(64);
  private column = new Float64Array(64);
  protected readonly ignored: number[] = [];
  /** Kept lines that the others imply so far: they hold by themselves until another material comes in. */
  private readonly waiting: number[] = [];

  constructor(
    readonly prepared: Prepared,
    readonly goal: Goal,
  ) {
    this.facets = goal.linear ? 0 : prepared.facets;
    this.used = new Uint8Array(prepared.count);
    this.inRows = new Uint8Array(prepared.rules.length);
    this.damping = goal.linear ? 1e-6 * (largest(goal.linear) || 1) : FLOOR * (largest(prepared.curvature) || 1);
  }

  /** Takes the point as it is; rows that depend on others there are left out. */
  begin(point: Point): void {
    this.materials.length = 0;
    this.rows.length = 0;
    this.residualIsFresh = false;
    this.factor.clear();
    this.inRows.fill(0);
    let sum = 0;
    for (const [k, i] of point.materials.entries()) sum += point.grams[k]! * this.goal.normal[i]!;
    this.grams = point.grams.reduce((total, z) => total + z, 0) / sum;
    this.factor.addRow(this.entries);
    this.waiting.length = 0;
    for (const [k, i] of point.materials.entries()) this.addMaterial(i, point.grams[k]! / sum);
    this.ignored.length = 0;
    const { rules, asleep } = this.prepared;
    const left = this.goal.left ?? asleep;
    for (let r = 0; r < this.prepared.general; r++) {
      if (rules[r]!.kind === 'exact' && left[r] === 0 && !this.tryRow(r)) this.waiting.push(r);
    }
    for (const r of point.rows) if (rules[r]!.kind !== 'exact' && this.binds(r)) this.tryRow(r);
  }

  impactOf(k: number): number {
    return this.u[k]! * this.zeta[k]! * this.prepared.strength[this.materials[k]!]!;
  }

  gramsOf(k: number): number {
    return this.u[k]! * this.zeta[k]!;
  }

  rowScale(r: number): number {
    return this.prepared.rules[r]!.per === 'mass' ? 1 / this.grams : this.prepared.strengthScale;
  }

  protected addMaterial(i: number, grams: number): void {
    const { prepared, facets, materials, factor, goal } = this;
    if (materials.length + 2 > this.u.length) this.growArrays();
    const k = materials.length;
    const zeta = this.scaleOf(i);
    const impact = zeta * prepared.strength[i]!;
    this.zeta[k] = zeta;
    this.u[k] = grams / zeta;
    for (let j = 0; j < k; j++) {
      const other = materials[j]!;
      this.column[j] =
        impact === 0
          ? 0
          : impact *
            this.zeta[j]! *
            prepared.strength[other]! *
            product(prepared.vectors, i * facets, prepared.vectors, other * facets, facets);
    }
    const own = goal.linear ? 0 : impact * impact * prepared.curvature[i]!;
    const damping = Math.max(DAMPING * own, this.damping);
    this.entries[0] = zeta * goal.normal[i]!;
    for (const [place, r] of this.rows.entries()) this.entries[place + 1] = this.coefficient(r, i, zeta);
    materials.push(i);
    factor.addMaterial(this.column, own + damping, 0.5 * damping, this.entries);
    this.used[i] = 1;
    for (let w = this.waiting.length - 1; w >= 0; w--) {
      if (this.tryRow(this.waiting[w]!)) this.waiting.splice(w, 1);
    }
  }

  /** Takes a material out, and with it any row that only this material kept independent of the others. */
  protected dropMaterial(k: number): void {
    this.removeMaterial(k);
    for (let r = this.factor.dependentRow(DEPENDENT); r > 0; r = this.factor.dependentRow(DEPENDENT)) {
      const [row] = this.rows.splice(r - 1, 1);
      this.factor.removeRow(r);
      this.inRows[row!] = 0;
      if (this.prepared.rules[row!]!.kind === 'exact') this.waiting.push(row!);
    }
  }

  protected removeMaterial(k: number): void {
    const last = this.materials.length - 1;
    this.used[this.materials[k]!] = 0;
    this.materials.splice(k, 1);
    this.u.copyWithin(k, k + 1, last + 1);
    this.zeta.copyWithin(k, k + 1, last + 1);
    this.factor.removeMaterial(k);
  }

  /** Puts a row into the working set unless it depends on those already there. */
  protected tryRow(r: number): boolean {
    const { factor, materials } = this;
    if (this.rows.length + 2 > materials.length) return false;
    for (let k = 0; k < materials.length; k++) this.entries[k] = this.coefficient(r, materials[k]!, this.zeta[k]!);
    factor.addRow(this.entries);
    if (factor.dependentRow(DEPENDENCE, factor.rows - 1) >= 0) {
      factor.removeRow(factor.rows - 1);
      return false;
    }
    this.rows.push(r);
    this.inRows[r] = 1;
    return true;
  }

  protected freeRow(place: number): void {
    this.inRows[this.rows[place]!] = 0;
    this.rows.splice(place, 1);
    this.factor.removeRow(place + 1);
  }

  /** A row that the working set already implies cannot block, but by rounding: it is left aside until something moves. */
  protected ignore(r: number): void {
    this.inRows[r] = 2;
    this.ignored.push(r);
  }

  protected heed(): void {
    for (const r of this.ignored) this.inRows[r] = 0;
    this.ignored.length = 0;
  }

  /** Whether the blend is at the row's limit, and not short of it. */
  private binds(r: number): boolean {
    let value = 0;
    for (let k = 0; k < this.materials.length; k++) {
      value += this.coefficient(r, this.materials[k]!, this.zeta[k]!) * this.u[k]!;
    }
    return value > -NEAR;
  }

  private coefficient(r: number, i: number, zeta: number): number {
    const { prepared } = this;
    let entry = 0;
    for (let at = prepared.start[i]!; at < prepared.start[i + 1]!; at++) {
      if (prepared.row[at] === r) entry = prepared.entry[at]!;
    }
    return (entry + prepared.base[r]!) * zeta * this.rowScale(r);
  }

  private scaleOf(i: number): number {
    return Math.min(1 / this.goal.normal[i]!, this.grams);
  }

  /** Renews the scales of the amounts where the blend's strength has moved far from the one they were made for. */
  protected rescaled(): boolean {
    let grams = 0;
    for (let k = 0; k < this.materials.length; k++) grams += this.gramsOf(k);
    const factor = grams / this.grams;
    if (factor < RESCALE && factor > 1 / RESCALE) return false;
    const point = {
      materials: [...this.materials],
      grams: this.materials.map((_, k) => this.gramsOf(k)),
      rows: [...this.rows],
    };
    for (const i of point.materials) this.used[i] = 0;
    this.begin(point);
    return true;
  }

  private growArrays(): void {
    const wider = (from: Float64Array) => {
      const to = new Float64Array(2 * from.length);
      to.set(from);
      return to;
    };
    this.u = wider(this.u);
    this.zeta = wider(this.zeta);
    this.column = wider(this.column);
    this.entries = wider(this.entries);
  }
}

function largest(values: Float64Array): number {
  let most = 0;
  for (let i = 0; i < values.length; i++) most = Math.max(most, Math.abs(values[i]!));
  return most;
}
