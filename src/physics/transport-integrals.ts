import type { BranchRates, ResistiveRate } from './scattering-rates.ts';

/** What a model works on: one branch at one temperature. */
export interface BranchProblem {
  /** θ_j/T, upper limit of the integrals. */
  readonly cutoffOverT: number;
  readonly rates: BranchRates;
  readonly resistive: ResistiveRate;
}

/**
 * What every model returns for one branch, as pure numbers; times are in units of e^(−logScale) seconds.
 */
export interface TransportIntegrals {
  /** ∫₀^{θ/T} W dx. */
  readonly heat: number;
  /** The integral that stands for ∫ τ W dx in the conductivity of this model. */
  readonly transport: number;
  /** ∫ W φ² (1/τ_i) dx for the mechanism of each coefficient of the resistive rate. */
  readonly resistance: readonly [number, number, number];
  /** Estimated relative error of the transport integral; an upper estimate. */
  readonly relativeError: number;
}
