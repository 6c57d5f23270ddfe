import { asc, eq } from 'drizzle-orm';
import type { Transaction } from '#src/db/client.ts';
import type { ValueRecord } from '#src/db/queries/records.ts';
import { citedSourceColumns, toSourceReference } from '#src/db/queries/sources.ts';
import type { CitedSourceRow } from '#src/db/queries/sources.ts';
import {
  elasticConstantSet,
  source,
  thermalExpansion,
  transition,
  zoneBoundaryFrequency,
} from '#src/db/schema/index.ts';

/** Stored values that have tables of their own, each as one record with its unit, like the property values. */

interface ProvenanceRow {
  readonly temperatureK?: number | null;
  readonly direction?: string | null;
  readonly basis: ValueRecord['basis'];
  readonly verification: ValueRecord['verification'];
  readonly note: string | null;
  readonly source: CitedSourceRow;
}

function toRecord(
  row: ProvenanceRow,
  value: Pick<ValueRecord, 'property' | 'kind' | 'value' | 'unit'> & { readonly valueSet?: string },
): ValueRecord {
  return {
    ...value,
    valueSet: value.valueSet ?? null,
    uncertainty: null,
    temperatureK: row.temperatureK ?? null,
    direction: row.direction ?? null,
    source: toSourceReference(row.source),
    basis: row.basis,
    verification: row.verification,
    preferred: false,
    note: row.note,
  };
}

/** C_ij of each published set; the set's name is its source. */
export async function listElasticConstants(
  tx: Transaction,
  materialId: string,
): Promise<readonly ValueRecord[]> {
  const table = elasticConstantSet;
  const rows = await tx
    .select({
      C11: table.c11Pa,
      C12: table.c12Pa,
      C13: table.c13Pa,
      C14: table.c14Pa,
      C33: table.c33Pa,
      C44: table.c44Pa,
      C66: table.c66Pa,
      temperatureK: table.temperatureK,
      basis: table.basis,
      verification: table.verification,
      note: table.note,
      source: citedSourceColumns,
    })
    .from(table)
    .innerJoin(source, eq(source.key, table.sourceKey))
    .where(eq(table.materialId, materialId))
    .orderBy(asc(table.sourceKey), asc(table.temperatureK), asc(table.c11Pa));
  return rows.flatMap(({ temperatureK, basis, verification, note, source: cited, ...constants }) =>
    Object.entries(constants).flatMap(([kind, value]) =>
      value === null
        ? []
        : [
            toRecord(
              { temperatureK, basis, verification, note, source: cited },
              { property: 'elastic_constant', kind, value, unit: 'Pa', valueSet: cited.key },
            ),
          ],
    ),
  );
}

export async function listZoneBoundaryFrequencies(
  tx: Transaction,
  materialId: string,
): Promise<readonly ValueRecord[]> {
  const table = zoneBoundaryFrequency;
  const rows = await tx
    .select({
      point: table.point,
      branch: table.branch,
      frequencyHz: table.frequencyHz,
      temperatureK: table.temperatureK,
      basis: table.basis,
      verification: table.verification,
      note: table.note,
      source: citedSourceColumns,
    })
    .from(table)
    .innerJoin(source, eq(source.key, table.sourceKey))
    .where(eq(table.materialId, materialId))
    .orderBy(asc(table.sourceKey), asc(table.point), asc(table.branch), asc(table.frequencyHz));
  return rows.map((row) =>
    toRecord(row, {
      property: 'zone_boundary_frequency',
      kind: `${row.branch} at ${row.point}`,
      value: row.frequencyHz,
      unit: 'Hz',
    }),
  );
}

export async function listThermalExpansions(
  tx: Transaction,
  materialId: string,
): Promise<readonly ValueRecord[]> {
  const table = thermalExpansion;
  const rows = await tx
    .select({
      alphaLinearPerK: table.alphaLinearPerK,
      direction: table.direction,
      temperatureK: table.temperatureK,
      basis: table.basis,
      verification: table.verification,
      note: table.note,
      source: citedSourceColumns,
    })
    .from(table)
    .innerJoin(source, eq(source.key, table.sourceKey))
    .where(eq(table.materialId, materialId))
    .orderBy(asc(table.direction), asc(table.temperatureK), asc(table.sourceKey), asc(table.alphaLinearPerK));
  return rows.map((row) =>
    toRecord(row, { property: 'thermal_expansion', kind: 'linear', value: row.alphaLinearPerK, unit: '1/K' }),
  );
}

/** Melting, decomposition and transition temperatures. */
export async function listTransitions(tx: Transaction, materialId: string): Promise<readonly ValueRecord[]> {
  const table = transition;
  const rows = await tx
    .select({
      kind: table.kind,
      transitionK: table.temperatureK,
      basis: table.basis,
      verification: table.verification,
      note: table.note,
      source: citedSourceColumns,
    })
    .from(table)
    .innerJoin(source, eq(source.key, table.sourceKey))
    .where(eq(table.materialId, materialId))
    .orderBy(asc(table.temperatureK), asc(table.kind));
  return rows.map((row) =>
    toRecord(row, { property: 'transition_temperature', kind: row.kind, value: row.transitionK, unit: 'K' }),
  );
}
