/** A plain seeded source of numbers (Mulberry32), so that a problem is named by its seed and the same everywhere. */
export interface Random {
  /** Uniform in [0, 1). */
  next: () => number;
  between: (min: number, max: number) => number;
  /** Uniform in the logarithm. */
  decades: (min: number, max: number) => number;
  /** A whole number from min to max, both possible. */
  whole: (min: number, max: number) => number;
  chance: (probability: number) => boolean;
  pick: <T>(list: readonly T[]) => T;
  /** `count` different ones, or all if there are fewer. */
  some: <T>(list: readonly T[], count: number) => T[];
}

export function seededRandom(seed: number): Random {
  let state = Math.imul(seed ^ 0x9e37_79b9, 0x85eb_ca6b) >>> 0;
  const next = () => {
    state = (state + 0x6d2b_79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
  const whole = (min: number, max: number) => min + Math.floor(next() * (max - min + 1));
  const pick = <T>(list: readonly T[]) => list[whole(0, list.length - 1)]!;
  return {
    next,
    whole,
    pick,
    between: (min, max) => min + next() * (max - min),
    decades: (min, max) => 10 ** (Math.log10(min) + next() * (Math.log10(max) - Math.log10(min))),
    chance: (probability) => next() < probability,
    some: (list, count) => {
      const left = [...list];
      const taken: (typeof left)[number][] = [];
      while (taken.length < count && left.length > 0) taken.push(...left.splice(whole(0, left.length - 1), 1));
      return taken;
    },
  };
}
