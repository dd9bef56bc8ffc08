import { z } from 'zod';

/** Any text: one that is no id of ours names no row, which is 404 as for every other unknown id. */
export const idParams = z.strictObject({ id: z.string() });

export const done = z.strictObject({ done: z.boolean() });
