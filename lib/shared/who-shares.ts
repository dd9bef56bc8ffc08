import type { RelatedLink, RelatedNode } from './related';
import { neighboursOf } from './related-links';

/** From this intensity on, of 10, we call a facet plainly there: fainter ones are the ground of many smells. */
export const PLAINLY = 2;
/** A material leans to the stronger of two facets when the weaker has less than this share of it. */
export const IN_BALANCE = 0.5;

export interface Sharer {
  id: string;
  name: string;
  /** In the order of the chosen facets. */
  intensities: number[];
  /** Which of two chosen facets it leans to (0 or 1); null in balance, or where not two are chosen. */
  leansTo: number | null;
}

export interface Bridge extends Sharer {
  /** How many it is linked to that smell plainly of the first and not of the second, and the other way round. */
  between: [number, number];
}

export interface WhoShares {
  /** Smell plainly of every chosen facet; those in which the weakest of them is strongest come first. */
  sharers: Sharer[];
  /** Share both of two facets and are linked to both sides. Empty unless two are chosen. */
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

/** 0: plainly the first and not the second; 1: the other way round. Those of both or neither are not in it. */
function sidesOf(nodes: readonly Smelt[], first: number, second: number): Map<string, 0 | 1> {
  const sides = new Map<string, 0 | 1>();
  for (const node of nodes) {
    const plainlyFirst = intensityOf(node, first) >= PLAINLY;
    if (plainlyFirst !== intensityOf(node, second) >= PLAINLY) sides.set(node.id, plainlyFirst ? 0 : 1);
  }
  return sides;
}

function bridges(sharers: readonly Sharer[], links: readonly RelatedLink[], sides: Map<string, 0 | 1>): Bridge[] {
  const neighbours = neighboursOf(links);
  return sharers
    .map((each): Bridge => {
      const between: [number, number] = [0, 0];
      for (const { id } of neighbours.get(each.id) ?? []) {
        const side = sides.get(id);
        if (side !== undefined) between[side]++;
      }
      return { ...each, between };
    })
    .filter(({ between }) => between[0] > 0 && between[1] > 0)
    .sort((a, b) => Math.min(...b.between) - Math.min(...a.between));
}

function step(links: readonly RelatedLink[], sides: Map<string, 0 | 1>): WhoShares['step'] {
  let best: WhoShares['step'] = null;
  for (const { a, b, similarity } of links) {
    const [sideA, sideB] = [sides.get(a), sides.get(b)];
    if (sideA === undefined || sideB === undefined || sideA === sideB) continue;
    if (!best || similarity > best.similarity) best = sideA === 0 ? { a, b, similarity } : { a: b, b: a, similarity };
  }
  return best;
}
