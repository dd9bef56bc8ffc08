import { z } from 'zod';
import { facetView } from './facet';

/** What the map shows: materials as nodes, and links between those that are alike. No price, no supplier, no share. */

export const relatedBy = z.enum(['facets', 'constituents']);
export type RelatedBy = z.infer<typeof relatedBy>;

/** Links below this likeness say nothing to a nose. */
export const LEAST_ALIKE = 0.5;
/** A material is linked to at most so many of those it is most like. */
export const MOST_LINKS = 8;

export const relatedQuery = z.strictObject({
  by: relatedBy.default('facets'),
  min: z.coerce
    .number('Likeness is a number from 0 to 1.')
    .min(0, 'Likeness is a number from 0 to 1.')
    .max(1, 'Likeness is a number from 0 to 1.')
    .default(LEAST_ALIKE),
  top: z.coerce
    .number('Give a whole number of links from 1 to 20.')
    .int('Give a whole number of links from 1 to 20.')
    .min(1, 'Give a whole number of links from 1 to 20.')
    .max(20, 'Give a whole number of links from 1 to 20.')
    .default(MOST_LINKS),
  /** Slugs of facets, comma between: only materials that smell plainly of all of them. */
  facets: z
    .string()
    .regex(/^[a-z0-9-]+(,[a-z0-9-]+)*$/, 'Name facets by their slugs with a comma between them.')
    .max(400, 'Name at most some ten facets.')
    .optional(),
  /** A material: only it and what it is linked to. */
  focus: z.string().max(40, 'This is not the id of a material.').optional(),
});
export type RelatedQuery = z.output<typeof relatedQuery>;

/** A profile without its zeros: pairs of the facet's place in `facets` and its intensity, 0..10. */
export const sparseProfile = z.array(z.tuple([z.int().min(0), z.number().min(0).max(10)]));
export type SparseProfile = z.infer<typeof sparseProfile>;

export const relatedNode = z.strictObject({
  id: z.string(),
  name: z.string(),
  botanicalName: z.string().nullable(),
  kind: z.string(),
  /** Mass fraction of natural origin, 0..1. */
  natural: z.number().min(0).max(1),
  /** A smeller's own words. */
  smell: z.string(),
  profile: sparseProfile,
  /** Only the phases in which it differs; a whole profile each. */
  phases: z.strictObject({
    opening: sparseProfile.optional(),
    heart: sparseProfile.optional(),
    dry: sparseProfile.optional(),
  }),
});
export type RelatedNode = z.infer<typeof relatedNode>;

export const relatedLink = z.strictObject({
  a: z.string(),
  b: z.string(),
  /** 0..1, the cosine between the two. */
  similarity: z.number().min(0).max(1),
  /** Names of what they share most, strongest first. */
  shared: z.array(z.string()),
});
export type RelatedLink = z.infer<typeof relatedLink>;

export const relatedMap = z.strictObject({
  by: relatedBy,
  /** In the house's order; `profile` counts in it. */
  facets: z.array(facetView),
  nodes: z.array(relatedNode),
  links: z.array(relatedLink),
});
export type RelatedMap = z.infer<typeof relatedMap>;

/** The whole vector, zeros included, as the strip and the engine want it. */
export function denseProfile(sparse: SparseProfile, facets: number): number[] {
  const dense = new Array<number>(facets).fill(0);
  for (const [place, intensity] of sparse) dense[place] = intensity;
  return dense;
}
