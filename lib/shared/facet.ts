import { z } from 'zod';

/** A facet of smell, with the one colour that belongs to it. Hue in degrees (OKLCH), lightness 0..1. */
export const facetView = z.strictObject({
  id: z.string(),
  slug: z.string(),
  name: z.string(),
  family: z.string(),
  description: z.string(),
  hueDeg: z.number(),
  lightness: z.number(),
});
export type FacetView = z.infer<typeof facetView>;

export const facetList = z.strictObject({ items: z.array(facetView) });

/** What a drawing needs of a facet; a `FacetView` is one. */
export type FacetTone = Pick<FacetView, 'id' | 'name' | 'family' | 'hueDeg' | 'lightness'>;
