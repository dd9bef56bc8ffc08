import type { ActiveSet } from './active-set';
import type { Prepared } from './prepare';
import { product } from './triangle';
import type { Goal, WorkingSet } from './working-set';

/** Materials looked at again before all of them are: most of the next ones to enter are among them. */
const LIST = 8;
/** Gains below this share of the objective's scale are left: the gap that is promised is a hundred times wider. */
const EXACT = 1e-11;
const ROUNDING = 1e-15;

/**
 * Which material outside would help most: the one with the most negative reduced cost for its curvature (the gain of a
 * step along it alone). A pass over all materials leaves a list of the best; the list is used up before the next pass.
 */
export class Pricing {
  private readonly used: Uint8Array;
  private readonly prepared: Prepared;
  private readonly goal: Goal;
  private readonly damping: number;
  /** A reduced cost per unit of impact above minus this is none. */
  tolerance = 0;
  rowTolerance = 0;
  passes = 0;
  private readonly lambda: Float64Array;
  private lift = 0;
  private normal = 0;
  private readonly facets: number;
  private readonly list = new Int32Array(LIST);
  private readonly scores = new Float64Array(LIST);
  private listed = 0;
  private readonly barred: number[] = [];
  private readonly isBarred: Uint8Array;

  constructor({ prepared, goal, damping, used }: WorkingSet) {
    this.prepared = prepared;
    this.goal = goal;
    this.damping = damping;
    this.used = used;
    this.isBarred = new Uint8Array(prepared.count);
    this.facets = goal.linear ? 0 : prepared.facets;
    this.lambda = new Float64Array(prepared.rules.length);
    this.setScale(goal.linear ? 1e6 * damping : 0.5 * prepared.targetSize);
  }

  /** Sets the tolerances for values of this size. */
  setScale(scale: number): void {
    this.tolerance = EXACT * scale;
    this.rowTolerance = 100 * ROUNDING * scale;
  }

  /** Leaves a material out of the choice until `unbar`. */
  bar(i: number): void {
    this.barred.push(i);
    this.isBarred[i] = 1;
  }

  unbar(): void {
    for (const i of this.barred) this.isBarred[i] = 0;
    this.barred.length = 0;
  }

  /** Reads the multipliers of the working set, per unit of each row. */
  setMultipliers(set: ActiveSet): void {
    const { lambda, prepared } = this;
    lambda.fill(0);
    this.lift = 0;
    this.normal = set.factor.nu[0]!;
    for (const [place, r] of set.rows.entries()) {
      const value = set.multiplierOf(place);
      lambda[r] = value;
      this.lift += value * prepared.base[r]!;
    }
  }

  best(set: ActiveSet): number {
    const again = this.bestListed(set);
    return again >= 0 ? again : this.bestOfAll(set);
  }

  /** The first by number that would help at all. */
  first(set: ActiveSet): number {
    for (let i = 0; i < this.prepared.count; i++) {
      if (this.used[i] === 0 && this.goal.allowed?.[i] !== 0 && this.score(i, set) < 0) return i;
    }
    return -1;
  }

  private bestListed(set: ActiveSet): number {
    let best = -1;
    let most = 0;
    for (let place = 0; place < this.listed; place++) {
      const i = this.list[place]!;
      const score = this.used[i] === 1 ? 0 : this.score(i, set);
      if (score < most || (score === most && score < 0 && i < best)) [best, most] = [i, score];
    }
    return best;
  }

  private bestOfAll(set: ActiveSet): number {
    const { goal, used } = this;
    this.passes++;
    this.listed = 0;
    for (let i = 0; i < this.prepared.count; i++) {
      if (used[i] === 1 || (goal.allowed && goal.allowed[i] === 0)) continue;
      const score = this.score(i, set);
      if (score < 0) this.keep(i, score);
    }
    return this.listed > 0 ? this.list[0]! : -1;
  }

  /** Insertion into the sorted list of the best; equal scores keep the order of their ids. */
  private keep(i: number, score: number): void {
    let place = this.listed < LIST ? this.listed++ : LIST;
    if (place === LIST) {
      if (score >= this.scores[LIST - 1]!) return;
      place = LIST - 1;
    }
    while (place > 0 && this.scores[place - 1]! > score) {
      this.scores[place] = this.scores[place - 1]!;
      this.list[place] = this.list[place - 1]!;
      place--;
    }
    this.scores[place] = score;
    this.list[place] = i;
  }

  /** Reduced cost over the root of the curvature, both per amount; 0 where there is no gain beyond rounding. */
  private score(i: number, set: ActiveSet): number {
    const { prepared, facets } = this;
    if (this.isBarred[i] === 1) return 0;
    const strength = prepared.strength[i]!;
    let rows = this.lift;
    for (let at = prepared.start[i]!; at < prepared.start[i + 1]!; at++) {
      rows += this.lambda[prepared.row[at]!]! * prepared.entry[at]!;
    }
    const pull =
      facets > 0 && strength > 0 ? strength * product(prepared.vectors, i * facets, set.residual, 0, facets) : 0;
    const direct = this.goal.linear ? this.goal.linear[i]! : 0;
    const cost = pull + rows + this.normal * this.goal.normal[i]! + direct;
    if (cost >= -this.tolerance * this.goal.normal[i]!) return 0;
    const zeta = Math.min(1 / this.goal.normal[i]!, set.grams);
    const terms = Math.abs(pull) + Math.abs(rows) + Math.abs(this.lift) + Math.abs(this.normal) * this.goal.normal[i]!;
    if (cost >= -ROUNDING * terms) return 0;
    const impact = zeta * strength;
    return (cost * zeta) / Math.sqrt((this.goal.linear ? 0 : impact * impact * prepared.curvature[i]!) + this.damping);
  }
}
