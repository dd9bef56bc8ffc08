import { EngineInputError } from '../errors';
import { ANY, checkId, checkList, checkObject, checkUnique, checkVector } from '../input/fields';
import { circleOrder, MOST_ON_A_CIRCLE } from './circle-order';

export interface FacetHue {
  id: string;
  /** The family's place on the circle, 0 up to 360. */
  hueDeg: number;
  /** 0..1, one step for each facet of a family. */
  lightness: number;
}

/** As far apart as a family of seven needs while each still reads on white and on near-black. */
const DARKEST = 0.46;
const LIGHTEST = 0.78;

/**
 * A colour for every facet, computed from the library: families that occur together in materials stand side by side on
 * the circle of hues, evenly spaced, and the facets of a family differ in lightness.
 *
 * Families are compared by the cosine of their occurrence over the materials (the largest intensity that a material has
 * in the family) and put into circular order by `circleOrder`. The first family listed has hue 0. Within a family the
 * facets keep the listed order from light to dark, so that a family's main facet, listed first, is its clearest; alone in a family, a facet stands in the middle.
 *
 * @throws EngineInputError if a facet comes twice, a profile has another length, or there are more than 15 families.
 */
export function facetHues(facets: { id: string; family: string }[], profiles: ArrayLike<number>[]): FacetHue[] {
  const families = checkedFamilies(facets, profiles);
  const occurrence = families.map((family) =>
    profiles.map((profile) =>
      facets.reduce((most, facet, at) => (facet.family === family ? Math.max(most, profile[at]!) : most), 0),
    ),
  );
  const order = circleOrder(occurrence.map((one) => occurrence.map((other) => cosine(one, other))));
  const hues = new Map(order.map((family, place) => [families[family]!, (360 * place) / families.length]));
  return facets.map(({ id, family }) => ({
    id,
    hueDeg: hues.get(family)!,
    lightness: lightnessOf(id, family, facets),
  }));
}

function lightnessOf(id: string, family: string, facets: readonly { id: string; family: string }[]): number {
  const siblings = facets.filter((facet) => facet.family === family);
  const place = siblings.findIndex((facet) => facet.id === id);
  const part = siblings.length === 1 ? 0.5 : place / (siblings.length - 1);
  return LIGHTEST - part * (LIGHTEST - DARKEST);
}

/** 0 where a family never occurs. */
function cosine(a: readonly number[], b: readonly number[]): number {
  const product = (x: readonly number[], y: readonly number[]) => x.reduce((sum, value, at) => sum + value * y[at]!, 0);
  const sizes = Math.sqrt(product(a, a)) * Math.sqrt(product(b, b));
  return sizes > 0 ? product(a, b) / sizes : 0;
}

/** The families in the order in which they are first listed. */
function checkedFamilies(facets: readonly { id: string; family: string }[], profiles: ArrayLike<number>[]): string[] {
  for (const [index, facet] of checkList(facets, 'facets').entries()) {
    checkObject(facet, `facets[${index}]`);
    checkId(facet.id, `facets[${index}].id`);
    checkId(facet.family, `facets[${index}].family`);
  }
  checkUnique(
    facets.map((facet) => facet.id),
    'facets',
  );
  for (const [index, profile] of checkList(profiles, 'profiles').entries()) {
    checkVector(profile, `profiles[${index}]`, ANY, facets.length);
  }
  const families = [...new Set(facets.map((facet) => facet.family))];
  if (families.length <= MOST_ON_A_CIRCLE) return families;
  throw new EngineInputError('facets', `facets must belong to at most ${MOST_ON_A_CIRCLE} families.`);
}
