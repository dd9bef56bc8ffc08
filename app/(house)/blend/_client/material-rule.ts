import type { BlendRequest } from '@/lib/shared/blend-input';

/** One rule that a person set for one material; the request holds them by kind. */
export interface MaterialRule {
  id: string;
  kind: 'excluded' | 'required' | 'kept' | 'most' | 'added';
  share?: number;
}

export function rulesOfMaterials(request: BlendRequest): MaterialRule[] {
  return [
    ...request.excluded.map((id): MaterialRule => ({ id, kind: 'excluded' })),
    ...request.required.map((id): MaterialRule => ({ id, kind: 'required' })),
    ...request.kept.map(({ materialId, share }): MaterialRule => ({ id: materialId, kind: 'kept', share })),
    ...request.maxShares.map(({ materialId, share }): MaterialRule => ({ id: materialId, kind: 'most', share })),
    ...request.added.map((id): MaterialRule => ({ id, kind: 'added' })),
  ];
}

/** The request with this one rule for the material, or with none. */
export function withMaterialRule(
  request: BlendRequest,
  id: string,
  rule: Omit<MaterialRule, 'id'> | null,
): BlendRequest {
  const others = (ids: string[]) => ids.filter((one) => one !== id);
  const otherShares = (list: BlendRequest['kept']) => list.filter(({ materialId }) => materialId !== id);
  const line = { materialId: id, share: rule?.share ?? 0 };
  const withId = (ids: string[], kind: MaterialRule['kind']) =>
    rule?.kind === kind ? [...others(ids), id] : others(ids);
  const withShare = (list: BlendRequest['kept'], kind: MaterialRule['kind']) =>
    rule?.kind === kind ? [...otherShares(list), line] : otherShares(list);
  return {
    ...request,
    excluded: withId(request.excluded, 'excluded'),
    required: withId(request.required, 'required'),
    added: withId(request.added, 'added'),
    kept: withShare(request.kept, 'kept'),
    maxShares: withShare(request.maxShares, 'most'),
  };
}
