import type { RelatedLink, RelatedNode } from './related';
import { neighboursOf } from './related-links';

/** From this intensity on, of 10, we call a facet plainly there: fainter ones are the ground of many smells. */
export const PLAINLY = 2;
/** Two facets stand in balance when the weaker has at least this share of the stronger; otherwise one is leant to. */
export const IN_BALANCE = 0.5;

export interface Sharer {
  id: string;
  name: string;
  /** In the order of the chosen facets. */
  intensities: number[];
  /** Which of two chosen facets it leans to (0 or 1); null in balance, or where not two are chosen. */
  leansTo: number | null;
}

/** Holds two facets in balance, so that it leads from one to the other. */
export interface Bridge extends Sharer {
  /** How many it is linked to that lean to the first facet, and to the second. */
  between: [number, number];
}

export interface WhoShares {
  /** Smell plainly of every chosen facet; those in which the weakest of them is strongest come first. */
  sharers: Sharer[];
  /** Those in balance; the ones with most links to both sides come first. Empty unless two facets are chosen. */
  bridges: Bridge[];
  /** Of two facets that nobody shares: the most alike pair of materials across. */
  step: { a: string; b: string; similarity: number } | null;
}

type Smelt = Pick<RelatedNode, 'id' | 'name' | 'profile'>;

/**
 * The question of the learner: which materials share these facets, and which of them stand between two?
 * `chosen` holds the facets' places.
 */
export function whoShares(
  nodes: readonly Smelt[],
  links: readonly RelatedLink[],
  chosen: readonly number[],
): WhoShares {
  if (chosen.length === 0) return { sharers: [], bridges: [], step: null };
  const sharers = nodes
    .map((node) => sharer(node, chosen))
    .filter(({ intensities }) => intensities.every((intensity) => intensity >= PLAINLY))
    .sort((a, b) => Math.min(...b.intensities) - Math.min(...a.intensities) || (a.name < b.name ? -1 : 1));
  const [first, second] = chosen;
  if (first === undefined || second === undefined || chosen.length > 2) return { sharers, bridges: [], step: null };
  const sides = sidesOf(nodes, first, second);
  return { sharers, bridges: bridges(sharers, links, sides), step: sharers.length ? null : step(links, sides) };
}

export const intensityOf = ({ profile }: Pick<RelatedNode, 'profile'>, place: number): number =>
  profile.find(([each]) => each === place)?.[1] ?? 0;

function sharer(node: Smelt, chosen: readonly number[]): Sharer {
  const intensities = chosen.map((place) => intensityOf(node, place));
  return { id: node.id, name: node.name, intensities, leansTo: leaning(intensities) };
}

function leaning([first, second, third]: readonly number[]): number | null {
  if (first === undefined || second === undefined || third !== undefined) return null;
  if (Math.min(first, second) >= IN_BALANCE * Math.max(first, second)) return null;
  return first > second ? 0 : 1;
}

/** 0: leans to the first, which is plainly there; 1: to the second. The others stand on neither side. */
function sidesOf(nodes: readonly Smelt[], first: number, second: number): Map<string, number> {
  const sides = new Map<string, number>();
  for (const node of nodes) {
    const intensities = [intensityOf(node, first), intensityOf(node, second)];
    const side = leaning(intensities);
    if (side !== null && Math.max(...intensities) >= PLAINLY) sides.set(node.id, side);
  }
  return sides;
}

function bridges(sharers: readonly Sharer[], links: readonly RelatedLink[], sides: Map<string, number>): Bridge[] {
  const neighbours = neighboursOf(links);
  return sharers
    .filter(({ leansTo }) => leansTo === null)
    .map((each): Bridge => {
      const near = (neighbours.get(each.id) ?? []).map(({ id }) => sides.get(id));
      return { ...each, between: [near.filter((side) => side === 0).length, near.filter((side) => side === 1).length] };
    })
    .sort((a, b) => Math.min(...b.between) - Math.min(...a.between));
}

function step(links: readonly RelatedLink[], sides: Map<string, number>): WhoShares['step'] {
  let best: WhoShares['step'] = null;
  for (const { a, b, similarity } of links) {
    const [sideA, sideB] = [sides.get(a), sides.get(b)];
    if (sideA === undefined || sideB === undefined || sideA === sideB) continue;
    if (!best || similarity > best.similarity) best = sideA === 0 ? { a, b, similarity } : { a: b, b: a, similarity };
  }
  return best;
}
