export interface Scale {
  min: number;
  max: number;
  ticks: number[];
  /** Where a value lies, 0..100. */
  at: (value: number) => number;
}

/** A plain scale with round ends and about `count` round ticks (1, 2 or 5 times a power of ten). */
export function roundScale(values: readonly number[], count: number, fromZero = false): Scale {
  const low = fromZero ? 0 : Math.min(...values);
  const high = Math.max(...values);
  // Values that differ by less than a millionth are one value to the eye, and the steps between them would not be.
  const span = high - low > Math.abs(high) * 1e-6 ? high - low : Math.abs(high);
  const step = roundStep(Math.max(span, 1e-9) / count);
  const min = Math.floor(low / step + 1e-9) * step;
  const max = Math.max(Math.ceil(high / step - 1e-9) * step, min + step);
  const ticks = Array.from({ length: Math.round((max - min) / step) + 1 }, (_, index) => min + index * step);
  return { min, max, ticks, at: (value) => ((value - min) / (max - min)) * 100 };
}

function roundStep(rough: number): number {
  const power = 10 ** Math.floor(Math.log10(rough));
  const leading = rough / power;
  return (leading <= 1 ? 1 : leading <= 2 ? 2 : leading <= 5 ? 5 : 10) * power;
}
