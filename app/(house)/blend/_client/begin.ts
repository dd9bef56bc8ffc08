import type { Candidate } from '@/lib/shared/blend-candidate';
import { type BlendRequest, requestFor } from '@/lib/shared/blend-input';
import { Decimal } from '@/lib/shared/decimal';

/** A third of what the target itself costs, to two digits: a ceiling that is worth the work and can usually be met. */
export function usualCeiling(target: Candidate): BlendRequest['ceiling'] {
  if (target.costPerKg === null) return null;
  const third = new Decimal(target.costPerKg).div(3).toSignificantDigits(2);
  return third.gt(0) ? { basis: 'equal strength', amount: third.toFixed() } : null;
}

/** A new target under the rules that stand; the ceiling goes with the target. */
export function withTarget(target: Candidate, before: BlendRequest | null): BlendRequest {
  const fresh = requestFor({ kind: 'material', materialId: target.id });
  return {
    ...(before ?? fresh),
    target: fresh.target,
    importance: {},
    ceiling: usualCeiling(target),
    added: before?.added.filter((id) => id !== target.id) ?? [],
  };
}

/** What is drawn begins as the material was, so that one bar can be moved without drawing all the others. */
export function drawnFrom(profile: readonly number[], facetIds: readonly string[], before: BlendRequest): BlendRequest {
  const intensities = Object.fromEntries(
    facetIds.flatMap((id, index) => ((profile[index] ?? 0) > 0 ? [[id, profile[index] ?? 0]] : [])),
  );
  return {
    ...before,
    target: { kind: 'drawn', name: 'Drawn profile', intensities },
    phases: null,
    // Strength and price at equal strength are now measured against linalool: the old figures mean something else.
    minStrength: before.target.kind === 'drawn' ? before.minStrength : null,
    ceiling: before.target.kind === 'drawn' ? before.ceiling : null,
  };
}
