import type { BlendProblem, EngineMaterial } from '@/engine/contract';

/** The problem with the named rules only; ids as the engine writes them, such as `limit:<id>`. */
export function withOnlyRules(problem: BlendProblem, kept: ReadonlySet<string>): BlendProblem {
  const named = <T>(rule: string, value: T | undefined) => (kept.has(rule) ? value : undefined);
  return {
    ...problem,
    budgetPerKg: named('budgetPerKg', problem.budgetPerKg),
    costPerImpact: named('costPerImpact', problem.costPerImpact),
    minStrength: named('minStrength', problem.minStrength),
    minNatural: named('minNatural', problem.minNatural),
    limits: problem.limits?.filter((limit) => kept.has(`limit:${limit.id}`)),
    groups: problem.groups?.filter((group) => kept.has(`group:${group.id}`)),
    kept: problem.kept?.filter((line) => kept.has(`kept:${line.id}`)),
    required: problem.required?.filter((id) => kept.has(`required:${id}`)),
    candidates: problem.candidates.map((material) =>
      kept.has(`share:${material.id}`) ? material : withoutShares(material),
    ),
  };
}

function withoutShares({ minShare: _, maxShare: __, ...material }: EngineMaterial): EngineMaterial {
  return material;
}

/** The problem with one limit put elsewhere. */
export function withLimitAt(
  problem: BlendProblem,
  rule: string,
  side: 'min' | 'max' | undefined,
  to: number,
): BlendProblem {
  const [kind, id] = [rule.split(':')[0]!, rule.slice(rule.indexOf(':') + 1)];
  const changed = <T extends { id: string }>(list: T[] | undefined, change: (item: T) => T) =>
    list?.map((item) => (item.id === id ? change(item) : item));
  switch (kind) {
    case 'limit':
      return { ...problem, limits: changed(problem.limits, (limit) => ({ ...limit, max: to })) };
    case 'group':
      return { ...problem, groups: changed(problem.groups, (group) => ({ ...group, [side!]: to })) };
    case 'kept':
      return { ...problem, kept: changed(problem.kept, (line) => ({ ...line, share: to })) };
    case 'share':
      return {
        ...problem,
        candidates: changed(problem.candidates, (one) => ({ ...one, [side === 'min' ? 'minShare' : 'maxShare']: to }))!,
      };
    default:
      return { ...problem, [kind]: to };
  }
}
