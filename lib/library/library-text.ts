import 'server-only';
import { Decimal } from '@/lib/shared/decimal';

interface Provenance {
  source: string;
  via: string;
  confidence?: string;
}

/** Where a figure is from, with how it got here, in one line for the source columns. */
export function sourceLine({ source, via, confidence }: Provenance, longest = 400): string {
  const how = confidence ? `${via}, confidence ${confidence}` : via;
  return `${source.slice(0, longest - how.length - 3)} (${how})`;
}

const FRACTION_DIGITS = 8;

/** Per cent to a mass fraction of the database; a minimum is rounded down and a maximum up, so a range only widens. */
export function fractionOfPercent(percent: number, rounding: 'nearest' | 'down' | 'up' = 'nearest'): string {
  const modes = { nearest: Decimal.ROUND_HALF_UP, down: Decimal.ROUND_DOWN, up: Decimal.ROUND_UP } as const;
  return new Decimal(percent).div(100).toFixed(FRACTION_DIGITS, modes[rounding]);
}

export const fraction = (value: number): string => new Decimal(value).toFixed(FRACTION_DIGITS);
