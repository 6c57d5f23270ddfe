import { describe, expect, it } from 'vitest';
import {
  defaultDrawnSeries,
  inReadingOrder,
  measuredAt,
  readDrawnSeries,
  seriesVerification,
  writeDrawnSeries,
} from '#src/components/material/measured-series.ts';
import type { MeasurementPoint, MeasurementSeries } from '#src/schemas/measurement.ts';

function series(
  name: string,
  points: readonly (readonly [number, number, MeasurementPoint['verification']?])[],
  change: Partial<MeasurementSeries['sample']> & { preferred?: boolean } = {},
): MeasurementSeries {
  const { preferred = false, ...sample } = change;
  return {
    series: name,
    preferred,
    quantity: 'total',
    direction: null,
    method: null,
    sample: {
      slug: name,
      form: 'single crystal',
      isotopes: 'natural',
      size_m: null,
      description: '',
      ...sample,
    },
    source: { key: 'none', citation: 'made for this test', doi: null },
    note: null,
    points: points.map(([T_K, kappa_W_mK, verification = null]) => ({
      T_K,
      kappa_W_mK,
      uncertainty_W_mK: null,
      verification,
      note: null,
    })),
  };
}

describe('κ of a measured series between its points', () => {
  it('follows a power law exactly, since it is joined on log–log axes', () => {
    // κ = 30000/T, the high-temperature law of a crystal (common practice); 200 K lies between 150 K and 300 K.
    const powerLaw = series('a', [
      [150, 200],
      [300, 100],
    ]);
    const between = measuredAt(powerLaw, 200);
    expect(between?.kappa_W_mK).toBeCloseTo(150, 9);
    expect(between?.isInterpolated).toBe(true);
  });

  it('is the stated value at a point', () => {
    expect(measuredAt(series('a', [[300, 148]]), 300)).toEqual({
      kappa_W_mK: 148,
      uncertainty_W_mK: null,
      isInterpolated: false,
    });
  });

  it('is not made up outside the points or across a gap of more than a factor of 2', () => {
    const gap = series('a', [
      [100, 10],
      [201, 5],
    ]);
    expect(measuredAt(gap, 150)).toBeNull();
    expect(measuredAt(gap, 99)).toBeNull();
    expect(measuredAt(gap, 202)).toBeNull();
  });
});

describe('the series drawn', () => {
  const list = [
    series('film', [[300, 60]], { form: 'film', size_m: 1e-7 }),
    series('crystal', [[300, 150]]),
    series('best', [[300, 148]], { preferred: true }),
  ];

  it('are the bulk ones unless the address says otherwise', () => {
    expect(defaultDrawnSeries(list)).toEqual(['crystal', 'best']);
    expect(readDrawnSeries(new URLSearchParams(''), list)).toEqual(['crystal', 'best']);
    expect(readDrawnSeries(new URLSearchParams('series=film'), list)).toEqual(['film']);
  });

  it('come back from the address, none of them included', () => {
    for (const drawn of [['film', 'best'], [], ['crystal', 'best']]) {
      const query = new URLSearchParams();
      writeDrawnSeries(query, drawn, list);
      expect(readDrawnSeries(query, list)).toEqual(drawn);
    }
  });

  it('stand with the preferred one first and films last', () => {
    expect(inReadingOrder(list).map((entry) => entry.series)).toEqual(['best', 'crystal', 'film']);
  });
});

describe('the verification of a series', () => {
  it('is one word where all points agree and counts them where they do not', () => {
    expect(seriesVerification(series('a', [[1, 1, 'checked']]))).toBe('checked');
    expect(
      seriesVerification(
        series('a', [
          [1, 1, 'checked'],
          [2, 1, 'from memory'],
          [3, 1, 'from memory'],
        ]),
      ),
    ).toBe('1 checked, 2 from memory');
    expect(seriesVerification(series('a', [[1, 1]]))).toBe('verification not stated');
  });
});
