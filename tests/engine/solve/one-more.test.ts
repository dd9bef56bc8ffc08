import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { OneMore } from '@/engine/solve/one-more';
import { prepare } from '@/engine/solve/prepare';
import { closestOf } from '@/engine/solve/subset';
import { linearProblem } from './arbitrary-problem';

describe('the bound on a set and one material more', () => {
  it('is below the closest blend of that set, whatever the rules are priced at', () => {
    let above = 0;
    const priced = fc.record({
      problem: linearProblem({ materials: 8 }),
      size: fc.integer({ min: 1, max: 3 }),
      prices: fc.array(fc.constantFrom(0, 0, 0.01, 1, 40), { minLength: 64, maxLength: 64 }),
      solved: fc.boolean(),
    });
    const check = fc.property(priced, ({ problem, size, prices, solved }) => {
      const prepared = prepare(problem);
      const chosen = Array.from({ length: Math.min(size, prepared.count - 1) }, (_, i) => i);
      const free = Array.from({ length: prepared.count - chosen.length }, (_, k) => k + chosen.length);
      const bounds = new OneMore(prepared).beside(chosen, free);
      const found = free.map((j) => closestOf(prepared, [...chosen, j], prepared.asleep));
      const first = found.find((one) => one.kind === 'blend');
      const any = Float64Array.from(prepared.rules, (_, r) => prices[r % prices.length]!);
      const lambda = solved && first?.kind === 'blend' ? first.evidence.lambda : any;
      const [plain, atPrices] = [bounds(), bounds(lambda)];
      for (const [k, one] of found.entries()) {
        if (one.kind === 'none') continue;
        const limit = one.evidence.objective + 1e-9 * Math.max(one.evidence.objective, prepared.targetSize, 1);
        expect(plain[k]).toBeLessThanOrEqual(limit);
        expect(atPrices[k]).toBeLessThanOrEqual(limit);
        if (atPrices[k]! > plain[k]! + 1e-6) above++;
      }
    });
    fc.assert(check, { seed: 1963, numRuns: 400 });
    expect(above).toBeGreaterThan(50);
  });
});
