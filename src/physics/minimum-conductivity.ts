import { boltzmannJPerK } from './constants.ts';
import { modeHeatCapacityRatio } from './bose-weight.ts';
import { branchCutoffTemperatureK } from './debye-temperature.ts';
import { positive, requireInside } from './domain.ts';
import { integrateSpectrum } from './quadrature.ts';

/** (1/y²) ∫₀^y x³eˣ/(eˣ−1)² dx: 1/2 for y → 0. */
function scaledIntegral(thetaOverT: number): number {
  const { values } = integrateSpectrum({
    upperLimit: thetaOverT,
    headLimit: 1,
    integrandCount: 1,
    integrands: (x, out) => {
      out[0] = x * modeHeatCapacityRatio(x);
    },
  });
  return (values[0] ?? NaN) / thetaOverT ** 2;
}

/**
 * Floor of the lattice conductivity: each vibration passes its energy on within half a period, W/(m K).
 *
 *   κ_min = (π/6)^(1/3) k_B V_a^(−2/3) Σ_{L,T,T} v_i (T/Θ_i)² ∫₀^{Θ_i/T} x³eˣ/(eˣ−1)² dx,  Θ_i = v_i (ħ/k_B)(6π²/V_a)^(1/3)
 *
 * V_a volume per atom, m³; v_L, v_T average sound velocities, m/s. The number of atoms in the cell does not enter.
 * Valid for any temperature above zero; (1/2)(π/6)^(1/3) k_B V_a^(−2/3)(v_L + 2v_T) at high temperature.
 * Source: Cahill, Watson, Pohl, Phys. Rev. B 46, 6131 (1992).
 *
 * @throws RangeError for an argument that is not positive.
 */
export function minimumConductivityWPerMK(input: {
  readonly volumePerAtomM3: number;
  readonly longitudinalMPerS: number;
  readonly transverseMPerS: number;
  readonly temperatureK: number;
}): number {
  const volumePerAtomM3 = requireInside('volumePerAtomM3', input.volumePerAtomM3, positive);
  const longitudinalMPerS = requireInside('longitudinalMPerS', input.longitudinalMPerS, positive);
  const transverseMPerS = requireInside('transverseMPerS', input.transverseMPerS, positive);
  const temperatureK = requireInside('temperatureK', input.temperatureK, positive);
  const branchSum = (velocityMPerS: number): number => {
    const cutoffK = branchCutoffTemperatureK({ velocityMPerS, cellVolumeM3: volumePerAtomM3 });
    return velocityMPerS * scaledIntegral(cutoffK / temperatureK);
  };
  const prefactor = Math.cbrt(Math.PI / 6) * boltzmannJPerK * volumePerAtomM3 ** (-2 / 3);
  return prefactor * (branchSum(longitudinalMPerS) + 2 * branchSum(transverseMPerS));
}
