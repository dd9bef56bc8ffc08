import type { Phase } from '@/app/_components/strip/segments';
import type { FacetView } from '@/lib/shared/facet';
import { denseProfile, type RelatedLink, type RelatedMap, type RelatedNode } from '@/lib/shared/related';
import { type Neighbour, neighboursOf } from '@/lib/shared/related-links';
import { type WhoShares, whoShares } from '@/lib/shared/who-shares';
import { likenessOf, type MapState } from './map-state';

export interface MapMaterial extends Omit<RelatedNode, 'profile' | 'phases'> {
  sparse: RelatedNode['profile'];
  /** Intensities in the house's order of facets, zeros included. */
  profile: number[];
  phases?: Partial<Record<Phase, number[]>>;
  /** The family of its strongest facet. */
  family: string;
}

export function materialsOf({ nodes, facets }: RelatedMap): MapMaterial[] {
  return nodes.map(({ profile, phases, ...node }) => {
    const differing = Object.entries(phases).map(([phase, each]) => [phase, denseProfile(each, facets.length)]);
    return {
      ...node,
      sparse: profile,
      profile: denseProfile(profile, facets.length),
      phases: differing.length > 0 ? Object.fromEntries(differing) : undefined,
      family: strongest(profile, facets)?.family ?? '',
    };
  });
}

function strongest(profile: RelatedNode['profile'], facets: readonly FacetView[]): FacetView | undefined {
  const first = profile.reduce<[number, number] | null>(
    (best, each) => (best && best[1] >= each[1] ? best : each),
    null,
  );
  return first ? facets[first[0]] : undefined;
}

/** What the screen shows for a state of the URL. The graph, the list and the table are drawn from this alone. */
export interface MapView {
  materials: MapMaterial[];
  links: RelatedLink[];
  byId: Map<string, MapMaterial>;
  neighbours: Map<string, Neighbour[]>;
  /** The facets asked about, in the order they were chosen. */
  chosen: FacetView[];
  who: WhoShares;
  /** Ids of the sharers; null while no facet is asked about. */
  sharers: Set<string> | null;
  focus: MapMaterial | null;
  selected: MapMaterial | null;
}

export function viewOf(map: RelatedMap, all: readonly MapMaterial[], state: MapState): MapView {
  const min = likenessOf(state);
  const alike = map.links.filter(({ similarity }) => similarity >= min);
  const near = state.focus ? nearOf(alike, state.focus) : null;
  const materials = all.filter((each) => isShown(each, state) && (near?.has(each.id) ?? true));
  const byId = new Map(materials.map((each) => [each.id, each]));
  const links = alike.filter(({ a, b }) => byId.has(a) && byId.has(b));
  const places = state.smells
    .map((slug) => map.facets.findIndex((facet) => facet.slug === slug))
    .filter((at) => at >= 0);
  const who = whoShares(
    materials.map(({ id, name, sparse }) => ({ id, name, profile: sparse })),
    links,
    places,
  );
  return {
    ...{ materials, links, byId, who },
    neighbours: neighboursOf(links),
    chosen: places.flatMap((place) => map.facets[place] ?? []),
    sharers: places.length > 0 ? new Set(who.sharers.map(({ id }) => id)) : null,
    focus: all.find(({ id }) => id === state.focus) ?? null,
    selected: all.find(({ id }) => id === state.at) ?? null,
  };
}

function isShown({ id, natural, family }: MapMaterial, state: MapState): boolean {
  if (id === state.focus) return true;
  if (state.nature === 'natural' && natural < 0.5) return false;
  if (state.nature === 'synthetic' && natural >= 0.5) return false;
  return state.family.length === 0 || state.family.includes(family);
}

function nearOf(links: readonly RelatedLink[], focus: string): Set<string> {
  const near = new Set([focus]);
  for (const { a, b } of links) {
    if (a === focus) near.add(b);
    if (b === focus) near.add(a);
  }
  return near;
}
