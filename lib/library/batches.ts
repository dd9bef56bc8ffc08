import 'server-only';
import type { MySqlTable } from 'drizzle-orm/mysql-core';
import type { Transaction } from '@/db/transaction';

/** Rows of one statement: far below the packet limit, and few enough round trips for a whole library. */
const ROWS_AT_ONCE = 400;

/** Inserts all rows, some hundred in one statement; none is no statement. */
export async function insertRows<T extends MySqlTable>(tx: Transaction, table: T, rows: T['$inferInsert'][]) {
  for (let from = 0; from < rows.length; from += ROWS_AT_ONCE) {
    await tx.insert(table).values(rows.slice(from, from + ROWS_AT_ONCE));
  }
}
