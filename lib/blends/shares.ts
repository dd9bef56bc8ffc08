import 'server-only';

/** Digits that a share is stored with, as its column has. */
const DIGITS = 14;
const UNITS = 10 ** DIGITS;

/**
 * Shares as stored decimals that sum to exactly 1: each is cut to 14 digits, and the units left over go to the largest
 * remainders, ties to the earlier line. None is off by a whole unit. Without a line there is nothing to hand out.
 */
export function storedShares(shares: readonly number[]): string[] {
  if (shares.length === 0) return [];
  const total = shares.reduce((sum, share) => sum + share, 0);
  const exact = shares.map((share) => (share / total) * UNITS);
  const units = exact.map(Math.floor);
  const left = UNITS - units.reduce((sum, unit) => sum + unit, 0);
  const byRemainder = exact
    .map((value, index) => ({ index, remainder: value - Math.floor(value) }))
    .sort((a, b) => b.remainder - a.remainder || a.index - b.index);
  for (let i = 0; i < left; i++) {
    const index = byRemainder[i % byRemainder.length]?.index ?? 0;
    units[index] = (units[index] ?? 0) + 1;
  }
  return units.map((unit) => `${Math.floor(unit / UNITS)}.${String(unit % UNITS).padStart(DIGITS, '0')}`);
}
