import { avogadroPerMol, boltzmannJPerK } from './constants.ts';
import { boseWeight } from './bose-weight.ts';
import { positive, requireInside } from './domain.ts';
import { integrateSpectrum } from './quadrature.ts';

/**
 * ∫₀^y x⁴eˣ/(eˣ−1)² dx, the integral of Debye's heat capacity.
 *
 * y = θ/T ≥ 0. Tends to 4π⁴/15 for y → ∞ and to y³/3 for y → 0. NaN for NaN.
 */
export function debyeIntegral(thetaOverT: number): number {
  if (!(thetaOverT > 0)) return thetaOverT === 0 ? 0 : NaN;
  const { values } = integrateSpectrum({
    upperLimit: thetaOverT,
    headLimit: 1,
    integrandCount: 1,
    integrands: (x, out) => {
      out[0] = boseWeight(x);
    },
  });
  return values[0] ?? NaN;
}

/** Below it the series is exact in double precision: the next term is y⁴/560 < 2e-19. */
const seriesBelow = 1e-4;

/**
 * C_V/(3N k_B) of Debye's model: the heat capacity as a fraction of the Dulong–Petit value.
 *
 *   C_V/(3N k_B) = 3 (T/θ)³ ∫₀^{θ/T} x⁴eˣ/(eˣ−1)² dx
 *
 * Argument: θ/T ≥ 0. Goes from 1 (θ/T → 0; as 1 − y²/20) to (4π⁴/5)(T/θ)³ (θ/T → ∞). NaN for NaN or a negative argument.
 * Source: Debye, Ann. Phys. 39, 789 (1912).
 * Accuracy: 1e-12 relative against GSL's Debye functions (tests/fixtures/debye-functions.json).
 */
export function debyeHeatCapacityRatio(thetaOverT: number): number {
  if (!(thetaOverT >= 0)) return NaN;
  if (thetaOverT < seriesBelow) return 1 - (thetaOverT * thetaOverT) / 20;
  return (3 * debyeIntegral(thetaOverT)) / thetaOverT ** 3;
}

function checkedRatio(debyeTemperatureK: number, temperatureK: number): number {
  requireInside('debyeTemperatureK', debyeTemperatureK, positive);
  requireInside('temperatureK', temperatureK, positive);
  return debyeHeatCapacityRatio(debyeTemperatureK / temperatureK);
}

/**
 * Debye heat capacity at constant volume, all 3N modes, J m⁻³ K⁻¹.
 *
 *   C_V = (3 k_B/V_a) · debyeHeatCapacityRatio(θ/T), V_a volume per atom, m³
 *
 * @throws RangeError for a temperature or volume that is not positive.
 */
export function debyeHeatCapacityJPerM3K(input: {
  readonly debyeTemperatureK: number;
  readonly temperatureK: number;
  readonly volumePerAtomM3: number;
}): number {
  requireInside('volumePerAtomM3', input.volumePerAtomM3, positive);
  const ratio = checkedRatio(input.debyeTemperatureK, input.temperatureK);
  return ((3 * boltzmannJPerK) / input.volumePerAtomM3) * ratio;
}

/**
 * Debye heat capacity at constant volume per mole of formula units, J mol⁻¹ K⁻¹.
 *
 *   C_V = 3 z N_A k_B · debyeHeatCapacityRatio(θ/T), z atoms per formula unit
 *
 * @throws RangeError for an argument that is not positive.
 */
export function debyeHeatCapacityJPerMolK(input: {
  readonly debyeTemperatureK: number;
  readonly temperatureK: number;
  readonly atomsPerFormula: number;
}): number {
  requireInside('atomsPerFormula', input.atomsPerFormula, positive);
  const ratio = checkedRatio(input.debyeTemperatureK, input.temperatureK);
  return 3 * input.atomsPerFormula * avogadroPerMol * boltzmannJPerK * ratio;
}

/**
 * Debye heat capacity at constant volume per kilogram, J kg⁻¹ K⁻¹.
 *
 *   C_V = (3 k_B/M̄) · debyeHeatCapacityRatio(θ/T), M̄ mean atomic mass, kg
 *
 * @throws RangeError for an argument that is not positive.
 */
export function debyeHeatCapacityJPerKgK(input: {
  readonly debyeTemperatureK: number;
  readonly temperatureK: number;
  readonly meanMassKg: number;
}): number {
  requireInside('meanMassKg', input.meanMassKg, positive);
  const ratio = checkedRatio(input.debyeTemperatureK, input.temperatureK);
  return ((3 * boltzmannJPerK) / input.meanMassKg) * ratio;
}
