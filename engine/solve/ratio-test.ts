import type { WorkingSet } from './working-set';

/** An amount below 0, or a row above, by this is rounding; amounts are scaled to be at most about 1. */
export const SLIP = 1e-12;

/** What stops a step: after which part of it, and the place of the material or the row that does. */
export interface Block {
  part: number;
  material: number;
  row: number;
}

/** How far the working set may go along its step. */
export class RatioTest {
  private readonly value: Float64Array;
  private readonly change: Float64Array;
  private readonly touched: Int32Array;
  private touchedCount = 0;
  private readonly block: Block = { part: 1, material: -1, row: -1 };

  constructor(private readonly set: WorkingSet) {
    const { length } = set.prepared.rules;
    this.value = new Float64Array(length);
    this.change = new Float64Array(length);
    this.touched = new Int32Array(length);
  }

  /**
   * Ratio test in two passes (Harris 1973): how far one may go if everything may slip by a rounding, then, among all
   * that block before, the one with the largest change, which is the safest to put into the working set.
   */
  firstBlock(): Block {
    const { u, factor, materials } = this.set;
    const { step } = factor;
    const size = materials.length;
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
    const { value, change, touched, set } = this;
    const { prepared, zeta, u, inRows, materials } = set;
    const { step } = set.factor;
    const { base, start, row, entry, general } = prepared;
    const left = set.goal.left ?? prepared.asleep;
    let mass = 0;
    let massChange = 0;
    for (let k = 0; k < materials.length; k++) {
      mass += zeta[k]! * u[k]!;
      massChange += zeta[k]! * step[k]!;
    }
    this.touchedCount = 0;
    for (let r = 0; r < general; r++) {
      value[r] = base[r]! * mass;
      change[r] = base[r]! * massChange;
      if (inRows[r] === 0 && left[r] === 0) touched[this.touchedCount++] = r;
    }
    for (let k = 0; k < materials.length; k++) {
      const i = materials[k]!;
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
      const scale = set.rowScale(r);
      value[r] = value[r]! * scale;
      change[r] = change[r]! * scale;
    }
  }
}
