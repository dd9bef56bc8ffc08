import fc from 'fast-check';
import type { BlendProblem, EngineMaterial } from '@/engine/contract';

/** Small blend problems in round numbers that fast-check can shrink: two to five materials, one to three facets, any rules. */
export function smallBlendProblem(): fc.Arbitrary<BlendProblem> {
  return fc
    .record({ facets: fc.integer({ min: 1, max: 3 }), count: fc.integer({ min: 1, max: 5 }) })
    .chain(({ facets, count }) =>
      fc.record(
        {
          target: intensities(facets),
          candidates: fc.tuple(...Array.from({ length: count }, (_, index) => material(`m${index}`, facets))),
          weights: fc.array(fc.integer({ min: 1, max: 3 }), { minLength: facets, maxLength: facets }),
          budgetPerKg: fc.integer({ min: 1, max: 100 }),
          costPerImpact: fc.integer({ min: 1, max: 100 }),
          minStrength: fc.constantFrom(0.01, 1, 50),
          minNatural: tenths(),
          limits: fc
            .constantFrom(0.01, 0.1, 0.3)
            .map((max) => [{ id: 'l', terms: [{ constituentId: 'c', factor: 1 }], max }]),
          groups: tenths().map((max) => [{ id: 'g', members: ['m0'], max }]),
          kept: tenths().map((share) => [{ id: 'm0', share }]),
          required: fc.constant<string[]>(['m0']),
        },
        { requiredKeys: ['target', 'candidates'] },
      ),
    )
    .filter((problem) => problem.candidates.some((candidate) => candidate.strength > 0));
}

function material(id: string, facets: number): fc.Arbitrary<EngineMaterial> {
  return fc.record(
    {
      id: fc.constant(id),
      profile: intensities(facets),
      strength: fc.constantFrom(1, 0, 2, 10, 1000, 0.01),
      costPerKg: fc.integer({ min: 1, max: 100 }),
      profileSd: intensities(facets),
      natural: fc.constantFrom(0, 0.5, 1),
      maxShare: tenths(),
      constituents: fc.constantFrom(0.1, 0.5, 1).map((max) => [{ id: 'c', max }]),
    },
    { requiredKeys: ['id', 'profile', 'strength', 'costPerKg'] },
  );
}

function intensities(facets: number): fc.Arbitrary<number[]> {
  return fc.array(fc.integer({ min: 0, max: 10 }), { minLength: facets, maxLength: facets });
}

function tenths(): fc.Arbitrary<number> {
  return fc.integer({ min: 0, max: 10 }).map((value) => value / 10);
}
