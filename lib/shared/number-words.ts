import { Decimal } from './decimal';

/* How numbers are said on the screen: each with its unit, and no more digits than are known. */

const LOCALE = 'en-GB';

/** Money from its decimal text: "EUR 1,234.50"; below 1 with as many digits as tell it from nothing. */
export function moneyWords(value: string, currency: string): string {
  const amount = new Decimal(value);
  const tiny = amount.abs().lt(1) && !amount.isZero();
  const format = new Intl.NumberFormat(LOCALE, {
    style: 'currency',
    currency,
    currencyDisplay: 'narrowSymbol',
    ...(tiny && { minimumSignificantDigits: 2, maximumSignificantDigits: 2 }),
    ...(amount.abs().gte(10_000) && { maximumFractionDigits: 0 }),
  });
  return format.format(amount.toFixed() as unknown as number); // Intl takes decimal text exactly
}

/** A fraction as per cent with up to four digits after the point: "0.35 %". */
export function percentWords(fraction: string): string {
  const percent = new Decimal(fraction).times(100);
  return `${new Decimal(percent.toFixed(4)).toFixed()} %`;
}

/** Two significant digits, which is what an estimate is worth: "0.90", "12", "4,500". */
export function estimateWords(value: number): string {
  return new Intl.NumberFormat(LOCALE, { maximumSignificantDigits: 2 }).format(value);
}

export function decimalWords(value: string | number, digits = 4): string {
  return new Intl.NumberFormat(LOCALE, { maximumFractionDigits: digits }).format(Number(value));
}

/** "100 g", "2.5 kg", "10 mL". */
export function packWords(amount: string, unit: 'g' | 'mL'): string {
  const size = new Decimal(amount);
  if (size.lt(1000)) return `${size.toFixed()} ${unit}`;
  return `${size.div(1000).toFixed()} ${unit === 'g' ? 'kg' : 'L'}`;
}

/** "9 March 2026", from an ISO day. */
export function dayWords(day: string): string {
  return new Intl.DateTimeFormat(LOCALE, { dateStyle: 'long', timeZone: 'UTC' }).format(new Date(day));
}
