import type { Prepared } from './prepare';
import { Pricing } from './pricing';
import { addTo, product } from './triangle';
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
 * The share of the largest curvature that is added to every material's own, so that L exists for any set of materials.
 * It damps the steps and leaves the answer alone: every step starts from the true gradient (proximal point,
 * Rockafellar 1976), and steps go on until nothing is left of it.
 */
const DAMPING = 1e-10;
const FLOOR = 1e-12;
/** An amount below 0, or a row above, by this is rounding; amounts are scaled to be at most about 1. */
const SLIP = 1e-12;
/** A row this near to its limit may be taken to bind. */
const NEAR = 1e-9;
/** A row this dependent on the others in L^-1 E' says nothing that they do not. */
const DEPENDENCE = 1e-13;
const DEPENDENT = 1e-14;
/** The scale of the amounts is renewed when the mass per unit of impact has changed by this factor. */
const RESCALE = 32;
/** An amount below this, relative to its scale, is rounding. */
const TRACE = 1e-10;
const REFINEMENTS = 12;
const LONGEST = 1e12;
/** Steps of no length after which the working set may be going round in circles. */
const PATIENCE = 40;

/**
 * A primal active set in the amounts of the materials in use and the rows that bind (Gill, Murray & Wright 1981,
 * chapter 5; for least squares Lawson & Hanson 1974, chapter 23).
 *
 * Every step solves the equality problem of the working set, goes there or to the first amount that reaches 0 or the
 * first row that would be broken, and changes the working set by that one. Where a full step was possible, the most
 * negative multiplier decides what is freed: a row, or a material that comes in. It ends when there is none.
 *
 * Amounts are u_k = z_k / zeta_k with zeta_k = min(1 / s_k, grams per unit of impact): for a mighty material the impact
 * share, for a weak one the mass share. Strengths span decades, and a tolerance in y alone would mean nothing in grams:
 * a mass excess of 8e-3 can be 2e-9 in y.
 */
export class ActiveSet {
  readonly materials: number[] = [];
  readonly rows: number[] = [];
  readonly factor = new WorkingFactor();
  readonly pricing: Pricing;
  iterations = 0;
  stalled = 0;
  private swept = false;
  /** Grams per unit of the normal sum, for which the amounts are scaled. */
  grams = 1;
  u = new Float64Array(64);
  zeta = new Float64Array(64);
  private damped = new Float64Array(64);
  readonly residual: Float64Array;
  private residualIsFresh = false;
  private readonly along: Float64Array;
  private gradient = new Float64Array(64);
  private entries = new Float64Array(64);
  private right = new Float64Array(64);
  private readonly value: Float64Array;
  private readonly change: Float64Array;
  private readonly touched: Int32Array;
  private touchedCount = 0;
  private readonly block = { part: 1, material: -1, row: -1 };
  /** 1 for a row of the working set, 2 for one left aside for now. */
  private readonly inRows: Uint8Array;
  private readonly ignored: number[] = [];
  /** Kept lines that the others imply so far: they hold by themselves until another material comes in. */
  private readonly waiting: number[] = [];
  private readonly damping: number;
  private readonly facets: number;

  constructor(
    readonly prepared: Prepared,
    readonly goal: Goal,
  ) {
    this.facets = goal.linear ? 0 : prepared.facets;
    this.residual = new Float64Array(prepared.facets);
    this.along = new Float64Array(prepared.facets);
    this.value = new Float64Array(prepared.rules.length);
    this.change = new Float64Array(prepared.rules.length);
    this.touched = new Int32Array(prepared.rules.length);
    this.inRows = new Uint8Array(prepared.rules.length);
    this.damping = goal.linear ? 1e-6 * (largest(goal.linear) || 1) : FLOOR * (largest(prepared.curvature) || 1);
    this.pricing = new Pricing(prepared, goal, this.damping);
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

  /** Runs to the optimum, or until `limit` steps are done; true if it got there. */
  run(limit: number): boolean {
    let refinements = 0;
    while (this.iterations < limit) {
      this.iterations++;
      this.solveStep();
      if (refinements > REFINEMENTS || (refinements > 0 && this.settled())) {
        if (this.swept || !this.sweep()) {
          this.refineMultipliers();
          return true;
        }
        refinements = 0;
        continue;
      }
      if (refinements % 2 === 1) this.stretch();
      const free = this.advance();
      refinements = free && !this.rescaled() && !this.release() ? refinements + 1 : 0;
    }
    return false;
  }

  /** Takes materials out whose amount is rounding, once, so that none is left of them; true if there were any. */
  private sweep(): boolean {
    this.swept = true;
    let any = false;
    for (let k = this.materials.length - 1; k >= 0 && this.materials.length > 1; k--) {
      if (this.u[k]! >= TRACE) continue;
      const i = this.materials[k]!;
      const grams = this.gramsOf(k);
      this.residualIsFresh = false;
      this.removeMaterial(k);
      if (this.factor.rows <= this.materials.length && this.factor.dependentRow(DEPENDENCE) < 0) any = true;
      else this.addMaterial(i, grams);
    }
    return any;
  }

  /** One more solve for what the multipliers leave of the gradient: where they are large, their rounding is, too. */
  private refineMultipliers(): void {
    const { factor, gradient, right } = this;
    const size = this.materials.length;
    this.solveStep();
    const nu = factor.nu.slice(0, factor.rows);
    for (let r = 0; r < factor.rows; r++) {
      addTo(gradient, 0, nu[r]!, factor.coefficients, factor.rowAt(r), size);
      right[r] = 0;
    }
    factor.solve(gradient, right);
    for (let r = 0; r < factor.rows; r++) factor.nu[r] = factor.nu[r]! + nu[r]!;
  }

  impactOf(k: number): number {
    return this.u[k]! * this.zeta[k]! * this.prepared.strength[this.materials[k]!]!;
  }

  gramsOf(k: number): number {
    return this.u[k]! * this.zeta[k]!;
  }

  /** The multiplier of a row of the rules, per unit of the row as `prepare` has it; 0 where it is rounding. */
  multiplierOf(place: number): number {
    const nu = this.factor.nu[place + 1]!;
    return Math.abs(nu) <= this.pricing.rowTolerance ? 0 : nu * this.rowScale(this.rows[place]!);
  }

  private rowScale(r: number): number {
    return this.prepared.rules[r]!.per === 'mass' ? 1 / this.grams : this.prepared.strengthScale;
  }

  /**
   * Along a direction that costs little or no curvature the damping makes steps short, over and over. So a step that
   * follows a full one is taken as far as the true curvature says, or the ratio test; the next one mends the rows.
   */
  private stretch(): void {
    const { factor, gradient, right, facets, prepared, along } = this;
    if (this.goal.linear) return;
    const { step } = factor;
    right.fill(0, 0, factor.rows);
    factor.solve(gradient, right);
    along.fill(0);
    let slope = 0;
    let curvature = 0;
    for (let k = 0; k < this.materials.length; k++) {
      const i = this.materials[k]!;
      const impact = step[k]! * this.zeta[k]! * prepared.strength[i]!;
      slope -= gradient[k]! * step[k]!;
      curvature += prepared.variance[i]! * impact * impact;
      addTo(along, 0, impact, prepared.vectors, i * facets, facets);
    }
    curvature += product(along, 0, along, 0, facets);
    const longer = Math.min(slope / curvature, LONGEST);
    if (longer > 2) for (let k = 0; k < this.materials.length; k++) step[k] = step[k]! * longer;
  }

  /** Whether nothing is left to gain in the working set: slopes alike, per unit of impact, and rows met. */
  private settled(): boolean {
    const { factor, gradient, right, zeta } = this;
    const size = this.materials.length;
    for (let r = 0; r < factor.rows; r++) if (Math.abs(right[r]!) > SLIP) return false;
    for (let k = 0; k < size; k++) this.entries[k] = gradient[k]!;
    for (let r = 0; r < factor.rows; r++)
      addTo(this.entries, 0, factor.nu[r]!, factor.coefficients, factor.rowAt(r), size);
    for (let k = 0; k < size; k++) {
      const normal = zeta[k]! * this.goal.normal[this.materials[k]!]!;
      if (Math.abs(this.entries[k]!) > this.pricing.tolerance * Math.max(normal, 1e-9)) return false;
    }
    return true;
  }

  /** The gradient at u, from the data, and the step and multipliers of the working set. */
  private solveStep(): void {
    const { prepared, facets, residual, gradient, factor } = this;
    this.computeResidual();
    for (let k = 0; k < this.materials.length; k++) {
      const i = this.materials[k]!;
      const impact = this.zeta[k]! * prepared.strength[i]!;
      gradient[k] = this.goal.linear
        ? this.zeta[k]! * this.goal.linear[i]!
        : impact *
          (product(prepared.vectors, i * facets, residual, 0, facets) + prepared.variance[i]! * impact * this.u[k]!);
    }
    for (let r = 0; r < factor.rows; r++) {
      this.right[r] =
        (r === 0 ? 1 : 0) - product(factor.coefficients, factor.rowAt(r), this.u, 0, this.materials.length);
    }
    factor.solve(gradient, this.right);
  }

  computeResidual(): void {
    const { prepared, facets, residual } = this;
    if (facets === 0 || this.residualIsFresh) return;
    this.residualIsFresh = true;
    for (let f = 0; f < facets; f++) residual[f] = -prepared.target[f]!;
    for (let k = 0; k < this.materials.length; k++) {
      addTo(residual, 0, this.impactOf(k), prepared.vectors, this.materials[k]! * facets, facets);
    }
  }

  /** E at the amounts that `residual` was computed for. */
  private objective(): number {
    let sum = product(this.residual, 0, this.residual, 0, this.facets);
    for (let k = 0; k < this.materials.length; k++) {
      sum += this.prepared.variance[this.materials[k]!]! * this.impactOf(k) ** 2;
    }
    return sum;
  }

  /** Goes along the step as far as nothing is broken; what stops it changes the working set. True if nothing does. */
  private advance(): boolean {
    const { factor, u } = this;
    const size = this.materials.length;
    const { step } = factor;
    const block = this.firstBlock();
    let furthest = 0;
    for (let k = 0; k < size; k++) {
      furthest = Math.max(furthest, Math.abs(block.part * step[k]!));
      u[k] = Math.max(u[k]! + block.part * step[k]!, 0);
    }
    this.residualIsFresh = false;
    this.stalled = furthest > SLIP ? 0 : this.stalled + 1;
    if (block.part > 0 && this.ignored.length > 0) this.heed();
    if (furthest > NEAR) this.pricing.unbar();
    // Lawson and Hanson's guard: what wants to go below 0 as soon as it is in came in by rounding, and would come again
    if (block.part === 0 && block.material === size - 1) this.pricing.bar(this.materials[block.material]!);
    if (block.material >= 0) this.dropMaterial(block.material);
    else if (block.row >= 0 && !this.tryRow(block.row)) this.ignore(block.row);
    return block.material < 0 && block.row < 0;
  }

  /**
   * Ratio test in two passes (Harris 1973): how far one may go if everything may slip by a rounding, then, among all
   * that block before, the one with the largest change, which is the safest to put into the working set.
   */
  private firstBlock(): { part: number; material: number; row: number } {
    const { u } = this;
    const { step } = this.factor;
    const size = this.materials.length;
    this.evaluateRows();
    const { value, change, touched, touchedCount } = this;
    let reach = 1;
    for (let k = 0; k < size; k++) {
      if (u[k]! + step[k]! < 0) reach = Math.min(reach, (u[k]! + SLIP) / -step[k]!);
    }
    for (let t = 0; t < touchedCount; t++) {
      const r = touched[t]!;
      if (change[r]! > 0 && value[r]! + change[r]! > SLIP) {
        reach = Math.min(reach, Math.max(0, SLIP - value[r]!) / change[r]!);
      }
    }
    const { block } = this;
    block.part = 1;
    block.material = -1;
    block.row = -1;
    if (reach >= 1) return block;
    let strongest = 0;
    for (let k = 0; k < size; k++) {
      const fall = -step[k]!;
      if (u[k]! - fall < 0 && u[k]! <= reach * fall && fall > strongest) {
        strongest = fall;
        block.material = k;
        block.part = Math.max(0, u[k]! / fall);
      }
    }
    for (let t = 0; t < touchedCount; t++) {
      const r = touched[t]!;
      const rise = change[r]!;
      if (rise > strongest && value[r]! + rise > SLIP && -value[r]! <= reach * rise) {
        strongest = rise;
        block.material = -1;
        block.row = r;
        block.part = Math.max(0, -value[r]! / rise);
      }
    }
    block.part = Math.min(1, block.part);
    return block;
  }

  /**
   * The value, and the change along the step, of every row outside the working set that the materials in use can break:
   * all general rules, and the upper limits of the materials themselves.
   */
  private evaluateRows(): void {
    const { prepared, value, change, touched, zeta, u, inRows } = this;
    const { step } = this.factor;
    const { base, start, row, entry, general } = prepared;
    const left = this.goal.left ?? prepared.asleep;
    let mass = 0;
    let massChange = 0;
    for (let k = 0; k < this.materials.length; k++) {
      mass += zeta[k]! * u[k]!;
      massChange += zeta[k]! * step[k]!;
    }
    this.touchedCount = 0;
    for (let r = 0; r < general; r++) {
      value[r] = base[r]! * mass;
      change[r] = base[r]! * massChange;
      if (inRows[r] === 0 && left[r] === 0) touched[this.touchedCount++] = r;
    }
    for (let k = 0; k < this.materials.length; k++) {
      const i = this.materials[k]!;
      for (let at = start[i]!; at < start[i + 1]!; at++) {
        const r = row[at]!;
        if (r >= general) {
          value[r] = base[r]! * mass;
          change[r] = base[r]! * massChange;
          if (inRows[r] === 0 && left[r] === 0) touched[this.touchedCount++] = r;
        }
        const weight = zeta[k]! * entry[at]!;
        value[r] = value[r]! + weight * u[k]!;
        change[r] = change[r]! + weight * step[k]!;
      }
    }
    for (let t = 0; t < this.touchedCount; t++) {
      const r = touched[t]!;
      const scale = this.rowScale(r);
      value[r] = value[r]! * scale;
      change[r] = change[r]! * scale;
    }
  }

  /**
   * Frees the row or takes in the material with the most negative multiplier; false if there is none. After many steps
   * of no length it is the first by number instead, which cannot go round in circles (Bland 1977).
   */
  private release(): boolean {
    const { factor, prepared, pricing } = this;
    const circling = this.stalled > PATIENCE;
    this.computeResidual();
    if (!this.goal.linear) pricing.setScale(0.5 * Math.max(prepared.targetSize, this.objective()));
    let worst = -1;
    let least = 0;
    for (const [place, r] of this.rows.entries()) {
      const nu = factor.nu[place + 1]!;
      if (prepared.rules[r]!.kind === 'exact' || nu >= -pricing.rowTolerance) continue;
      if (circling ? worst < 0 || r < this.rows[worst]! : nu < least) [worst, least] = [place, nu];
    }
    if (worst >= 0) {
      this.inRows[this.rows[worst]!] = 0;
      this.rows.splice(worst, 1);
      factor.removeRow(worst + 1);
      return true;
    }
    pricing.setMultipliers(this);
    const best = circling ? pricing.first(this) : pricing.best(this);
    if (best < 0) return false;
    this.addMaterial(best, 0);
    return true;
  }

  private addMaterial(i: number, grams: number): void {
    const { prepared, facets, materials, factor, goal } = this;
    if (materials.length + 2 > this.u.length) this.growArrays();
    const k = materials.length;
    const zeta = this.scaleOf(i);
    const impact = zeta * prepared.strength[i]!;
    this.zeta[k] = zeta;
    this.u[k] = grams / zeta;
    for (let j = 0; j < k; j++) {
      const other = materials[j]!;
      this.gradient[j] =
        impact === 0
          ? 0
          : impact *
            this.zeta[j]! *
            prepared.strength[other]! *
            product(prepared.vectors, i * facets, prepared.vectors, other * facets, facets);
    }
    const own = goal.linear ? 0 : impact * impact * prepared.curvature[i]!;
    const damping = Math.max(DAMPING * own, this.damping);
    this.damped[k] = damping;
    this.entries[0] = zeta * goal.normal[i]!;
    for (const [place, r] of this.rows.entries()) this.entries[place + 1] = this.coefficient(r, i, zeta);
    materials.push(i);
    factor.addMaterial(this.gradient, own + damping, 0.5 * damping, this.entries);
    this.pricing.used[i] = 1;
    for (let w = this.waiting.length - 1; w >= 0; w--) {
      if (this.tryRow(this.waiting[w]!)) this.waiting.splice(w, 1);
    }
  }

  /** Takes a material out, and with it any row that only this material kept independent of the others. */
  private dropMaterial(k: number): void {
    this.removeMaterial(k);
    for (let r = this.factor.dependentRow(DEPENDENT); r > 0; r = this.factor.dependentRow(DEPENDENT)) {
      const [row] = this.rows.splice(r - 1, 1);
      this.factor.removeRow(r);
      this.inRows[row!] = 0;
      if (this.prepared.rules[row!]!.kind === 'exact') this.waiting.push(row!);
    }
  }

  private removeMaterial(k: number): void {
    const last = this.materials.length - 1;
    this.pricing.used[this.materials[k]!] = 0;
    this.materials.splice(k, 1);
    this.u.copyWithin(k, k + 1, last + 1);
    this.zeta.copyWithin(k, k + 1, last + 1);
    this.damped.copyWithin(k, k + 1, last + 1);
    this.factor.removeMaterial(k);
  }

  /** Puts a row into the working set unless it depends on those already there. */
  private tryRow(r: number): boolean {
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

  /** A row that the working set already implies cannot block, but by rounding: it is left aside until something moves. */
  private ignore(r: number): void {
    this.inRows[r] = 2;
    this.ignored.push(r);
  }

  private heed(): void {
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
  private rescaled(): boolean {
    let grams = 0;
    for (let k = 0; k < this.materials.length; k++) grams += this.gramsOf(k);
    const factor = grams / this.grams;
    if (factor < RESCALE && factor > 1 / RESCALE) return false;
    const point = {
      materials: [...this.materials],
      grams: this.materials.map((_, k) => this.gramsOf(k)),
      rows: [...this.rows],
    };
    for (const i of point.materials) this.pricing.used[i] = 0;
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
    this.damped = wider(this.damped);
    this.gradient = wider(this.gradient);
    this.entries = wider(this.entries);
    this.right = wider(this.right);
  }
}

function largest(values: Float64Array): number {
  let most = 0;
  for (let i = 0; i < values.length; i++) most = Math.max(most, Math.abs(values[i]!));
  return most;
}
