import type { BlendProblem, EngineMaterial } from '@/engine/contract';
import { clash } from './clash';
import { generatedMaterials, type Library } from './materials';
import { type Random, seededRandom } from './random';

/** A whole blend problem, with what is known of it by construction. */
export interface GeneratedProblem {
  seed: number;
  problem: BlendProblem;
  /** Every rule was put so that `witness` keeps it, or two or more rules were made to clash. */
  feasible: boolean;
  witness: { id: string; share: number }[];
  /** How the target was made, and which clash if any: printed when a check fails. */
  story: string;
}

export interface Wanted {
  candidates?: [min: number, max: number];
  /** Rules that count materials (`maxMaterials`, `minDose`); none unless asked. */
  discrete?: boolean;
  /** A share of problems that cannot be solved; a quarter unless said. */
  infeasible?: number;
  /** Every linear rule appears with this probability; drawn per problem unless said. */
  rules?: number;
}

/**
 * The problem of a seed: 30 to 300 materials over five decades of strength, with duplicates, odourless ones, zero and
 * tied profiles and families of low rank among them; tiny and huge units; every linear rule in any combination, tight
 * or wide around a hidden blend, the witness; a quarter of the problems made impossible.
 */
export function generatedProblem(seed: number, wanted: Wanted = {}): GeneratedProblem {
  const random = seededRandom(seed);
  const [min, max] = wanted.candidates ?? [30, 300];
  const library = generatedMaterials(random, Math.round(random.decades(min, max)));
  const witness = hiddenBlend(random, library.materials);
  const { target, story } = drawnTarget(random, library, witness);
  const problem: BlendProblem = { target, candidates: library.materials };
  if (random.chance(0.4))
    problem.weights = Array.from(target, () => (random.chance(0.15) ? 0 : random.between(0.1, 5)));
  if (problem.weights && Array.from(problem.weights).every((weight) => weight === 0))
    problem.weights = target.map(() => 1);
  if (random.chance(0.2)) addStages(random, problem);
  addRules(random, { problem, witness, library }, wanted.rules ?? random.pick([0, 0.2, 0.5, 0.9]));
  if (wanted.discrete) addCounting(random, problem, witness);
  const impossible = random.chance(wanted.infeasible ?? 0.25);
  const why = impossible ? clash(random, problem) : '';
  const lines = [...witness].map(([material, share]) => ({ id: material.id, share }));
  return { seed, problem, feasible: !impossible, witness: lines, story: `seed ${seed}: target ${story}${why}` };
}

type Blend = Map<EngineMaterial, number>;

function hiddenBlend(random: Random, materials: readonly EngineMaterial[]): Blend {
  const smelling = materials.filter((material) => material.strength > 0);
  const chosen = random.some(smelling, random.whole(1, 10));
  const solvents = materials.filter((material) => material.strength === 0);
  if (solvents.length > 0 && random.chance(0.3)) chosen.push(random.pick(solvents));
  const parts = chosen.map(() => random.decades(0.01, 1));
  const sum = parts.reduce((total, part) => total + part, 0);
  return new Map(chosen.map((material, index) => [material, parts[index]! / sum]));
}

/** Inside the cone of the materials, on its border, a perturbed blend, anywhere, or beyond everything. */
function drawnTarget(random: Random, library: Library, witness: Blend): { target: number[]; story: string } {
  const { scale, facets, materials } = library;
  const blended = profileOf(witness, facets);
  const kind = random.pick(['blend', 'material', 'near', 'anywhere', 'outside'] as const);
  const anywhere = () => Array.from({ length: facets }, () => scale * random.between(0, 10));
  switch (kind) {
    case 'blend':
      return { target: blended, story: kind };
    case 'material':
      return { target: Array.from(random.pick(materials).profile), story: kind };
    case 'near':
      return { target: blended.map((value) => Math.max(0, value + scale * random.between(-1, 1))), story: kind };
    case 'anywhere':
      return { target: anywhere(), story: kind };
    case 'outside':
      return { target: anywhere().map((value) => value * 10), story: kind };
  }
}

function profileOf(blend: Blend, facets: number): number[] {
  const strength = total(blend, (material) => material.strength);
  return Array.from(
    { length: facets },
    (_, facet) => total(blend, (material) => material.strength * material.profile[facet]!) / strength,
  );
}

function addStages(random: Random, problem: BlendProblem): void {
  problem.stages = Array.from({ length: random.whole(1, 3) }, (_, stage) => ({
    hours: stage === 0 ? 0 : random.decades(0.1, 48),
    weight: random.between(0.2, 2),
    target: Array.from(problem.target, (value) => value * random.between(0.2, 1)),
  }));
  const stages = problem.stages.length;
  problem.candidates = problem.candidates.map((material) => {
    if (!random.chance(0.2)) return material;
    const stageProfiles = Array.from({ length: stages }, () =>
      Array.from(material.profile, (value) => value * random.between(0.5, 1.5)),
    );
    return { ...material, stageProfiles };
  });
}

interface Setting {
  problem: BlendProblem;
  witness: Blend;
  library: Library;
}

/** A limit as wide as a part in a million or as all the room there is, so that some bind and many do not. */
const room = (random: Random) => random.pick([1e-6, 1e-3, 0.02, 0.2, 1, 10]);

function addRules(random: Random, { problem, witness, library }: Setting, often: number): void {
  const cost = total(witness, (material) => material.costPerKg);
  const strength = total(witness, (material) => material.strength);
  const natural = total(witness, (material) => material.natural ?? 0);
  if (random.chance(often)) problem.budgetPerKg = cost * (1 + room(random));
  if (random.chance(often)) problem.costPerImpact = (cost / strength) * (1 + room(random));
  if (random.chance(often)) problem.minStrength = strength / (1 + room(random));
  if (random.chance(often)) problem.minNatural = natural / (1 + room(random));
  if (random.chance(often)) addLimits(random, { problem, witness, library });
  if (random.chance(often)) addShares(random, problem, witness);
  if (random.chance(often)) addGroups(random, problem, witness);
  const lines = [...witness];
  if (random.chance(often / 2)) {
    problem.kept = random.some(lines, random.whole(1, 2)).map(([material, share]) => ({ id: material.id, share }));
  }
  if (random.chance(often / 2)) {
    const usable = lines.filter(([material, share]) => share > 2e-4 && share > (material.minShare ?? 0));
    problem.required = random.some(usable, 2).map(([material]) => material.id);
  }
}

function addLimits(random: Random, { problem, witness, library }: Setting): void {
  problem.limits = Array.from({ length: random.whole(1, 20) }, (_, index) => {
    const chosen = random.some(library.constituents, random.whole(1, 6));
    const terms = chosen.map((constituentId) => ({ constituentId, factor: random.decades(0.1, 50) }));
    const factors = new Map(terms.map((term) => [term.constituentId, term.factor]));
    const held = total(witness, (material) =>
      (material.constituents ?? []).reduce((sum, { id, max }) => sum + (factors.get(id) ?? 0) * max, 0),
    );
    const max = held > 0 ? held * (1 + room(random)) : random.pick([0, 1e-6, 1e-3]);
    return { id: `limit ${index}`, terms, max };
  });
}

function addShares(random: Random, problem: BlendProblem, witness: Blend): void {
  const shares = new Map([...witness].map(([material, share]) => [material.id, share]));
  problem.candidates = problem.candidates.map((material) => {
    const share = shares.get(material.id) ?? 0;
    const limited = { ...material };
    if (random.chance(0.2)) limited.maxShare = share > 0 ? Math.min(1, share * (1 + room(random))) : random.next();
    if (share > 0 && random.chance(0.2)) limited.minShare = share / (1 + room(random));
    return limited;
  });
}

function addGroups(random: Random, problem: BlendProblem, witness: Blend): void {
  const shares = new Map([...witness].map(([material, share]) => [material.id, share]));
  problem.groups = Array.from({ length: random.whole(1, 4) }, (_, index) => {
    const members = random.some(problem.candidates, random.whole(1, 20)).map((material) => material.id);
    const share = members.reduce((sum, id) => sum + (shares.get(id) ?? 0), 0);
    const group: NonNullable<BlendProblem['groups']>[number] = { id: `group ${index}`, members };
    if (random.chance(0.6)) group.min = share / (1 + room(random));
    if (random.chance(0.6)) group.max = Math.min(1, share > 0 ? share * (1 + room(random)) : random.next());
    return group;
  });
}

/** Counting rules that the witness keeps: it uses as many materials as it uses, none below its smallest line. */
function addCounting(random: Random, problem: BlendProblem, witness: Blend): void {
  const smallest = Math.min(...witness.values());
  const kind = random.whole(1, 3);
  if (kind !== 2) problem.maxMaterials = witness.size + random.whole(0, 2);
  if (kind !== 1) problem.minDose = smallest * random.pick([0.5, 0.9, 0.999]);
}

function total(blend: Blend, amount: (material: EngineMaterial) => number): number {
  let sum = 0;
  for (const [material, share] of blend) sum += share * amount(material);
  return sum;
}
