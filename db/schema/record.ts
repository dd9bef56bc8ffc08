import { foreignKey, index, mysqlTable, primaryKey, smallint } from 'drizzle-orm/mysql-core';
import { codeColumn, createdAt, exactText, idColumn, jsonColumn, sha256Column } from '../columns';
import { memberships, teams } from './people';

/** Who did what: written in the transaction of the write itself, never changed. */
export const activity = mysqlTable(
  'activity',
  {
    teamId: idColumn()
      .notNull()
      .references(() => teams.id, { onDelete: 'cascade' }),
    id: idColumn().notNull(),
    userId: idColumn().notNull(),
    action: codeColumn({ length: 40 }).notNull(),
    subjectId: idColumn(),
    detail: jsonColumn().notNull(),
    at: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.id] }), index('activity_subject').on(t.teamId, t.subjectId)],
);

/** The answer to a repeated POST, kept for a day under the person's own key. */
export const idempotencyKeys = mysqlTable(
  'idempotency_keys',
  {
    teamId: idColumn().notNull(),
    userId: idColumn().notNull(),
    operation: codeColumn({ length: 60 }).notNull(),
    key: exactText({ length: 128 }).notNull(),
    bodyHash: sha256Column().notNull(),
    /** Null while the first request is still at work. */
    status: smallint(),
    answer: jsonColumn(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.userId, t.operation, t.key] }),
    index('idempotency_keys_age').on(t.createdAt),
    foreignKey({
      name: 'idempotency_keys_member',
      columns: [t.teamId, t.userId],
      foreignColumns: [memberships.teamId, memberships.userId],
    }).onDelete('cascade'),
  ],
);
