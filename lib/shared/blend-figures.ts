/*
 * Figures as the blend's screens and sentences write them: never without a unit, and with no more digits than a person
 * can use. Exact values stand behind them.
 */

const plain = (options: Intl.NumberFormatOptions) => new Intl.NumberFormat('en-GB', options);
const fine = plain({ minimumFractionDigits: 2, maximumFractionDigits: 2 });
const whole = plain({ maximumFractionDigits: 0 });
const short = plain({ maximumSignificantDigits: 3 });
const money = plain({ minimumFractionDigits: 2, maximumFractionDigits: 2 });

/** "1.24": points of the 0-10 facet scale. */
export const pointsOf = (distance: number): string => fine.format(distance);

/** "1,240 EUR/kg", "12.40 EUR/kg": whole above 100. */
export function pricePerKg(amount: number, currency: string): string {
  return `${amount >= 100 ? whole.format(amount) : money.format(amount)} ${currency}/kg`;
}

/** "20 %", "0.35 %", "less than 0.001 %": of a fraction. */
export function percent(fraction: number): string {
  const value = fraction * 100;
  if (value !== 0 && Math.abs(value) < 0.001) return 'less than 0.001 %';
  return `${short.format(value)} %`;
}

/** A share in a column: two digits after the point, more for traces, so that a trace is not 0. */
export function shareInColumn(fraction: number): string {
  const value = fraction * 100;
  if (value >= 0.1) return fine.format(value);
  return value >= 0.0001
    ? plain({ minimumSignificantDigits: 2, maximumSignificantDigits: 2 }).format(value)
    : '< 0.0001';
}

/** The next round step (1, 2 or 5 times a power of ten) not above a value. */
export function roundStep(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value));
  const leading = value / power;
  return (leading >= 5 ? 5 : leading >= 2 ? 2 : 1) * power;
}

/** To three digits, away from or towards 0: a loosened rule must not be rounded tight again. */
export function roundOut(value: number, direction: 'up' | 'down'): number {
  if (!(value > 0)) return 0;
  const step = 10 ** (Math.floor(Math.log10(value)) - 2);
  // A hair more than the bound itself, which the engine knows to 1e-9 only.
  const safe = direction === 'up' ? value * (1 + 1e-8) : value * (1 - 1e-8);
  const rounded = direction === 'up' ? Math.ceil(safe / step) : Math.floor(safe / step);
  return Number((rounded * step).toPrecision(4));
}

/** An impact share in a column, in per cent: a nose knows no second digit after the point. */
export function impactInColumn(fraction: number): string {
  const value = fraction * 100;
  return value < 0.05 ? '< 0.1' : plain({ minimumFractionDigits: 1, maximumFractionDigits: 1 }).format(value);
}

/** A list as it is spoken: "A, B and C". */
export const listed = (words: readonly string[]): string => new Intl.ListFormat('en-GB').format(words);
