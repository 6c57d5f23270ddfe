import { boltzmannJPerK, reducedPlanckJS } from './constants.ts';
import type { BranchName, CrystalParameters, MechanismName, SampleParameters } from './crystal.ts';
import { headLimitOf } from './quadrature.ts';

/**
 * Scattering rates of one branch at one temperature, each a power of the reduced frequency x = ħω/(k_B T):
 *
 *   boundary  1/τ_B = (v/L)(1−p)/(1+p)                                  x⁰  Casimir 1938; Berman, Foster, Ziman 1955
 *   Umklapp   1/τ_U = s ħγ²ω²T/(M v² θ) exp(−θ/(3T))                     x²  Slack and Galginaitis 1964; Morelli et al. 2002
 *   defects   1/τ_D = V_a Γ ω⁴/(4π v³)                                  x⁴  Klemens 1955
 *   normal    1/τ_N = k_B³γ²V_a/(M ħ² v⁵) ω²T³ (longitudinal)            x²  Herring 1954; prefactors Morelli et al. 2002
 *             1/τ_N = k_B⁴γ²V_a/(M ħ³ v⁵) ωT⁴  (transverse)              x¹
 *
 * M = M̄ in kg, V_a volume per atom in m³. Kept as the natural logarithm of the coefficient (1/s), −∞ for a rate of
 * zero: the exponential of Umklapp scattering leaves the range of a double at low temperature.
 */
export interface BranchRates {
  readonly logResistive: Readonly<Record<MechanismName, number>>;
  readonly logNormal: number;
  readonly normalPower: 1 | 2;
}

function logBoundaryRate(velocityMPerS: number, sample: SampleParameters): number {
  if (sample.boundary === null) return -Infinity;
  const { effectiveLengthM, specularity } = sample.boundary;
  return Math.log(velocityMPerS / effectiveLengthM) + Math.log((1 - specularity) / (1 + specularity));
}

/** The rates of one branch; mechanisms that are switched off have a rate of zero. */
export function branchRates(input: {
  readonly branchName: BranchName;
  readonly crystal: CrystalParameters;
  readonly sample: SampleParameters;
  readonly temperatureK: number;
}): BranchRates {
  const { branchName, crystal, sample, temperatureK: T } = input;
  const { velocityMPerS: v, cutoffK: theta, gruneisen: gamma } = crystal[branchName];
  const volumePerAtomM3 = crystal.cellVolumeM3 / crystal.atomsPerCell;
  const M = crystal.meanMassKg;
  /** ω at x = 1. */
  const omega = (boltzmannJPerK * T) / reducedPlanckJS;
  const isOn = (name: MechanismName): boolean => sample.mechanisms.includes(name);
  const logDefect =
    Math.log(sample.massVariance) + Math.log((volumePerAtomM3 * omega ** 4) / (4 * Math.PI * v ** 3));
  const logUmklapp =
    Math.log(sample.umklappScale) +
    Math.log((reducedPlanckJS * gamma ** 2 * omega ** 2 * T) / (M * v ** 2 * theta)) -
    theta / (3 * T);
  // k_B T/ħ = ω at x = 1 turns both prefactors into γ²V_a k_B ω²·ω²T/(M v⁵) at x = 1; they differ in the power of x.
  const logNormal = Math.log((gamma ** 2 * volumePerAtomM3 * boltzmannJPerK * T * omega ** 4) / (M * v ** 5));
  return {
    logResistive: {
      boundary: isOn('boundary') ? logBoundaryRate(v, sample) : -Infinity,
      defect: isOn('defect') ? logDefect : -Infinity,
      umklapp: isOn('umklapp') ? logUmklapp : -Infinity,
    },
    logNormal,
    normalPower: branchName === 'longitudinal' ? 2 : 1,
  };
}

/** Resistive mechanisms in the order of their powers 0, 2 and 4 of x. */
const mechanismsByPower: readonly MechanismName[] = ['boundary', 'umklapp', 'defect'];

/**
 * The resistive rate of one branch in the form the integrals use:
 *
 *   1/τ(x) = e^logScale · x^lowestPower · (c₀ + c₁x² + c₂x⁴), c₀ > 0, largest coefficient of the three rates = 1
 *
 * The power in front keeps W·τ finite for x → 0 however far below 1 the rates cross.
 */
export interface ResistiveRate {
  readonly logScale: number;
  readonly lowestPower: 0 | 2 | 4;
  readonly coefficients: readonly [number, number, number];
  /** The mechanism that belongs to each coefficient; null beyond the last. */
  readonly mechanisms: readonly [MechanismName, MechanismName | null, MechanismName | null];
}

/** Null where no mechanism resists: each is switched off or has a rate of zero. */
export function resistiveRate(rates: BranchRates): ResistiveRate | null {
  const logs = mechanismsByPower.map((name) => rates.logResistive[name]);
  const logScale = Math.max(...logs);
  if (!Number.isFinite(logScale)) return null;
  const [c0 = 0, c2 = 0, c4 = 0] = logs.map((log) => Math.exp(log - logScale));
  if (c0 > 0) {
    return {
      logScale,
      lowestPower: 0,
      coefficients: [c0, c2, c4],
      mechanisms: ['boundary', 'umklapp', 'defect'],
    };
  }
  if (c2 > 0)
    return { logScale, lowestPower: 2, coefficients: [c2, c4, 0], mechanisms: ['umklapp', 'defect', null] };
  return { logScale, lowestPower: 4, coefficients: [c4, 0, 0], mechanisms: ['defect', null, null] };
}

/** Coefficient of the normal rate in units of the resistive scale, kept where products with it stay finite. */
export function relativeNormalCoefficient(rates: BranchRates, resistive: ResistiveRate): number {
  return Math.min(Math.max(Math.exp(rates.logNormal - resistive.logScale), 1e-300), 1e300);
}

/** Where the first panel of the quadrature may end: below every root of the denominator 1/τ (+ 1/τ_N). */
export function headLimit(
  resistive: ResistiveRate,
  normal: { readonly coefficient: number; readonly power: number } | null,
): number {
  const terms = resistive.coefficients.map((coefficient, index) => ({
    coefficient,
    power: resistive.lowestPower + 2 * index,
  }));
  return headLimitOf(normal === null ? terms : [...terms, normal]);
}
