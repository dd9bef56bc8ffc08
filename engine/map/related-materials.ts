import type { EngineMaterial } from '../contract';
import { EngineInputError } from '../errors';
import { checkList, checkNumber, checkObject, checkUnique, checkWhole, FRACTION } from '../input/fields';
import { checkMaterial } from '../input/material';
import { compareByAxes } from './compare-by-axes';
import { compareByTraits, sharedPerPair } from './compare-by-traits';
import { emptyNearest, type Nearest } from './nearest';
import { constituentTraits, facetTraits } from './traits';

/** Where two materials share fewer traits than this on average, looking at the shared ones is quicker than at axes. */
const FEW_SHARED = 3;

export interface Relation {
  a: string;
  b: string;
  /** Cosine between the two, up to 1. */
  similarity: number;
}

/**
 * Links between materials that smell alike (cosine of their facets) or are made alike (cosine of their constituents):
 * every material with its `top` nearest, as far as they reach `minSimilarity`. Each pair comes once, a before b, the
 * most similar first. A material without any trait has no neighbours, and materials that share nothing are not related.
 *
 * Exact, and the same to the last bit as comparing all pairs. Each pair is looked at once, and most need no full
 * comparison: see `compareByTraits` and `compareByAxes`, between which the density of the traits decides.
 *
 * @throws EngineInputError if a material is not well put, an id comes twice, or an option is out of its range.
 */
export function relatedMaterials(
  materials: EngineMaterial[],
  options: { top: number; minSimilarity: number; by: 'facets' | 'constituents' },
): Relation[] {
  checkInput(materials, options);
  const traits = options.by === 'facets' ? facetTraits(materials) : constituentTraits(materials);
  const top = Math.min(options.top, Math.max(1, materials.length - 1));
  const nearest = emptyNearest(materials.length, top, options.minSimilarity);
  if (sharedPerPair(traits) < FEW_SHARED) compareByTraits(traits, nearest);
  else compareByAxes(traits, nearest);
  return relations(traits.ids, nearest);
}

/** Each pair once, from the lower row, or from the higher where the lower does not list it. Rows are in order of id. */
function relations(ids: readonly string[], nearest: Nearest): Relation[] {
  const { top, partners, similarities, counts } = nearest;
  const pairs: { first: number; second: number; similarity: number }[] = [];
  for (let row = 0; row < ids.length; row++) {
    for (let place = row * top; place < row * top + counts[row]!; place++) {
      const partner = partners[place]!;
      if (partner < row && lists(nearest, partner, row)) continue;
      const similarity = Math.min(1, similarities[place]!);
      pairs.push({ first: Math.min(row, partner), second: Math.max(row, partner), similarity });
    }
  }
  pairs.sort((a, b) => b.similarity - a.similarity || a.first - b.first || a.second - b.second);
  return pairs.map(({ first, second, similarity }) => ({ a: ids[first]!, b: ids[second]!, similarity }));
}

function lists({ top, partners, counts }: Nearest, row: number, partner: number): boolean {
  for (let place = row * top; place < row * top + counts[row]!; place++) if (partners[place] === partner) return true;
  return false;
}

function checkInput(materials: readonly EngineMaterial[], options: Parameters<typeof relatedMaterials>[1]): void {
  checkObject(options, 'options');
  checkWhole(options.top, 'options.top', { min: 1, max: 200 });
  checkNumber(options.minSimilarity, 'options.minSimilarity', FRACTION);
  if (options.by !== 'facets' && options.by !== 'constituents') {
    throw new EngineInputError('options.by', 'options.by must be "facets" or "constituents".');
  }
  const list = checkList(materials, 'materials');
  for (const [index, material] of list.entries()) {
    checkMaterial(material, `materials[${index}]`, list[0]?.profile?.length);
  }
  checkUnique(
    list.map((material) => material.id),
    'materials',
  );
}
