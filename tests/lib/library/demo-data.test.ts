import { describe, expect, it } from 'vitest';
import { estimateEvaporation, estimateStrength } from '@/engine';
import { readDemoLibrary } from '@/lib/library/demo-files';
import type { DemoProfile } from '@/lib/library/demo-format';

const library = readDemoLibrary();
const { facets, families, materials, constituents, suppliers, qualities, categories, limitSets, allergens } = library;
const materialKeys = new Set(materials.map((m) => m.key));
const constituentKeys = new Set(constituents.map((c) => c.key));
const wholes = new Set(constituents.filter((c) => c.whole).map((c) => c.key));
const strengthOf = (key: string) => materials.find((m) => m.key === key)!.strength.value;

/** Weighted by position from the right, the digits before the last must give the last (the rule of the CAS registry). */
function checkDigitHolds(cas: string): boolean {
  const digits = /^(\d{2,7})-(\d{2})-(\d)$/.exec(cas);
  if (!digits) return false;
  const body = [...`${digits[1]}${digits[2]}`].reverse();
  return body.reduce((sum, digit, i) => sum + (i + 1) * Number(digit), 0) % 10 === Number(digits[3]);
}

function expectUnique(values: string[]) {
  expect(values.filter((value, i) => values.indexOf(value) !== i)).toEqual([]);
}

const cosine = (a: DemoProfile, b: DemoProfile) => {
  const dot = (x: DemoProfile, y: DemoProfile) =>
    facets.reduce((s, f) => s + (x[f.id]?.[0] ?? 0) * (y[f.id]?.[0] ?? 0), 0);
  return dot(a, b) / Math.sqrt(dot(a, a) * dot(b, b));
};

describe('the sample library as a whole', () => {
  it('repeats no key, name or offer', () => {
    expectUnique(facets.map((f) => f.id));
    expectUnique(materials.map((m) => m.key));
    expectUnique(materials.map((m) => m.name.toLowerCase()));
    expectUnique(constituents.map((c) => c.key));
    expectUnique(constituents.flatMap((c) => (c.cas ? [c.cas] : [])).filter((cas) => !wholeCas().has(cas)));
    expectUnique(qualities.map((q) => q.key));
    expectUnique(qualities.map((q) => `${q.supplier} ${q.supplierCode} ${q.grade}`));
    expectUnique(qualities.flatMap((q) => q.offers.map((o) => `${q.key} ${o.packAmount} ${o.packUnit} ${o.date}`)));
    for (const set of limitSets) expectUnique(set.limits.map((l) => l.id));
    expectUnique(allergens.entries.map((e) => String(e.entry)));
  });

  it('names only things that exist', () => {
    const facetIds = new Set(facets.map((f) => f.id));
    const used = materials.flatMap((m) => [m.profile, ...Object.values(m.phases ?? {})].flatMap(Object.keys));
    expect(used.filter((id) => !facetIds.has(id))).toEqual([]);
    const solvents = materials.flatMap((m) => m.usualDilution.solvent ?? []);
    expect(solvents.filter((key) => !materialKeys.has(key))).toEqual([]);
    expect(qualities.filter((q) => !materialKeys.has(q.material)).map((q) => q.key)).toEqual([]);
    expect(qualities.filter((q) => !suppliers.some((s) => s.key === q.supplier)).map((q) => q.key)).toEqual([]);
    const named = [
      ...qualities.flatMap((q) => q.constituents.map((c) => c.constituent)),
      ...limitSets.flatMap((set) => set.limits.flatMap((l) => l.terms.map((t) => t.constituent))),
      ...allergens.entries.flatMap((e) => e.constituents),
    ];
    expect(named.filter((key) => !constituentKeys.has(key))).toEqual([]);
    expect([...constituentKeys].filter((key) => !named.includes(key))).toEqual([]);
  });

  it('holds only CAS numbers whose check digit is right', () => {
    const all = [
      ...materials.flatMap((m) => m.cas),
      ...constituents.flatMap((c) => [c.cas ?? [], c.otherCas ?? []].flat()),
      ...allergens.entries.flatMap((e) => e.cas),
    ];
    expect(all.filter((cas) => !checkDigitHolds(cas))).toEqual([]);
    expect(checkDigitHolds('78-70-5')).toBe(false);
  });
});

function wholeCas() {
  return new Set(constituents.filter((c) => c.whole).map((c) => c.cas));
}

describe('the materials', () => {
  it('are at least 180, at least 60 with rose in them, over every family and facet', () => {
    expect(materials.length).toBeGreaterThanOrEqual(180);
    expect(materials.filter((m) => (m.profile.rosy?.[0] ?? 0) >= 2).length).toBeGreaterThanOrEqual(60);
    const carried = (id: string) => materials.filter((m) => (m.profile[id]?.[0] ?? 0) >= 2).length;
    expect(facets.filter((f) => carried(f.id) < 3).map((f) => f.id)).toEqual([]);
    expect(families.filter((family) => !facets.some((f) => f.family === family.id))).toEqual([]);
    expect(facets.filter((f) => !families.some((family) => family.id === f.family))).toEqual([]);
  });

  it('span five decades of strength, and solvents have none', () => {
    const strengths = materials.map((m) => m.strength.value).filter((s) => s > 0);
    expect(Math.max(...strengths) / Math.min(...strengths)).toBeGreaterThanOrEqual(1e5);
    const silent = materials.filter((m) => m.strength.value === 0).map((m) => m.kind);
    expect(new Set(silent)).toEqual(new Set(['solvent']));
    expect(materials.filter((m) => (m.kind === 'solvent') !== (Object.keys(m.profile).length === 0))).toEqual([]);
  });

  it('put every strength into the class whose own strength is nearest, decade by decade', () => {
    const wrong = materials.filter(({ strength: { value, class: name } }) => {
      const estimate = estimateStrength({ strengthClass: name })!.strength;
      return value === 0 ? estimate !== 0 : Math.abs(Math.log10(value / estimate)) > 0.51;
    });
    expect(wrong.map((m) => m.key)).toEqual([]);
  });

  it('evaporate as their vapour pressure says, wherever one is known', () => {
    for (const { key, vapourPressure, evaporation } of materials) {
      if (!vapourPressure) continue;
      const rate = estimateEvaporation({ vapourPressurePa: vapourPressure.pa25C })!.perHour;
      expect(evaporation.perHour / Math.min(6, rate), key).toBeCloseTo(1, 1);
    }
  });

  it('say a botanical name and part where they are natural, a chemical name where they are one substance', () => {
    const natural = ['oil', 'absolute', 'resinoid', 'extract'];
    expect(materials.filter((m) => natural.includes(m.kind) && !(m.botanical && m.part)).map((m) => m.key)).toEqual([]);
    const single = ['synthetic', 'isolate', 'solvent'];
    expect(materials.filter((m) => single.includes(m.kind) && !m.chemicalName).map((m) => m.key)).toEqual([]);
  });

  it('tell smells apart: no two profiles are the same', () => {
    expectUnique(materials.filter((m) => m.kind !== 'solvent').map((m) => JSON.stringify(m.profile)));
    expectUnique(materials.map((m) => m.smell));
  });

  it('make ready bases of materials that exist, whose strength and smell follow from the parts', () => {
    const bases = materials.filter((m) => m.kind === 'ready base');
    expect(bases.length).toBeGreaterThanOrEqual(6);
    for (const base of bases) {
      const parts = base.madeOf ?? [];
      expect(parts.filter((p) => !materialKeys.has(p.material))).toEqual([]);
      expect(parts.reduce((sum, p) => sum + p.share, 0)).toBeCloseTo(1, 7);
      const strength = parts.reduce((sum, p) => sum + p.share * strengthOf(p.material), 0);
      expect(Math.abs(base.strength.value - strength) / strength).toBeLessThan(0.05);
      expect(cosine(base.profile, mixed(parts))).toBeGreaterThan(0.97);
    }
  });
});

/** The profile of a base by the impact shares of its parts. */
function mixed(parts: { material: string; share: number }[]): DemoProfile {
  const profile: DemoProfile = {};
  for (const part of parts) {
    const material = materials.find((m) => m.key === part.material)!;
    for (const [facet, [intensity]] of Object.entries(material.profile)) {
      const before = profile[facet]?.[0] ?? 0;
      profile[facet] = [before + part.share * material.strength.value * intensity, 0];
    }
  }
  return profile;
}

describe('the qualities', () => {
  it('give every material exactly one preferred quality, with offers at a price', () => {
    for (const material of materials) {
      const preferred = qualities.filter((q) => q.material === material.key && q.preferred);
      expect(
        preferred.map((q) => q.key),
        material.key,
      ).toHaveLength(1);
    }
    const offers = qualities.flatMap((q) => q.offers);
    expect(qualities.filter((q) => q.offers.length < 2).map((q) => q.key)).toEqual([]);
    expect(offers.filter((o) => !(Number(o.price) > 0))).toEqual([]);
    expect(qualities.filter((q) => !q.densityGPerMl && q.offers.some((o) => o.packUnit === 'mL'))).toEqual([]);
  });

  it('spread prices over four decades, with the rose absolute among the dear', () => {
    const perKg = qualities.map((q) => {
      const grams = q.offers.map(
        (o) => Number(o.price) / (o.packAmount * (o.packUnit === 'mL' ? q.densityGPerMl! : 1)),
      );
      return { material: q.material, price: 1000 * Math.min(...grams) };
    });
    const prices = perKg.map((p) => p.price);
    expect(Math.max(...prices) / Math.min(...prices)).toBeGreaterThan(1e4);
    const rose = perKg.filter((p) => p.material === 'rose-absolute').map((p) => p.price);
    expect(Math.min(...rose)).toBeGreaterThan(6000);
    expect(Math.max(...rose)).toBeLessThan(9000);
  });

  it('keep every range in order and the minima of one quality within 100 %', () => {
    for (const quality of qualities) {
      const ranges = quality.constituents;
      expectUnique(ranges.map((r) => r.constituent));
      expect(
        ranges.filter((r) => !(r.minPct <= r.typicalPct && r.typicalPct <= r.maxPct)),
        quality.key,
      ).toEqual([]);
      const parts = ranges.filter((r) => !wholes.has(r.constituent));
      expect(
        parts.reduce((sum, r) => sum + r.minPct, 0),
        quality.key,
      ).toBeLessThanOrEqual(100);
    }
  });

  it('are mostly fully declared, some only in part, some not at all', () => {
    const share = (c: string) => qualities.filter((q) => q.completeness === c).length / qualities.length;
    expect(share('full')).toBeGreaterThan(0.7);
    expect(share('declared')).toBeGreaterThan(0.08);
    expect(share('unknown')).toBeGreaterThan(0.05);
    const empty = qualities.filter((q) => q.constituents.length === 0).map((q) => q.completeness);
    expect(empty.filter((c) => c !== 'unknown')).toEqual([]);
  });
});

describe('the limits and allergens', () => {
  it('speak of categories that exist', () => {
    const codes = new Set(categories.map((c) => c.code));
    const named = limitSets.flatMap((set) => set.limits.flatMap((l) => Object.keys(l.maxPctByCategory)));
    expect(named.filter((code) => !codes.has(code))).toEqual([]);
  });

  it('have something in the library to count, but for the few that only guard against what may come', () => {
    const held = new Set(qualities.flatMap((q) => q.constituents.map((c) => c.constituent)));
    const idle = limitSets.flatMap((set) => set.limits).filter((l) => !l.terms.some((t) => held.has(t.constituent)));
    expect(idle.map((l) => l.id).sort()).toEqual(IDLE_LIMITS);
  });

  it('tell what was seen from what was remembered, row by row', () => {
    for (const set of limitSets.filter((s) => s.via !== 'invented')) {
      const ways = new Set(set.limits.map((l) => l.via));
      expect(ways.size, set.key).toBeGreaterThan(1);
      expect(set.limits.filter((l) => l.via === 'memory' && !l.confidence).map((l) => l.id)).toEqual([]);
    }
  });

  it('list the 81 labelling entries, 24 of them from the first list', () => {
    expect(allergens.entries).toHaveLength(81);
    expect(allergens.entries.filter((e) => e.inOriginal26)).toHaveLength(24);
    const whole = allergens.entries.filter((e) => e.naturalComplex).flatMap((e) => e.constituents);
    expect(whole.filter((key) => !wholes.has(key))).toEqual([]);
  });
});

/** Limits on what no material of the library holds: they catch what a house adds later. */
const IDLE_LIMITS = ['6-methylcoumarin', 'butylphenyl-methylpropional', 'hicc', 'propylidenephthalide'];
