import { z } from 'zod';
import { DECIMAL_TEXT } from './decimal';
import { fractionField } from './input-fields';
import { MATERIAL_KINDS, type MaterialKind } from './material-words';
import { USUAL_PACK_GRAMS } from './price';

/* What the list of materials can be asked: the query of the API and of the screen's address alike. */

export const MATERIAL_SORTS = ['name', 'price', 'equal', 'strength', 'natural', 'updated'] as const;
export type MaterialSort = (typeof MATERIAL_SORTS)[number];
export type SortOrder = 'asc' | 'desc';

/** The way that each order is wanted first: names from A, prices from the lowest, all else from the greatest. */
export const FIRST_ORDER: Record<MaterialSort, SortOrder> = {
  name: 'asc',
  price: 'asc',
  equal: 'asc',
  strength: 'desc',
  natural: 'desc',
  updated: 'desc',
};

export const PAGE_SIZE = 100;

export interface FacetFloor {
  slug: string;
  /** At least this intensity, 0 to 10, in some phase. */
  min: number;
}

/** "rosy:4,honeyed": a facet alone means any trace of it. */
const facetFloors = z
  .string()
  .max(400, 'Name at most some ten facets.')
  .transform((text, context): FacetFloor[] => {
    const floors = text.split(',').filter(Boolean).map(facetFloor);
    for (const floor of floors) if (typeof floor === 'string') context.addIssue({ code: 'custom', message: floor });
    return floors.filter((floor) => typeof floor !== 'string');
  });

function facetFloor(part: string): FacetFloor | string {
  const [slug = '', least = '0.01', ...more] = part.split(':');
  const min = Number(least);
  if (more.length > 0 || !/^[a-z0-9-]{1,40}$/.test(slug)) return `“${part}” is not a facet, as in rosy or rosy:4.`;
  if (!(min >= 0 && min <= 10)) return `The intensity of ${slug} must be between 0 and 10; it was ${least}.`;
  return { slug, min };
}

const kinds = z.string().transform((text, context): MaterialKind[] => {
  const wanted = text.split(',').filter(Boolean);
  const unknown = wanted.find((kind) => !(MATERIAL_KINDS as readonly string[]).includes(kind));
  if (unknown)
    context.addIssue({ code: 'custom', message: `Kind must be of ${MATERIAL_KINDS.join(', ')}; it was “${unknown}”.` });
  return wanted as MaterialKind[];
});

const moneyText = (name: string) =>
  z.string().refine((text) => DECIMAL_TEXT.test(text) && !text.startsWith('-'), {
    error: `${name} must be a number of at least 0, such as 120.50.`,
  });

export const materialListQuery = z.strictObject({
  q: z.string().trim().max(200, 'Search for at most 200 characters.').optional(),
  kind: kinds.optional(),
  facets: facetFloors.optional(),
  /** At least this natural share, 0..1. */
  natural: fractionField('Natural share').optional(),
  /** Of the cost per kg at `pack`, in the house's currency. */
  minPrice: moneyText('The lowest price').optional(),
  maxPrice: moneyText('The highest price').optional(),
  /** Of the cost at equal strength. */
  maxEqual: moneyText('The highest cost at equal strength').optional(),
  /** The grams that costs are quoted for. */
  pack: z
    .string()
    .refine((text) => DECIMAL_TEXT.test(text) && Number(text) > 0 && Number(text) <= 1_000_000, {
      error: 'The pack must be above 0 g and at most 1,000,000 g.',
    })
    .default(USUAL_PACK_GRAMS),
  sort: z.enum(MATERIAL_SORTS, { error: `Sort by one of ${MATERIAL_SORTS.join(', ')}.` }).default('name'),
  order: z.enum(['asc', 'desc'], { error: 'Order is asc or desc.' }).optional(),
  cursor: z.string().max(800).optional(),
  limit: z.coerce.number().int().min(1, 'At least 1 row.').max(200, 'At most 200 rows.').default(PAGE_SIZE),
});
export type MaterialListQuery = z.output<typeof materialListQuery>;
