import { z } from 'zod';
import { casFault } from './cas';
import { strictFields, textField } from './input-fields';

export const constituentInput = strictFields({
  name: textField('Name', { min: 2, max: 160 }),
  cas: z
    .string({ error: 'A CAS number must be text.' })
    .trim()
    .superRefine((text, context) => {
      const fault = casFault(text);
      if (fault) context.addIssue({ code: 'custom', message: fault });
    })
    .nullable()
    .default(null),
});
export type ConstituentInput = z.output<typeof constituentInput>;

export const constituentView = z.strictObject({
  id: z.string(),
  slug: z.string(),
  name: z.string(),
  cas: z.string().nullable(),
});
export const constituentViews = z.strictObject({ items: z.array(constituentView) });
export type ConstituentView = z.infer<typeof constituentView>;
