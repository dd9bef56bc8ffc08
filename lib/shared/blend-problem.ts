import type { BlendProblem, EngineMaterial } from '@/engine/contract';
import { type Candidate, isIncomplete } from './blend-candidate';
import { type BlendRequest, RequestFault } from './blend-input';
import { type AskedTarget, askedTarget, phaseProfiles, stagesOf } from './blend-target';
import { Decimal } from './decimal';
import { type AppliedLimit, burdenOf, limitsInForce } from './limit-verdict';
import type { LimitTables } from './limit-view';

/*
 * The one way from a request to the engine's problem. The browser's worker and the server both use it, on the same
 * inputs, so that the blend a person sees while dragging is the blend that is saved.
 */

export interface BlendInputs {
  /** Facet ids in the order of every vector. */
  facetIds: readonly string[];
  candidates: readonly Candidate[];
  /** Null where the house has no tables, or none is asked for. */
  limits: LimitTables | null;
}

export type LeftOutReason = 'target' | 'odourless' | 'no price' | 'incomplete' | 'by hand';

export interface BuiltProblem {
  problem: BlendProblem;
  target: AskedTarget;
  /** The candidates that the engine may use, by id. */
  materials: ReadonlyMap<string, Candidate>;
  leftOut: { id: string; name: string; reason: LeftOutReason }[];
  /** Every limit with a figure; those that no candidate could exceed are not among the problem's rules. */
  limits: AppliedLimit[];
  limitsWithoutFigure: string[];
  /** Mass fraction of the concentrate in the finished product; 1 where no product is named. */
  concentrate: number;
  /** The sum of the facets' weights, over the phases where those count. */
  totalWeight: number;
}

/** What sentences and verdicts need to know of it; a saved blend keeps this much, of the materials it uses. */
export type AskedBlend = Pick<BuiltProblem, 'target' | 'materials' | 'limits' | 'concentrate' | 'totalWeight'>;

/** @throws RequestFault with a sentence for each field that cannot be put to the engine. */
export function buildBlendProblem(request: BlendRequest, inputs: BlendInputs): BuiltProblem {
  const all = new Map(inputs.candidates.map((candidate) => [candidate.id, candidate]));
  const target = askedTarget(request.target, inputs);
  const { used, leftOut } = chooseCandidates(request, inputs.candidates);
  checkNamed(request, all, used);
  const concentrate = request.product ? new Decimal(request.product.concentratePct).div(100).toNumber() : 1;
  const inForce = appliedLimits(request, inputs.limits);
  const strange = Object.keys(request.importance).find((id) => !inputs.facetIds.includes(id));
  if (strange !== undefined) throw new RequestFault({ [`importance.${strange}`]: 'The house has no such facet.' });
  const weights = inputs.facetIds.map((id) => request.importance[id] ?? 1);
  if (!weights.some((weight) => weight > 0))
    throw new RequestFault({ importance: 'At least one facet must count for something.' });
  const stages = request.phases ? stagesOf(request, target) : undefined;
  const problem: BlendProblem = {
    target: target.profile,
    weights,
    candidates: used.map((candidate) => engineMaterial(candidate, request)),
    ...ceilings(request, target),
    minStrength: request.minStrength ? request.minStrength * target.referenceStrength : undefined,
    minNatural: request.minNatural || undefined,
    limits: limitRows(inForce.applied, used, concentrate),
    kept: request.kept.map(({ materialId, share }) => ({ id: materialId, share })),
    required: request.required,
    stages,
    maxMaterials: request.maxMaterials ?? undefined,
    minDose: request.minDose || undefined,
  };
  const facetWeight = weights.reduce((sum, weight) => sum + weight, 0);
  const phaseWeight = stages?.reduce((sum, stage) => sum + stage.weight, 0) ?? 1;
  return {
    problem: withoutUndefined(problem),
    target,
    materials: new Map(used.map((candidate) => [candidate.id, candidate])),
    leftOut,
    limits: inForce.applied,
    limitsWithoutFigure: inForce.withoutFigure,
    concentrate,
    totalWeight: facetWeight * phaseWeight,
  };
}

/** The problem is frozen as JSON when a blend is saved: a rule that is not there has no key. */
function withoutUndefined(problem: BlendProblem): BlendProblem {
  return Object.fromEntries(
    Object.entries(problem).filter(([, value]) => value !== undefined),
  ) as unknown as BlendProblem;
}

function chooseCandidates(request: BlendRequest, candidates: readonly Candidate[]) {
  const asked = new Set([...request.added, ...request.required, ...request.kept.map(({ materialId }) => materialId)]);
  const used: Candidate[] = [];
  const leftOut: BuiltProblem['leftOut'] = [];
  for (const candidate of candidates) {
    const reason = whyLeftOut(candidate, request, asked.has(candidate.id));
    if (reason) leftOut.push({ id: candidate.id, name: candidate.name, reason });
    else used.push(candidate);
  }
  if (!used.some((candidate) => candidate.strength > 0))
    throw new RequestFault({ excluded: 'No material with a smell and a price is left to blend from.' });
  return { used: used.sort((a, b) => (a.id < b.id ? -1 : 1)), leftOut };
}

function whyLeftOut(candidate: Candidate, request: BlendRequest, isAsked: boolean): LeftOutReason | null {
  if (request.excluded.includes(candidate.id)) return 'by hand';
  if (candidate.costPerKg === null) return 'no price';
  if (isAsked) return null;
  if (request.target.kind === 'material' && request.target.materialId === candidate.id) return 'target';
  if (candidate.strength === 0) return 'odourless';
  return request.leaveOutIncomplete && isIncomplete(candidate) ? 'incomplete' : null;
}

/** A material that is asked for must be there to be used. */
function checkNamed(request: BlendRequest, all: ReadonlyMap<string, Candidate>, used: readonly Candidate[]): void {
  const usable = new Set(used.map(({ id }) => id));
  const named: [string, string][] = [
    ...request.required.map((id, index): [string, string] => [`required.${index}`, id]),
    ...request.kept.map(({ materialId }, index): [string, string] => [`kept.${index}`, materialId]),
  ];
  const fields: Record<string, string> = {};
  for (const [field, id] of named) {
    if (usable.has(id)) continue;
    const name = all.get(id)?.name;
    fields[field] = !name
      ? 'A material that is asked for is not in the library any more.'
      : request.excluded.includes(id)
        ? `${name} is both asked for and left out.`
        : `${name} is asked for and has no price. ${all.get(id)?.costReason ?? ''}`.trim();
  }
  const kept = request.kept.map(({ materialId }) => materialId);
  if (new Set(kept).size < kept.length) fields.kept = 'A material can be kept at one share only.';
  if (request.kept.reduce((sum, { share }) => sum + share, 0) > 1 + 1e-12)
    fields.kept = 'The shares that are kept come to more than 100 %.';
  if (Object.keys(fields).length > 0) throw new RequestFault(fields);
}

function ceilings({ ceiling }: BlendRequest, target: AskedTarget): Pick<BlendProblem, 'budgetPerKg' | 'costPerImpact'> {
  if (!ceiling) return {};
  if (ceiling.basis === 'per kg') return { budgetPerKg: Number(ceiling.amount) };
  return { costPerImpact: new Decimal(ceiling.amount).div(target.referenceStrength).toNumber() };
}

function appliedLimits(request: BlendRequest, tables: LimitTables | null) {
  if (!request.product || !tables) return { applied: [], withoutFigure: [] };
  const { category } = request.product;
  if (!tables.categories.some(({ code }) => code === category))
    throw new RequestFault({ 'product.category': 'There is no such product category.' });
  return limitsInForce(tables, category);
}

/** A row says something only if one of the candidates, neat, would exceed it. */
function limitRows(limits: readonly AppliedLimit[], used: readonly Candidate[], concentrate: number) {
  return limits.flatMap(({ id, terms, maxFraction }) => {
    const max = maxFraction / concentrate;
    const binds = used.some((candidate) => burdenOf(terms, candidate.constituents).worst > max);
    return binds ? [{ id, terms: terms.map((term) => ({ ...term })), max }] : [];
  });
}

function engineMaterial(candidate: Candidate, request: BlendRequest): EngineMaterial {
  const override = request.maxShares.find(({ materialId }) => materialId === candidate.id)?.share;
  const maxShare = override ?? candidate.maxShare ?? undefined;
  // A line kept at a share, or a solvent taken in on purpose, is the person's own decision.
  const isOwnDecision = request.kept.some(({ materialId }) => materialId === candidate.id) && override === undefined;
  return {
    id: candidate.id,
    profile: candidate.profile,
    profileSd: candidate.sd,
    ...(request.phases ? { stageProfiles: phaseProfiles(candidate) } : {}),
    strength: candidate.strength,
    costPerKg: Number(candidate.costPerKg),
    constituents: candidate.constituents.map(({ id, max, typical }) => ({ id, max, typical: typical ?? undefined })),
    natural: candidate.natural,
    ...(maxShare !== undefined && maxShare < 1 && !isOwnDecision ? { maxShare } : {}),
    ...(candidate.evaporation === null ? {} : { evaporation: candidate.evaporation }),
  };
}
