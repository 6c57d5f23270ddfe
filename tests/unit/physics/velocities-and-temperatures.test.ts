import { describe, expect, it } from 'vitest';
import {
  acousticDebyeTemperatureK,
  branchCutoffTemperatureK,
  debyeHeatCapacityJPerM3K,
  elasticDebyeTemperatureK,
  gruneisenFromVelocities,
  hzPerTHz,
  meanSoundVelocityMPerS,
  poissonRatio,
  soundVelocities,
  thetaFromFrequencyK,
} from '#src/physics/index.ts';
import { expectRelative } from '#tests/support/approx.ts';

describe('sound velocities', () => {
  it('of diamond along [100] are 17.52 and 12.82 km/s', () => {
    // Outside source: Ioffe Institute data page on diamond (seen): C11 = 1076, C44 = 577 GPa (McSkimin and Andreatch 1972,
    // from memory), 3515 kg/m³; a longitudinal modulus K + 4G/3 with G = C44 stands for C11.
    const { longitudinalMPerS, transverseMPerS } = soundVelocities({
      bulkModulusPa: 1076e9 - (4 / 3) * 577e9,
      shearModulusPa: 577e9,
      densityKgPerM3: 3515,
    });
    expectRelative(longitudinalMPerS, 17520, { within: 2e-3, because: 'four figures printed' });
    expectRelative(transverseMPerS, 12820, { within: 2e-3, because: 'four figures printed' });
  });

  it('average to the one velocity when the branches agree', () => {
    expectRelative(meanSoundVelocityMPerS(5000, 5000), 5000, { within: 1e-14, because: 'rounding' });
  });

  it('give Poisson’s ratio 1/4 for a Cauchy solid and 1/2 in the limit of a liquid', () => {
    // Outside source: elasticity of isotropic bodies, λ = G gives v_L = √3 v_T and ν = 1/4 (Poisson 1829).
    expectRelative(poissonRatio({ longitudinalMPerS: Math.sqrt(3), transverseMPerS: 1 }), 0.25, {
      within: 1e-14,
      because: 'rounding',
    });
    expect(poissonRatio({ longitudinalMPerS: 1, transverseMPerS: 1e-9 })).toBeCloseTo(0.5, 12);
  });

  it('give a Grüneisen parameter of 1.5 for ν = 1/4, and near 2 for metals', () => {
    // Outside source: Belomestnykh 2004: γ = (3/2)(1 + ν)/(2 − 3ν); ν = 1/4 gives 1.875/1.25 = 1.5.
    expectRelative(gruneisenFromVelocities({ longitudinalMPerS: Math.sqrt(3), transverseMPerS: 1 }), 1.5, {
      within: 1e-13,
      because: 'rounding',
    });
    // Copper: γ = 2.0 from thermal expansion (from memory); the relation is good to some 15 %.
    const copper = gruneisenFromVelocities({ longitudinalMPerS: 4760, transverseMPerS: 2330 });
    expectRelative(copper, 2.0, { within: 0.15, because: 'an empirical relation' });
  });

  it('refuses a pair that no stable solid has', () => {
    expect(() => poissonRatio({ longitudinalMPerS: 1000, transverseMPerS: 900 })).toThrow(
      /transverseMPerS must be above 0 and below 866\.0/,
    );
    expect(() => meanSoundVelocityMPerS(0, 1)).toThrow(/longitudinalMPerS/);
  });
});

describe('Debye temperatures', () => {
  it('of copper from its polycrystal velocities lie within 4 % of the calorimetric 343 K', () => {
    // Outside source: velocities 4760 and 2330 m/s (tabulated, seen), a = 3.6147 Å; θ = 343 K (Kittel, from memory).
    const theta = elasticDebyeTemperatureK({
      meanVelocityMPerS: meanSoundVelocityMPerS(4760, 2330),
      volumePerAtomM3: 3.6147e-10 ** 3 / 4,
    });
    expectRelative(theta, 343, { within: 0.04, because: 'room-temperature velocities' });
  });

  it('make the branch picture and the Debye solid agree at low temperature', () => {
    // Outside source: Debye 1912; C = (12π⁴/5)(k_B/V)(T/θ)³ with θ from the mean velocity counts the same modes as one
    // longitudinal and two transverse branches: C = (2π²/15) k_B⁴T³/ħ³ Σ w v⁻³ … written with each branch's own cut-off.
    const volumePerAtomM3 = 20e-30;
    const [vL, vT] = [8000, 5000];
    const third = (velocityMPerS: number): number => {
      const debyeTemperatureK = branchCutoffTemperatureK({ velocityMPerS, cellVolumeM3: volumePerAtomM3 });
      return debyeHeatCapacityJPerM3K({ debyeTemperatureK, temperatureK: 2, volumePerAtomM3 }) / 3;
    };
    const debyeTemperatureK = elasticDebyeTemperatureK({
      meanVelocityMPerS: meanSoundVelocityMPerS(vL, vT),
      volumePerAtomM3,
    });
    expectRelative(
      third(vL) + 2 * third(vT),
      debyeHeatCapacityJPerM3K({ debyeTemperatureK, temperatureK: 2, volumePerAtomM3 }),
      {
        within: 1e-12,
        because: 'rounding',
      },
    );
  });

  it('of the acoustic modes of silicon is 512 K, of garnet a quarter of the whole', () => {
    // Outside source: Slack 1973, θ_a = θ n^(−1/3); 645/2^(1/3) = 511.9, and 80^(1/3) = 4.31.
    expectRelative(acousticDebyeTemperatureK({ debyeTemperatureK: 645, atomsPerCell: 2 }), 511.9, {
      within: 1e-4,
      because: 'four figures',
    });
    expectRelative(acousticDebyeTemperatureK({ debyeTemperatureK: 750, atomsPerCell: 80 }), 750 / 4.3089, {
      within: 1e-4,
      because: 'five figures',
    });
    expect(() => acousticDebyeTemperatureK({ debyeTemperatureK: 645, atomsPerCell: 1.5 })).toThrow(
      'atomsPerCell must be a whole number of at least 1; it is 1.5.',
    );
  });

  it('of the zone-boundary phonons of silicon are 590 and 215 K', () => {
    // Outside source: Dolling 1963 at X: 12.3 and 4.49 THz (from memory).
    expectRelative(thetaFromFrequencyK(12.3 * hzPerTHz), 590.3, {
      within: 1e-4,
      because: '47.992 K per THz',
    });
    expectRelative(thetaFromFrequencyK(4.49 * hzPerTHz), 215.5, {
      within: 1e-4,
      because: '47.992 K per THz',
    });
  });
});
