import { modeHeatCapacityRatio } from './bose-weight.ts';
import { integrateSpectrum } from './quadrature.ts';
import { headLimit, relativeNormalCoefficient } from './scattering-rates.ts';
import type { BranchProblem, TransportIntegrals } from './transport-integrals.ts';

/**
 * Model `callaway`: normal processes redistribute, resistive ones decay; 1/τ_C = 1/τ + 1/τ_N.
 *
 *   κ_j ∝ ∫ τ_C W dx + β ∫ (τ_C/τ_N) W dx,  β = ∫ (τ_C/τ_N) W dx / ∫ τ_C/(τ_N τ) W dx
 *
 * A phonon carries the heat of an effective time φ = τ_C(1 + β/τ_N), and the resistance by mechanism i is ∫ W φ²/τ_i dx.
 * With q = τ_C/τ_N (the part of a phonon's collisions that is normal) and 1 − q = τ_C/τ:
 *   φ²/τ = τ_C(1 − q) + 2β q(1 − q) + β² q²/τ,
 * three positive integrals for each mechanism, in the same pass. Both q and 1 − q come from the ratio of the two rates,
 * so nothing cancels.
 * Source: Callaway, Phys. Rev. 113, 1046 (1959), both terms kept; two branches as in Holland 1963,
 * Asen-Palmer et al., Phys. Rev. B 56, 9431 (1997) and Morelli et al., Phys. Rev. B 66, 195304 (2002).
 * Accuracy: better than 1e-10 relative against SciPy.
 */
export function callawayIntegrals({ cutoffOverT, rates, resistive }: BranchProblem): TransportIntegrals {
  const { lowestPower, coefficients } = resistive;
  const [c0, c1, c2] = coefficients;
  const normal = { coefficient: relativeNormalCoefficient(rates, resistive), power: rates.normalPower };
  const { values, relativeErrors } = integrateSpectrum({
    upperLimit: cutoffOverT,
    headLimit: headLimit(resistive, normal),
    integrandCount: 13,
    integrands: (x, out) => {
      const x2 = x * x;
      const weightOverX2 = modeHeatCapacityRatio(x);
      const weight = x2 * weightOverX2;
      const r1 = c1 * x2;
      const r2 = c2 * x2 * x2;
      const reduced = c0 + r1 + r2;
      const normalReduced = normal.power === 1 ? normal.coefficient * x : normal.coefficient * x2;
      let normalPart: number;
      let resistivePart: number;
      /** τ_C W */
      let combined: number;
      if (lowestPower === 0) {
        const ratio = normalReduced / reduced;
        normalPart = ratio / (1 + ratio);
        resistivePart = 1 / (1 + ratio);
        combined = (weight * resistivePart) / reduced;
      } else {
        // Both rates vanish for x → 0: divide their common power of x out before comparing them.
        const extra = lowestPower === 2 ? (normal.power === 1 ? x : 1) : normal.power === 1 ? x2 * x : x2;
        const ratio = (extra * reduced) / normal.coefficient;
        normalPart = 1 / (1 + ratio);
        resistivePart = ratio / (1 + ratio);
        combined = ((normal.power === 1 ? x : 1) * weightOverX2 * normalPart) / normal.coefficient;
      }
      const resistiveRate = (lowestPower === 0 ? 1 : lowestPower === 2 ? x2 : x2 * x2) * reduced;
      const decay = weight * normalPart * resistiveRate;
      out[0] = weight;
      out[1] = combined;
      out[2] = weight * normalPart;
      out[3] = decay;
      const direct = (combined * resistivePart) / reduced;
      const mixed = (weight * normalPart * resistivePart) / reduced;
      const drifting = (normalPart * decay) / reduced;
      out[4] = direct * c0;
      out[5] = direct * r1;
      out[6] = direct * r2;
      out[7] = mixed * c0;
      out[8] = mixed * r1;
      out[9] = mixed * r2;
      out[10] = drifting * c0;
      out[11] = drifting * r1;
      out[12] = drifting * r2;
    },
  });
  const at = (index: number): number => values[index] ?? NaN;
  const redistributed = at(2);
  /** β; without normal processes the drift term vanishes. */
  const drift = redistributed > 0 ? redistributed / at(3) : 0;
  const resistance = (index: number): number =>
    at(4 + index) + drift * (2 * at(7 + index) + drift * at(10 + index));
  return {
    heat: at(0),
    transport: at(1) + redistributed * drift,
    resistance: [resistance(0), resistance(1), resistance(2)],
    relativeError: 3 * Math.max(...relativeErrors.subarray(0, 4)),
  };
}
