/** The words that a material is described by; the database holds the same lists in its checks. */

export const MATERIAL_KINDS = [
  'oil',
  'absolute',
  'resinoid',
  'extract',
  'isolate',
  'synthetic',
  'ready base',
  'solvent',
] as const;
export type MaterialKind = (typeof MATERIAL_KINDS)[number];

export const KIND_NAMES: Record<MaterialKind, string> = {
  oil: 'Essential oil',
  absolute: 'Absolute',
  resinoid: 'Resinoid',
  extract: 'Extract',
  isolate: 'Isolate',
  synthetic: 'Synthetic',
  'ready base': 'Ready base',
  solvent: 'Solvent',
};

export const STRENGTH_CLASSES = ['odourless', 'faint', 'weak', 'medium', 'strong', 'very strong', 'mighty'] as const;
export const FORMS = ['mobile liquid', 'viscous liquid', 'paste', 'crystals', 'solid'] as const;
export const COMPLETENESS = ['full', 'declared', 'unknown'] as const;
export type Completeness = (typeof COMPLETENESS)[number];
export const PHASES = ['opening', 'heart', 'dry'] as const;
export type Phase = (typeof PHASES)[number];
export const PHASE_NAMES: Record<Phase, string> = { opening: 'Opening', heart: 'Heart', dry: 'Dry phase' };
export const FACET_PHASES = ['all', ...PHASES] as const;

/** What a composition is worth for checking limits, said in words. */
export const COMPLETENESS_WORDS: Record<Completeness, { short: string; long: string }> = {
  full: { short: 'full', long: 'Full: every constituent that a limit speaks of is stated.' },
  declared: {
    short: 'declared only',
    long: 'Declared only: what an SDS must name. Other constituents may be there, unnamed; a limit on one of them is unknown, not met.',
  },
  unknown: {
    short: 'unknown',
    long: 'Unknown: nothing reliable is stated. No limit counts as met with this quality in the blend.',
  },
};

export const CAUTION_CODES = [
  'sensitiser',
  'phototoxic',
  'irritant',
  'aspiration',
  'restricted',
  'flammable',
  'warm',
  'strong',
  'oxidises',
  'discolours',
] as const;
export type CautionCode = (typeof CAUTION_CODES)[number];

/** Common practice at the bench, in general words. The supplier's SDS and local rules come first, and the screen says so. */
export const CAUTIONS: Record<CautionCode, { title: string; advice: string }> = {
  sensitiser: {
    title: 'Skin sensitiser',
    advice:
      'Keep it off the skin, neat or in concentrate. Wear gloves that the SDS names; stop if skin reddens or itches.',
  },
  phototoxic: {
    title: 'Phototoxic',
    advice: 'On skin it can burn under sunlight. Weigh it with gloves, and smell it on a blotter, not on skin.',
  },
  irritant: { title: 'Irritant', advice: 'Protect eyes and skin, and smell it from the blotter, diluted.' },
  aspiration: {
    title: 'Harmful if swallowed into the lungs',
    advice: 'Never pipette by mouth. If swallowed, do not bring it up: call a poison centre at once.',
  },
  restricted: {
    title: 'Use is restricted',
    advice: 'Limits or bans exist for some products. Check the current standard and ask a qualified safety assessor.',
  },
  flammable: {
    title: 'Flammable',
    advice: 'No flame or spark near it, good air, closed vessels; store it as local fire rules say.',
  },
  warm: {
    title: 'Warm before pouring',
    advice: 'Warm in a water bath, closed and slowly, no hotter than its supplier says. Never on an open hot plate.',
  },
  strong: {
    title: 'Very strong',
    advice: 'Handle it diluted, away from other work: a trace of it stays on the balance and in the air.',
  },
  oxidises: {
    title: 'Oxidises',
    advice:
      'Keep it cool, full and closed. Old stock can sensitise more: note the date of opening, and test peroxides.',
  },
  discolours: { title: 'Discolours', advice: 'It can tint the finished product. Check colour after maturing.' },
};
