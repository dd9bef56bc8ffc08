import { double, foreignKey, index, mysqlTable, primaryKey, smallint, varchar } from 'drizzle-orm/mysql-core';
import { blendShare, codeColumn, createdAt, idColumn, jsonColumn } from '../columns';
import { teams, users } from './people';

/**
 * A solved blend, frozen: what was asked, the problem as the engine got it, the answer with its certificate, and the
 * names, prices and limits of that day. Never updated; the numbers beside the JSON serve lists only.
 */
export const blends = mysqlTable(
  'blends',
  {
    teamId: idColumn()
      .notNull()
      .references(() => teams.id, { onDelete: 'cascade' }),
    id: idColumn().notNull(),
    name: varchar({ length: 160 }).notNull(),
    note: varchar({ length: 2000 }),
    targetName: varchar({ length: 160 }).notNull(),
    status: codeColumn({ length: 12 }).notNull(),
    distance: double().notNull(),
    costPerKg: double().notNull(),
    /** What the person asked for. */
    request: jsonColumn().notNull(),
    /** The engine's problem, as built from rows. */
    problem: jsonColumn().notNull(),
    solution: jsonColumn().notNull(),
    certificate: jsonColumn().notNull(),
    /** Names, offers and limits as they stood. */
    context: jsonColumn().notNull(),
    createdBy: idColumn()
      .notNull()
      .references(() => users.id, { onDelete: 'restrict' }),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.id] }), index('blends_newest').on(t.teamId, t.createdAt)],
);

/** The lines stay even when a material is deleted: the name is frozen beside the id. */
export const blendLines = mysqlTable(
  'blend_lines',
  {
    teamId: idColumn().notNull(),
    blendId: idColumn().notNull(),
    position: smallint().notNull(),
    materialId: idColumn().notNull(),
    materialName: varchar({ length: 160 }).notNull(),
    share: blendShare().notNull(),
    impact: blendShare().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.blendId, t.position] }),
    index('blend_lines_material').on(t.teamId, t.materialId),
    foreignKey({
      name: 'blend_lines_blend',
      columns: [t.teamId, t.blendId],
      foreignColumns: [blends.teamId, blends.id],
    }).onDelete('cascade'),
  ],
);
