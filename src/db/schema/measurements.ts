import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  doublePrecision,
  foreignKey,
  index,
  integer,
  pgTable,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import {
  basisColumn,
  isFinitePositive,
  isNullOrFiniteNotNegative,
  isNullOrFinitePositive,
  isOneOf,
  provenanceChecks,
  verificationColumn,
} from './columns.ts';
import { material } from './materials.ts';
import { source } from './sources.ts';

/** Published measurements. A group's own go into tables of their own, under a policy. */

export const sampleForms = [
  'single crystal',
  'polycrystal',
  'ceramic',
  'film',
  'wire',
  'layer',
  'glass',
  'evaluated',
  'unknown',
] as const;
/** Forms whose conductivity is the material's own, not that of a thin piece of it. */
export const bulkSampleForms: readonly (typeof sampleForms)[number][] = [
  'single crystal',
  'polycrystal',
  'ceramic',
  'glass',
  'evaluated',
  'unknown',
];
export const sampleIsotopes = ['natural', 'enriched', 'mixture', 'unknown'] as const;
export const measuredQuantities = ['total', 'lattice', 'not-stated'] as const;

export const sample = pgTable(
  'sample',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    materialId: uuid('material_id')
      .notNull()
      .references(() => material.id, { onDelete: 'cascade' }),
    slug: text('slug').notNull(),
    form: text('form', { enum: sampleForms }).notNull(),
    isotopes: text('isotopes', { enum: sampleIsotopes }).notNull(),
    /** Film thickness or wire diameter, only where stated. */
    sizeM: doublePrecision('size_m'),
    description: text('description').notNull(),
  },
  (table) => [
    unique('sample_slug_of_material').on(table.materialId, table.slug),
    // For measurements to refer to, so that none claims a sample of another material.
    unique('sample_of_material').on(table.id, table.materialId),
    check('sample_form', isOneOf(table.form, sampleForms)),
    check('sample_isotopes', isOneOf(table.isotopes, sampleIsotopes)),
    check('sample_size', isNullOrFinitePositive(table.sizeM)),
  ],
);

/** A series of points on one sample. */
export const measurement = pgTable(
  'measurement',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    materialId: uuid('material_id')
      .notNull()
      .references(() => material.id, { onDelete: 'cascade' }),
    sampleId: uuid('sample_id').notNull(),
    series: text('series').notNull(),
    quantity: text('quantity', { enum: measuredQuantities }).notNull(),
    direction: text('direction'),
    method: text('method'),
    sourceKey: text('source_key')
      .notNull()
      .references(() => source.key),
    isPreferred: boolean('is_preferred').notNull().default(false),
    note: text('note'),
    /** Order in the files, which is the order people read. */
    position: integer('position').notNull(),
  },
  (table) => [
    unique('measurement_series_of_material').on(table.materialId, table.series),
    foreignKey({
      name: 'measurement_sample_of_material',
      columns: [table.sampleId, table.materialId],
      foreignColumns: [sample.id, sample.materialId],
    }).onDelete('cascade'),
    check('measurement_quantity', isOneOf(table.quantity, measuredQuantities)),
    uniqueIndex('measurement_one_preferred')
      .on(table.materialId)
      .where(sql`${table.isPreferred}`),
  ],
);

export const measurementPoint = pgTable(
  'measurement_point',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    measurementId: uuid('measurement_id')
      .notNull()
      .references(() => measurement.id, { onDelete: 'cascade' }),
    temperatureK: doublePrecision('temperature_k').notNull(),
    kappaWPerMK: doublePrecision('kappa_w_per_m_k').notNull(),
    /** As the source states it, in W/(m K); null where it states none. */
    uncertaintyWPerMK: doublePrecision('uncertainty_w_per_m_k'),
    basis: basisColumn(),
    verification: verificationColumn(),
    note: text('note'),
  },
  (table) => [
    check('measurement_point_temperature', isFinitePositive(table.temperatureK)),
    check('measurement_point_kappa', isFinitePositive(table.kappaWPerMK)),
    check('measurement_point_uncertainty', isNullOrFiniteNotNegative(table.uncertaintyWPerMK)),
    ...provenanceChecks('measurement_point', table),
    unique('measurement_point_temperature_of_series').on(table.measurementId, table.temperatureK),
    index('measurement_point_measurement').on(table.measurementId),
  ],
);
