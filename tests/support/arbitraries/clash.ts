import type { BlendProblem, EngineMaterial } from '@/engine/contract';
import type { Random } from './random';

/** Makes the problem impossible for certain, by one rule alone or by several together; says how. */
export function clash(random: Random, problem: BlendProblem): string {
  const ways = [
    tooCheap,
    tooStrong,
    tooCheapForItsStrength,
    keptTooMuch,
    groupsTooLarge,
    excludedWhatIsRequired,
    dearNaturals,
  ];
  return `, impossible: ${random.pick(ways)(problem)}`;
}

/** By how much two rules miss each other: clearly, or by one part in a thousand. */
const miss = (problem: BlendProblem) => (problem.candidates.length % 2 === 0 ? 0.5 : 0.999);

function tooCheap(problem: BlendProblem): string {
  problem.budgetPerKg = miss(problem) * Math.min(...problem.candidates.map((material) => material.costPerKg));
  return 'the ceiling is below the cheapest material';
}

function tooStrong(problem: BlendProblem): string {
  problem.minStrength = Math.max(...problem.candidates.map((material) => material.strength)) / miss(problem);
  return 'wanted stronger than the strongest material';
}

function tooCheapForItsStrength(problem: BlendProblem): string {
  const perImpact = problem.candidates.map((material) => material.costPerKg / material.strength);
  problem.costPerImpact = miss(problem) * Math.min(...perImpact);
  return 'the ceiling at equal strength is below every material';
}

function keptTooMuch(problem: BlendProblem): string {
  const [first, second] = problem.candidates;
  problem.kept = [
    { id: first!.id, share: 0.6 },
    { id: second!.id, share: 0.5 },
  ];
  return 'kept lines weigh more than everything';
}

function groupsTooLarge(problem: BlendProblem): string {
  const ids = problem.candidates.map((material) => material.id);
  const half = Math.ceil(ids.length / 2);
  const small = { id: 'clash a', members: ids.slice(0, half), max: 0.4 };
  problem.groups = [...(problem.groups ?? []), small, { id: 'clash b', members: ids.slice(half), max: 0.5 }];
  return 'two groups that hold all materials may not make up the whole';
}

function excludedWhatIsRequired(problem: BlendProblem): string {
  const constituent = { id: 'clash', max: 0.5 };
  const holds = (material: EngineMaterial) => [...(material.constituents ?? []), constituent];
  const [first] = problem.candidates;
  problem.candidates = problem.candidates.map((material) =>
    material === first ? { ...material, constituents: holds(material) } : material,
  );
  const limit = { id: 'clash', terms: [{ constituentId: 'clash', factor: 2 }], max: 1e-5 };
  problem.limits = [...(problem.limits ?? []), limit];
  problem.required = [...(problem.required ?? []).filter((id) => id !== first!.id), first!.id];
  return 'a required material holds more of a constituent than is allowed';
}

/** At least 60 % natural, but six tenths of the cheapest natural already cost more than the ceiling. */
function dearNaturals(problem: BlendProblem): string {
  problem.candidates = problem.candidates.map((material) => ({
    ...material,
    natural: Math.round(material.natural ?? 0),
  }));
  const cheapest = (natural: number) =>
    Math.min(...problem.candidates.filter((it) => it.natural === natural).map((it) => it.costPerKg));
  const other = Math.min(cheapest(0), cheapest(1));
  problem.minNatural = 0.6;
  problem.budgetPerKg = Number.isFinite(cheapest(1)) ? miss(problem) * (0.6 * cheapest(1) + 0.4 * other) : other;
  return 'no natural blend is that cheap';
}
