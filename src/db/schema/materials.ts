import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  doublePrecision,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import {
  basisColumn,
  isFinite,
  isFinitePositive,
  isNullOrFiniteNotNegative,
  isNullOrFinitePositive,
  isOneOf,
  provenanceChecks,
  verificationColumn,
  verificationValues,
} from './columns.ts';
import { propertyNames, propertyUnits } from './properties.ts';
import { source } from './sources.ts';

/**
 * The published store. These tables hold no private rows: a group's own material and measurements get tables of their
 * own with a policy, so that search here keeps its index.
 */

/** Atoms per formula unit, in the order of the formula. */
export interface CompositionPart {
  readonly element: string;
  readonly count: number;
}

export const hazardFlags = [
  'beryllium',
  'cadmium',
  'thallium',
  'lead',
  'arsenic',
  'antimony',
  'tellurium',
  'selenium',
  'uranium',
  'thorium',
  'mercury',
  'lithium-hydride',
  'alkali-metal',
  'fluoride',
  'asphyxiant',
  'cryogenic',
  'fine-dust',
] as const;

export const material = pgTable(
  'material',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    slug: text('slug').notNull().unique(),
    name: text('name').notNull(),
    formula: text('formula').notNull(),
    aliases: text('aliases')
      .array()
      .notNull()
      .default(sql`'{}'`),
    composition: jsonb('composition').$type<readonly CompositionPart[]>().notNull(),
    structure: text('structure').notNull(),
    spaceGroup: text('space_group'),
    spaceGroupNumber: integer('space_group_number'),
    class: text('class').notNull(),
    /** Atoms in the primitive cell; null for a glass. */
    atomsPerCell: integer('atoms_per_cell'),
    hazards: text('hazards')
      .array()
      .notNull()
      .default(sql`'{}'`),
    note: text('note'),
    revision: integer('revision').notNull().default(1),
    /** Name, formula, slug and aliases in lower case: what a misspelling is compared with. Kept by the loader. */
    searchText: text('search_text').notNull(),
  },
  (table) => [
    check('material_slug_form', sql`${table.slug} ~ '^[a-z0-9]+(-[a-z0-9]+)*$'`),
    check(
      'material_space_group_number',
      sql`${table.spaceGroupNumber} is null or ${table.spaceGroupNumber} between 1 and 230`,
    ),
    check(
      'material_atoms_per_cell',
      sql`${table.atomsPerCell} is null or ${table.atomsPerCell} between 1 and 1000`,
    ),
    check(
      'material_composition',
      sql`jsonb_typeof(${table.composition}) = 'array' and jsonb_array_length(${table.composition}) > 0`,
    ),
    check(
      'material_hazards',
      sql`${table.hazards} <@ ${sql.raw(`array[${hazardFlags.map((flag) => `'${flag}'`).join(', ')}]`)}`,
    ),
    check('material_revision', sql`${table.revision} >= 1`),
    index('material_search_text_trigram').using('gin', table.searchText.op('gin_trgm_ops')),
    index('material_class').on(table.class),
  ],
);

const materialId = () =>
  uuid('material_id')
    .notNull()
    .references(() => material.id, { onDelete: 'cascade' });
const sourceKey = () =>
  text('source_key')
    .notNull()
    .references(() => source.key);

/** One value of one quantity, in the SI unit that belongs to the quantity. */
export const propertyValue = pgTable(
  'property_value',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    materialId: materialId(),
    property: text('property', { enum: propertyNames }).notNull(),
    kind: text('kind').notNull(),
    /** Names the published row that a velocity pair and its cut-offs belong to; pairs of two rows are never mixed. */
    valueSet: text('value_set'),
    value: doublePrecision('value').notNull(),
    unit: text('unit').notNull(),
    /** Standard uncertainty (k = 1) in the value's unit; null where the source states none. */
    uncertainty: doublePrecision('uncertainty'),
    temperatureK: doublePrecision('temperature_k'),
    direction: text('direction'),
    sourceKey: sourceKey(),
    basis: basisColumn(),
    verification: verificationColumn(),
    isPreferred: boolean('is_preferred').notNull().default(false),
    note: text('note'),
  },
  (table) => [
    check('property_value_property', isOneOf(table.property, propertyNames)),
    check(
      'property_value_unit',
      sql.join(
        [
          sql`${table.unit} = case ${table.property}`,
          ...propertyNames.map((name) => sql.raw(` when '${name}' then '${propertyUnits[name].si}'`)),
          sql` end`,
        ],
        sql``,
      ),
    ),
    // A Grüneisen parameter may be negative: transverse branches at the zone edge of open structures.
    check(
      'property_value_range',
      sql`case when ${table.property} like 'gruneisen%' then abs(${table.value}) <= 20 else ${isFinitePositive(table.value)} end`,
    ),
    check('property_value_uncertainty', isNullOrFiniteNotNegative(table.uncertainty)),
    // What a material is asked for by default: never a velocity within a plane, never a thermal Grüneisen parameter.
    check(
      'property_value_preferred_kind',
      sql`not ${table.isPreferred} or (${table.kind} <> 'in-plane' and (${table.property} <> 'gruneisen' or ${table.kind} = 'acoustic'))`,
    ),
    check('property_value_branch_set', sql`${table.kind} <> 'branch' or ${table.valueSet} is not null`),
    check('property_value_temperature', isNullOrFinitePositive(table.temperatureK)),
    ...provenanceChecks('property_value', table),
    index('property_value_material').on(table.materialId, table.property),
    uniqueIndex('property_value_one_preferred')
      .on(
        table.materialId,
        table.property,
        sql`(case when ${table.kind} = 'branch' then 'branch' else 'other' end)`,
      )
      .where(sql`${table.isPreferred}`),
  ],
);

/** Elastic constants of one published set, in Pa; those that the crystal system does not have, or the source does not give, are null. */
export const elasticConstantSet = pgTable(
  'elastic_constant_set',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    materialId: materialId(),
    c11Pa: doublePrecision('c11_pa').notNull(),
    c12Pa: doublePrecision('c12_pa').notNull(),
    c44Pa: doublePrecision('c44_pa'),
    c13Pa: doublePrecision('c13_pa'),
    c33Pa: doublePrecision('c33_pa'),
    c66Pa: doublePrecision('c66_pa'),
    c14Pa: doublePrecision('c14_pa'),
    temperatureK: doublePrecision('temperature_k'),
    sourceKey: sourceKey(),
    basis: basisColumn(),
    verification: verificationColumn(),
    note: text('note'),
  },
  (table) => [
    // Born's conditions for cubic crystals, part of those for the others: a crystal that breaks them falls apart.
    check(
      'elastic_constant_set_stable',
      sql`${isFinitePositive(table.c11Pa)} and ${isFinite(table.c12Pa)} and ${table.c11Pa} > abs(${table.c12Pa})`,
    ),
    check('elastic_constant_set_c44', isNullOrFinitePositive(table.c44Pa)),
    check('elastic_constant_set_c33', isNullOrFinitePositive(table.c33Pa)),
    check('elastic_constant_set_c66', isNullOrFinitePositive(table.c66Pa)),
    check('elastic_constant_set_c13', sql`${table.c13Pa} is null or (${isFinite(table.c13Pa)})`),
    check('elastic_constant_set_c14', sql`${table.c14Pa} is null or (${isFinite(table.c14Pa)})`),
    check('elastic_constant_set_temperature', isNullOrFinitePositive(table.temperatureK)),
    ...provenanceChecks('elastic_constant_set', table),
    index('elastic_constant_set_material').on(table.materialId),
  ],
);

export const phononBranches = ['LA', 'TA', 'LO', 'TO'] as const;

/** Phonon frequency ν (not ω) of one branch at a point of the zone boundary. */
export const zoneBoundaryFrequency = pgTable(
  'zone_boundary_frequency',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    materialId: materialId(),
    point: text('point').notNull(),
    branch: text('branch', { enum: phononBranches }).notNull(),
    frequencyHz: doublePrecision('frequency_hz').notNull(),
    temperatureK: doublePrecision('temperature_k'),
    sourceKey: sourceKey(),
    basis: basisColumn(),
    verification: verificationColumn(),
    note: text('note'),
  },
  (table) => [
    check('zone_boundary_frequency_branch', isOneOf(table.branch, phononBranches)),
    check('zone_boundary_frequency_range', isFinitePositive(table.frequencyHz)),
    check('zone_boundary_frequency_temperature', isNullOrFinitePositive(table.temperatureK)),
    ...provenanceChecks('zone_boundary_frequency', table),
    index('zone_boundary_frequency_material').on(table.materialId),
  ],
);

/** Linear expansion; negative values are real (open structures at low temperature). */
export const thermalExpansion = pgTable(
  'thermal_expansion',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    materialId: materialId(),
    alphaLinearPerK: doublePrecision('alpha_linear_per_k').notNull(),
    direction: text('direction'),
    temperatureK: doublePrecision('temperature_k'),
    sourceKey: sourceKey(),
    basis: basisColumn(),
    verification: verificationColumn(),
    note: text('note'),
  },
  (table) => [
    check('thermal_expansion_range', sql`abs(${table.alphaLinearPerK}) < 0.01`),
    check('thermal_expansion_temperature', isNullOrFinitePositive(table.temperatureK)),
    ...provenanceChecks('thermal_expansion', table),
    index('thermal_expansion_material').on(table.materialId),
  ],
);

export const transitionKinds = ['melting', 'decomposition', 'transition'] as const;

export const transition = pgTable(
  'transition',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    materialId: materialId(),
    kind: text('kind', { enum: transitionKinds }).notNull(),
    temperatureK: doublePrecision('temperature_k').notNull(),
    sourceKey: sourceKey(),
    basis: basisColumn(),
    verification: verificationColumn(),
    note: text('note'),
  },
  (table) => [
    check('transition_kind', isOneOf(table.kind, transitionKinds)),
    check('transition_temperature', isFinitePositive(table.temperatureK)),
    ...provenanceChecks('transition', table),
    index('transition_material').on(table.materialId),
  ],
);

/** What a reader must know of a crystal that no number says. */
export const caveat = pgTable(
  'caveat',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    materialId: materialId(),
    text: text('text').notNull(),
    sourceKey: sourceKey(),
    verification: verificationColumn(),
  },
  (table) => [
    check(
      'caveat_verification',
      sql`${table.verification} is null or ${isOneOf(table.verification, verificationValues)}`,
    ),
    index('caveat_material').on(table.materialId),
  ],
);

/** Each publication's model has its own prefactors, hence the powers of the rates' units. */
export const scatteringUnits = [
  '1',
  'm',
  'm/s',
  'K',
  's',
  's^3',
  's K^-1',
  's K^-3',
  'K^-4',
  'W/(m K)',
] as const;

/** Rates fitted in the literature, and what follows from them. Never an input of an estimate. */
export const scatteringParameter = pgTable(
  'scattering_parameter',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    materialId: materialId(),
    sample: text('sample'),
    quantity: text('quantity').notNull(),
    value: doublePrecision('value').notNull(),
    unit: text('unit', { enum: scatteringUnits }).notNull(),
    sourceKey: sourceKey(),
    basis: basisColumn(),
    verification: verificationColumn(),
    note: text('note'),
  },
  (table) => [
    check('scattering_parameter_unit', isOneOf(table.unit, scatteringUnits)),
    check('scattering_parameter_range', isFinite(table.value)),
    ...provenanceChecks('scattering_parameter', table),
    index('scattering_parameter_material').on(table.materialId),
  ],
);
