import { Decimal as Base } from 'decimal.js';

/**
 * Decimals for money, masses and fractions: exact in sums and products, 40 significant digits in quotients. A number
 * is only rounded where it is shown or stored, by `toFixed` with the digits of its column.
 */
export const Decimal = Base.clone({ precision: 40, rounding: Base.ROUND_HALF_UP, toExpNeg: -40, toExpPos: 40 });
export type Decimal = Base;

/** A plain decimal without exponent: "12", "0.5", "-3.25". A decimal comma is for the field to turn into a point. */
export const DECIMAL_TEXT = /^-?\d{1,12}(\.\d{1,14})?$/;

/** How many digits stand after the point, trailing zeros not counted. */
export function decimalPlaces(text: string): number {
  return new Decimal(text).decimalPlaces();
}

/** What a person types: blanks go, a decimal comma becomes a point. */
export function decimalOfTyped(text: string): string {
  return text.replaceAll(/[\s\u00a0\u202f]/g, '').replace(',', '.');
}
