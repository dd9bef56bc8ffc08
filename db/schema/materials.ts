import { sql } from 'drizzle-orm';
import {
  check,
  decimal,
  double,
  foreignKey,
  index,
  mysqlTable,
  primaryKey,
  smallint,
  text,
  unique,
  varchar,
} from 'drizzle-orm/mysql-core';
import { codeColumn, createdAt, idColumn, instant, massFraction, revision } from '../columns';
import { teams } from './people';

/** The house's words for what a material smells of. Hue and lightness are computed once and frozen. */
export const facets = mysqlTable(
  'facets',
  {
    teamId: idColumn()
      .notNull()
      .references(() => teams.id, { onDelete: 'cascade' }),
    id: idColumn().notNull(),
    slug: codeColumn({ length: 40 }).notNull(),
    name: varchar({ length: 60 }).notNull(),
    family: varchar({ length: 60 }).notNull(),
    description: varchar({ length: 400 }).notNull(),
    position: smallint().notNull(),
    hueDeg: decimal({ precision: 6, scale: 3 }).notNull(),
    lightness: decimal({ precision: 4, scale: 3 }).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('facets_slug').on(t.teamId, t.slug),
    check('facets_hue', sql`${t.hueDeg} >= 0 and ${t.hueDeg} < 360`),
    check('facets_lightness', sql`${t.lightness} between 0 and 1`),
  ],
);

export const materials = mysqlTable(
  'materials',
  {
    teamId: idColumn()
      .notNull()
      .references(() => teams.id, { onDelete: 'cascade' }),
    id: idColumn().notNull(),
    name: varchar({ length: 160 }).notNull(),
    kind: codeColumn({ length: 24 }).notNull(),
    botanicalName: varchar({ length: 160 }),
    plantPart: varchar({ length: 80 }),
    chemicalName: varchar({ length: 200 }),
    inciName: varchar({ length: 200 }),
    /** What it smells like, in a smeller's own words. */
    smell: text().notNull(),
    naturalShare: massFraction().notNull(),
    /** Odour impact per gram, relative; 0 for a solvent. An estimate: shown with two digits at most. */
    strength: double().notNull(),
    /** The strength is known within this factor, up or down. */
    strengthSpread: double().notNull(),
    strengthClass: codeColumn({ length: 16 }).notNull(),
    strengthSource: varchar({ length: 400 }).notNull(),
    vapourPressurePa: double(),
    vapourPressureSource: varchar({ length: 400 }),
    odourThresholdUgPerM3: double(),
    odourThresholdSource: varchar({ length: 400 }),
    /** First-order rate, 1/h; null where nothing is known. */
    evaporationPerHour: double(),
    evaporationSource: varchar({ length: 400 }),
    usualDilution: massFraction(),
    dilutionSolvent: varchar({ length: 80 }),
    /** The largest advisable mass share in a concentrate. */
    maxShare: massFraction(),
    note: text(),
    revision: revision(),
    createdAt: createdAt(),
    updatedAt: instant().notNull().default(sql`(utc_timestamp(3))`),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('materials_name').on(t.teamId, t.name),
    index('materials_kind').on(t.teamId, t.kind),
    check(
      'materials_kind_known',
      sql`${t.kind} in ('oil','absolute','resinoid','extract','synthetic','isolate','ready base','solvent')`,
    ),
    check('materials_natural', sql`${t.naturalShare} between 0 and 1`),
    check('materials_strength', sql`${t.strength} >= 0 and ${t.strengthSpread} >= 1`),
    check(
      'materials_strength_class',
      sql`${t.strengthClass} in ('odourless','faint','weak','medium','strong','very strong','mighty')`,
    ),
    check('materials_measured', sql`${t.vapourPressurePa} > 0 and ${t.odourThresholdUgPerM3} > 0`),
    check('materials_evaporation', sql`${t.evaporationPerHour} >= 0`),
    check('materials_dilution', sql`${t.usualDilution} between 0 and 1`),
    check('materials_max_share', sql`${t.maxShare} between 0 and 1`),
  ],
);

export const materialCas = mysqlTable(
  'material_cas',
  {
    teamId: idColumn().notNull(),
    materialId: idColumn().notNull(),
    cas: codeColumn({ length: 14 }).notNull(),
    position: smallint().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.materialId, t.cas] }),
    index('material_cas_number').on(t.teamId, t.cas),
    foreignKey({
      name: 'material_cas_material',
      columns: [t.teamId, t.materialId],
      foreignColumns: [materials.teamId, materials.id],
    }).onDelete('cascade'),
  ],
);

export const materialSynonyms = mysqlTable(
  'material_synonyms',
  {
    teamId: idColumn().notNull(),
    materialId: idColumn().notNull(),
    position: smallint().notNull(),
    name: varchar({ length: 160 }).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.materialId, t.position] }),
    foreignKey({
      name: 'material_synonyms_material',
      columns: [t.teamId, t.materialId],
      foreignColumns: [materials.teamId, materials.id],
    }).onDelete('cascade'),
  ],
);

/** One intensity of one facet: `all` phases, or one phase where the material differs as it dries down. */
export const materialFacets = mysqlTable(
  'material_facets',
  {
    teamId: idColumn().notNull(),
    materialId: idColumn().notNull(),
    facetId: idColumn().notNull(),
    phase: codeColumn({ length: 8 }).notNull(),
    intensity: decimal({ precision: 4, scale: 2 }).notNull(),
    sd: decimal({ precision: 4, scale: 2 }).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.materialId, t.facetId, t.phase] }),
    index('material_facets_facet').on(t.teamId, t.facetId),
    foreignKey({
      name: 'material_facets_material',
      columns: [t.teamId, t.materialId],
      foreignColumns: [materials.teamId, materials.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'material_facets_facet_word',
      columns: [t.teamId, t.facetId],
      foreignColumns: [facets.teamId, facets.id],
    }).onDelete('restrict'),
    check('material_facets_phase', sql`${t.phase} in ('all','opening','heart','dry')`),
    check('material_facets_intensity', sql`${t.intensity} between 0 and 10 and ${t.sd} between 0 and 10`),
  ],
);

/** What can hurt someone at the bench, and where that is known from. */
export const materialCautions = mysqlTable(
  'material_cautions',
  {
    teamId: idColumn().notNull(),
    materialId: idColumn().notNull(),
    code: codeColumn({ length: 24 }).notNull(),
    source: varchar({ length: 300 }).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.materialId, t.code] }),
    foreignKey({
      name: 'material_cautions_material',
      columns: [t.teamId, t.materialId],
      foreignColumns: [materials.teamId, materials.id],
    }).onDelete('cascade'),
  ],
);

/** What a ready base is made of, where the house knows it: mass shares of other materials. */
export const materialParts = mysqlTable(
  'material_parts',
  {
    teamId: idColumn().notNull(),
    materialId: idColumn().notNull(),
    partId: idColumn().notNull(),
    share: massFraction().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.materialId, t.partId] }),
    foreignKey({
      name: 'material_parts_material',
      columns: [t.teamId, t.materialId],
      foreignColumns: [materials.teamId, materials.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'material_parts_part',
      columns: [t.teamId, t.partId],
      foreignColumns: [materials.teamId, materials.id],
    }).onDelete('restrict'),
    check('material_parts_share', sql`${t.share} > 0 and ${t.share} <= 1`),
  ],
);
