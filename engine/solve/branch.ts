import type { Run } from '../contract';
import { type Closest, closest } from './closest';
import { mandatory } from './discrete';
import { type Evidence, ROUNDING, rowSize } from './evidence';
import { rowSum } from './forced-out';
import { Heap } from './heap';
import { OneMore } from './one-more';
import type { Prepared } from './prepare';
import { closestOf } from './subset';
import type { Point } from './working-set';

/** What is left of the problem: materials that are used for certain, materials that are out, and its relaxation. */
interface Node {
  bound: number;
  serial: number;
  ins: readonly number[];
  outs: readonly number[];
  point: Point;
  evidence: Evidence;
}

export interface SearchResult {
  best: { point: Point; evidence: Evidence } | null;
  bound: number;
  /** False if time or the number of nodes ran out first. */
  complete: boolean;
  nodes: number;
  iterations: number;
}

/** Nodes after which a search without a clock ends by itself, with the bound it has. */
const MOST_NODES = 100_000;
/** A node that cannot better the best blend by this, relative to the objective's scale, is done with. */
const PRUNE = 5e-10;

/**
 * At most k materials, and no used one below its smallest dose: branch and bound (Land & Doig 1960), best bound first.
 *
 * The relaxation drops both rules: the convex problem without the materials that are out. The material that would be
 * missed most is then taken to be used for certain (the relaxation stays as it is, but for its smallest dose) or to be out
 * (solved again from where it stood). With one place left, `OneMore` bounds every material that could take it, at the
 * rules' prices of the sets solved before, and only those that might win are solved. Blends found by rounding and by exchanging one line at a time come first, so that
 * most nodes need not be opened. It ends when no node left is better than the best blend, or when time is out.
 */
export function searchBlend(prepared: Prepared, run: Run = {}, mostNodes = MOST_NODES): SearchResult {
  return new Search(prepared, run, mostNodes).result();
}

class Search {
  private readonly heap = new Heap<Node>();
  private readonly places: number;
  private readonly oneMore: OneMore;
  private readonly kept: Set<number>;
  private readonly until: number;
  private best: SearchResult['best'] = null;
  private discarded = Number.POSITIVE_INFINITY;
  private nodes = 0;
  private iterations = 0;
  private serial = 0;

  constructor(
    private readonly prepared: Prepared,
    private readonly run: Run,
    private readonly mostNodes: number,
  ) {
    const { problem } = prepared;
    this.places = problem.maxMaterials ?? prepared.count;
    this.oneMore = new OneMore(prepared);
    const keptIds = new Set((problem.kept ?? []).map(({ id }) => id));
    this.kept = new Set(prepared.materials.flatMap(({ id }, i) => (keptIds.has(id) ? [i] : [])));
    this.until = run.now && run.timeLimitMs !== undefined ? run.now() + run.timeLimitMs : Number.POSITIVE_INFINITY;
  }

  result(): SearchResult {
    const ins = mandatory(this.prepared);
    if (ins.length <= this.places) {
      this.open(ins, []);
      const root = this.heap.least;
      if (root) this.roundAndExchange(root);
    }
    let complete = true;
    for (let node = this.heap.least; node; node = this.heap.least) {
      if (node.bound >= this.cutoff()) break;
      if (this.outOfTime() || this.nodes >= this.mostNodes) {
        complete = false;
        break;
      }
      this.heap.pop();
      this.branch(node);
    }
    const objective = this.best?.evidence.objective ?? Number.POSITIVE_INFINITY;
    const bound = Math.min(objective, this.discarded, this.heap.least?.bound ?? objective);
    return { best: this.best, bound, complete, nodes: this.nodes, iterations: this.iterations };
  }

  private outOfTime(): boolean {
    return this.until < Number.POSITIVE_INFINITY && this.run.now!() >= this.until;
  }

  private cutoff(): number {
    if (!this.best) return Number.POSITIVE_INFINITY;
    const { objective } = this.best.evidence;
    return objective - PRUNE * Math.max(objective, this.prepared.targetSize);
  }

  /** Solves the relaxation and keeps the node unless it is hopeless, or already a blend. */
  private open(ins: readonly number[], outs: readonly number[], near?: Point): void {
    const among = new Uint8Array(this.prepared.count).fill(1);
    for (const i of outs) among[i] = 0;
    if (ins.length === this.places) {
      this.tryMaterials(ins);
      return;
    }
    this.nodes++;
    const found = closest(this.prepared, { among, left: this.dosesOf(ins), ...(near ? { near } : {}) });
    this.iterations += found.iterations;
    if (found.kind === 'blend') {
      this.keep({ bound: found.evidence.bound, serial: 0, ins, outs, point: found.point, evidence: found.evidence });
    }
  }

  private keep(node: Node): void {
    if (node.bound >= this.cutoff()) this.discarded = Math.min(this.discarded, node.bound);
    else if (this.isBlend(node.point)) {
      this.discarded = Math.min(this.discarded, node.bound);
      this.accept(node.point, node.evidence);
    } else this.heap.push({ ...node, serial: this.serial++ });
  }

  private branch(node: Node): void {
    const free = this.freeOf(node);
    if (this.places - node.ins.length === 1) {
      this.fillLastPlace(node.ins, free, node);
      return;
    }
    const next = this.branchingMaterial(node);
    if (this.prepared.problem.minDose || node.ins.length + 1 === this.places) {
      this.open([...node.ins, next], node.outs, node.point);
    } else this.keep({ ...node, ins: [...node.ins, next] });
    this.open(node.ins, [...node.outs, next], node.point);
  }

  private freeOf({ ins, outs }: Pick<Node, 'ins' | 'outs'>): number[] {
    const fixed = new Set([...ins, ...outs]);
    return Array.from({ length: this.prepared.count }, (_, i) => i).filter((i) => !fixed.has(i));
  }

  /** With too many materials the one that would be missed most, |y_i a_i|^2 + v_i y_i^2; otherwise the most underdosed. */
  private branchingMaterial({ ins, point }: Node): number {
    const crowded = point.materials.length > this.places;
    const shares = sharesOf(point);
    let best = -1;
    let most = Number.NEGATIVE_INFINITY;
    for (const [k, i] of point.materials.entries()) {
      if (ins.includes(i) || (!crowded && !this.isUnderdosed(i, shares[k]!))) continue;
      const impact = point.grams[k]! * this.prepared.strength[i]!;
      const weight = crowded ? impact * impact * this.prepared.curvature[i]! : -shares[k]!;
      if (weight > most || (weight === most && i < best)) [best, most] = [i, weight];
    }
    return best;
  }

  /**
   * Every material that may take the last place, least bound first; and the set as it is. What each trial teaches goes
   * on to the rest: its multipliers price the rules for the next bounds, and the weights that prove that it allows no
   * blend prove it for every material that they charge as well.
   */
  private fillLastPlace(
    ins: readonly number[],
    free: readonly number[],
    { bound, evidence }: Pick<Node, 'bound' | 'evidence'>,
  ): void {
    // a smallest dose makes the last material cost something: without one, any blend of `ins` is among the others
    if (this.prepared.problem.minDose || free.length === 0) this.tryMaterials(ins);
    const priced = this.oneMore.beside(ins, free);
    const bounds = priced().map((value) => Math.max(value, bound));
    const raise = (lambda: Float64Array) => {
      const again = priced(this.withoutDoses(lambda, ins));
      for (let k = 0; k < bounds.length; k++) bounds[k] = Math.max(bounds[k]!, again[k]!);
    };
    raise(evidence.lambda);
    for (let left = free.length; left > 0; left--) {
      const k = leastOf(bounds);
      if (bounds[k]! >= this.cutoff()) {
        this.discarded = Math.min(this.discarded, bounds[k]!);
        return;
      }
      bounds[k] = Number.POSITIVE_INFINITY;
      const found = this.tryMaterials([...ins, free[k]!]);
      if (found.kind === 'blend') raise(found.evidence.lambda);
      else for (const too of this.chargedToo(found.weights, ins, free)) bounds[too] = Number.POSITIVE_INFINITY;
    }
  }

  /** Multipliers that hold for `ins` and any other material: those of smallest doses of others are not owed. */
  private withoutDoses(lambda: Float64Array, ins: readonly number[]): Float64Array {
    const { rules } = this.prepared;
    return lambda.map((value, r) => {
      const { doseOf, kind } = rules[r]!;
      if (doseOf !== undefined && !ins.includes(doseOf)) return 0;
      return kind === 'exact' ? value : Math.max(0, value);
    });
  }

  /**
   * The places in `free` of the materials that no blend with `ins` can use, by Farkas' weights of another such set: where
   * every charge is a good part of s_i, the rules added up would demand that the whole impact is nothing.
   */
  private chargedToo(weights: Float64Array, ins: readonly number[], free: readonly number[]): number[] {
    const { strength } = this.prepared;
    const owed = this.withoutDoses(weights, ins);
    const charged = (i: number) => {
      const charge = rowSum(this.prepared, owed, i);
      return strength[i] === 0 ? charge >= 0 : charge - ROUNDING * rowSize(this.prepared, owed, i) >= strength[i]! / 2;
    };
    return ins.every(charged) ? free.flatMap((i, k) => (charged(i) ? [k] : [])) : [];
  }

  /** The closest blend of these alone; where one of them is not wanted it stays away, unless its dose keeps it in. */
  private tryMaterials(materials: readonly number[]): Closest {
    this.nodes++;
    const found = closestOf(this.prepared, materials, this.dosesOf(materials));
    this.iterations += found.iterations;
    if (found.kind === 'none') return found;
    this.discarded = Math.min(this.discarded, Math.max(found.evidence.bound, 0));
    if (this.isBlend(found.point)) this.accept(found.point, found.evidence);
    return found;
  }

  private accept(point: Point, evidence: Evidence): void {
    const scale = Math.max(evidence.objective, this.prepared.targetSize);
    if (evidence.worstViolation > 1e-9) return;
    if (this.best && evidence.objective >= this.best.evidence.objective - 1e-13 * scale) return;
    this.best = { point, evidence };
    const { totalWeight, materials } = this.prepared;
    const shares = sharesOf(point);
    this.run.onBetter?.({
      distance: Math.sqrt(evidence.far / totalWeight),
      bound: Math.sqrt(Math.min(evidence.objective, this.heap.least?.bound ?? 0) / totalWeight),
      lines: point.materials.map((i, k) => ({ id: materials[i]!.id, share: shares[k]! })),
    });
  }

  /** A first blend: the materials of most impact in the relaxation, then one exchanged for a better one while that helps. */
  private roundAndExchange(root: Node): void {
    if (this.places >= this.prepared.count) return;
    const impact = (k: number) => root.point.grams[k]! * this.prepared.strength[root.point.materials[k]!]!;
    const ranked = root.point.materials.map((_, k) => k).sort((a, b) => impact(b) - impact(a) || a - b);
    const chosen = [...root.ins];
    for (const k of ranked) {
      const i = root.point.materials[k]!;
      if (chosen.length < this.places && !chosen.includes(i)) chosen.push(i);
    }
    this.tryMaterials(chosen);
    for (let found = true; found && this.best && !this.outOfTime(); ) {
      const before: SearchResult['best'] = this.best;
      const lines: readonly number[] = before.point.materials;
      for (const gone of lines) {
        if (root.ins.includes(gone)) continue;
        const rest = [...new Set([...root.ins, ...lines.filter((i) => i !== gone)])];
        this.fillLastPlace(rest, this.freeOf({ ins: rest, outs: [] }), { bound: 0, evidence: before.evidence });
      }
      found = this.best !== before;
    }
  }

  private isBlend(point: Point): boolean {
    if (point.materials.length > this.places) return false;
    const shares = sharesOf(point);
    return point.materials.every((i, k) => !this.isUnderdosed(i, shares[k]!));
  }

  private isUnderdosed(i: number, share: number): boolean {
    const { minDose = 0 } = this.prepared.problem;
    return share < minDose * (1 - 1e-10) && !this.kept.has(i);
  }

  /** The rules left aside when these materials are used: all smallest doses but theirs. */
  private dosesOf(materials: readonly number[]): Uint8Array {
    const { asleep, rules } = this.prepared;
    if (!this.prepared.problem.minDose) return asleep;
    const used = new Set(materials);
    return asleep.map((sleeps, r) => (sleeps === 1 && used.has(rules[r]!.doseOf!) ? 0 : sleeps));
  }
}

function sharesOf({ grams }: Point): number[] {
  const mass = grams.reduce((sum, z) => sum + z, 0);
  return grams.map((z) => z / mass);
}

function leastOf(values: Float64Array): number {
  let least = 0;
  for (let k = 1; k < values.length; k++) if (values[k]! < values[least]!) least = k;
  return least;
}
