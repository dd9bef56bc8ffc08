import 'server-only';
import { z } from 'zod';
import { Invalid } from '@/lib/errors';
import type { MaterialSort, SortOrder } from '@/lib/shared/material-list';

const content = z.tuple([z.string(), z.string(), z.string().nullable(), z.string().regex(/^[0-9A-Z]{26}$/)]);

/** The key of a page's last row, with the order it belongs to. It holds nothing that the page did not show. */
export function cursorOf(sort: MaterialSort, order: SortOrder, last: { key: string | null; id: string }): string {
  return Buffer.from(JSON.stringify([sort, order, last.key, last.id])).toString('base64url');
}

/** @throws Invalid when it is no cursor of ours, or one of another order. */
export function readCursor(cursor: string, sort: MaterialSort, order: SortOrder): { key: string | null; id: string } {
  const fault = new Invalid({ cursor: 'This place in the list is not known. Begin again without a cursor.' });
  let parsed: z.infer<typeof content>;
  try {
    parsed = content.parse(JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8')));
  } catch {
    throw fault;
  }
  const [ofSort, ofOrder, key, id] = parsed;
  if (ofSort !== sort || ofOrder !== order) throw fault;
  return { key, id };
}
