import type { BlendProblem } from '@/engine/contract';
import type { Candidate } from './blend-candidate';
import { type BlendRequest, type BlendTarget, RequestFault } from './blend-input';

/** What the blend shall smell like, and what its price and strength are measured against. */
export interface AskedTarget {
  name: string;
  profile: number[];
  /** The material itself; null for a drawn profile. */
  material: Candidate | null;
  /** Strengths and prices at equal strength are relative to this: the target's own, or 1 for a drawn profile. */
  referenceStrength: number;
}

export function askedTarget(
  target: BlendTarget,
  inputs: { facetIds: readonly string[]; candidates: readonly Candidate[] },
): AskedTarget {
  if (target.kind === 'drawn') return drawnTarget(target, inputs.facetIds);
  const material = inputs.candidates.find(({ id }) => id === target.materialId);
  if (!material) throw new RequestFault({ 'target.materialId': 'The target is not in the library any more.' });
  if (!(material.strength > 0))
    throw new RequestFault({ 'target.materialId': `${material.name} has no smell to come close to.` });
  return { name: material.name, profile: material.profile, material, referenceStrength: material.strength };
}

function drawnTarget(target: Extract<BlendTarget, { kind: 'drawn' }>, facetIds: readonly string[]): AskedTarget {
  const profile = facetIds.map((id) => target.intensities[id] ?? 0);
  const unknown = Object.keys(target.intensities).find((id) => !facetIds.includes(id));
  if (unknown) throw new RequestFault({ 'target.intensities': 'A facet of the drawing is not in the house any more.' });
  if (!profile.some((intensity) => intensity > 0))
    throw new RequestFault({ 'target.intensities': 'Draw at least one facet above 0.' });
  return { name: target.name, profile, material: null, referenceStrength: 1 };
}

/** When each phase is smelled, in hours on the blotter: usual times of smelling, by common practice. */
export const PHASE_HOURS = { opening: 0.25, heart: 4, dry: 24 } as const;
const PHASES = ['opening', 'heart', 'dry'] as const;

/** A material's own vector at each phase. */
export function phaseProfiles({ phases, profile }: Candidate): number[][] {
  return PHASES.map((phase) => phases[phase] ?? profile);
}

/** The target as it fades by itself: what is left of it at each phase. */
export function stagesOf(request: BlendRequest, target: AskedTarget): BlendProblem['stages'] {
  const { material } = target;
  if (!material)
    throw new RequestFault({ phases: 'A drawn profile has no course over time; choose a material as the target.' });
  const profiles = phaseProfiles(material);
  return PHASES.map((phase, index) => {
    const left = Math.exp(-(material.evaporation ?? 0) * PHASE_HOURS[phase]);
    return {
      hours: PHASE_HOURS[phase],
      weight: request.phases?.[phase] ?? 0,
      target: (profiles[index] ?? material.profile).map((intensity) => intensity * left),
    };
  });
}
