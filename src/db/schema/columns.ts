import { sql } from 'drizzle-orm';
import type { SQL } from 'drizzle-orm';
import { check, text, type AnyPgColumn } from 'drizzle-orm/pg-core';

/**
 * What every stored value carries besides its number: the source it stands on, how it came about, and whether anybody
 * compared it with that source.
 */

export const basisValues = ['measured', 'published', 'derived', 'estimated'] as const;
export const verificationValues = ['checked', 'from memory'] as const;

export const basisColumn = () => text('basis', { enum: basisValues }).notNull();
export const verificationColumn = () => text('verification', { enum: verificationValues });

interface ProvenanceColumns {
  readonly basis: AnyPgColumn;
  readonly verification: AnyPgColumn;
}

/** A value worked out here has nothing to be compared with; one taken from a source says whether it was. */
export function provenanceChecks(table: string, columns: ProvenanceColumns) {
  return [
    check(`${table}_basis`, isOneOf(columns.basis, basisValues)),
    check(`${table}_verification`, verificationRule(columns)),
  ] as const;
}

export function isOneOf(column: AnyPgColumn, values: readonly string[]): SQL {
  return sql`${column} in (${sql.raw(values.map((value) => `'${value.replaceAll("'", "''")}'`).join(', '))})`;
}

function verificationRule({ basis, verification }: ProvenanceColumns): SQL {
  return sql`case when ${basis} in ('measured', 'published') then ${verification} in ('checked', 'from memory') and ${verification} is not null else ${verification} is null end`;
}

/** PostgreSQL's doubles hold NaN (which it sorts above everything) and infinities; no quantity here is one. */
export function isFinitePositive(column: AnyPgColumn): SQL {
  return sql`${column} > 0 and ${column} < 'Infinity'`;
}

export function isFinite(column: AnyPgColumn): SQL {
  return sql`${column} > '-Infinity' and ${column} < 'Infinity'`;
}

export function isNullOrFinitePositive(column: AnyPgColumn): SQL {
  return sql`${column} is null or (${column} > 0 and ${column} < 'Infinity')`;
}

export function isNullOrFiniteNotNegative(column: AnyPgColumn): SQL {
  return sql`${column} is null or (${column} >= 0 and ${column} < 'Infinity')`;
}
