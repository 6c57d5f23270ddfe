import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { interpolateSeries } from '#src/services/series-interpolation.ts';
import { expectRelative } from '#tests/support/approx.ts';

function series(
  ...points: readonly (readonly [number, number])[]
): { temperatureK: number; kappaWPerMK: number }[] {
  return points.map(([temperatureK, kappaWPerMK]) => ({ temperatureK, kappaWPerMK }));
}

describe('κ between measured points', () => {
  it('is the measured value at a measured temperature', () => {
    expect(interpolateSeries(series([200, 264], [300, 148], [400, 98.9]), 300)).toBe(148);
    expect(interpolateSeries(series([300, 148]), 300)).toBe(148);
  });

  it('follows a power law exactly, for any exponent', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -4, max: 4, noNaN: true }),
        fc.double({ min: 200, max: 299, noNaN: true }),
        fc.double({ min: 301, max: 400, noNaN: true }),
        (exponent, low, high) => {
          const kappa = (temperatureK: number): number => 100 * (temperatureK / 300) ** exponent;
          const value = interpolateSeries(series([low, kappa(low)], [high, kappa(high)]), 300);
          expectRelative(value ?? NaN, 100, {
            within: 1e-12,
            because: 'a power law is a straight line in logarithms',
          });
        },
      ),
    );
  });

  it('is not known between neighbours more than a factor of 2 apart', () => {
    expect(interpolateSeries(series([200, 1], [400, 1]), 300)).toBe(1);
    expect(interpolateSeries(series([199.9, 1], [400, 1]), 300)).toBeNull();
    expect(interpolateSeries(series([150, 1], [300.001, 1]), 300)).toBeNull();
  });

  it('is never extrapolated, not even by a degree', () => {
    expect(interpolateSeries(series([100, 1], [299, 1]), 300)).toBeNull();
    expect(interpolateSeries(series([301, 1], [400, 1]), 300)).toBeNull();
    expect(interpolateSeries(series([298, 1]), 300)).toBeNull();
    expect(interpolateSeries([], 300)).toBeNull();
  });

  it('takes the two nearest neighbours, whatever the order of the points', () => {
    const points = series([400, 100], [250, 100], [290, 50], [310, 50], [100, 1000]);
    expectRelative(interpolateSeries(points, 300) ?? NaN, 50, {
      within: 1e-12,
      because: 'both neighbours are 50',
    });
  });
});
