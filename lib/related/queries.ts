import 'server-only';
import { type EngineMaterial, relatedMaterials } from '@/engine';
import { demand, type Member } from '@/lib/auth/member';
import { Invalid, NotFound } from '@/lib/errors';
import { listFacets } from '@/lib/facets/queries';
import type { FacetView } from '@/lib/shared/facet';
import {
  denseProfile,
  type RelatedLink,
  type RelatedMap,
  type RelatedNode,
  type RelatedQuery,
} from '@/lib/shared/related';
import { whoShares } from '@/lib/shared/who-shares';
import { type Contained, contents, smellingMaterials, smells } from './rows';
import { around, sharedNames, sparse, type Weights, within } from './view';

/**
 * The house's materials and which of them are alike, by what they smell of or by what they contain.
 *
 * @throws NotFound for a focus that is no material of the house, Invalid for a facet that the house doesn't have.
 */
export async function relatedMapOf(ctx: Member, query: RelatedQuery): Promise<RelatedMap> {
  demand(ctx, 'map.read');
  const facets = await listFacets(ctx);
  const chosen = placesOf(query.facets, facets);
  const { nodes, weights, nameOf } = await readNodes(ctx, query.by, facets);
  if (query.focus && !nodes.some(({ id }) => id === query.focus)) throw new NotFound();
  const links = link(weights, nameOf, query);
  let shown = { nodes, links };
  if (chosen.length > 0) {
    const kept = new Set(whoShares(nodes, links, chosen).sharers.map(({ id }) => id));
    if (query.focus) kept.add(query.focus);
    shown = within(nodes, links, kept);
  }
  if (query.focus) shown = around(shown.nodes, shown.links, query.focus);
  return { by: query.by, facets, ...shown };
}

function placesOf(slugs: string | undefined, facets: readonly FacetView[]): number[] {
  return (slugs?.split(',') ?? []).map((slug) => {
    const place = facets.findIndex((facet) => facet.slug === slug);
    if (place < 0) throw new Invalid({ facets: `The house has no facet “${slug}”.` });
    return place;
  });
}

async function readNodes(ctx: Member, by: RelatedQuery['by'], facets: readonly FacetView[]) {
  const [rows, smelt, contained] = await Promise.all([
    smellingMaterials(ctx),
    smells(ctx),
    by === 'constituents' ? contents(ctx) : new Map<string, Contained[]>(),
  ]);
  const placeOf = new Map(facets.map(({ id }, place) => [id, place]));
  const nodes = rows.map(({ naturalShare, ...row }): RelatedNode => {
    const phases = smelt.get(row.id);
    const whole = phases?.get('all') ?? new Map<string, number>();
    const inPhase = (phase: string) => {
      const differs = phases?.get(phase);
      return differs ? { [phase]: sparse(new Map([...whole, ...differs]), placeOf) } : {};
    };
    return {
      ...row,
      natural: Number(naturalShare),
      profile: sparse(whole, placeOf),
      phases: { ...inPhase('opening'), ...inPhase('heart'), ...inPhase('dry') },
    };
  });
  return by === 'facets' ? smellWeights(nodes, facets) : contentWeights(nodes, facets, contained);
}

interface Weighed {
  nodes: RelatedNode[];
  weights: { material: EngineMaterial; shared: Weights }[];
  nameOf: (key: string) => string;
}

function smellWeights(nodes: RelatedNode[], facets: readonly FacetView[]): Weighed {
  const weights = nodes.map((node) => ({
    material: asMaterial(node, facets),
    shared: new Map(node.profile.map(([place, intensity]) => [String(place), intensity])),
  }));
  return { nodes, weights, nameOf: (place) => facets[Number(place)]?.name ?? '' };
}

function contentWeights(
  nodes: RelatedNode[],
  facets: readonly FacetView[],
  contained: Map<string, Contained[]>,
): Weighed {
  const names = new Map([...contained.values()].flat().map(({ id, name }) => [id, name]));
  const weights = nodes.map((node) => {
    const constituents = contained.get(node.id) ?? [];
    const shared = new Map(constituents.map((each) => [each.id, each.typical ?? each.max]));
    return { material: { ...asMaterial(node, facets), constituents }, shared };
  });
  return { nodes, weights, nameOf: (key) => names.get(key) ?? '' };
}

/** For likeness the engine needs neither strength nor cost, and takes no empty vector: a house may have no facets yet. */
function asMaterial({ id, profile }: RelatedNode, facets: readonly FacetView[]): EngineMaterial {
  return { id, profile: denseProfile(profile, Math.max(1, facets.length)), strength: 1, costPerKg: 0 };
}

function link(weights: Weighed['weights'], nameOf: Weighed['nameOf'], query: RelatedQuery): RelatedLink[] {
  const sharedBy = new Map(weights.map(({ material, shared }) => [material.id, shared]));
  const found = relatedMaterials(
    weights.map(({ material }) => material),
    { top: query.top, minSimilarity: query.min, by: query.by },
  );
  const none: Weights = new Map();
  return found.map(({ a, b, similarity }) => ({
    a,
    b,
    similarity: Math.min(1, similarity),
    shared: sharedNames(sharedBy.get(a) ?? none, sharedBy.get(b) ?? none, nameOf),
  }));
}
