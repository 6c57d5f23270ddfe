import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { budgetInWords, limitedBy } from '#src/components/material/budget-words.ts';
import { chartFrame, kappaExtent, ticksWithin } from '#src/components/material/chart-frame.ts';
import { factorFigures, kappaFigures } from '#src/components/material/factors.ts';
import { placeLabels, type Spot } from '#src/components/material/label-placement.ts';
import {
  curveTemperaturesK,
  nearestIndex,
  temperatureExtentK,
  usualTemperatureK,
} from '#src/components/material/temperatures.ts';
import type { EstimatePoint } from '#src/schemas/estimate.ts';

function point(change: Partial<EstimatePoint>): EstimatePoint {
  return {
    T_K: 300,
    kappa_W_mK: 100,
    low_W_mK: null,
    high_W_mK: null,
    heat_capacity_J_m3K: 1e6,
    velocity_m_s: 6000,
    mean_free_path_m: 5e-8,
    porosity_factor: 1,
    share: {},
    floor_W_mK: null,
    ...change,
  };
}

describe('the factors shown', () => {
  it('multiply to the κ shown, for any crystal and temperature (κ = ⅓ C v l, kinetic theory)', () => {
    const magnitude = fc.double({ min: 1, max: 10, maxExcluded: true, noNaN: true });
    fc.assert(
      fc.property(
        magnitude,
        magnitude,
        magnitude,
        fc.double({ min: 0.1, max: 1, noNaN: true }),
        (c, v, l, pores) => {
          const heat_capacity_J_m3K = c * 1e5;
          const velocity_m_s = v * 1e3;
          const mean_free_path_m = l * 1e-8;
          const kappa_W_mK = (heat_capacity_J_m3K * velocity_m_s * mean_free_path_m * pores) / 3;
          const shown = point({
            heat_capacity_J_m3K,
            velocity_m_s,
            mean_free_path_m,
            kappa_W_mK,
            porosity_factor: pores,
          });
          const figures = factorFigures(shown);
          const read = (value: number): number => Number(value.toPrecision(figures));
          const product =
            (read(heat_capacity_J_m3K) * read(velocity_m_s) * read(mean_free_path_m) * read(pores)) / 3;
          expect(product.toPrecision(kappaFigures)).toBe(kappa_W_mK.toPrecision(kappaFigures));
        },
      ),
    );
  });
});

describe('the rate budget in words', () => {
  const at = (T_K: number, boundary: number, defect: number, umklapp: number): EstimatePoint =>
    point({ T_K, share: { boundary, defect, umklapp } });

  it('names who turns phonons back in each range of temperature', () => {
    const words = budgetInWords([
      at(2, 0.9, 0.1, 0),
      at(10, 0.6, 0.4, 0),
      at(25, 0.3, 0.5, 0.2),
      at(60, 0.1, 0.3, 0.6),
      at(300, 0, 0.1, 0.9),
    ]);
    expect(words).toBe(
      'Below 25\u202fK it is mostly the crystal’s own surface; from there to 60\u202fK isotopes and other point defects; above 60\u202fK other phonons.',
    );
  });

  it('says so when one mechanism rules everywhere, and nothing when nothing is known', () => {
    expect(budgetInWords([at(2, 1, 0, 0), at(300, 1, 0, 0)])).toContain('At every temperature');
    expect(budgetInWords([point({})])).toBe('');
    expect(limitedBy(point({}))).toBeNull();
  });
});

describe('the temperature axis', () => {
  it('runs from 2 K to 1500 K where the crystal stays solid and nothing was measured outside', () => {
    expect(temperatureExtentK({ solidUpToK: 1687, measuredK: [10, 300, 1400] })).toEqual([2, 1500]);
  });

  it('ends at the melting point of a crystal that melts earlier', () => {
    expect(temperatureExtentK({ solidUpToK: 83.8, measuredK: [8, 77] })).toEqual([2, 83.8]);
  });

  it('widens to hold what was measured outside, but not what the estimator refuses', () => {
    expect(temperatureExtentK({ solidUpToK: null, measuredK: [1.4, 1673.2, 0.3] })).toEqual([1.4, 1674]);
  });

  it('has ascending temperatures that hold both ends, helium, nitrogen and the room', () => {
    const grid = curveTemperaturesK([2, 1500]);
    expect(grid).toEqual([...grid].sort((a, b) => a - b));
    expect(new Set(grid).size).toBe(grid.length);
    expect(grid).toEqual(expect.arrayContaining([2, 4.2, 77, 273.15, 300, 1500]));
  });

  it('is close enough that no step between neighbours passes a tenth', () => {
    const grid = curveTemperaturesK([2, 1500]);
    const steps = grid.slice(1).map((temperature, index) => temperature / (grid[index] ?? Number.NaN));
    expect(Math.max(...steps)).toBeLessThan(1.101);
  });

  it('points at 300 K, or lower where the crystal melts before', () => {
    expect(usualTemperatureK([2, 1500])).toBe(300);
    expect(usualTemperatureK([2, 83.8])).toBe(42);
  });

  it('finds the nearest temperature by ratio, as it looks on the axis', () => {
    expect(nearestIndex([10, 100], 31)).toBe(0);
    expect(nearestIndex([10, 100], 32)).toBe(1);
  });
});

describe('the κ axis', () => {
  it('holds everything drawn and ends on 1, 2 or 5 of a decade', () => {
    const [low, high] = kappaExtent(
      [[point({ kappa_W_mK: 0.7, floor_W_mK: 0.5 }), point({ kappa_W_mK: 4300 })]],
      [],
    );
    expect(low).toBeLessThanOrEqual(0.7);
    expect(high).toBeGreaterThanOrEqual(4300);
    for (const end of [low, high]) expect(['1', '2', '5']).toContain(end.toExponential().charAt(0));
  });

  it('is logarithmic: equal ratios take equal lengths', () => {
    const frame = chartFrame([1, 100], [1, 10000]);
    expect(frame.x(10)).toBeCloseTo(50, 9);
    expect(frame.y(100)).toBeCloseTo(50, 9);
    expect(frame.temperatureAt(0.5)).toBeCloseTo(10, 9);
  });

  it('has gridlines at 1, 2 and 5 of each decade', () => {
    expect(ticksWithin([2, 100]).map(({ value }) => value)).toEqual([2, 5, 10, 20, 50, 100]);
  });
});

describe('names of curves', () => {
  it('stand on no curve and on no other name', () => {
    const rising: Spot[] = Array.from({ length: 101 }, (_, x) => ({ x, y: 100 - x }));
    const low: Spot[] = Array.from({ length: 101 }, (_, x) => ({ x, y: 90 }));
    const placed = placeLabels(
      [
        { key: 'estimate', length: { wide: 8, narrow: 8 }, own: rising },
        { key: 'floor', length: { wide: 5, narrow: 5 }, own: low },
      ],
      [...rising, ...low],
    );
    expect(placed.size).toBe(2);
    for (const spot of placed.values()) {
      expect(rising.some(({ x, y }) => Math.hypot(x - spot.x, y - spot.y) < 1.5)).toBe(false);
    }
    expect(placed.get('estimate')).not.toEqual(placed.get('floor'));
  });

  it('are left out where there is no room', () => {
    const everywhere: Spot[] = [];
    for (let x = 0; x <= 100; x += 1) for (let y = 0; y <= 100; y += 2) everywhere.push({ x, y });
    expect(
      placeLabels([{ key: 'a', length: { wide: 8, narrow: 8 }, own: everywhere }], everywhere).size,
    ).toBe(0);
  });
});
