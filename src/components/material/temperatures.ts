/** Temperatures people read at, per decade: every kelvin where the curve bends, round steps elsewhere. */
const mantissas: readonly number[] = [
  ...Array.from({ length: 20 }, (_, step) => 10 + step),
  30,
  32,
  34,
  35,
  36,
  38,
  40,
  42,
  44,
  45,
  46,
  48,
  50,
  55,
  60,
  65,
  70,
  75,
  80,
  85,
  90,
  95,
];
/** Boiling helium and nitrogen, melting ice, and the room as three communities measure it. */
const customaryK: readonly number[] = [4.2, 77, 273.15, 293, 295, 298];

/** The extent that the design asks for, K. */
const usualExtentK = [2, 1500] as const;
/** Outside it the estimator refuses, K. */
const limitsK = [1, 3000] as const;

/** Temperatures of a curve, K: a readable grid of about forty-two a decade, the ends included. */
export function curveTemperaturesK([fromK, toK]: readonly [number, number]): number[] {
  const grid = [0.1, 1, 10, 100].flatMap((decade) =>
    mantissas.map((mantissa) => Number((mantissa * decade).toPrecision(3))),
  );
  const inside = [...grid, ...customaryK].filter((temperature) => temperature > fromK && temperature < toK);
  return [...new Set([fromK, ...inside, toK])].sort((a, b) => a - b);
}

export interface ExtentFacts {
  /** Melting or decomposition temperature, K; null when not stored. */
  readonly solidUpToK: number | null;
  /** Temperatures of the measured points that may be drawn, K. */
  readonly measuredK: readonly number[];
}

/**
 * Where the axis runs, K: 2 to 1500 K, not past melting, widened to hold every measured point
 * that the estimator can answer for.
 */
export function temperatureExtentK({ solidUpToK, measuredK }: ExtentFacts): [number, number] {
  const measured = measuredK.filter((temperature) => temperature >= limitsK[0] && temperature <= limitsK[1]);
  const upTo = Math.min(usualExtentK[1], solidUpToK ?? Number.POSITIVE_INFINITY);
  return [
    Math.min(usualExtentK[0], ...measured.map((temperature) => Math.floor(temperature * 10) / 10)),
    Math.max(upTo, 5, ...measured.map((temperature) => Math.ceil(temperature))),
  ];
}

/** The entry nearest to a temperature on a logarithmic axis. */
export function nearestIndex(temperaturesK: readonly number[], temperatureK: number): number {
  let nearest = 0;
  let least = Number.POSITIVE_INFINITY;
  temperaturesK.forEach((candidate, index) => {
    const distance = Math.abs(Math.log(candidate / temperatureK));
    if (distance < least) {
      least = distance;
      nearest = index;
    }
  });
  return nearest;
}

/** Room temperature where the crystal is solid there, else the round temperature nearest to half the melting point. */
export function usualTemperatureK(extentK: readonly [number, number]): number {
  if (extentK[1] >= 300) return 300;
  const grid = curveTemperaturesK(extentK).filter((temperature) => temperature === Math.round(temperature));
  return grid[nearestIndex(grid, extentK[1] / 2)] ?? extentK[1];
}

/** Rows of the table behind the chart: round temperatures, the one pointed at among them. */
export function isTableTemperature(temperatureK: number): boolean {
  const mantissa = temperatureK / 10 ** Math.floor(Math.log10(temperatureK) + 1e-9);
  return [1, 1.5, 2, 3, 4, 5, 6, 8].some((round) => Math.abs(mantissa - round) < 1e-9);
}
