import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { facetHues } from '@/engine';

const DEMO = path.resolve(import.meta.dirname, '../../db/demo');

const TARGET = 'rose-absolute';
/** From a rose on a shoestring to the dearest naturals; enough that every price has its own blend. */
const CANDIDATES = [
  ...['citronellol', 'laevo-citronellol', 'geraniol', 'phenethyl-alcohol', 'rhodinol-ex-geranium', 'geranyl-acetate'],
  ...['phenethyl-acetate', 'phenethyl-phenylacetate', 'geranium-oil', 'palmarosa-oil', 'rose-oxide'],
  ...['beta-damascenone', 'alpha-damascone', 'eugenol', 'clove-bud-oil', 'phenylacetic-acid', 'beeswax-absolute'],
  ...['honey-extract', 'mimosa-absolute', 'broom-absolute', 'black-tea-absolute', 'hay-absolute', 'gamma-decalactone'],
  ...['alpha-isomethyl-ionone', 'cis-3-hexenol', 'castoreum-resinoid', 'rose-concrete', 'rose-co2-extract', 'rose-oil'],
];

interface DemoMaterial {
  key: string;
  name: string;
  botanical?: string;
  profile: Record<string, [number, number]>;
  strength: { value: number };
  naturalShare: number;
  maxShare?: number;
  evaporation?: { perHour: number };
}
interface DemoQuality {
  material: string;
  preferred: boolean;
  offers: { packAmount: number; packUnit: string; price: string; currency: string }[];
}

const read = <T>(name: string): T => JSON.parse(readFileSync(path.join(DEMO, name), 'utf8')) as T;
const readAll = <T>(folder: string, list: string): T[] =>
  readdirSync(path.join(DEMO, folder))
    .toSorted()
    .flatMap((name) => read<Record<string, T[]>>(`${folder}/${name}`)[list] ?? []);

/** The part of the sample library that the public page carries, taken from the files that fill the demo house. */
export function roseSample() {
  const library = readAll<DemoMaterial>('materials', 'materials');
  const materials = new Map(library.map((m) => [m.key, m]));
  const qualities = readAll<DemoQuality>('qualities', 'qualities');
  const take = (key: string) => {
    const m = materials.get(key);
    if (!m) throw new Error(`db/demo has no material ${key}`);
    return {
      key,
      name: m.name,
      latin: m.botanical,
      profile: m.profile,
      strength: m.strength.value,
      costPerKg: cheapestPerKg(qualities.filter((q) => q.material === key && q.preferred)),
      natural: m.naturalShare,
      maxShare: m.maxShare,
      evaporation: m.evaporation?.perHour,
    };
  };
  return { facets: tones(library), target: take(TARGET), candidates: CANDIDATES.map(take) };
}

/** The facets in the colours that a house gets which begins with the whole library. */
function tones(library: DemoMaterial[]) {
  const { facets } = read<{ facets: { id: string; name: string; family: string }[] }>('facets.json');
  const profiles = library.map((m) => facets.map((facet) => m.profile[facet.id]?.[0] ?? 0));
  const colours = facetHues(facets, profiles);
  return facets.map(({ id, name, family }, at) => ({
    id,
    name,
    family,
    hueDeg: Number(colours[at]?.hueDeg.toFixed(3)),
    lightness: Number(colours[at]?.lightness.toFixed(3)),
  }));
}

/** EUR per kg in the pack that is cheapest by mass. */
function cheapestPerKg(qualities: DemoQuality[]): number {
  const offers = qualities.flatMap((q) => q.offers).filter((o) => o.packUnit === 'g' && o.currency === 'EUR');
  if (offers.length === 0) throw new Error(`no offer by the gram for ${qualities[0]?.material}`);
  return Math.min(...offers.map((o) => Math.round((Number(o.price) / o.packAmount) * 100_000) / 100));
}
