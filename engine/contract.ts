/**
 * The shapes that go into the engine and come out of it. They are a contract: other programs call them.
 *
 * Units: shares and natural shares are mass fractions (0..1), costs are in one currency per kg, strength is odour
 * impact per gram (relative), evaporation is 1/h, facet intensities run 0..10, limits are mass fractions of the
 * concentrate (already divided by the concentrate in product).
 */

/** What the engine knows of one material. `id` is any non-empty string, unique among the candidates. */
export interface EngineMaterial {
  id: string;
  /** Facet intensities, 0..10, one per facet. */
  profile: ArrayLike<number>;
  /** The material's own vector at each of the problem's stages, in their order, where it differs from `profile`. */
  stageProfiles?: ArrayLike<number>[];
  /** Standard deviation of each facet intensity, 0 where missing. */
  profileSd?: ArrayLike<number>;
  /** Odour impact per gram, >= 0; 0 is an odourless solvent. */
  strength: number;
  costPerKg: number;
  /** `max` (the worst case) and `typical` are mass fractions of the material. */
  constituents?: { id: string; max: number; typical?: number }[];
  /** Mass fraction of natural origin; missing counts as 0. */
  natural?: number;
  minShare?: number;
  maxShare?: number;
  /** First-order evaporation rate, 1/h; missing counts as 0. */
  evaporation?: number;
}

/** A material at a mass share; shares of a blend sum to 1. */
export interface BlendLine {
  material: EngineMaterial;
  share: number;
}

/** A limit on constituents: the sum of factor x worst-case mass fraction must not exceed `max`. */
export interface ConstituentLimit {
  id: string;
  terms: { constituentId: string; factor: number }[];
  max: number;
}

/** A wanted smell and the rules that the blend must keep. */
export interface BlendProblem {
  target: ArrayLike<number>;
  /** Importance of each facet, >= 0; all 1 where missing. */
  weights?: ArrayLike<number>;
  candidates: EngineMaterial[];
  /** Ceiling on the price per kg. */
  budgetPerKg?: number;
  /** Ceiling U on the price at equal strength, per 1,000 units of impact (cost per kg / strength per g): row sum (c_i - U s_i) z_i <= 0. */
  costPerImpact?: number;
  /** Least strength per gram. */
  minStrength?: number;
  /** Least natural share of the mass. */
  minNatural?: number;
  limits?: ConstituentLimit[];
  groups?: { id: string; members: string[]; min?: number; max?: number }[];
  /** Lines kept at exactly this share. */
  kept?: { id: string; share: number }[];
  required?: string[];
  /** Replaces `target` by one target per stage of the evaporation. */
  stages?: { hours: number; weight: number; target: ArrayLike<number> }[];
  maxMaterials?: number;
  minDose?: number;
}

/** How long the engine may look, and whom it tells. `now` is a clock in milliseconds, handed in. */
export interface Run {
  timeLimitMs?: number;
  now?: () => number;
  onBetter?: (best: BetterBlend) => void;
}

export interface BetterBlend {
  distance: number;
  bound: number;
  lines: { id: string; share: number }[];
}

/** What one rule costs: `slack` in the rule's own unit, `perUnit` the change of expectedDistance per unit of the limit. */
export interface RulePrice {
  rule: string;
  side?: 'min' | 'max';
  slack: number;
  multiplier: number;
  perUnit?: number;
}

/** The answer with its evidence. Without a blend: `lines` is [] and the numbers are null. */
export interface BlendSolution {
  status: 'optimal' | 'stopped' | 'infeasible';
  lines: { id: string; share: number; impact: number }[];
  profile: number[];
  distance: number;
  expectedDistance: number;
  angle: number | null;
  costPerKg: number;
  costPerImpact: number;
  strength: number;
  natural: number;
  exponent: 1;
  objective: number;
  /** bound <= true optimum <= objective. */
  bound: number;
  kktResidual: number;
  prices: RulePrice[];
  farkas?: { rule: string; side?: 'min' | 'max'; multiplier: number }[];
  /** Infeasible: rules that are impossible together, and possible without any one of them. */
  conflict?: string[];
  /** What one rule would have to become, alone, to allow a blend. */
  relax?: { rule: string; side?: 'min' | 'max'; from: number; to: number }[];
  warnings: string[];
  nodes: number;
  iterations: number;
}

/** What `certify` finds from the problem alone. */
export interface Certificate {
  feasible: boolean;
  /** The largest violation of any rule, as relative mass excess. */
  worstViolation: number;
  objective: number;
  bound: number;
  gap: number;
  boundProven: boolean;
  infeasibilityProven: boolean;
  agrees: boolean;
}

/** One answer on the curve of price against closeness. */
export interface FrontierPoint {
  ceiling: number;
  costPerKg: number;
  distance: number;
  expectedDistance: number;
  solution: BlendSolution;
}
