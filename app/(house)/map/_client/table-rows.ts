import type { MapMaterial, MapView } from './model';

export interface TableRow {
  material: MapMaterial;
  /** In the order of the chosen facets. */
  intensities: number[];
  links: number;
  closest: { name: string; similarity: number } | null;
}

type Key = string | number;

/** One row for each material on the map; while facets are asked about, for each that shares them. */
export function tableRows(view: MapView, sort: string): TableRow[] {
  const places = view.chosen.map((facet) => facet.slug);
  const keyOf = sortKey(sort.replace(/^-/, ''), places);
  const turn = sort.startsWith('-') ? -1 : 1;
  return view.materials
    .filter(({ id }) => view.sharers?.has(id) ?? true)
    .map((material) => rowOf(view, material))
    .sort((a, b) => turn * compare(keyOf(a), keyOf(b)) || compare(a.material.name, b.material.name));
}

function rowOf(view: MapView, material: MapMaterial): TableRow {
  const near = view.neighbours.get(material.id) ?? [];
  const closest = near[0] ? view.byId.get(near[0].id) : undefined;
  const sharer = view.who.sharers.find(({ id }) => id === material.id);
  return {
    material,
    intensities: sharer?.intensities ?? [],
    links: near.length,
    closest: closest && near[0] ? { name: closest.name, similarity: near[0].similarity } : null,
  };
}

function sortKey(key: string, chosen: readonly string[]): (row: TableRow) => Key {
  const place = chosen.indexOf(key);
  if (place >= 0) return (row) => row.intensities[place] ?? 0;
  if (key === 'kind') return ({ material }) => material.kind;
  if (key === 'links') return ({ links }) => links;
  if (key === 'closest') return ({ closest }) => closest?.name ?? '';
  if (key === 'likeness') return ({ closest }) => closest?.similarity ?? 0;
  return ({ material }) => material.name;
}

const compare = (a: Key, b: Key): number =>
  typeof a === 'number' && typeof b === 'number' ? a - b : String(a).localeCompare(String(b), 'en-GB');
