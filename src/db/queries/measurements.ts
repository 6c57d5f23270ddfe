import { and, asc, eq, inArray, sql } from 'drizzle-orm';
import type { Transaction } from '#src/db/client.ts';
import type { MeasuredPointRecord, MeasuredSeriesRecord } from '#src/db/queries/records.ts';
import { citedSourceColumns, toSourceReference } from '#src/db/queries/sources.ts';
import { measurement, measurementPoint, sample, source } from '#src/db/schema/index.ts';

async function listPoints(
  tx: Transaction,
  measurementIds: readonly string[],
): Promise<ReadonlyMap<string, readonly MeasuredPointRecord[]>> {
  const points = new Map<string, MeasuredPointRecord[]>();
  if (measurementIds.length === 0) return points;
  const rows = await tx
    .select({
      measurementId: measurementPoint.measurementId,
      temperatureK: measurementPoint.temperatureK,
      kappaWPerMK: measurementPoint.kappaWPerMK,
      uncertaintyWPerMK: measurementPoint.uncertaintyWPerMK,
      verification: measurementPoint.verification,
      note: measurementPoint.note,
    })
    .from(measurementPoint)
    .where(inArray(measurementPoint.measurementId, [...measurementIds]))
    .orderBy(asc(measurementPoint.temperatureK));
  for (const { measurementId, ...point } of rows) {
    const series = points.get(measurementId);
    if (series === undefined) points.set(measurementId, [point]);
    else series.push(point);
  }
  return points;
}

const seriesColumns = {
  id: measurement.id,
  materialId: measurement.materialId,
  series: measurement.series,
  preferred: measurement.isPreferred,
  quantity: measurement.quantity,
  direction: measurement.direction,
  method: measurement.method,
  note: measurement.note,
  sample: {
    slug: sample.slug,
    form: sample.form,
    isotopes: sample.isotopes,
    sizeM: sample.sizeM,
    description: sample.description,
  },
  source: citedSourceColumns,
};

/** All published series of a material with their points; the preferred one first. */
export async function listMeasuredSeries(
  tx: Transaction,
  materialId: string,
): Promise<readonly MeasuredSeriesRecord[]> {
  const rows = await tx
    .select(seriesColumns)
    .from(measurement)
    .innerJoin(sample, eq(sample.id, measurement.sampleId))
    .innerJoin(source, eq(source.key, measurement.sourceKey))
    .where(eq(measurement.materialId, materialId))
    .orderBy(sql`${measurement.isPreferred} desc`, asc(measurement.position));
  const points = await listPoints(
    tx,
    rows.map(({ id }) => id),
  );
  return rows.map(({ id, materialId: _materialId, source: cited, ...series }) => ({
    ...series,
    source: toSourceReference(cited),
    points: points.get(id) ?? [],
  }));
}

/** The preferred series of each of some materials, by material id. */
export async function listPreferredSeries(
  tx: Transaction,
  materialIds: readonly string[],
): Promise<ReadonlyMap<string, MeasuredSeriesRecord>> {
  if (materialIds.length === 0) return new Map();
  const rows = await tx
    .select(seriesColumns)
    .from(measurement)
    .innerJoin(sample, eq(sample.id, measurement.sampleId))
    .innerJoin(source, eq(source.key, measurement.sourceKey))
    .where(and(inArray(measurement.materialId, [...materialIds]), measurement.isPreferred));
  const points = await listPoints(
    tx,
    rows.map(({ id }) => id),
  );
  return new Map(
    rows.map(({ id, materialId, source: cited, ...series }) => [
      materialId,
      { ...series, source: toSourceReference(cited), points: points.get(id) ?? [] },
    ]),
  );
}
