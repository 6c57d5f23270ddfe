import { positive, requireInside } from './domain.ts';

/**
 * v_D = [(v_L⁻³ + 2 v_T⁻³)/3]^(−1/3), the velocity that gives a Debye solid the low-temperature heat capacity of one
 * longitudinal and two transverse branches, m/s.
 *
 * Source: Anderson, J. Phys. Chem. Solids 24, 909 (1963).
 *
 * @throws RangeError for a velocity that is not positive.
 */
export function meanSoundVelocityMPerS(longitudinalMPerS: number, transverseMPerS: number): number {
  requireInside('longitudinalMPerS', longitudinalMPerS, positive);
  requireInside('transverseMPerS', transverseMPerS, positive);
  return ((longitudinalMPerS ** -3 + 2 * transverseMPerS ** -3) / 3) ** (-1 / 3);
}

/**
 * Sound velocities of an isotropic solid from its moduli: v_L = √((K + 4G/3)/ρ), v_T = √(G/ρ), m/s.
 *
 * K bulk modulus, Pa; G shear modulus, Pa; ρ density, kg/m³. With Hill moduli: the average velocities of a polycrystal.
 *
 * @throws RangeError for an argument that is not positive.
 */
export function soundVelocities(input: {
  readonly bulkModulusPa: number;
  readonly shearModulusPa: number;
  readonly densityKgPerM3: number;
}): { readonly longitudinalMPerS: number; readonly transverseMPerS: number } {
  const bulk = requireInside('bulkModulusPa', input.bulkModulusPa, positive);
  const shear = requireInside('shearModulusPa', input.shearModulusPa, positive);
  const density = requireInside('densityKgPerM3', input.densityKgPerM3, positive);
  return {
    longitudinalMPerS: Math.sqrt((bulk + (4 / 3) * shear) / density),
    transverseMPerS: Math.sqrt(shear / density),
  };
}

/**
 * Poisson's ratio of an isotropic solid from its average velocities.
 *
 *   ν = (v_L² − 2v_T²)/(2(v_L² − v_T²))
 *
 * Between −1 and 1/2. A bulk modulus above zero asks for v_T < (√3/2) v_L.
 *
 * @throws RangeError for velocities that are not positive, or a pair that no stable solid has.
 */
export function poissonRatio(velocities: {
  readonly longitudinalMPerS: number;
  readonly transverseMPerS: number;
}): number {
  const longitudinal = requireInside('longitudinalMPerS', velocities.longitudinalMPerS, positive);
  const transverse = requireInside('transverseMPerS', velocities.transverseMPerS, {
    min: 0,
    minExcluded: true,
    max: (Math.sqrt(3) / 2) * longitudinal,
    maxExcluded: true,
  });
  const squaredRatio = (transverse / longitudinal) ** 2;
  return (1 - 2 * squaredRatio) / (2 * (1 - squaredRatio));
}

/**
 * Grüneisen parameter from the average sound velocities, for a crystal that has no published one.
 *
 *   γ = (3/2)(1 + ν)/(2 − 3ν), ν Poisson's ratio
 *
 * An empirical relation between elastic and anharmonic behaviour: mark the result as derived.
 * Source: Belomestnykh, Tech. Phys. Lett. 30, 91 (2004).
 *
 * @throws RangeError as `poissonRatio` does.
 */
export function gruneisenFromVelocities(velocities: {
  readonly longitudinalMPerS: number;
  readonly transverseMPerS: number;
}): number {
  const poisson = poissonRatio(velocities);
  return (1.5 * (1 + poisson)) / (2 - 3 * poisson);
}
