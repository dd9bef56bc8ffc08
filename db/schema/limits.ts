import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  date,
  decimal,
  foreignKey,
  mysqlTable,
  primaryKey,
  smallint,
  text,
  unique,
  varchar,
} from 'drizzle-orm/mysql-core';
import { codeColumn, idColumn, massFraction } from '../columns';
import { teams } from './people';
import { constituents } from './qualities';

/** What the scent goes into, as the limit tables divide it. */
export const productCategories = mysqlTable(
  'product_categories',
  {
    teamId: idColumn()
      .notNull()
      .references(() => teams.id, { onDelete: 'cascade' }),
    code: codeColumn({ length: 8 }).notNull(),
    name: varchar({ length: 200 }).notNull(),
    /** leave-on, rinse-off, oral, household, no skin contact: our reading, for rules that speak of exposure. */
    exposure: codeColumn({ length: 20 }).notNull(),
    position: smallint().notNull(),
    source: varchar({ length: 300 }).notNull(),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.code] })],
);

/** A table of limits with its edition, date and scope. Several may be in force; the strictest decides. */
export const limitSets = mysqlTable(
  'limit_sets',
  {
    teamId: idColumn()
      .notNull()
      .references(() => teams.id, { onDelete: 'cascade' }),
    id: idColumn().notNull(),
    slug: codeColumn({ length: 60 }).notNull(),
    title: varchar({ length: 200 }).notNull(),
    edition: varchar({ length: 120 }).notNull(),
    datedOn: date({ mode: 'string' }),
    scope: varchar({ length: 400 }).notNull(),
    source: varchar({ length: 400 }).notNull(),
    inForce: boolean().notNull().default(true),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.id] }), unique('limit_sets_slug').on(t.teamId, t.slug)],
);

export const limits = mysqlTable(
  'limits',
  {
    teamId: idColumn().notNull(),
    id: idColumn().notNull(),
    setId: idColumn().notNull(),
    slug: codeColumn({ length: 100 }).notNull(),
    name: varchar({ length: 200 }).notNull(),
    kind: codeColumn({ length: 16 }).notNull(),
    source: varchar({ length: 400 }).notNull(),
    /** How the figure got here: read in the document, read in a text that reprints it, or from memory (check it). */
    via: codeColumn({ length: 24 }).notNull(),
    note: text(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('limits_slug').on(t.teamId, t.setId, t.slug),
    foreignKey({
      name: 'limits_set',
      columns: [t.teamId, t.setId],
      foreignColumns: [limitSets.teamId, limitSets.id],
    }).onDelete('cascade'),
    check('limits_kind', sql`${t.kind} in ('restriction','prohibition','specification')`),
    check('limits_via', sql`${t.via} in ('document text seen','secondary text seen','memory','invented','computed')`),
  ],
);

/** A limit bounds the sum of factor x mass fraction over its constituents. */
export const limitTerms = mysqlTable(
  'limit_terms',
  {
    teamId: idColumn().notNull(),
    limitId: idColumn().notNull(),
    constituentId: idColumn().notNull(),
    factor: decimal({ precision: 12, scale: 6 }).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.limitId, t.constituentId] }),
    foreignKey({
      name: 'limit_terms_limit',
      columns: [t.teamId, t.limitId],
      foreignColumns: [limits.teamId, limits.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'limit_terms_constituent',
      columns: [t.teamId, t.constituentId],
      foreignColumns: [constituents.teamId, constituents.id],
    }).onDelete('restrict'),
    check('limit_terms_factor', sql`${t.factor} >= 0`),
  ],
);

/** The largest mass fraction in the finished product, by product category. 0 is a prohibition. */
export const limitMaxima = mysqlTable(
  'limit_maxima',
  {
    teamId: idColumn().notNull(),
    limitId: idColumn().notNull(),
    category: codeColumn({ length: 8 }).notNull(),
    maxFraction: massFraction().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.limitId, t.category] }),
    foreignKey({
      name: 'limit_maxima_limit',
      columns: [t.teamId, t.limitId],
      foreignColumns: [limits.teamId, limits.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'limit_maxima_category',
      columns: [t.teamId, t.category],
      foreignColumns: [productCategories.teamId, productCategories.code],
    }).onDelete('restrict'),
    check('limit_maxima_range', sql`${t.maxFraction} between 0 and 1`),
  ],
);
