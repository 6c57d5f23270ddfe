import { scaleLog } from 'd3';
import type { EstimatePoint } from '#src/schemas/estimate.ts';
import type { MeasurementSeries } from '#src/schemas/measurement.ts';

/** Positions on a chart in per cent of the plot, so that the drawing follows the width of the page without a script. */
export interface ChartFrame {
  readonly extentK: readonly [number, number];
  readonly kappaExtent_W_mK: readonly [number, number];
  x(temperatureK: number): number;
  y(kappa_W_mK: number): number;
  /** The temperature at a fraction of the width. */
  temperatureAt(fraction: number): number;
}

export interface Tick {
  readonly value: number;
  readonly isDecade: boolean;
}

const oneTwoFive = [1, 2, 5] as const;

/** Grid positions at 1, 2 and 5 of every decade within the bounds. */
export function ticksWithin([low, high]: readonly [number, number]): Tick[] {
  const ticks: Tick[] = [];
  for (let exponent = Math.floor(Math.log10(low)); exponent <= Math.ceil(Math.log10(high)); exponent += 1) {
    for (const mantissa of oneTwoFive) {
      const value = Number(`${mantissa}e${exponent}`);
      if (value >= low * (1 - 1e-9) && value <= high * (1 + 1e-9))
        ticks.push({ value, isDecade: mantissa === 1 });
    }
  }
  return ticks;
}

function roundedOut(value: number, direction: 'down' | 'up'): number {
  const candidates = ticksWithin([value / 20, value * 20]).map((tick) => tick.value);
  return direction === 'up'
    ? (candidates.find((candidate) => candidate >= value) ?? value)
    : (candidates.findLast((candidate) => candidate <= value) ?? value);
}

/** Decades beyond which a curve is cut rather than squeezed: the floor at 2 K would flatten everything else. */
const mostDecades = 7;

/** Bounds of the κ axis: whatever is drawn, rounded out to 1-2-5, two decades at least. */
export function kappaExtent(
  estimates: readonly (readonly EstimatePoint[])[],
  series: readonly MeasurementSeries[],
): [number, number] {
  const values = [
    ...estimates.flatMap((points) => points.map((point) => point.kappa_W_mK)),
    ...series.flatMap(({ points }) =>
      points.flatMap(({ kappa_W_mK: kappa, uncertainty_W_mK: uncertainty }) =>
        uncertainty !== null && uncertainty < kappa ? [kappa - uncertainty, kappa + uncertainty] : [kappa],
      ),
    ),
  ].filter((value) => value > 0 && Number.isFinite(value));
  if (values.length === 0) return [0.1, 1000];
  const largest = Math.max(...values);
  const floors = estimates.flatMap((points) => points.at(-1)?.floor_W_mK ?? []);
  const smallest = Math.max(
    Math.min(...values, ...floors.map((floor) => floor / 2)),
    largest / 10 ** mostDecades,
  );
  let low = roundedOut(smallest, 'down');
  const high = roundedOut(largest * 1.15, 'up');
  while (high / low < 100) low = roundedOut(low / 1.5, 'down');
  return [low, high];
}

export function chartFrame(
  extentK: readonly [number, number],
  kappaExtent_W_mK: readonly [number, number],
): ChartFrame {
  const temperature = scaleLog().domain(extentK).range([0, 100]);
  const kappa = scaleLog().domain(kappaExtent_W_mK).range([100, 0]);
  return {
    extentK,
    kappaExtent_W_mK,
    x: (temperatureK) => temperature(temperatureK),
    y: (kappa_W_mK) => kappa(kappa_W_mK),
    temperatureAt: (fraction) => temperature.invert(Math.min(Math.max(fraction, 0), 1) * 100),
  };
}

/** An SVG coordinate in per cent. */
export function percent(value: number): string {
  return `${Number(value.toFixed(2))}%`;
}
