import type { FacetView } from '@/lib/shared/facet';
import type { MapView } from './model';

const list = new Intl.ListFormat('en-GB');
const number = new Intl.NumberFormat('en-GB');
const twoDigits = new Intl.NumberFormat('en-GB', { minimumFractionDigits: 2, maximumFractionDigits: 2 });

export const facetWord = (facet: Pick<FacetView, 'name'> | undefined): string => facet?.name.toLowerCase() ?? '';
export const likenessInWords = (similarity: number): string => `${twoDigits.format(similarity)} alike`;

export function materialsInWords(count: number): string {
  return count === 1 ? '1 material' : `${number.format(count)} materials`;
}

/** What is on the map now: "352 materials, 781 links by shared facets". */
export function mapInWords({ materials, links }: Pick<MapView, 'materials' | 'links'>, by: string): string {
  const joined = links.length === 1 ? '1 link' : `${number.format(links.length)} links`;
  return `${materialsInWords(materials.length)}, ${joined} by shared ${by}`;
}

/** The answer to "who shares these, and who bridges the two", as a teacher would give it. */
export function answerInWords({ chosen, who, byId }: Pick<MapView, 'chosen' | 'who' | 'byId'>): string {
  const words = chosen.map(facetWord);
  const count = who.sharers.length;
  if (chosen.length === 1)
    return count
      ? `${oneOrMany(count, 'smells', 'smell')} plainly of ${words[0]}.`
      : `No material smells plainly of ${words[0]}.`;
  if (count === 0) return nobody(words, who.step, byId);
  const shared = `${oneOrMany(count, 'shares', 'share')} ${list.format(words)}.`;
  return chosen.length === 2 ? `${shared} ${balance(words, who)}` : shared;
}

const oneOrMany = (count: number, one: string, many: string) =>
  `${materialsInWords(count)} ${count === 1 ? one : many}`;

function nobody(words: string[], step: MapView['who']['step'], byId: MapView['byId']): string {
  const none = `No material smells plainly of ${list.format(words)} at once.`;
  const [from, to] = [byId.get(step?.a ?? ''), byId.get(step?.b ?? '')];
  if (!step || !from || !to) return none;
  return `${none} The shortest step across is from ${from.name} to ${to.name}, ${likenessInWords(step.similarity)}.`;
}

function balance([first, second]: string[], { sharers, bridges }: MapView['who']): string {
  const leaning = [0, 1].map((side) => sharers.filter(({ leansTo }) => leansTo === side).length);
  const held =
    bridges.length === 0
      ? 'None holds both in balance'
      : `${bridges.length === 1 ? '1 holds' : `${bridges.length} hold`} both in balance and so ${bridges.length === 1 ? 'bridges' : 'bridge'} the two`;
  const leans = [
    leaning[0] ? `${leaning[0]} ${leaning[0] === 1 ? 'leans' : 'lean'} to ${first}` : '',
    leaning[1] ? `${leaning[1]} ${leaning[1] === 1 ? 'leans' : 'lean'} to ${second}` : '',
  ].filter(Boolean);
  return leans.length > 0 ? `${held}; ${list.format(leans)}.` : `${held}.`;
}
