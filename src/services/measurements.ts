import type { Actor } from '#src/auth/actor.ts';
import type { DatabaseHandle } from '#src/db/client.ts';
import { listMeasuredSeries } from '#src/db/queries/measurements.ts';
import type { MeasuredSeriesRecord } from '#src/db/queries/records.ts';
import type { MeasurementList, MeasurementSeries } from '#src/schemas/measurement.ts';
import { requireMaterial } from '#src/services/materials.ts';

/** Published measurements. */

function toSeries(record: MeasuredSeriesRecord): MeasurementSeries {
  const { sizeM, ...sample } = record.sample;
  return {
    series: record.series,
    preferred: record.preferred,
    quantity: record.quantity,
    direction: record.direction,
    method: record.method,
    sample: { ...sample, size_m: sizeM },
    source: record.source,
    note: record.note,
    points: record.points.map((point) => ({
      T_K: point.temperatureK,
      kappa_W_mK: point.kappaWPerMK,
      uncertainty_W_mK: point.uncertaintyWPerMK,
      verification: point.verification,
      note: point.note,
    })),
  };
}

/**
 * All series measured on a material, the preferred one first; points by rising temperature.
 *
 * @throws AppError NOT_FOUND
 */
export async function listMeasurements(
  db: DatabaseHandle,
  _actor: Actor,
  slug: string,
): Promise<MeasurementList> {
  const series = await db.run(async (tx) => {
    const material = await requireMaterial(tx, slug);
    return listMeasuredSeries(tx, material.id);
  });
  return { items: series.map(toSeries), next_cursor: null };
}
