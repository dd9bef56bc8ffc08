import type { BlendProblem } from '../contract';

/** The problem with no rules but the named ones. */
export function onlyRules(problem: BlendProblem, names: ReadonlySet<string>): BlendProblem {
  const { budgetPerKg, costPerImpact, minStrength, minNatural, maxMaterials, minDose, ...rest } = problem;
  const scalars = { budgetPerKg, costPerImpact, minStrength, minNatural, maxMaterials, minDose };
  const kept = Object.fromEntries(
    Object.entries(scalars).filter(([name, value]) => names.has(name) && value !== undefined),
  );
  return {
    ...rest,
    ...kept,
    candidates: problem.candidates.map((material) => {
      if (names.has(`share:${material.id}`)) return material;
      const { minShare: _min, maxShare: _max, ...free } = material;
      return free;
    }),
    limits: (problem.limits ?? []).filter(({ id }) => names.has(`limit:${id}`)),
    groups: (problem.groups ?? []).filter(({ id }) => names.has(`group:${id}`)),
    kept: (problem.kept ?? []).filter(({ id }) => names.has(`kept:${id}`)),
    required: (problem.required ?? []).filter((id) => names.has(`required:${id}`)),
  };
}

/** The ids of all rules that a problem has, those that count materials last. */
export function ruleNames(problem: BlendProblem): string[] {
  const names: string[] = [];
  for (const name of ['budgetPerKg', 'costPerImpact', 'minStrength', 'minNatural'] as const) {
    if (problem[name] !== undefined) names.push(name);
  }
  for (const { id } of problem.limits ?? []) names.push(`limit:${id}`);
  for (const { id } of problem.groups ?? []) names.push(`group:${id}`);
  for (const { id } of problem.kept ?? []) names.push(`kept:${id}`);
  for (const { id, minShare, maxShare } of problem.candidates) {
    if (minShare !== undefined || maxShare !== undefined) names.push(`share:${id}`);
  }
  for (const id of problem.required ?? []) names.push(`required:${id}`);
  if (problem.minDose !== undefined) names.push('minDose');
  if (problem.maxMaterials !== undefined) names.push('maxMaterials');
  return names;
}
