import type { RelatedLink } from './related';

export interface Neighbour {
  id: string;
  similarity: number;
  shared: readonly string[];
}

/** For each material those it is linked to, most alike first; ties by id. A material without links is not in it. */
export function neighboursOf(links: readonly RelatedLink[]): Map<string, Neighbour[]> {
  const neighbours = new Map<string, Neighbour[]>();
  const add = (from: string, neighbour: Neighbour) => {
    const known = neighbours.get(from);
    if (known) known.push(neighbour);
    else neighbours.set(from, [neighbour]);
  };
  for (const { a, b, similarity, shared } of links) {
    add(a, { id: b, similarity, shared });
    add(b, { id: a, similarity, shared });
  }
  for (const each of neighbours.values()) each.sort((x, y) => y.similarity - x.similarity || (x.id < y.id ? -1 : 1));
  return neighbours;
}
