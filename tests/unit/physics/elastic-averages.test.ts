import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  elasticDebyeTemperatureK,
  meanSoundVelocityMPerS,
  paPerGPa,
  poissonRatio,
  soundVelocities,
  voigtReussHill,
} from '#src/physics/index.ts';
import type { ElasticAverages, ElasticConstants } from '#src/physics/index.ts';
import { expectRelative } from '#tests/support/approx.ts';
import { checksNamed, numberAfter } from '#tests/support/checks.ts';

function inGPa(averages: ElasticAverages): Readonly<Record<'bulkHill' | 'shearHill', number>> {
  return { bulkHill: averages.bulkHillPa / paPerGPa, shearHill: averages.shearHillPa / paPerGPa };
}

function scaled<Constants extends object>(constantsGPa: Constants): { [Name in keyof Constants]: number } {
  // Every member is a number of GPa; mapping keeps the names.
  return Object.fromEntries(
    Object.entries(constantsGPa).map(([name, value]) => [name, Number(value) * paPerGPa]),
  ) as { [Name in keyof Constants]: number };
}

/** θ_el of Hill averages. */
function debyeTemperature(
  averages: ElasticAverages,
  densityKgPerM3: number,
  volumePerAtomM3: number,
): number {
  const { longitudinalMPerS, transverseMPerS } = soundVelocities({
    bulkModulusPa: averages.bulkHillPa,
    shearModulusPa: averages.shearHillPa,
    densityKgPerM3,
  });
  return elasticDebyeTemperatureK({
    meanVelocityMPerS: meanSoundVelocityMPerS(longitudinalMPerS, transverseMPerS),
    volumePerAtomM3,
  });
}

describe('Voigt, Reuss and Hill averages against published values', () => {
  it('magnesium oxide: K = 162.8 GPa and ν = 0.18', () => {
    // Outside source: Sumino, Anderson, Suzuki, Phys. Chem. Minerals 9, 38 (1983), abstract (seen): at 300 K
    // C11 = 296.6, C12 = 95.9, C44 = 156.2, K_S = 162.8 GPa. Zha, Mao, Hemley, PNAS 97, 13494 (2000), Fig. 5 (seen):
    // Poisson's ratio of the aggregate at zero pressure 0.18.
    const averages = voigtReussHill({
      system: 'cubic',
      constantsPa: scaled({ c11: 296.6, c12: 95.9, c44: 156.2 }),
    });
    expectRelative(averages.bulkHillPa, 162.8e9, { within: 4e-4, because: 'four figures printed' });
    const velocities = soundVelocities({
      bulkModulusPa: averages.bulkHillPa,
      shearModulusPa: averages.shearHillPa,
      densityKgPerM3: 3584,
    });
    expect(Math.abs(poissonRatio(velocities) - 0.18)).toBeLessThan(0.005);
  });

  it('corundum (trigonal, C14): K = 253.5 and G = 163.2 GPa', () => {
    // Outside source: Bass, Elasticity of Minerals, Glasses, and Melts, AGU Reference Shelf 2, 45 (1995): Hill averages of
    // the constants of Goto et al. 1989 (from memory).
    const averages = inGPa(
      voigtReussHill({
        system: 'trigonal',
        constantsPa: scaled({ c11: 497, c12: 162, c13: 116, c33: 501, c44: 147, c14: -22 }),
      }),
    );
    expectRelative(averages.bulkHill, 253.5, { within: 1e-3, because: 'constants rounded to 1 GPa' });
    expectRelative(averages.shearHill, 163.2, { within: 1e-3, because: 'constants rounded to 1 GPa' });
  });

  it('quartz (trigonal, C14): K = 37.8 and G = 44.3 GPa', () => {
    // Outside source: Bass 1995 as above (from memory).
    const averages = inGPa(
      voigtReussHill({
        system: 'trigonal',
        constantsPa: scaled({ c11: 86.6, c12: 6.7, c13: 12.6, c33: 106.1, c44: 57.8, c14: -17.8 }),
      }),
    );
    expectRelative(averages.bulkHill, 37.8, { within: 2e-3, because: 'three figures printed' });
    expectRelative(averages.shearHill, 44.3, { within: 2e-3, because: 'three figures printed' });
  });

  it('stishovite (tetragonal): K = 316 and G = 220 GPa', () => {
    // Outside source: Weidner, Bass, Ringwood, Sinclair, J. Geophys. Res. 87, 4740 (1982), as in Bass 1995 (from memory).
    const averages = inGPa(
      voigtReussHill({
        system: 'tetragonal',
        constantsPa: scaled({ c11: 453, c12: 211, c13: 203, c33: 776, c44: 252, c66: 302 }),
      }),
    );
    expectRelative(averages.bulkHill, 316, { within: 2e-3, because: 'three figures printed' });
    expectRelative(averages.shearHill, 220, { within: 2e-3, because: 'three figures printed' });
  });

  it('cuprous oxide: Debye temperature 181 K', () => {
    // Outside source: Hallberg and Hanson, phys. stat. sol. (b) 42, 305 (1970), abstract (seen): at low temperature
    // C11 = 121, C12 = 105, C44 = 10.9 GPa give 181 K. Cubic cell of 6 atoms, a = 4.2696 Å, 6106 kg/m³ (seen).
    const averages = voigtReussHill({
      system: 'cubic',
      constantsPa: scaled({ c11: 121, c12: 105, c44: 10.9 }),
    });
    expectRelative(debyeTemperature(averages, 6106, 4.2696e-10 ** 3 / 6), 181, {
      within: 0.01,
      because: 'the paper averages over directions exactly; lattice parameter at room temperature',
    });
  });

  it('cadmium (hexagonal): Debye temperature 213 K, less what Hill averaging misses', () => {
    // Outside source: Garland and Silverman, Phys. Rev. 119, 1218 (1960), abstract (seen): at 0 K C11 = 130.8, C33 = 57.37,
    // C44 = 24.49, C12 = 40.48, C13 = 41.45 GPa give 213 ± 1 K by exact averaging over directions. Cell: a = 2.979,
    // c = 5.617 Å (from memory), two atoms of 112.41 u.
    const averages = voigtReussHill({
      system: 'hexagonal',
      constantsPa: scaled({ c11: 130.8, c12: 40.48, c13: 41.45, c33: 57.37, c44: 24.49 }),
    });
    const volumePerAtomM3 = ((Math.sqrt(3) / 2) * 2.979 ** 2 * 5.617e-30) / 2;
    const densityKgPerM3 = (112.41 * 1.66054e-27) / volumePerAtomM3;
    const theta = debyeTemperature(averages, densityKgPerM3, volumePerAtomM3);
    expectRelative(theta, 213, {
      within: 0.04,
      because: 'Hill moduli lie too high in so anisotropic a crystal',
    });
    expect(theta).toBeGreaterThan(213);
  });

  it('hexagonal crystals follow the published closed forms', () => {
    // Outside source: Berryman, Stanford Exploration Project report 125 (2006), appendix A, equations 22 to 25 (seen):
    // K_V = [2(C11 + C12) + 4C13 + C33]/9, G_V = (G_eff + 2C44 + 2C66)/5, G_eff = (C11 + C33 − 2C13 − C66)/3,
    // 1/(K_R − C13) = 1/(C11 − C66 − C13) + 1/(C33 − C13). Constants: GaN, Polian et al. 1996, abstract (seen).
    const [c11, c12, c13, c33, c44] = [390, 145, 106, 398, 105];
    const c66 = (c11 - c12) / 2;
    const averages = voigtReussHill({ system: 'hexagonal', constantsPa: { c11, c12, c13, c33, c44 } });
    const rounding = { within: 1e-12, because: 'the same equation in another form' };
    expectRelative(averages.bulkVoigtPa, (2 * (c11 + c12) + 4 * c13 + c33) / 9, rounding);
    expectRelative(
      averages.shearVoigtPa,
      ((c11 + c33 - 2 * c13 - c66) / 3 + 2 * c44 + 2 * c66) / 5,
      rounding,
    );
    expectRelative(averages.bulkReussPa, c13 + 1 / (1 / (c11 - c66 - c13) + 1 / (c33 - c13)), rounding);
  });
});

describe('Voigt, Reuss and Hill averages against another program', () => {
  it('agree with the cubic averages, velocities and Debye temperatures of the check table', () => {
    // Computed from Hill 1952 and Anderson 1963 by another program (tests/fixtures/checks.csv); no printed values.
    const velocityRows = checksNamed('velocities_from_vrh');
    const thetaRows = checksNamed('debye_temperature_from_velocities');
    const rows = checksNamed('vrh_cubic');
    expect(rows).toHaveLength(velocityRows.length);
    rows.forEach((row, index) => {
      const constantsPa = scaled({
        c11: numberAfter('C11', row.inputs),
        c12: numberAfter('C12', row.inputs),
        c44: numberAfter('C44', row.inputs),
      });
      const averages = voigtReussHill({ system: 'cubic', constantsPa });
      const digits = { within: 1e-4, because: row.inputs };
      expectRelative(averages.bulkHillPa / paPerGPa, numberAfter('B', row.expected), digits);
      expectRelative(averages.shearVoigtPa / paPerGPa, numberAfter('G_V', row.expected), digits);
      expectRelative(averages.shearReussPa / paPerGPa, numberAfter('G_R', row.expected), digits);
      expectRelative(averages.shearHillPa / paPerGPa, numberAfter('G_H', row.expected), digits);
      const velocityRow = velocityRows[index];
      const thetaRow = thetaRows[index];
      if (velocityRow === undefined || thetaRow === undefined)
        throw new Error(`No velocities for ${row.inputs}.`);
      const velocities = soundVelocities({
        bulkModulusPa: averages.bulkHillPa,
        shearModulusPa: averages.shearHillPa,
        densityKgPerM3: numberAfter('rho', velocityRow.inputs),
      });
      const mean = meanSoundVelocityMPerS(velocities.longitudinalMPerS, velocities.transverseMPerS);
      expectRelative(velocities.longitudinalMPerS, numberAfter('v_L', velocityRow.expected), digits);
      expectRelative(velocities.transverseMPerS, numberAfter('v_T', velocityRow.expected), digits);
      expectRelative(mean, numberAfter('v_m', velocityRow.expected), digits);
      expect(poissonRatio(velocities)).toBeCloseTo(numberAfter('nu_H', row.expected), 4);
      const atoms = Number(/(\d+) atoms in/.exec(thetaRow.inputs)?.[1]);
      const edgeM = numberAfter('a', thetaRow.inputs) * 1e-10;
      expectRelative(
        elasticDebyeTemperatureK({ meanVelocityMPerS: mean, volumePerAtomM3: edgeM ** 3 / atoms }),
        parseFloat(thetaRow.expected),
        digits,
      );
    });
  });

  it('lie near the exact average over directions where a crystal is nearly isotropic', () => {
    // Computed from Christoffel's equation by another program (tests/fixtures/checks.csv): averages v⁻³ over directions.
    for (const row of checksNamed('debye_temperature_exact_elastic')) {
      const averages = voigtReussHill({
        system: 'cubic',
        constantsPa: scaled({
          c11: numberAfter('C11', row.inputs),
          c12: numberAfter('C12', row.inputs),
          c44: numberAfter('C44', row.inputs),
        }),
      });
      const atoms = Number(/(\d+) atoms in/.exec(row.inputs)?.[1]);
      const volumePerAtomM3 = (numberAfter('a', row.inputs) * 1e-10) ** 3 / atoms;
      const theta = debyeTemperature(averages, numberAfter('rho', row.inputs), volumePerAtomM3);
      expectRelative(theta, parseFloat(row.expected), {
        within: 0.035,
        because: 'Hill against exact; lead is 3 % off',
      });
    }
  });
});

describe('limits of the elastic averages', () => {
  it('an isotropic tensor has the same moduli in every crystal system', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 500, noNaN: true }),
        fc.double({ min: 1, max: 500, noNaN: true }),
        (bulk, shear) => {
          const c11 = bulk + (4 / 3) * shear;
          const c12 = bulk - (2 / 3) * shear;
          const uniaxial = { c11, c12, c13: c12, c33: c11, c44: shear };
          const same: readonly ElasticConstants[] = [
            { system: 'cubic', constantsPa: { c11, c12, c44: shear } },
            { system: 'hexagonal', constantsPa: uniaxial },
            { system: 'trigonal', constantsPa: { ...uniaxial, c14: 0 } },
            { system: 'tetragonal', constantsPa: { ...uniaxial, c66: shear } },
          ];
          for (const elastic of same) {
            const averages = voigtReussHill(elastic);
            const rounding = { within: 1e-11, because: elastic.system };
            for (const value of [averages.bulkVoigtPa, averages.bulkReussPa])
              expectRelative(value, bulk, rounding);
            for (const value of [averages.shearVoigtPa, averages.shearReussPa])
              expectRelative(value, shear, rounding);
          }
        },
      ),
    );
  });

  it('Reuss never exceeds Voigt, and Hill lies between', () => {
    // Outside source: Hill 1952, the extremum principles of elasticity.
    const part = fc.double({ min: -0.95, max: 0.95, noNaN: true });
    const size = fc.double({ min: 0.1, max: 3, noNaN: true });
    fc.assert(
      fc.property(part, part, part, size, size, (p, q, r, c33, c44) => {
        const [c11, c12] = [1, p];
        const constantsPa = {
          c11,
          c12,
          c13: q * Math.sqrt((c33 * (c11 + c12)) / 2),
          c33,
          c44,
          c14: r * Math.sqrt(((c11 - c12) * c44) / 2),
        };
        const averages = voigtReussHill({ system: 'trigonal', constantsPa });
        expect(averages.bulkReussPa).toBeLessThanOrEqual(averages.bulkVoigtPa * (1 + 1e-12));
        expect(averages.shearReussPa).toBeLessThanOrEqual(averages.shearVoigtPa * (1 + 1e-12));
        expect(averages.bulkReussPa).toBeGreaterThan(0);
        expect(averages.shearReussPa).toBeGreaterThan(0);
        expect(averages.bulkHillPa).toBeCloseTo(0.5 * (averages.bulkVoigtPa + averages.bulkReussPa), 12);
      }),
    );
  });

  it('refuses constants that no stable crystal has, and constants that are no numbers', () => {
    expect(() => voigtReussHill({ system: 'cubic', constantsPa: { c11: 1, c12: 2, c44: 1 } })).toThrow(
      /stable cubic crystal/,
    );
    expect(() =>
      voigtReussHill({
        system: 'trigonal',
        constantsPa: { c11: 2, c12: 1, c13: 0, c33: 1, c44: 1, c14: 0.8 },
      }),
    ).toThrow(/stable trigonal crystal/);
    expect(() => voigtReussHill({ system: 'cubic', constantsPa: { c11: NaN, c12: 2, c44: 1 } })).toThrow(
      'constantsPa.c11 must be a finite number; it is NaN.',
    );
  });
});
