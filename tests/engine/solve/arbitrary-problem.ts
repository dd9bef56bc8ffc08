import fc from 'fast-check';
import type { BlendProblem, EngineMaterial } from '@/engine/contract';

/** Whole numbers and few values make ties, duplicates, dependent vectors and corners the rule, not the exception. */
const share = fc.constantFrom(0, 0.01, 0.1, 0.25, 0.5, 1);
/** The value so many times in ten, and otherwise nothing. */
const maybe = <T>(value: fc.Arbitrary<T>, often = 3): fc.Arbitrary<T | undefined> =>
  fc.oneof({ weight: often, arbitrary: value }, { weight: 10 - often, arbitrary: fc.constant(undefined) });

const material = (facets: number, decades: number, spread: boolean): fc.Arbitrary<Omit<EngineMaterial, 'id'>> =>
  fc.record({
    profile: fc.array(fc.constantFrom(0, 0, 0, 1, 2, 5, 10), { minLength: facets, maxLength: facets }),
    profileSd: spread
      ? maybe(fc.array(fc.constantFrom(0, 0.5, 2), { minLength: facets, maxLength: facets }))
      : fc.constant(undefined),
    strength: fc.oneof(
      { weight: 1, arbitrary: fc.constant(0) },
      { weight: 6, arbitrary: fc.integer({ min: -decades, max: decades }).map((k) => 10 ** (k / 2)) },
    ),
    costPerKg: fc.constantFrom(0, 1, 3, 10, 40, 100, 1000),
    natural: maybe(fc.constantFrom(0, 0.5, 1)),
    minShare: maybe(fc.constantFrom(0, 0.01, 0.1), 1),
    maxShare: maybe(fc.constantFrom(0, 0.1, 0.3, 0.6, 1), 2),
    evaporation: maybe(fc.constantFrom(0, 0.1, 1)),
    constituents: maybe(
      fc.uniqueArray(fc.record({ id: fc.constantFrom('a', 'b', 'c'), max: share }), {
        selector: (c) => c.id,
        maxLength: 3,
      }),
    ),
  });

export interface ProblemShape {
  materials?: number;
  facets?: number;
  decades?: number;
  spread?: boolean;
}

/** Blend problems of every linear kind: solvents, doubles, rules that clash, rules that are met exactly, stages. */
export function linearProblem({
  materials = 9,
  facets = 5,
  decades = 5,
  spread = true,
}: ProblemShape = {}): fc.Arbitrary<BlendProblem> {
  return fc
    .record({ count: fc.integer({ min: 1, max: materials }), width: fc.integer({ min: 1, max: facets }) })
    .chain(({ count, width }) => {
      const vector = fc.array(fc.constantFrom(0, 1, 2, 3, 5, 8), { minLength: width, maxLength: width });
      return fc.record({
        pool: fc.array(material(width, decades, spread), { minLength: count, maxLength: count }),
        doubles: fc.array(fc.nat({ max: count - 1 }), { maxLength: 2 }),
        target: vector,
        weights: maybe(vector, 1),
        stages: maybe(
          fc.array(fc.record({ hours: fc.constantFrom(0, 1, 4), weight: fc.constantFrom(0.5, 1), target: vector }), {
            minLength: 1,
            maxLength: 2,
          }),
          1,
        ),
        budgetPerKg: maybe(fc.constantFrom(0, 1, 3, 8, 20, 60, 200)),
        costPerImpact: maybe(fc.constantFrom(0.1, 1, 5, 30, 200)),
        minStrength: maybe(fc.constantFrom(0, 0.01, 0.1, 1, 10)),
        minNatural: maybe(fc.constantFrom(0, 0.3, 0.5, 1)),
        limits: maybe(
          fc.uniqueArray(
            fc.record({
              id: fc.constantFrom('l', 'm'),
              terms: fc.array(
                fc.record({ constituentId: fc.constantFrom('a', 'b', 'z'), factor: fc.constantFrom(0, 1, 2.5) }),
                { maxLength: 2 },
              ),
              max: fc.constantFrom(0, 0.01, 0.1, 2),
            }),
            { selector: (limit) => limit.id, maxLength: 2 },
          ),
        ),
        group: maybe(fc.record({ from: fc.nat({ max: count - 1 }), min: maybe(share), max: maybe(share) })),
        kept: maybe(fc.record({ at: fc.nat({ max: count - 1 }), share: fc.constantFrom(0, 0.05, 0.3, 1) }), 1),
        required: maybe(fc.nat({ max: count - 1 }), 1),
      });
    })
    .map(({ pool, doubles, group, kept, required, ...rest }) => {
      const all = [...pool, ...doubles.map((index) => pool[index]!)];
      const candidates = all.map(({ minShare = 0, maxShare, ...one }, index) => ({
        ...one,
        id: `m${index}`,
        maxShare,
        ...(minShare > 0 ? { minShare: Math.min(minShare, maxShare ?? 1) } : {}),
      }));
      if (!candidates.some((one) => one.strength > 0)) candidates[0]!.strength = 1;
      const weights = rest.weights?.some((value) => value > 0) ? rest.weights : undefined;
      const groups = group && {
        id: 'g',
        members: candidates.slice(group.from).map((one) => one.id),
        ...(group.min === undefined ? {} : { min: Math.min(group.min, group.max ?? 1) }),
        ...(group.max === undefined ? {} : { max: group.max }),
      };
      return {
        ...rest,
        weights,
        candidates,
        ...(groups ? { groups: [groups] } : {}),
        ...(kept ? { kept: [{ id: candidates[kept.at]!.id, share: kept.share }] } : {}),
        ...(required === undefined ? {} : { required: [candidates[required]!.id] }),
      };
    });
}
