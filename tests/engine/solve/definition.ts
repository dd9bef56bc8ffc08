import { expect } from 'vitest';
import type { BlendProblem, BlendSolution, EngineMaterial } from '@/engine/contract';

/**
 * The definition of the answer, written out densely and slowly from the problem's own words: what a blend is worth,
 * what every rule says of it, and what weak duality proves. Shares nothing with the solver.
 */
export interface Judged {
  objective: number;
  targetSize: number;
  violation: number;
  bound: number;
}

interface DenseRule {
  rule: string;
  side: 'min' | 'max' | 'exact';
  excess: (m: EngineMaterial) => number;
  limit: (m: EngineMaterial) => number;
}

export function denseRules(p: BlendProblem): DenseRule[] {
  const rules: DenseRule[] = [];
  const max = (rule: string, has: DenseRule['limit'], may: DenseRule['limit']) =>
    rules.push({ rule, side: 'max', excess: (m) => has(m) - may(m), limit: may });
  const min = (rule: string, has: DenseRule['limit'], must: DenseRule['limit']) =>
    rules.push({ rule, side: 'min', excess: (m) => must(m) - has(m), limit: must });
  const { budgetPerKg: b, costPerImpact: u, minStrength: s, minNatural: n } = p;
  if (b !== undefined)
    max(
      'budgetPerKg',
      (m) => m.costPerKg,
      () => b,
    );
  if (u !== undefined)
    max(
      'costPerImpact',
      (m) => m.costPerKg,
      (m) => u * m.strength,
    );
  if (s !== undefined)
    min(
      'minStrength',
      (m) => m.strength,
      () => s,
    );
  if (n !== undefined)
    min(
      'minNatural',
      (m) => m.natural ?? 0,
      () => n,
    );
  for (const { id, terms, max: most } of p.limits ?? []) {
    const held = (m: EngineMaterial) =>
      terms.reduce((sum, t) => sum + t.factor * (m.constituents?.find((c) => c.id === t.constituentId)?.max ?? 0), 0);
    max(`limit:${id}`, held, () => most);
  }
  const has = (ids: string[]) => (m: EngineMaterial) => (ids.includes(m.id) ? 1 : 0);
  for (const g of p.groups ?? []) {
    if (g.min !== undefined) min(`group:${g.id}`, has(g.members), () => g.min!);
    if (g.max !== undefined) max(`group:${g.id}`, has(g.members), () => g.max!);
  }
  for (const m of p.candidates) {
    if (m.minShare !== undefined) min(`share:${m.id}`, has([m.id]), () => m.minShare!);
    if (m.maxShare !== undefined) max(`share:${m.id}`, has([m.id]), () => m.maxShare!);
  }
  for (const { id, share } of p.kept ?? []) {
    rules.push({ rule: `kept:${id}`, side: 'exact', excess: (m) => has([id])(m) - share, limit: () => share });
  }
  for (const id of p.required ?? []) {
    const least = Math.max(p.candidates.find((m) => m.id === id)!.minShare ?? 0, p.minDose ?? 1e-4);
    min(`required:${id}`, has([id]), () => least);
  }
  return rules;
}

export function judge(p: BlendProblem, solution: BlendSolution): Judged {
  const share = new Map(solution.lines.map((line) => [line.id, line.share]));
  const x = p.candidates.map((m) => share.get(m.id) ?? 0);
  const sum = (of: (m: EngineMaterial) => number) => p.candidates.reduce((total, m, i) => total + x[i]! * of(m), 0);
  const strength = sum((m) => m.strength);
  const y = p.candidates.map((m, i) => (m.strength * x[i]!) / strength);
  const stages = p.stages ?? [{ hours: 0, weight: 1, target: p.target }];
  const slope = p.candidates.map(() => 0);
  let objective = 0;
  let targetSize = 0;
  for (const [index, { hours, weight, target }] of stages.entries()) {
    const left = p.candidates.map((m) => Math.exp(-(m.evaporation ?? 0) * hours));
    const profile = (i: number, f: number) =>
      left[i]! * ((p.stages && p.candidates[i]!.stageProfiles?.[index]?.[f]) ?? p.candidates[i]!.profile[f]!);
    for (let f = 0; f < p.target.length; f++) {
      const w = weight * (p.weights?.[f] ?? 1);
      const off = y.reduce((total, part, i) => total + part * profile(i, f), 0) - target[f]!;
      objective += w * off * off;
      targetSize += w * target[f]! ** 2;
      for (const [i, m] of p.candidates.entries()) {
        const variance = w * (left[i]! * (m.profileSd?.[f] ?? 0)) ** 2;
        objective += variance * y[i]! ** 2;
        slope[i]! += 2 * w * off * profile(i, f) + 2 * variance * y[i]!;
      }
    }
  }
  let violation = Math.abs(sum(() => 1) - 1);
  const charged = p.candidates.map(() => 0);
  const sizes = p.candidates.map(() => 0);
  for (const rule of denseRules(p)) {
    const excess = sum(rule.excess);
    const most = Math.max(...p.candidates.map((m) => Math.abs(rule.excess(m))));
    const relative = (rule.side === 'exact' ? Math.abs(excess) : excess) / (sum(rule.limit) || most || 1);
    violation = Math.max(violation, relative);
    const price = solution.prices.find((one) => one.rule === rule.rule && (!one.side || one.side === rule.side));
    if (rule.side !== 'exact') expect(price?.multiplier ?? 0).toBeGreaterThanOrEqual(0);
    for (const [i, m] of p.candidates.entries()) {
      charged[i]! += (price?.multiplier ?? 0) * rule.excess(m);
      sizes[i]! += Math.abs(price?.multiplier ?? 0) * (Math.abs(rule.excess(m)) + rule.limit(m));
    }
  }
  let least = Number.POSITIVE_INFINITY;
  for (const [i, m] of p.candidates.entries()) {
    if (m.strength > 0) least = Math.min(least, slope[i]! + charged[i]! / m.strength);
    else if (charged[i]! < -1e-13 * sizes[i]!) least = Number.NEGATIVE_INFINITY;
  }
  const along = slope.reduce((total, value, i) => total + value * y[i]!, 0);
  return { objective, targetSize, violation, bound: Math.max(0, objective - (along - least)) }; // E is a sum of squares
}

/** Optimal by the definition: allowed, and proven to leave nothing better. */
export function expectOptimal(p: BlendProblem, solution: BlendSolution): void {
  expect(solution.status).toBe('optimal');
  const { objective, targetSize, violation, bound } = judge(p, solution);
  const size = Math.max(objective, targetSize);
  expect(violation).toBeLessThanOrEqual(1e-9);
  expect(objective - bound).toBeLessThanOrEqual(1e-9 * size);
  expect(Math.abs(solution.objective - objective)).toBeLessThanOrEqual(1e-11 * size);
  expect(solution.bound).toBeLessThanOrEqual(solution.objective);
}

/** Impossible by the definition: the rules, added with Farkas' weights, would demand that 1 <= 0. */
export function expectImpossible(p: BlendProblem, solution: BlendSolution): void {
  expect(solution.status).toBe('infeasible');
  expect(solution.lines).toEqual([]);
  const rules = denseRules(p);
  for (const m of p.candidates) {
    let sum = 0;
    let size = 0;
    for (const { rule, side, multiplier } of solution.farkas!) {
      const dense = rules.find((one) => one.rule === rule && (one.side === 'exact' || one.side === side))!;
      if (dense.side !== 'exact') expect(multiplier).toBeGreaterThan(0);
      sum += multiplier * dense.excess(m);
      size += Math.abs(multiplier) * (Math.abs(dense.excess(m)) + dense.limit(m));
    }
    expect(sum).toBeGreaterThanOrEqual(m.strength > 0 ? m.strength * 0.999 : -1e-13 * size);
  }
}
