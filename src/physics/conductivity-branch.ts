import { modeHeatCapacityRatio } from './bose-weight.ts';
import { integrateSpectrum } from './quadrature.ts';
import { headLimit } from './scattering-rates.ts';
import type { BranchProblem, TransportIntegrals } from './transport-integrals.ts';

/**
 * Model `branch`: every frequency of a branch has its own relaxation time.
 *
 *   κ_j ∝ ∫₀^{θ_j/T} τ_j W dx,  1/τ_j = Σ_i 1/τ_ij (Matthiessen)
 *
 * Exists only where the resistive rate falls more slowly than ω³ for ω → 0; the caller refuses the rest
 * (`lowestPower` 4). The highest of the three models: normal processes count as no resistance at all.
 * Source: Debye spectrum with relaxation times, Klemens 1951; two branches as in Holland, Phys. Rev. 132, 2461 (1963).
 * Accuracy: better than 1e-10 relative against SciPy.
 */
export function branchIntegrals({ cutoffOverT, resistive }: BranchProblem): TransportIntegrals {
  const { lowestPower, coefficients } = resistive;
  const [c0, c1, c2] = coefficients;
  const { values, relativeErrors } = integrateSpectrum({
    upperLimit: cutoffOverT,
    headLimit: headLimit(resistive, null),
    integrandCount: 5,
    integrands: (x, out) => {
      const x2 = x * x;
      const heat = modeHeatCapacityRatio(x);
      const r1 = c1 * x2;
      const r2 = c2 * x2 * x2;
      const reduced = c0 + r1 + r2;
      // W τ = (W/x²) x^(2 − lowestPower) / reduced
      const transport = ((lowestPower === 0 ? x2 : 1) * heat) / reduced;
      out[0] = x2 * heat;
      out[1] = transport;
      out[2] = (transport * c0) / reduced;
      out[3] = (transport * r1) / reduced;
      out[4] = (transport * r2) / reduced;
    },
  });
  const [heat = NaN, transport = NaN, first = NaN, second = NaN, third = NaN] = values;
  return { heat, transport, resistance: [first, second, third], relativeError: relativeErrors[1] ?? NaN };
}
