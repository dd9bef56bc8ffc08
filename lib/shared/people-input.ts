import { z } from 'zod';
import { CURRENCIES } from './currencies';

/** What a person types at the door. Passwords are taken exactly as typed; addresses without the spaces around them. */
const email = z
  .string()
  .trim()
  .max(254, 'The address is longer than 254 characters.')
  .pipe(z.email('This is not an e-mail address: it needs a name, an @ and a domain.'));

export const signInInput = z.strictObject({
  email,
  password: z.string().min(1, 'Type your password.').max(1024, 'The password is longer than any we take.'),
});

export const signUpInput = z.strictObject({
  houseName: z
    .string()
    .trim()
    .min(2, 'Give the house a name of at least two characters.')
    .max(120, 'At most 120 characters.'),
  name: z.string().trim().min(1, 'Tell the house your name.').max(120, 'At most 120 characters.'),
  email,
  password: z.string(),
  currency: z.enum(CURRENCIES, 'Choose the currency that the house calculates in.'),
  /** sample: begin with the sample library, whose prices and ratings are invented; facets: only the words and limits. */
  begin: z.enum(['sample', 'facets'], 'Choose what the house begins with.'),
});

export type SignUpInput = z.infer<typeof signUpInput>;
