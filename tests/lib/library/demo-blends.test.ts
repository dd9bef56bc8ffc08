import { describe, expect, it } from 'vitest';
import { type BlendProblem, certify, type EngineMaterial, solveBlend } from '@/engine';
import { readDemoLibrary } from '@/lib/library/demo-files';
import type { DemoMaterial } from '@/lib/library/demo-format';

/** The three jobs the product is for, on the sample library: they must have an answer worth smelling, and not a free one. */
const { facets, materials, qualities, limitSets } = readDemoLibrary();

const preferred = new Map(qualities.filter((q) => q.preferred).map((q) => [q.material, q]));
const vector = (m: DemoMaterial, part: 0 | 1) => facets.map((f) => m.profile[f.id]?.[part] ?? 0);

function pricePerKg(key: string): number {
  const { offers, densityGPerMl } = preferred.get(key)!;
  const grams = (o: (typeof offers)[number]) => o.packAmount * (o.packUnit === 'mL' ? densityGPerMl! : 1);
  return 1000 * Math.min(...offers.map((o) => Number(o.price) / grams(o)));
}

const engineMaterial = (m: DemoMaterial): EngineMaterial => ({
  id: m.key,
  profile: vector(m, 0),
  profileSd: vector(m, 1),
  strength: m.strength.value,
  costPerKg: pricePerKg(m.key),
  constituents: preferred.get(m.key)!.constituents.map((c) => ({ id: c.constituent, max: c.maxPct / 100 })),
  natural: m.naturalShare,
  maxShare: m.maxShare,
  evaporation: m.evaporation.perHour,
});

/** Everything whose composition is fully stated, but the target and what is odourless. */
const candidatesFor = (target: string) =>
  materials
    .filter((m) => m.key !== target && m.strength.value > 0 && preferred.get(m.key)!.completeness === 'full')
    .map(engineMaterial);

function limitsFor(category: string, concentrate: number): BlendProblem['limits'] {
  return limitSets.flatMap((set) =>
    set.limits
      .filter((l) => l.maxPctByCategory[category] !== undefined)
      .map((l) => ({
        id: `${set.key}-${l.id}`,
        terms: l.terms.map((t) => ({ constituentId: t.constituent, factor: t.factor })),
        max: l.maxPctByCategory[category]! / 100 / concentrate,
      })),
  );
}

const target = (key: string) => engineMaterial(materials.find((m) => m.key === key)!);

function expectProven(problem: BlendProblem) {
  const solution = solveBlend(problem);
  expect(solution.status).toBe('optimal');
  expect(certify(problem, solution)).toMatchObject({ feasible: true, boundProven: true, agrees: true });
  return solution;
}

describe('a rose on a budget', () => {
  const rose = target('rose-absolute');
  const third = rose.costPerKg / rose.strength / 3;
  const problem: BlendProblem = {
    target: rose.profile,
    candidates: candidatesFor('rose-absolute'),
    costPerImpact: third,
    minStrength: rose.strength / 10,
    limits: limitsFor('4', 0.15),
  };

  it('comes close to the absolute for a third of its price at equal strength, within the limits for fine fragrance', () => {
    const solution = expectProven(problem);
    const heard = solution.lines.filter((line) => line.impact >= 0.01);
    expect(heard.length).toBeGreaterThanOrEqual(6);
    expect(heard.length).toBeLessThanOrEqual(14);
    expect(solution.distance).toBeGreaterThan(0.1);
    expect(solution.distance).toBeLessThan(0.6);
    expect(solution.costPerImpact).toBeLessThanOrEqual(third * (1 + 1e-9));
  });

  it('gets worse as less may be paid, and by a price that somebody feels', () => {
    const cheap = expectProven({ ...problem, costPerImpact: third / 20 });
    const dear = expectProven({ ...problem, costPerImpact: third * 2 });
    expect(cheap.expectedDistance).toBeGreaterThan(dear.expectedDistance * 1.05);
  });

  it('also fits a body lotion at one per cent', () => {
    const solution = expectProven({ ...problem, limits: limitsFor('5A', 0.01) });
    expect(solution.distance).toBeLessThan(0.7);
  });
});

describe('a natural in place of a synthetic', () => {
  const naturalFor = (key: string) => {
    const wanted = target(key);
    const solution = expectProven({
      target: wanted.profile,
      candidates: candidatesFor(key),
      minNatural: 1,
      limits: limitsFor('4', 0.15),
    });
    expect(solution.natural).toBeGreaterThan(1 - 1e-9);
    const silence = Math.sqrt(vectorSquare(wanted.profile) / facets.length);
    return { distance: solution.distance, silence };
  };

  it.each(['citronellol', 'geraniol', 'linalool', 'alpha-isomethyl-ionone'])('is there for %s', (key) => {
    const { distance, silence } = naturalFor(key);
    expect(distance).toBeLessThan(silence / 2);
  });

  it('is not there for a lily of the valley, which no still has ever given', () => {
    const { distance, silence } = naturalFor('hydroxycitronellal');
    expect(distance).toBeGreaterThan(silence / 2);
  });
});

const vectorSquare = (v: ArrayLike<number>) => Array.from(v).reduce((sum, value) => sum + value * value, 0);
