import type { CsvColumn } from '#src/lib/csv.ts';
import type { EstimatePoint, EstimateResponse } from '#src/schemas/estimate.ts';
import type { StoredValue } from '#src/schemas/material.ts';
import type { MeasurementPoint, MeasurementSeries } from '#src/schemas/measurement.ts';
import type { MaterialTableRow } from '#src/services/materials.ts';

/** Columns of the tables that are also given as CSV: names with units, and where the numbers come from. */

function materialSource({ sources }: MaterialTableRow): string {
  return [
    ['debye_temperature_K', sources.debyeTemperature],
    ['v_L_m_s and v_T_m_s', sources.velocities],
    ['kappa_300_W_mK', sources.kappa300],
  ]
    .flatMap(([name, source]) => (source === null ? [] : [`${name ?? ''}: ${source ?? ''}`]))
    .join('; ');
}

export const materialColumns: readonly CsvColumn<MaterialTableRow>[] = [
  { header: 'slug', cell: (row) => row.slug },
  { header: 'name', cell: (row) => row.name },
  { header: 'formula', cell: (row) => row.formula },
  { header: 'structure', cell: (row) => row.structure },
  { header: 'class', cell: (row) => row.class },
  { header: 'debye_temperature_K', cell: (row) => row.debye_temperature_K },
  { header: 'v_L_m_s', cell: (row) => row.v_L_m_s },
  { header: 'v_T_m_s', cell: (row) => row.v_T_m_s },
  { header: 'kappa_300_W_mK', cell: (row) => row.kappa_300_W_mK?.value },
  { header: 'kappa_300_basis', cell: (row) => row.kappa_300_W_mK?.basis },
  { header: 'source', cell: materialSource },
];

/** Values of different units share a column, so the unit has one of its own. */
export const valueColumns: readonly CsvColumn<StoredValue>[] = [
  { header: 'property', cell: (row) => row.property },
  { header: 'kind', cell: (row) => row.kind },
  { header: 'value', cell: (row) => row.value },
  { header: 'unit', cell: (row) => row.unit },
  { header: 'uncertainty', cell: (row) => row.uncertainty },
  { header: 'temperature_K', cell: (row) => row.temperature_K },
  { header: 'direction', cell: (row) => row.direction },
  { header: 'value_set', cell: (row) => row.value_set },
  { header: 'basis', cell: (row) => row.basis },
  { header: 'verification', cell: (row) => row.verification },
  { header: 'preferred', cell: (row) => row.preferred },
  { header: 'source', cell: (row) => row.source.citation },
  { header: 'source_key', cell: (row) => row.source.key },
  { header: 'doi', cell: (row) => row.source.doi },
  { header: 'note', cell: (row) => row.note },
];

/** One measured point with the series it belongs to. */
export interface MeasurementRow {
  readonly series: MeasurementSeries;
  readonly point: MeasurementPoint;
}

export const measurementColumns: readonly CsvColumn<MeasurementRow>[] = [
  { header: 'series', cell: ({ series }) => series.series },
  { header: 'T_K', cell: ({ point }) => point.T_K },
  { header: 'kappa_W_mK', cell: ({ point }) => point.kappa_W_mK },
  { header: 'uncertainty_W_mK', cell: ({ point }) => point.uncertainty_W_mK },
  { header: 'quantity', cell: ({ series }) => series.quantity },
  { header: 'direction', cell: ({ series }) => series.direction },
  { header: 'method', cell: ({ series }) => series.method },
  { header: 'sample', cell: ({ series }) => series.sample.description },
  { header: 'form', cell: ({ series }) => series.sample.form },
  { header: 'isotopes', cell: ({ series }) => series.sample.isotopes },
  { header: 'size_m', cell: ({ series }) => series.sample.size_m },
  { header: 'preferred', cell: ({ series }) => series.preferred },
  { header: 'verification', cell: ({ point }) => point.verification },
  { header: 'source', cell: ({ series }) => series.source.citation },
  { header: 'source_key', cell: ({ series }) => series.source.key },
  { header: 'doi', cell: ({ series }) => series.source.doi },
  {
    header: 'note',
    cell: ({ series, point }) => [series.note, point.note].filter(Boolean).join('; ') || null,
  },
];

/** An estimate's source is what it was made from. */
export function estimateColumns(estimate: EstimateResponse): readonly CsvColumn<EstimatePoint>[] {
  const inputs = estimate.inputs.map(({ name, value, source }) => `${name} ${value} (${source})`).join('; ');
  const source = `estimate, model ${estimate.model}, Umklapp scale ${estimate.umklapp_scale}, from ${inputs}`;
  return [
    { header: 'T_K', cell: (row) => row.T_K },
    { header: 'kappa_W_mK', cell: (row) => row.kappa_W_mK },
    { header: 'low_W_mK', cell: (row) => row.low_W_mK },
    { header: 'high_W_mK', cell: (row) => row.high_W_mK },
    { header: 'heat_capacity_J_m3K', cell: (row) => row.heat_capacity_J_m3K },
    { header: 'velocity_m_s', cell: (row) => row.velocity_m_s },
    { header: 'mean_free_path_m', cell: (row) => row.mean_free_path_m },
    { header: 'porosity_factor', cell: (row) => row.porosity_factor },
    { header: 'share_boundary', cell: (row) => row.share.boundary },
    { header: 'share_defect', cell: (row) => row.share.defect },
    { header: 'share_umklapp', cell: (row) => row.share.umklapp },
    { header: 'floor_W_mK', cell: (row) => row.floor_W_mK },
    { header: 'source', cell: () => source },
  ];
}
