import type { MeasurementSeries } from '#src/schemas/measurement.ts';
import type { Verification } from '#src/schemas/provenance.ts';

const thinForms: ReadonlySet<string> = new Set(['film', 'layer', 'wire']);
/** Pieces thinner than this are drawn on request only: their own surface, not the crystal, sets κ. */
const bulkFromM = 1e-4;

/** Whether a series tells of the crystal rather than of a film, layer or wire made of it. */
export function isBulk(series: MeasurementSeries): boolean {
  if (thinForms.has(series.sample.form)) return false;
  return series.sample.size_m === null || series.sample.size_m >= bulkFromM;
}

/** The preferred series first, then bulk ones, then the rest, each in the order of the store. */
export function inReadingOrder(list: readonly MeasurementSeries[]): MeasurementSeries[] {
  const rank = (series: MeasurementSeries): number => (series.preferred ? 0 : isBulk(series) ? 1 : 2);
  return [...list].sort((a, b) => rank(a) - rank(b));
}

/** Which series the address asks for; without a word in it, all bulk ones. `series=none` draws none. */
export function readDrawnSeries(query: URLSearchParams, list: readonly MeasurementSeries[]): string[] {
  const asked = query.getAll('series');
  if (asked.length === 0) return defaultDrawnSeries(list);
  return list.map(({ series }) => series).filter((series) => asked.includes(series));
}

export function defaultDrawnSeries(list: readonly MeasurementSeries[]): string[] {
  return list.filter(isBulk).map(({ series }) => series);
}

/** Adds the drawn series to an address unless they are the default ones. */
export function writeDrawnSeries(
  query: URLSearchParams,
  drawn: readonly string[],
  list: readonly MeasurementSeries[],
): void {
  const usual = defaultDrawnSeries(list);
  if (usual.length === drawn.length && usual.every((series) => drawn.includes(series))) return;
  if (drawn.length === 0) query.append('series', 'none');
  for (const series of drawn) query.append('series', series);
}

/** "natural-recommended-1972" in words. */
export function seriesWords(series: MeasurementSeries): string {
  return series.series.replace(/-/g, ' ');
}

/** "all checked", "from memory", or how many of each: the verification of a series is that of its points. */
export function seriesVerification(series: MeasurementSeries): string {
  const count = (verification: Verification | null): number =>
    series.points.filter((point) => point.verification === verification).length;
  const [checked, fromMemory, notStated] = [count('checked'), count('from memory'), count(null)];
  const all = series.points.length;
  if (checked === all) return 'checked';
  if (fromMemory === all) return 'from memory';
  if (notStated === all) return 'verification not stated';
  return [
    [checked, 'checked'],
    [fromMemory, 'from memory'],
    [notStated, 'not stated'],
  ]
    .filter(([number]) => number !== 0)
    .map(([number, words]) => `${number} ${words}`)
    .join(', ');
}

export interface MeasuredAt {
  readonly kappa_W_mK: number;
  /** As stated at a measured point; null between points and where none is stated. */
  readonly uncertainty_W_mK: number | null;
  readonly isInterpolated: boolean;
}

/** Neighbours further apart than this factor in T are not joined. */
const widestGap = 2;

/**
 * κ of a series at a temperature: the point itself, or log–log between neighbours at most a factor of 2 apart.
 * Null outside, never extrapolated.
 */
export function measuredAt(series: MeasurementSeries, temperatureK: number): MeasuredAt | null {
  const points = [...series.points].sort((a, b) => a.T_K - b.T_K);
  const hit = points.find((point) => Math.abs(point.T_K / temperatureK - 1) < 1e-9);
  if (hit !== undefined) {
    return {
      kappa_W_mK: hit.kappa_W_mK,
      uncertainty_W_mK: hit.uncertainty_W_mK,
      isInterpolated: false,
    };
  }
  const above = points.findIndex((point) => point.T_K > temperatureK);
  const [lower, upper] = [points[above - 1], points[above]];
  if (lower === undefined || upper === undefined || upper.T_K / lower.T_K > widestGap) return null;
  const fraction = Math.log(temperatureK / lower.T_K) / Math.log(upper.T_K / lower.T_K);
  return {
    kappa_W_mK: lower.kappa_W_mK * (upper.kappa_W_mK / lower.kappa_W_mK) ** fraction,
    uncertainty_W_mK: null,
    isInterpolated: true,
  };
}
