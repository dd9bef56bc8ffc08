import 'server-only';
import type { RelatedLink, RelatedNode, SparseProfile } from '@/lib/shared/related';

const SHARED_NAMES = 4;

/** What two vectors have in common, strongest first: a thing is shared as much as the one with less of it has. */
export function sharedNames(a: Weights, b: Weights, nameOf: (key: string) => string): string[] {
  const shared: { key: string; amount: number }[] = [];
  for (const [key, amount] of a) {
    const other = b.get(key) ?? 0;
    if (amount > 0 && other > 0) shared.push({ key, amount: Math.min(amount, other) });
  }
  shared.sort((x, y) => y.amount - x.amount || (x.key < y.key ? -1 : 1));
  return shared.slice(0, SHARED_NAMES).map(({ key }) => nameOf(key));
}

/** Facets or constituents of a material, by id. */
export type Weights = ReadonlyMap<string, number>;

/** Only the material in question and what it is linked to; links among those stay. */
export function around(nodes: readonly RelatedNode[], links: readonly RelatedLink[], focus: string) {
  const near = new Set([focus]);
  for (const { a, b } of links) {
    if (a === focus) near.add(b);
    if (b === focus) near.add(a);
  }
  return within(nodes, links, near);
}

export function within(nodes: readonly RelatedNode[], links: readonly RelatedLink[], kept: ReadonlySet<string>) {
  return {
    nodes: nodes.filter(({ id }) => kept.has(id)),
    links: links.filter(({ a, b }) => kept.has(a) && kept.has(b)),
  };
}

export function sparse(profile: Weights, placeOf: ReadonlyMap<string, number>): SparseProfile {
  const pairs: SparseProfile = [];
  for (const [facetId, intensity] of profile) {
    const place = placeOf.get(facetId);
    if (place !== undefined && intensity > 0) pairs.push([place, intensity]);
  }
  return pairs.sort((a, b) => a[0] - b[0]);
}
