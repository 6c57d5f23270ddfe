/** κ between the points of a measured series. */

export interface SeriesPoint {
  readonly temperatureK: number;
  readonly kappaWPerMK: number;
}

/** Neighbours further apart than this factor in temperature say too little of what lies between them. */
const neighbourRatioMax = 2;
/** So that 150 K and 300 K count as a factor of 2 whatever the rounding. */
const rounding = 1e-12;

/**
 * κ at a temperature, W/(m K): the point itself, else a straight line in ln κ over ln T between its two neighbours when
 * they are at most a factor of 2 apart. Null elsewhere: never extrapolated.
 */
export function interpolateSeries(points: readonly SeriesPoint[], temperatureK: number): number | null {
  const sorted = points.toSorted((a, b) => a.temperatureK - b.temperatureK);
  const upperIndex = sorted.findIndex((point) => point.temperatureK >= temperatureK);
  const upper = sorted[upperIndex];
  if (upper === undefined) return null;
  if (upper.temperatureK === temperatureK) return upper.kappaWPerMK;
  const lower = sorted[upperIndex - 1];
  if (lower === undefined) return null;
  if (upper.temperatureK / lower.temperatureK > neighbourRatioMax * (1 + rounding)) return null;
  const part =
    Math.log(temperatureK / lower.temperatureK) / Math.log(upper.temperatureK / lower.temperatureK);
  return lower.kappaWPerMK * (upper.kappaWPerMK / lower.kappaWPerMK) ** part;
}
