import type { BlendProblem, EngineMaterial } from '@/engine/contract';

/** A stream of numbers in 0..1 from a seed (mulberry32): the same problems every time. */
export function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

export interface Shape {
  materials: number;
  facets: number;
  limits: number;
  seed: number;
  /** Decades that the strengths span. */
  decades?: number;
  /** Mean standard deviation of a rating; 0 for none. */
  spread?: number;
  /** Without any rule on the mass: what plain non-negative least squares can do as well. */
  free?: boolean;
}

/**
 * A generated blend problem: materials with a fifth of the facets each, strengths over some decades, dearer where
 * stronger, constituents with limits; the target is a blend of eight that are not for sale. Invented throughout.
 */
export function blendProblem({
  materials,
  facets,
  limits,
  seed,
  decades = 4,
  spread = 0.5,
  free = false,
}: Shape): BlendProblem {
  const random = seeded(seed);
  const constituents = Math.max(1, limits);
  const make = (id: string): EngineMaterial => {
    const loudness = decades * (random() - 0.5);
    return {
      id,
      profile: Float64Array.from({ length: facets }, () => (random() < 0.2 ? Math.round(100 * random()) / 10 : 0)),
      profileSd: Float64Array.from({ length: facets }, () => spread * (0.5 + random())),
      strength: 10 ** loudness,
      costPerKg: Math.round(1000 * 20 * 10 ** (0.6 * loudness + 1.2 * (random() - 0.5))) / 1000,
      natural: random() < 0.4 ? 1 : 0,
      constituents: Array.from({ length: 4 }, () => ({
        id: `c${Math.floor(random() * constituents)}`,
        max: random() ** 3,
      })).filter(({ id: one }, index, all) => all.findIndex(({ id: other }) => other === one) === index),
    };
  };
  const hidden = Array.from({ length: 8 }, (_, index) => make(`hidden${index}`));
  const shares = hidden.map(() => random());
  const total = shares.reduce((sum, share) => sum + share, 0);
  const target = Float64Array.from({ length: facets }, (_, f) =>
    hidden.reduce((sum, material, index) => sum + (shares[index]! / total) * material.profile[f]!, 0),
  );
  const candidates = Array.from({ length: materials }, (_, index) => make(`m${String(index).padStart(5, '0')}`));
  if (free) return { target, candidates };
  return {
    target,
    candidates,
    costPerImpact: 12,
    minStrength: 0.2,
    minNatural: 0.3,
    limits: Array.from({ length: limits }, (_, index) => ({
      id: `l${index}`,
      terms: [{ constituentId: `c${index}`, factor: 1 }],
      max: 0.002 + 0.05 * random() ** 2,
    })),
  };
}
