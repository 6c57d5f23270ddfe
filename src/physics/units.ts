import { atomicMassKg, boltzmannJPerK, planckJS } from './constants.ts';

/**
 * Factors between SI and the units people use. Physics computes in SI; a factor is applied once, at the edge:
 * `cellVolumeM3 = cellVolumeA3 * m3PerCubicAngstrom`, `modulusGPa = modulusPa / paPerGPa`.
 */

export const m3PerCubicAngstrom = 1e-30;
/** Unified atomic mass unit, u. */
export const kgPerU = atomicMassKg;
export const paPerGPa = 1e9;
export const hzPerTHz = 1e12;
/** hν/k_B of 1 THz, about 47.99 K. */
export const kPerTHz = (planckJS * hzPerTHz) / boltzmannJPerK;
