import { z } from 'zod';

export const categoryView = z.strictObject({
  code: z.string(),
  name: z.string(),
  exposure: z.string(),
  source: z.string(),
});
export type CategoryView = z.output<typeof categoryView>;

export const limitView = z.strictObject({
  id: z.string(),
  name: z.string(),
  kind: z.enum(['restriction', 'prohibition', 'specification']),
  source: z.string(),
  /** How the figure got here: seen in a text, from memory (check it), invented or computed. */
  via: z.string(),
  note: z.string().nullable(),
  terms: z.array(z.strictObject({ constituentId: z.string(), factor: z.number() })),
  /** Category code to the largest mass fraction in the product, a decimal. A category that is missing has no figure. */
  maxima: z.record(z.string(), z.string()),
});
export type LimitView = z.output<typeof limitView>;

export const limitSetView = z.strictObject({
  id: z.string(),
  title: z.string(),
  edition: z.string(),
  datedOn: z.string().nullable(),
  scope: z.string(),
  source: z.string(),
  inForce: z.boolean(),
  limits: z.array(limitView),
});
export type LimitSetView = z.output<typeof limitSetView>;

export const limitTables = z.strictObject({
  categories: z.array(categoryView),
  constituents: z.array(z.strictObject({ id: z.string(), name: z.string() })),
  sets: z.array(limitSetView),
});
export type LimitTables = z.output<typeof limitTables>;

/** How far a figure can be trusted, in words for beside it. */
export function knownHow(via: string): string {
  if (via === 'document text seen') return 'read in the document itself';
  if (via === 'secondary text seen') return 'read in a text that reprints it';
  if (via === 'memory') return 'from memory: check it before relying on it';
  if (via === 'invented') return 'a rule of the house';
  return via;
}
