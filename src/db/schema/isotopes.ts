import { sql } from 'drizzle-orm';
import { check, doublePrecision, integer, pgTable, primaryKey, text } from 'drizzle-orm/pg-core';
import { basisColumn, isFinitePositive, provenanceChecks, verificationColumn } from './columns.ts';
import { source } from './sources.ts';

/** Isotopes of the elements with their natural abundances. */
export const isotope = pgTable(
  'isotope',
  {
    symbol: text('symbol').notNull(),
    atomicNumber: integer('atomic_number').notNull(),
    massNumber: integer('mass_number').notNull(),
    massU: doublePrecision('mass_u').notNull(),
    abundanceFraction: doublePrecision('abundance_fraction').notNull(),
    sourceKey: text('source_key')
      .notNull()
      .references(() => source.key),
    basis: basisColumn(),
    verification: verificationColumn(),
  },
  (table) => [
    primaryKey({ columns: [table.symbol, table.massNumber] }),
    check('isotope_symbol', sql`${table.symbol} ~ '^[A-Z][a-z]?$'`),
    check('isotope_atomic_number', sql`${table.atomicNumber} between 1 and 120`),
    check(
      'isotope_mass',
      sql`${isFinitePositive(table.massU)} and abs(${table.massU} - ${table.massNumber}) < 0.5`,
    ),
    check('isotope_abundance', sql`${table.abundanceFraction} >= 0 and ${table.abundanceFraction} <= 1`),
    ...provenanceChecks('isotope', table),
  ],
);
