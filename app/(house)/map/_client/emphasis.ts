import type { MapView } from './model';

/** What is lit on the map; null while everything is. */
export interface Emphasis {
  pointed: string | null;
  lit: ReadonlySet<string> | null;
}

/** What is pointed at with its neighbours, and whoever shares the chosen facets. */
export function emphasisOf(view: MapView, pointed: string | null): Emphasis {
  if (!pointed || !view.byId.has(pointed)) return { pointed: null, lit: view.sharers };
  const near = (view.neighbours.get(pointed) ?? []).map(({ id }) => id);
  return { pointed, lit: new Set([pointed, ...near, ...(view.sharers ?? [])]) };
}

/** The ids in the order in which they deserve a label: what is pointed at, what is lit, then those most linked. */
export function labelOrder(view: MapView, { pointed, lit }: Emphasis): string[] {
  const rank = (id: string) =>
    (id === pointed ? 2e6 : 0) + (lit?.has(id) ? 1e6 : 0) + (view.neighbours.get(id)?.length ?? 0);
  return view.materials
    .map(({ id }) => ({ id, rank: rank(id) }))
    .filter(({ rank }) => lit === null || rank >= 1e6)
    .sort((a, b) => b.rank - a.rank || (a.id < b.id ? -1 : 1))
    .map(({ id }) => id);
}
