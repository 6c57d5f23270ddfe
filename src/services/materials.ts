import type { Actor } from '#src/auth/actor.ts';
import type { DatabaseHandle, Transaction } from '#src/db/client.ts';
import {
  listElasticConstants,
  listThermalExpansions,
  listTransitions,
  listZoneBoundaryFrequencies,
} from '#src/db/queries/crystal-values.ts';
import {
  findMaterialBySlug,
  listCaveats,
  listMaterialsByName,
  proposeMaterials,
} from '#src/db/queries/materials.ts';
import type { MaterialFilter } from '#src/db/queries/materials.ts';
import { listPreferredSeries } from '#src/db/queries/measurements.ts';
import type { MaterialRecord, MeasuredSeriesRecord, ValueRecord } from '#src/db/queries/records.ts';
import { decodeCursor, encodeCursor } from '#src/lib/cursor.ts';
import type { Cursor } from '#src/lib/cursor.ts';
import { AppError } from '#src/lib/errors.ts';
import { UnboundedConductivityError } from '#src/physics/index.ts';
import { defaultBoundaryLengthM } from '#src/schemas/estimate.ts';
import type {
  MaterialDetail,
  MaterialListItem,
  MaterialListQuery,
  StoredValue,
} from '#src/schemas/material.ts';
import type { Page } from '#src/schemas/pagination.ts';
import { toEdgeUnit } from '#src/services/edge-units.ts';
import {
  findDebyeTemperature,
  findVelocityPair,
  resolveEstimatorInputs,
} from '#src/services/estimator-inputs.ts';
import type { MaterialFacts, ResolvedInputs } from '#src/services/estimator-inputs.ts';
import { estimatePoints, plainSample } from '#src/services/kinetic-estimate.ts';
import { loadMaterialFacts } from '#src/services/material-facts.ts';
import { parseFormula, rankMaterials } from '#src/services/material-search.ts';
import { interpolateSeries } from '#src/services/series-interpolation.ts';

/** Finding and reading materials of the published store. */

const roomTemperatureK = 300;

type Kappa300 = MaterialListItem['kappa_300_W_mK'];

/** A list item with the sources its numbers come from, for tables. */
export interface MaterialTableRow extends MaterialListItem {
  readonly sources: {
    readonly debyeTemperature: string | null;
    readonly velocities: string | null;
    readonly kappa300: string | null;
  };
}

function toFilter(query: MaterialListQuery): MaterialFilter {
  return {
    class: query.class,
    structure: query.structure,
    element: query.element,
    thetaMinK: query.theta_min_K,
    thetaMaxK: query.theta_max_K,
    velocityMinMPerS: query.v_min_m_s,
    velocityMaxMPerS: query.v_max_m_s,
  };
}

/** κ(300 K) of the recommended model for a plain sample of 5 mm, W/(m K); null where no estimate can be made. */
function estimateKappa300(resolved: ResolvedInputs): number | null {
  const { parameters, average, recommendedModel } = resolved;
  if (parameters === null || average === null) return null;
  try {
    const [point] = estimatePoints({
      model: recommendedModel,
      parameters,
      average,
      sample: plainSample(parameters.mass_variance, defaultBoundaryLengthM),
      temperaturesK: [roomTemperatureK],
    });
    return point?.kappa_W_mK ?? null;
  } catch (error) {
    // A stored crystal that the model refuses has no estimate; the list goes on without it.
    if (error instanceof AppError && error.cause instanceof UnboundedConductivityError) return null;
    throw error;
  }
}

function findKappa300(series: MeasuredSeriesRecord | undefined, resolved: ResolvedInputs): Kappa300 {
  const measured = series === undefined ? null : interpolateSeries(series.points, roomTemperatureK);
  if (measured !== null) return { value: measured, basis: 'measured' };
  const estimated = estimateKappa300(resolved);
  return estimated === null ? null : { value: estimated, basis: 'estimated' };
}

function kappa300Source(
  kappa: Kappa300,
  series: MeasuredSeriesRecord | undefined,
  resolved: ResolvedInputs,
): string | null {
  if (kappa === null) return null;
  if (kappa.basis === 'measured') return series?.source.citation ?? null;
  return `estimate, model ${resolved.recommendedModel}, 5 mm, natural isotopes`;
}

function toTableRow(
  record: MaterialRecord,
  facts: MaterialFacts,
  series: MeasuredSeriesRecord | undefined,
): MaterialTableRow {
  const debye = findDebyeTemperature(facts.values)?.record;
  const velocities = findVelocityPair(facts.values);
  const resolved = resolveEstimatorInputs({ material: facts });
  const kappa = findKappa300(series, resolved);
  return {
    slug: record.slug,
    name: record.name,
    formula: record.formula,
    structure: record.structure,
    class: record.class,
    debye_temperature_K: debye?.value ?? null,
    v_L_m_s: velocities?.longitudinal.value ?? null,
    v_T_m_s: velocities?.transverse.value ?? null,
    kappa_300_W_mK: kappa,
    sources: {
      debyeTemperature: debye?.source.citation ?? null,
      velocities: velocities?.longitudinal.source.citation ?? null,
      kappa300: kappa300Source(kappa, series, resolved),
    },
  };
}

interface RecordPage {
  readonly records: readonly MaterialRecord[];
  readonly nextCursor: string | null;
}

function badCursor(): AppError {
  const message = 'cursor is not one that this list gave out: leave it out to start at the first page.';
  return new AppError('INVALID_INPUT', message, { fields: [{ path: 'cursor', message }] });
}

function readCursor(text: string | undefined): Cursor | null {
  if (text === undefined) return null;
  const cursor = decodeCursor(text);
  if (cursor === null) throw badCursor();
  return cursor;
}

/** The first `limit` of the rows, and the cursor after them where there are more. */
function cutPage<Row extends MaterialRecord>(
  rows: readonly Row[],
  limit: number,
  sortKeyOf: (row: Row) => string,
): RecordPage {
  const records = rows.slice(0, limit);
  const last = records.at(-1);
  const hasMore = rows.length > limit;
  const nextCursor =
    hasMore && last !== undefined ? encodeCursor({ sortKey: sortKeyOf(last), id: last.slug }) : null;
  return { records, nextCursor };
}

async function listByName(tx: Transaction, query: MaterialListQuery): Promise<RecordPage> {
  const cursor = readCursor(query.cursor);
  const rows = await listMaterialsByName(tx, {
    filter: toFilter(query),
    after: cursor === null ? null : { nameKey: cursor.sortKey, slug: cursor.id },
    limit: query.limit + 1,
  });
  return cutPage(rows, query.limit, (row) => row.nameKey);
}

/** Ranks are computed anew for each page; the cursor is the place (rank, slug) after which it starts. */
async function searchByWords(tx: Transaction, words: string, query: MaterialListQuery): Promise<RecordPage> {
  const cursor = readCursor(query.cursor);
  const after = cursor === null ? null : { rank: Number(cursor.sortKey), slug: cursor.id };
  if (after !== null && !Number.isFinite(after.rank)) throw badCursor();
  const elements = parseFormula(words)?.map(({ element }) => element) ?? null;
  const candidates = await proposeMaterials(tx, { words, elements, filter: toFilter(query) });
  const rows = rankMaterials(candidates, words)
    .filter(
      ({ rank, material }) =>
        after === null || rank > after.rank || (rank === after.rank && material.slug > after.slug),
    )
    .slice(0, query.limit + 1)
    .map(({ material, rank }) => ({ ...material, rank }));
  return cutPage(rows, query.limit, (row) => String(row.rank));
}

/** As `searchMaterials`, with the sources of the numbers. */
export async function tabulateMaterials(
  db: DatabaseHandle,
  _actor: Actor,
  query: MaterialListQuery,
): Promise<Page<MaterialTableRow>> {
  const { page, facts, series } = await db.run(async (tx) => {
    const words = query.q ?? '';
    const found = words === '' ? await listByName(tx, query) : await searchByWords(tx, words, query);
    const ids = found.records.map(({ id }) => id);
    return {
      page: found,
      facts: await loadMaterialFacts(tx, found.records),
      series: await listPreferredSeries(tx, ids),
    };
  });
  // The estimates are made after the transaction has ended: they take longer than the queries.
  const items = page.records.flatMap((record) => {
    const known = facts.get(record.id);
    return known === undefined ? [] : [toTableRow(record, known, series.get(record.id))];
  });
  return { items, next_cursor: page.nextCursor };
}

/**
 * Materials that match the words (misspelled ones too, formulas in any order of their elements) and the filters: best
 * match first, or in name order without words. Bounds on `theta` compare the preferred Debye temperature, bounds on `v`
 * the longitudinal velocity, as the list shows them; a material without that value is left out by either.
 *
 * @throws AppError INVALID_INPUT for a cursor that is not ours.
 */
export async function searchMaterials(
  db: DatabaseHandle,
  actor: Actor,
  query: MaterialListQuery,
): Promise<Page<MaterialListItem>> {
  const { items, next_cursor } = await tabulateMaterials(db, actor, query);
  return { items: items.map(({ sources: _sources, ...item }) => item), next_cursor };
}

/** @throws AppError NOT_FOUND */
export async function requireMaterial(tx: Transaction, slug: string): Promise<MaterialRecord> {
  const record = await findMaterialBySlug(tx, slug);
  if (record !== null) return record;
  throw new AppError('NOT_FOUND', `There is no material ${JSON.stringify(slug)} in the store.`);
}

function toStoredValue(record: ValueRecord): StoredValue {
  const { value, unit, uncertainty } = toEdgeUnit(record.property, record);
  return {
    property: record.property,
    kind: record.kind,
    value,
    unit,
    uncertainty,
    temperature_K: record.temperatureK,
    direction: record.direction,
    value_set: record.valueSet,
    basis: record.basis,
    verification: record.verification,
    preferred: record.preferred,
    source: record.source,
    note: record.note,
  };
}

/**
 * A material with everything stored of it, and what an estimate of it would use.
 *
 * @throws AppError NOT_FOUND
 */
export async function getMaterial(db: DatabaseHandle, _actor: Actor, slug: string): Promise<MaterialDetail> {
  const { record, facts, others, caveats, series } = await db.run(async (tx) => {
    const found = await requireMaterial(tx, slug);
    return {
      record: found,
      facts: (await loadMaterialFacts(tx, [found])).get(found.id),
      others: [
        ...(await listElasticConstants(tx, found.id)),
        ...(await listZoneBoundaryFrequencies(tx, found.id)),
        ...(await listThermalExpansions(tx, found.id)),
        ...(await listTransitions(tx, found.id)),
      ],
      caveats: await listCaveats(tx, found.id),
      series: (await listPreferredSeries(tx, [found.id])).get(found.id),
    };
  });
  const known: MaterialFacts = facts ?? { ...record, values: [], isotopes: [] };
  const resolved = resolveEstimatorInputs({ material: known });
  return {
    slug: record.slug,
    name: record.name,
    formula: record.formula,
    aliases: record.aliases,
    structure: record.structure,
    space_group: record.spaceGroup,
    space_group_number: record.spaceGroupNumber,
    class: record.class,
    atoms_per_cell: record.atomsPerCell,
    composition: record.composition,
    hazards: record.hazards,
    note: record.note,
    revision: record.revision,
    values: [...known.values, ...others].map(toStoredValue),
    caveats,
    estimator_inputs: resolved.parameters,
    recommended_model: resolved.parameters === null ? null : resolved.recommendedModel,
    estimate_obstacles: resolved.obstacles.map(({ message }) => message),
    kappa_300_W_mK: findKappa300(series, resolved),
  };
}
