import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  debyeHeatCapacityJPerKgK,
  debyeHeatCapacityJPerM3K,
  debyeHeatCapacityJPerMolK,
  debyeHeatCapacityRatio,
  gasConstantJPerMolK,
  kgPerU,
} from '#src/physics/index.ts';
import { expectRelative } from '#tests/support/approx.ts';
import { checksNamed, numberAfter } from '#tests/support/checks.ts';

interface DebyeTable {
  readonly program: string;
  readonly points: readonly { readonly thetaOverT: number; readonly heatCapacityRatio: number }[];
}
// The file is our own program's output; its shape is what the type says.
const table = JSON.parse(
  readFileSync(new URL('../../fixtures/debye-functions.json', import.meta.url), 'utf8'),
) as DebyeTable;

describe('the Debye heat capacity', () => {
  // Outside source: GSL's Debye functions (tests/fixtures/debye-functions.c writes the table).
  it(`agrees with ${table.program} from θ/T = 0.001 to 5000`, () => {
    expect(table.points.length).toBeGreaterThan(40);
    for (const { thetaOverT, heatCapacityRatio } of table.points) {
      expectRelative(debyeHeatCapacityRatio(thetaOverT), heatCapacityRatio, {
        within: 1e-12,
        because: `GSL's own error at θ/T = ${thetaOverT}`,
      });
    }
  });

  it('agrees with the printed high-accuracy table', () => {
    // Outside source: R. Pässler, Advances in Condensed Matter Physics 2017, 9321439, Table 7 (seen), 10 figures.
    const printed = [
      [0.1, 0.9995001785],
      [0.5, 0.9876107521],
      [1.0, 0.9517321357],
      [1.5, 0.8959504801],
      [5.0, 0.3686348236],
      [6.0, 0.2655968891],
      [8.0, 0.1381873779],
      [10.0, 0.07582100303],
      [12.0, 0.04478011684],
      [17.0, 0.01585873694],
    ] as const;
    for (const [thetaOverT, ratio] of printed) {
      expectRelative(debyeHeatCapacityRatio(thetaOverT), ratio, { within: 1e-9, because: 'figures printed' });
    }
  });

  it('agrees with the Debye functions of the mathematical handbook', () => {
    // Outside source: Abramowitz and Stegun, Table 27.1, D₃(x) to six decimals (seen in a public transcription);
    // C_V/(3N k_B) = 4 D₃(x) − 3x/(eˣ − 1).
    const printed = [
      [0.1, 0.963],
      [0.5, 0.824963],
      [1.0, 0.674416],
      [1.4, 0.570793],
      [2.0, 0.441129],
      [3.0, 0.28358],
      [4.0, 0.181737],
      [5.0, 0.117597],
    ] as const;
    for (const [x, d3] of printed) {
      expect(Math.abs(debyeHeatCapacityRatio(x) - (4 * d3 - (3 * x) / Math.expm1(x)))).toBeLessThan(
        4 * 5.5e-7,
      );
    }
  });

  it('agrees with the recomputed handbook values at T/θ from 0.02 to 5', () => {
    // Source: Debye 1912, computed in two ways by another program (tests/fixtures/checks.csv); eight decimals.
    const rows = checksNamed('debye_heat_capacity_ratio');
    for (const row of rows) {
      const ratio = debyeHeatCapacityRatio(1 / numberAfter('T/theta', row.inputs));
      expect(Math.abs(ratio - Number(row.expected)), row.inputs).toBeLessThan(1e-7);
    }
  });

  it('tends to the value of Dulong and Petit at high temperature', () => {
    // Outside source: Dulong and Petit 1819, 3R per mole of atoms; checks.csv prints 24.94 J/(mol K).
    const hot = debyeHeatCapacityJPerMolK({ debyeTemperatureK: 100, temperatureK: 1e6, atomsPerFormula: 1 });
    expectRelative(hot, 3 * gasConstantJPerMolK, { within: 1e-9, because: 'what remains is (θ/T)²/20' });
    for (const row of checksNamed('dulong_petit_limit')) {
      expectRelative(hot, parseFloat(row.expected), { within: 1e-4, because: 'digits printed in the row' });
    }
  });

  it('follows (12π⁴/5) R (T/θ)³ at low temperature', () => {
    // Outside source: Debye 1912; 12π⁴/5 R = 1943.8 J/(mol K).
    const debyeTemperatureK = 645;
    for (const temperatureK of [1, 2, 5]) {
      expectRelative(
        debyeHeatCapacityJPerMolK({ debyeTemperatureK, temperatureK, atomsPerFormula: 1 }),
        ((12 * Math.PI ** 4) / 5) * gasConstantJPerMolK * (temperatureK / debyeTemperatureK) ** 3,
        { within: 1e-12, because: 'T is below θ/100' },
      );
    }
  });

  it('is continuous where the series takes over', () => {
    expectRelative(debyeHeatCapacityRatio(0.99999e-4), debyeHeatCapacityRatio(1.00001e-4), {
      within: 1e-12,
      because: 'both are 1 − 5e-10',
    });
    expect(debyeHeatCapacityRatio(0)).toBe(1);
    expect(debyeHeatCapacityRatio(Infinity)).toBe(0);
    expect(debyeHeatCapacityRatio(NaN)).toBeNaN();
    expect(debyeHeatCapacityRatio(-1)).toBeNaN();
  });

  it('falls as the temperature falls, and stays between 0 and 1', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-6, max: 5000, noNaN: true }),
        fc.double({ min: 1.001, max: 3, noNaN: true }),
        (y, factor) => {
          const colder = debyeHeatCapacityRatio(y * factor);
          const warmer = debyeHeatCapacityRatio(y);
          expect(colder).toBeLessThanOrEqual(warmer);
          expect(colder).toBeGreaterThan(0);
          expect(warmer).toBeLessThanOrEqual(1);
        },
      ),
    );
  });

  it('says the same per volume, per mole and per kilogram', () => {
    // Silicon: 28.0855 u, 20.02 Å³ per atom.
    const state = { debyeTemperatureK: 645, temperatureK: 300 };
    const perMole = debyeHeatCapacityJPerMolK({ ...state, atomsPerFormula: 1 });
    const molarMassKg = 28.0855e-3;
    const perKg = debyeHeatCapacityJPerKgK({ ...state, meanMassKg: 28.0855 * kgPerU });
    expectRelative(perKg, perMole / molarMassKg, { within: 1e-8, because: 'u N_A is 1 g/mol within 3e-10' });
    const perM3 = debyeHeatCapacityJPerM3K({ ...state, volumePerAtomM3: 20.02e-30 });
    expectRelative(perM3, perKg * ((28.0855 * kgPerU) / 20.02e-30), { within: 1e-12, because: 'rounding' });
  });

  it('lies below the measured heat capacity of silicon by less than a tenth', () => {
    // Outside source: c_p = 19.789 J/(mol K) at 298 K (CRC Handbook, checked). One calorimetric 0 K value of θ cannot do better.
    const debye = debyeHeatCapacityJPerMolK({
      debyeTemperatureK: 645,
      temperatureK: 298.15,
      atomsPerFormula: 1,
    });
    expect(debye / 19.789).toBeGreaterThan(0.9);
    expect(debye / 19.789).toBeLessThan(1.05);
  });

  it('refuses temperatures and sizes that are not positive, by name', () => {
    expect(() =>
      debyeHeatCapacityJPerMolK({ debyeTemperatureK: 645, temperatureK: 0, atomsPerFormula: 1 }),
    ).toThrow('temperatureK must be a finite number above 0; it is 0.');
    expect(() =>
      debyeHeatCapacityJPerM3K({ debyeTemperatureK: -1, temperatureK: 1, volumePerAtomM3: 1 }),
    ).toThrow(RangeError);
    expect(() =>
      debyeHeatCapacityJPerKgK({ debyeTemperatureK: 1, temperatureK: 1, meanMassKg: NaN }),
    ).toThrow(/meanMassKg/);
  });
});
