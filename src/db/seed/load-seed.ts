import { getTableColumns, notInArray, sql, type SQL } from 'drizzle-orm';
import { drizzle, type NodePgDatabase } from 'drizzle-orm/node-postgres';
import type { PgColumn, PgTable } from 'drizzle-orm/pg-core';
import pg from 'pg';
import * as schema from '#src/db/schema/index.ts';
import type { SeedData } from './files.ts';
import { toRows } from './rows.ts';

export interface SeedCounts {
  readonly materials: number;
  readonly values: number;
  readonly series: number;
  readonly points: number;
  readonly sources: number;
}

type Transaction = Parameters<Parameters<NodePgDatabase['transaction']>[0]>[0];

/** PostgreSQL takes 65 535 parameters a statement; the widest table here has 17 columns. */
const rowsPerStatement = 1000;

/**
 * Makes the published store of a database what the seed files say: rows are added, changed and removed in one
 * transaction, so that a failure changes nothing. Loading the same files again changes nothing either.
 * @param url the owner's address of the database
 */
export async function loadSeed(url: string, data: SeedData): Promise<SeedCounts> {
  const rows = toRows(data);
  const client = new pg.Client({ connectionString: url, connectionTimeoutMillis: 10_000 });
  await client.connect();
  try {
    await drizzle(client).transaction(async (tx) => {
      // Two loaders at once would wait for each other's rows in different orders.
      await tx.execute(sql`select pg_advisory_xact_lock(726520)`);
      await removeAbsent(tx, rows);
      await replace(tx, schema.source, rows.source, [schema.source.key]);
      await replace(tx, schema.isotope, rows.isotope, [schema.isotope.symbol, schema.isotope.massNumber]);
      await replace(tx, schema.material, rows.material, [schema.material.id]);
      await replace(tx, schema.propertyValue, rows.propertyValue, [schema.propertyValue.id]);
      await replace(tx, schema.elasticConstantSet, rows.elasticConstantSet, [schema.elasticConstantSet.id]);
      await replace(tx, schema.zoneBoundaryFrequency, rows.zoneBoundaryFrequency, [
        schema.zoneBoundaryFrequency.id,
      ]);
      await replace(tx, schema.thermalExpansion, rows.thermalExpansion, [schema.thermalExpansion.id]);
      await replace(tx, schema.transition, rows.transition, [schema.transition.id]);
      await replace(tx, schema.caveat, rows.caveat, [schema.caveat.id]);
      await replace(tx, schema.sample, rows.sample, [schema.sample.id]);
      await replace(tx, schema.measurement, rows.measurement, [schema.measurement.id]);
      await replace(tx, schema.measurementPoint, rows.measurementPoint, [schema.measurementPoint.id]);
      await replace(tx, schema.scatteringParameter, rows.scatteringParameter, [
        schema.scatteringParameter.id,
      ]);
      await removeUnusedSources(
        tx,
        rows.source.map(({ key }) => key),
      );
    });
  } finally {
    await client.end();
  }
  return {
    materials: rows.material.length,
    values:
      rows.propertyValue.length +
      rows.elasticConstantSet.length +
      rows.zoneBoundaryFrequency.length +
      rows.thermalExpansion.length +
      rows.transition.length,
    series: rows.measurement.length,
    points: rows.measurementPoint.length,
    sources: rows.source.length,
  };
}

async function replace<Table extends PgTable>(
  tx: Transaction,
  table: Table,
  rows: Table['$inferInsert'][],
  target: PgColumn[],
): Promise<void> {
  const set = excludedColumns(table, target);
  for (let start = 0; start < rows.length; start += rowsPerStatement) {
    await tx
      .insert(table)
      .values(rows.slice(start, start + rowsPerStatement))
      .onConflictDoUpdate({ target, set });
  }
}

/** `column = excluded.column` for all that is neither the key nor counted by the database (the revision). */
function excludedColumns(table: PgTable, target: readonly PgColumn[]): Record<string, SQL> {
  return Object.fromEntries(
    Object.entries<PgColumn>(getTableColumns(table))
      .filter(([, column]) => !target.includes(column) && column.name !== 'revision')
      .map(([name, column]) => [name, sql`excluded.${sql.identifier(column.name)}`]),
  );
}

/** First what refers to other rows, then what is referred to. A value that changed its preference must not meet its old rival. */
async function removeAbsent(tx: Transaction, rows: ReturnType<typeof toRows>): Promise<void> {
  const tables = [
    [schema.measurementPoint, schema.measurementPoint.id, rows.measurementPoint],
    [schema.measurement, schema.measurement.id, rows.measurement],
    [schema.sample, schema.sample.id, rows.sample],
    [schema.propertyValue, schema.propertyValue.id, rows.propertyValue],
    [schema.elasticConstantSet, schema.elasticConstantSet.id, rows.elasticConstantSet],
    [schema.zoneBoundaryFrequency, schema.zoneBoundaryFrequency.id, rows.zoneBoundaryFrequency],
    [schema.thermalExpansion, schema.thermalExpansion.id, rows.thermalExpansion],
    [schema.transition, schema.transition.id, rows.transition],
    [schema.caveat, schema.caveat.id, rows.caveat],
    [schema.scatteringParameter, schema.scatteringParameter.id, rows.scatteringParameter],
    [schema.material, schema.material.id, rows.material],
  ] as const;
  for (const [table, id, kept] of tables) {
    await tx.delete(table).where(
      notInArray(
        id,
        kept.map((row) => row.id),
      ),
    );
  }
  await tx
    .update(schema.propertyValue)
    .set({ isPreferred: false })
    .where(sql`is_preferred`);
  await tx
    .update(schema.measurement)
    .set({ isPreferred: false })
    .where(sql`is_preferred`);
  const isotopes = rows.isotope.map(({ symbol, massNumber }) => `${symbol}-${massNumber}`);
  await tx
    .delete(schema.isotope)
    .where(notInArray(sql`${schema.isotope.symbol} || '-' || ${schema.isotope.massNumber}`, isotopes));
}

async function removeUnusedSources(tx: Transaction, kept: string[]): Promise<void> {
  await tx.delete(schema.source).where(notInArray(schema.source.key, kept));
}
