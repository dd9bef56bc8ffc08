import type { BlendProblem, EngineMaterial } from '../contract';
import type { Prepared } from './prepare';
import { type Rule, rulesOf } from './rules';

/** A coefficient this near to 0, in roundings of its two parts, is 0: a material that meets a limit exactly. */
const SAME = 4 * Number.EPSILON;

/** The rules, and their entries by material: row r is sum_i (entry_ri + base_r) z_i. */
export function rowsByMaterial(problem: BlendProblem, materials: readonly EngineMaterial[]) {
  const { rules, general } = rulesOf(problem, materials);
  const strengthScale = middleStrength(materials);
  for (const rule of rules) if (rule.per === 'impact') rule.scale *= strengthScale;
  const base = Float64Array.from(rules, baseOf);
  const asleep = Uint8Array.from(rules, ({ doseOf }) => (doseOf === undefined ? 0 : 1));
  const list = new EntryList(rules, base, strengthScale);
  const start = new Int32Array(materials.length + 1);
  for (let i = 0; i < materials.length; i++) {
    list.add(i, materials[i]!);
    start[i + 1] = list.length;
  }
  return { rules, general, base, start, ...list.taken(), asleep, strengthScale };
}

/** What each rule counts of one material after the other; filled in one pass, since 20,000 materials are looked at. */
class EntryList {
  length = 0;
  private row = new Int32Array(1024);
  private entry = new Float64Array(1024);
  private readonly properties: number[] = [];
  private readonly terms = new Map<string, { r: number; value: number }[]>();
  private readonly memberOf = new Map<number, number[]>();

  constructor(
    private readonly rules: readonly Rule[],
    private readonly base: Float64Array,
    private readonly strengthScale: number,
  ) {
    for (let r = 0; r < rules.length; r++) {
      const { counts, scale } = rules[r]!;
      if (typeof counts === 'string') this.properties.push(r);
      else if ('members' in counts) for (const i of counts.members) listIn(this.memberOf, i).push(r);
      else {
        for (const { constituentId, factor } of counts.terms) {
          listIn(this.terms, constituentId).push({ r, value: factor / scale });
        }
      }
    }
  }

  add(i: number, material: EngineMaterial): void {
    const from = this.length;
    for (const r of this.properties) this.put(r, this.propertyOf(material, this.rules[r]!));
    if (this.terms.size > 0 && material.constituents) this.addConstituents(material.constituents, from);
    for (const r of this.memberOf.get(i) ?? []) {
      const { kind, scale } = this.rules[r]!;
      this.put(r, (kind === 'min' ? -1 : 1) / scale);
    }
    for (let at = from; at < this.length; at++) {
      const base = this.base[this.row[at]!]!;
      if (Math.abs(this.entry[at]! + base) <= SAME) this.entry[at] = -base;
    }
  }

  taken() {
    return { row: this.row.subarray(0, this.length), entry: this.entry.subarray(0, this.length) };
  }

  private propertyOf(material: EngineMaterial, { kind, counts, per, limit, scale }: Rule): number {
    if (per === 'impact' && limit > 0) {
      return impactPrice(material.costPerKg / scale, material.strength / this.strengthScale);
    }
    const amount =
      counts === 'cost' ? material.costPerKg : counts === 'strength' ? material.strength : (material.natural ?? 0);
    return (kind === 'min' ? -amount : amount) / scale;
  }

  private addConstituents(constituents: NonNullable<EngineMaterial['constituents']>, from: number): void {
    for (const { id, max } of constituents) {
      for (const { r, value } of this.terms.get(id) ?? []) {
        let at = from;
        while (at < this.length && this.row[at] !== r) at++;
        if (at < this.length) this.entry[at]! += value * max;
        else if (value * max !== 0) this.put(r, value * max);
      }
    }
  }

  private put(r: number, value: number): void {
    if (this.length === this.row.length) {
      const [row, entry] = [new Int32Array(2 * this.length), new Float64Array(2 * this.length)];
      row.set(this.row);
      entry.set(this.entry);
      [this.row, this.entry] = [row, entry];
    }
    this.row[this.length] = r;
    this.entry[this.length++] = value;
  }
}

function listIn<K, V>(map: Map<K, V[]>, key: K): V[] {
  const list = map.get(key) ?? [];
  map.set(key, list);
  return list;
}

/** What rule r counts per gram of every material. */
export function amountsOf(prepared: Prepared, r: number): Float64Array {
  const { rules, start, row, entry, cost } = prepared;
  const { counts, kind, scale } = rules[r]!;
  if (counts === 'cost') return cost;
  const amounts = new Float64Array(prepared.count);
  for (let i = 0; i < prepared.count; i++) {
    for (let at = start[i]!; at < start[i + 1]!; at++) {
      if (row[at] === r) amounts[i] = (kind === 'min' ? -1 : 1) * entry[at]! * scale;
    }
  }
  return amounts;
}

/** Gives a price rule another ceiling above 0, in place: the rows of a frontier differ in nothing else. */
export function renewLimit(prepared: Prepared, name: 'budgetPerKg' | 'costPerImpact', limit: number): void {
  const { rules, base, start, row, entry, cost, strength, strengthScale } = prepared;
  const r = rules.findIndex(({ rule }) => rule === name);
  const rule = rules[r]!;
  rule.limit = limit;
  rule.scale = rule.per === 'impact' ? limit * strengthScale : limit;
  for (let i = 0; i < prepared.count; i++) {
    for (let at = start[i]!; at < start[i + 1]!; at++) {
      if (row[at] !== r) continue;
      const value = cost[i]! / rule.scale;
      if (rule.per === 'impact') entry[at] = impactPrice(value, strength[i]! / strengthScale);
      else entry[at] = Math.abs(value + base[r]!) <= SAME ? -base[r]! : value;
    }
  }
}

function baseOf(rule: Rule): number {
  if (rule.limit === 0 || rule.per === 'impact') return 0;
  return rule.kind === 'min' ? 1 : -1;
}

function impactPrice(costPerCeiling: number, strength: number): number {
  const value = costPerCeiling - strength;
  return Math.abs(value) <= SAME * strength ? 0 : value;
}

/** A strength in the middle of those there are: the price at equal strength is a row in strengths, and needs a scale. */
function middleStrength(materials: readonly EngineMaterial[]): number {
  const strengths = materials.map((material) => material.strength).filter((strength) => strength > 0);
  return strengths.sort((a, b) => a - b)[strengths.length >> 1]!;
}
