import type { BlendProblem, EngineMaterial } from '@/engine';
import { SAMPLE, type SampleMaterial, sampleProfile, sampleSpread } from './sample';

const engineMaterial = (material: SampleMaterial): EngineMaterial => ({
  id: material.key,
  profile: sampleProfile(material),
  profileSd: sampleSpread(material),
  strength: material.strength,
  costPerKg: material.costPerKg,
  natural: material.natural,
  maxShare: material.maxShare,
});

const candidates = SAMPLE.candidates.map(engineMaterial);
const target = sampleProfile(SAMPLE.target);

/**
 * The closest blend to the sample's target at this price. The ceiling is at equal strength and the blend at least half
 * as strong as the target, so that thinning never counts as saving.
 */
export function sampleProblem(price: number): BlendProblem {
  const { strength } = SAMPLE.target;
  return { target, candidates, costPerImpact: price / strength, minStrength: strength / 2 };
}
