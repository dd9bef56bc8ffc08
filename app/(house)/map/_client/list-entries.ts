import { facetWord, likenessInWords } from './in-words';
import type { MapMaterial, MapView } from './model';

export interface ListEntry {
  material: MapMaterial;
  /** Why it is in the list. */
  note: string;
}

const list = new Intl.ListFormat('en-GB');
const count = (links: number) => (links === 1 ? '1 link' : `${links} links`);

/** What stands beside the map: the kin of what was picked, or who shares the chosen facets, or everything by its links. */
export function listOf(view: MapView): { title: string; entries: ListEntry[] } {
  if (view.selected && view.byId.has(view.selected.id)) return kinOf(view, view.selected);
  if (view.chosen.length > 0) return sharersOf(view);
  const linksOf = ({ id }: MapMaterial) => view.neighbours.get(id)?.length ?? 0;
  const entries = [...view.materials]
    .sort((a, b) => linksOf(b) - linksOf(a) || (a.name < b.name ? -1 : 1))
    .map((material) => ({ material, note: count(linksOf(material)) }));
  return { title: 'All, the most linked first', entries };
}

function kinOf(view: MapView, selected: MapMaterial) {
  const entries = (view.neighbours.get(selected.id) ?? []).flatMap(({ id, similarity, shared }) => {
    const material = view.byId.get(id);
    return material ? [{ material, note: `${likenessInWords(similarity)}: ${list.format(shared).toLowerCase()}` }] : [];
  });
  return { title: `Linked to ${selected.name}`, entries };
}

/** Bridges first, for they answer the question; each says how it stands between the two. */
function sharersOf({ who, chosen, byId }: MapView) {
  const [first, second] = chosen.map(facetWord);
  const bridges = who.bridges.flatMap(({ id, between }) => {
    const material = byId.get(id);
    const linked = between[0] + between[1] > 0 ? `; linked to ${between[0]} ${first}, ${between[1]} ${second}` : '';
    return material ? [{ material, note: `in balance${linked}` }] : [];
  });
  const named = new Set(bridges.map(({ material }) => material.id));
  const others = who.sharers.flatMap(({ id, intensities, leansTo }) => {
    const material = byId.get(id);
    if (!material || named.has(id)) return [];
    const strengths = intensities.map((intensity, at) => `${facetWord(chosen[at])} ${intensity}`).join(', ');
    return [{ material, note: leansTo === null ? strengths : `leans to ${facetWord(chosen[leansTo])}: ${strengths}` }];
  });
  return { title: `Smell plainly of ${list.format(chosen.map(facetWord))}`, entries: [...bridges, ...others] };
}
