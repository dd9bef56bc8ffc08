/** What is left when a blotter counts as gone: one part in fifty. A convention of ours, not a threshold of smelling. */
const LEFT_AT_THE_END = 1 / 50;
const LONGEST_H = 10_000;

/** How long a neat drop lasts on a blotter, from its evaporation alone; null where that is not known. */
export function lastsHours(evaporationPerHour: number | null): number | null {
  if (evaporationPerHour === null) return null;
  const hours = -Math.log(LEFT_AT_THE_END) / Math.max(evaporationPerHour, 1e-9);
  return Math.min(LONGEST_H, Math.round(hours * 10) / 10);
}
