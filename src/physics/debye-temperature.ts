import { boltzmannJPerK, planckJS, reducedPlanckJS } from './constants.ts';
import { positive, requireCount, requireInside } from './domain.ts';

/** θ = (ħ/k_B) v (6π²/V)^(1/3): linear dispersion filled with one mode per volume V. */
function cutoffK(velocityMPerS: number, volumeM3: number): number {
  return (reducedPlanckJS / boltzmannJPerK) * velocityMPerS * Math.cbrt((6 * Math.PI ** 2) / volumeM3);
}

/**
 * θ_el = (ħ/k_B) v_D (6π²/V_a)^(1/3), Debye temperature from the sound velocities, K.
 *
 * v_D mean sound velocity, m/s; V_a volume per atom, m³. Source: Anderson, J. Phys. Chem. Solids 24, 909 (1963).
 *
 * @throws RangeError for an argument that is not positive.
 */
export function elasticDebyeTemperatureK(input: {
  readonly meanVelocityMPerS: number;
  readonly volumePerAtomM3: number;
}): number {
  requireInside('meanVelocityMPerS', input.meanVelocityMPerS, positive);
  requireInside('volumePerAtomM3', input.volumePerAtomM3, positive);
  return cutoffK(input.meanVelocityMPerS, input.volumePerAtomM3);
}

/**
 * θ_j = (ħ/k_B) v_j (6π²/V_c)^(1/3), cut-off of an acoustic branch whose zone-boundary frequency is not known, K.
 *
 * v_j velocity of the branch, m/s; V_c volume of the primitive cell, m³: one mode of the branch for each cell.
 * Mark the result as derived: dispersion bends real branches down, the transverse ones of open structures by half.
 *
 * @throws RangeError for an argument that is not positive.
 */
export function branchCutoffTemperatureK(input: {
  readonly velocityMPerS: number;
  readonly cellVolumeM3: number;
}): number {
  requireInside('velocityMPerS', input.velocityMPerS, positive);
  requireInside('cellVolumeM3', input.cellVolumeM3, positive);
  return cutoffK(input.velocityMPerS, input.cellVolumeM3);
}

/**
 * θ_a = θ_D n^(−1/3), Debye temperature of the acoustic modes alone, K.
 *
 * n atoms in the primitive cell. Source: Slack, J. Phys. Chem. Solids 34, 321 (1973); Solid State Physics 34, 1 (1979).
 *
 * @throws RangeError for a temperature that is not positive or n that is not a whole number of at least 1.
 */
export function acousticDebyeTemperatureK(input: {
  readonly debyeTemperatureK: number;
  readonly atomsPerCell: number;
}): number {
  requireInside('debyeTemperatureK', input.debyeTemperatureK, positive);
  requireCount('atomsPerCell', input.atomsPerCell);
  return input.debyeTemperatureK / Math.cbrt(input.atomsPerCell);
}

/**
 * θ = hν/k_B, the temperature of a phonon frequency, K.
 *
 * @throws RangeError for a frequency that is not positive.
 */
export function thetaFromFrequencyK(frequencyHz: number): number {
  return (planckJS * requireInside('frequencyHz', frequencyHz, positive)) / boltzmannJPerK;
}
