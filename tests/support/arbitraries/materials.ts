import type { EngineMaterial } from '@/engine/contract';
import type { Random } from './random';

export interface Library {
  materials: EngineMaterial[];
  facets: number;
  /** Facet intensities are this times 0 to 10. */
  scale: number;
  constituents: string[];
}

/** Which kind of awkwardness the profiles have: none, few distinct directions, or ratings in whole steps with many ties. */
type Kind = 'plain' | 'low rank' | 'stepped' | 'sparse';

/** A library of materials as awkward as real ones, and then some. */
export function generatedMaterials(random: Random, count: number): Library {
  const facets = Math.round(random.decades(2, 60));
  const library: Library = {
    facets,
    scale: random.pick([1, 1, 1, 1e-4, 1e4]),
    constituents: Array.from({ length: random.whole(1, 40) }, (_, index) => `constituent ${index}`),
    materials: [],
  };
  const kind = random.pick<Kind>(['plain', 'low rank', 'stepped', 'sparse']);
  const money = random.pick([1, 1, 1, 1e-4, 1e5]);
  const strength = random.pick([1, 1, 1, 1e-6, 1e6]);
  const rated = random.chance(0.5);
  const directions = Array.from({ length: random.whole(1, 4) }, () => drawn(random, 'plain', facets));
  for (let index = 0; index < count; index++) {
    const id = `material ${String(index).padStart(4, '0')}`;
    const twin = index > 0 && random.chance(0.05) ? random.pick(library.materials) : undefined;
    const profile = kind === 'low rank' ? mixed(random, directions) : drawn(random, kind, facets);
    const material = twin ?? {
      id,
      profile: profile.map((value) => value * library.scale),
      ...(rated ? { profileSd: profile.map(() => library.scale * random.between(0, 2)) } : {}),
      strength: random.chance(0.08) ? 0 : strength * random.decades(1e-2, 1e3),
      costPerKg: money * (kind === 'stepped' ? random.whole(1, 9) * 10 : random.decades(5, 50_000)),
      natural: random.pick([0, 0, 1, 1, random.next()]),
      evaporation: random.chance(0.1) ? 0 : random.decades(1e-3, 30),
      constituents: composition(random, library.constituents),
    };
    library.materials.push({ ...material, id });
  }
  if (!library.materials.some((material) => material.strength > 0)) library.materials[0]!.strength = strength;
  return library;
}

function drawn(random: Random, kind: Kind, facets: number): number[] {
  if (random.chance(0.03)) return new Array<number>(facets).fill(0);
  const dense = kind === 'sparse' ? 0.15 : 0.7;
  return Array.from({ length: facets }, () => {
    if (!random.chance(dense)) return 0;
    return kind === 'stepped' ? random.whole(0, 3) : random.between(0, 10);
  });
}

function mixed(random: Random, directions: readonly number[][]): number[] {
  const weights = directions.map(() => random.next() / directions.length);
  return directions[0]!.map((_, facet) =>
    directions.reduce((sum, direction, index) => sum + weights[index]! * direction[facet]!, 0),
  );
}

function composition(random: Random, constituents: readonly string[]): NonNullable<EngineMaterial['constituents']> {
  const held = random.some(constituents, random.pick([0, 0, 1, 2, 5]));
  return held.map((id) => {
    const max = random.decades(1e-4, 1) / held.length;
    return { id, max, typical: max / 2 };
  });
}
