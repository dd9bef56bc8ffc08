import { forceLink, forceManyBody, forceSimulation, forceX, forceY, type SimulationNodeDatum } from 'd3-force';
import {
  checkId,
  checkKnown,
  checkList,
  checkNumber,
  checkObject,
  checkUnique,
  checkWhole,
  FRACTION,
} from '../input/fields';
import type { Relation } from './related-materials';

export interface MapPoint {
  id: string;
  x: number;
  y: number;
}

type Node = MapPoint & SimulationNodeDatum;

/** Related materials pull together to about this distance (in the map's own unit) if they are all but the same. */
const NEAREST = 12;
const REPULSION = -30;
/** Keeps groups that nothing links to the others from drifting away. */
const GRAVITY = 0.05;

/**
 * Where the materials stand on the map after `ticks` steps of a force simulation (d3-force): related ones attract each
 * other, the more the likelier they are, all repel, and a weak pull holds everything together. The same input gives the
 * same map: it starts on a spiral in order of id, and chance comes from `seed`.
 *
 * @throws EngineInputError if an id comes twice or a relation names an unknown one.
 */
export function mapLayout(
  ids: string[],
  relations: Relation[],
  { ticks, seed }: { ticks: number; seed: number },
): MapPoint[] {
  checkLayoutInput(ids, relations);
  checkWhole(ticks, 'ticks', { min: 0, max: 10_000 });
  checkWhole(seed, 'seed', { min: 0, max: 0xffff_ffff });
  const nodes = [...ids].sort().map((id) => ({ id }) as Node);
  const links = relations.map(({ a, b, similarity }) => ({ source: a, target: b, similarity }));
  const pull = forceLink<Node, (typeof links)[number]>(links)
    .id((node) => node.id)
    .distance(({ similarity }) => NEAREST * (1 + 4 * (1 - similarity)))
    .strength(({ similarity }) => similarity / 4);
  const simulation = forceSimulation(nodes)
    .stop()
    .randomSource(linearCongruence(seed))
    .force('pull', pull)
    .force('repulsion', forceManyBody().strength(REPULSION))
    .force('x', forceX().strength(GRAVITY))
    .force('y', forceY().strength(GRAVITY))
    .tick(ticks);
  const places = new Map(simulation.nodes().map((node) => [node.id, node]));
  return ids.map((id) => ({ id, x: places.get(id)!.x, y: places.get(id)!.y }));
}

/** Chance only parts nodes that coincide: the constants of Numerical Recipes are good enough. */
function linearCongruence(seed: number): () => number {
  let state = seed;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}

function checkLayoutInput(ids: readonly string[], relations: readonly Relation[]): void {
  for (const [index, id] of checkList(ids, 'ids').entries()) checkId(id, `ids[${index}]`);
  checkUnique(ids, 'ids');
  const known = new Set(ids);
  for (const [index, relation] of checkList(relations, 'relations').entries()) {
    checkObject(relation, `relations[${index}]`);
    checkKnown(relation.a, known, `relations[${index}].a`);
    checkKnown(relation.b, known, `relations[${index}].b`);
    checkNumber(relation.similarity, `relations[${index}].similarity`, FRACTION);
  }
}
