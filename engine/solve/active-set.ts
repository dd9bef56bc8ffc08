import type { Prepared } from './prepare';
import { Pricing } from './pricing';
import { RatioTest, SLIP } from './ratio-test';
import { addTo, product } from './triangle';
import { DEPENDENCE, type Goal, NEAR, WorkingSet } from './working-set';

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
 */
export class ActiveSet extends WorkingSet {
  readonly pricing: Pricing;
  iterations = 0;
  stalled = 0;
  readonly residual: Float64Array;
  private swept = false;
  private readonly along: Float64Array;
  private gradient = new Float64Array(64);
  private right = new Float64Array(64);
  private readonly ratioTest = new RatioTest(this);

  constructor(prepared: Prepared, goal: Goal) {
    super(prepared, goal);
    this.residual = new Float64Array(prepared.facets);
    this.along = new Float64Array(prepared.facets);
    this.pricing = new Pricing(this);
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
    this.solveStep();
    const { factor, gradient, right } = this;
    const size = this.materials.length;
    const nu = factor.nu.slice(0, factor.rows);
    for (let r = 0; r < factor.rows; r++) {
      addTo(gradient, 0, nu[r]!, factor.coefficients, factor.rowAt(r), size);
      right[r] = 0;
    }
    factor.solve(gradient, right);
    for (let r = 0; r < factor.rows; r++) factor.nu[r] = factor.nu[r]! + nu[r]!;
  }

  /** The multiplier of a row of the rules, per unit of the row as `prepare` has it; 0 where it is rounding. */
  multiplierOf(place: number): number {
    const nu = this.factor.nu[place + 1]!;
    return Math.abs(nu) <= this.pricing.rowTolerance ? 0 : nu * this.rowScale(this.rows[place]!);
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
    if (this.gradient.length < this.u.length) {
      this.gradient = new Float64Array(this.u.length);
      this.right = new Float64Array(this.u.length);
    }
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
    const block = this.ratioTest.firstBlock();
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
      this.freeRow(worst);
      return true;
    }
    pricing.setMultipliers(this);
    const best = circling ? pricing.first(this) : pricing.best(this);
    if (best < 0) return false;
    this.addMaterial(best, 0);
    return true;
  }
}
