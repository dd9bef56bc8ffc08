import { sql } from 'drizzle-orm';
import {
  char,
  check,
  date,
  decimal,
  foreignKey,
  index,
  mysqlTable,
  primaryKey,
  smallint,
  unique,
  varchar,
} from 'drizzle-orm/mysql-core';
import { amount, codeColumn, createdAt, idColumn, massFraction, money, revision } from '../columns';
import { materials } from './materials';
import { teams } from './people';

export const suppliers = mysqlTable(
  'suppliers',
  {
    teamId: idColumn()
      .notNull()
      .references(() => teams.id, { onDelete: 'cascade' }),
    id: idColumn().notNull(),
    name: varchar({ length: 120 }).notNull(),
    note: varchar({ length: 400 }),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.id] }), unique('suppliers_name').on(t.teamId, t.name)],
);

/** What a material may contain, and what limits are written on. CAS is a hint, not an identity. */
export const constituents = mysqlTable(
  'constituents',
  {
    teamId: idColumn()
      .notNull()
      .references(() => teams.id, { onDelete: 'cascade' }),
    id: idColumn().notNull(),
    slug: codeColumn({ length: 80 }).notNull(),
    name: varchar({ length: 160 }).notNull(),
    cas: codeColumn({ length: 14 }),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('constituents_slug').on(t.teamId, t.slug),
    index('constituents_cas').on(t.teamId, t.cas),
  ],
);

/** One supplier's grade of a material. The one with the lowest position is preferred. */
export const qualities = mysqlTable(
  'qualities',
  {
    teamId: idColumn()
      .notNull()
      .references(() => teams.id, { onDelete: 'cascade' }),
    id: idColumn().notNull(),
    materialId: idColumn().notNull(),
    supplierId: idColumn().notNull(),
    position: smallint().notNull().default(0),
    code: varchar({ length: 60 }).notNull(),
    grade: varchar({ length: 120 }).notNull(),
    origin: varchar({ length: 120 }),
    /** full: every regulated constituent is stated; declared: only what an SDS must name; unknown: nothing. */
    completeness: codeColumn({ length: 10 }).notNull(),
    compositionSource: varchar({ length: 400 }).notNull(),
    densityGPerMl: decimal({ precision: 6, scale: 4 }),
    form: codeColumn({ length: 16 }).notNull(),
    warmToC: decimal({ precision: 5, scale: 1 }),
    flashPointC: decimal({ precision: 5, scale: 1 }),
    colour: varchar({ length: 80 }),
    revision: revision(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('qualities_code').on(t.teamId, t.supplierId, t.code, t.grade),
    index('qualities_material').on(t.teamId, t.materialId, t.position),
    foreignKey({
      name: 'qualities_material_row',
      columns: [t.teamId, t.materialId],
      foreignColumns: [materials.teamId, materials.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'qualities_supplier_row',
      columns: [t.teamId, t.supplierId],
      foreignColumns: [suppliers.teamId, suppliers.id],
    }).onDelete('restrict'),
    check('qualities_completeness', sql`${t.completeness} in ('full','declared','unknown')`),
    check('qualities_form', sql`${t.form} in ('mobile liquid','viscous liquid','paste','crystals','solid')`),
    check('qualities_density', sql`${t.densityGPerMl} > 0`),
  ],
);

/** A range of mass fractions with the document that says so. Maxima of one quality may sum to more than 1. */
export const qualityConstituents = mysqlTable(
  'quality_constituents',
  {
    teamId: idColumn().notNull(),
    qualityId: idColumn().notNull(),
    constituentId: idColumn().notNull(),
    minFraction: massFraction().notNull(),
    typicalFraction: massFraction(),
    maxFraction: massFraction().notNull(),
    source: varchar({ length: 300 }).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.qualityId, t.constituentId] }),
    index('quality_constituents_of').on(t.teamId, t.constituentId),
    foreignKey({
      name: 'quality_constituents_quality',
      columns: [t.teamId, t.qualityId],
      foreignColumns: [qualities.teamId, qualities.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'quality_constituents_word',
      columns: [t.teamId, t.constituentId],
      foreignColumns: [constituents.teamId, constituents.id],
    }).onDelete('restrict'),
    check(
      'quality_constituents_range',
      sql`0 <= ${t.minFraction} and ${t.minFraction} <= ${t.maxFraction} and ${t.maxFraction} <= 1`,
    ),
    check('quality_constituents_typical', sql`${t.typicalFraction} between ${t.minFraction} and ${t.maxFraction}`),
  ],
);

/** A pack that a supplier offers at a price on a day. */
export const offers = mysqlTable(
  'offers',
  {
    teamId: idColumn().notNull(),
    id: idColumn().notNull(),
    qualityId: idColumn().notNull(),
    packAmount: amount().notNull(),
    packUnit: codeColumn({ length: 4 }).notNull(),
    price: money().notNull(),
    currency: char({ length: 3 }).notNull(),
    offeredOn: date({ mode: 'string' }).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    index('offers_quality').on(t.teamId, t.qualityId),
    foreignKey({
      name: 'offers_quality_row',
      columns: [t.teamId, t.qualityId],
      foreignColumns: [qualities.teamId, qualities.id],
    }).onDelete('cascade'),
    check('offers_pack', sql`${t.packAmount} > 0 and ${t.packUnit} in ('g','mL')`),
    check('offers_price', sql`${t.price} > 0`),
  ],
);
