/** What the conductivity models need to know of a crystal and of the piece cut from it. SI units. */

export type ModelName = 'gray' | 'branch' | 'callaway';

/** Scattering that resists the heat flow. Normal processes only redistribute and are not in the list. */
export type MechanismName = 'boundary' | 'defect' | 'umklapp';
export const mechanismNames: readonly MechanismName[] = ['boundary', 'defect', 'umklapp'];

export type BranchName = 'longitudinal' | 'transverse';

/** One acoustic branch with linear dispersion up to its cut-off. */
export interface AcousticBranch {
  /** v_j, sound velocity, m/s. */
  readonly velocityMPerS: number;
  /** θ_j, cut-off (zone-boundary) temperature, K. */
  readonly cutoffK: number;
  /** γ_j, Grüneisen parameter of the branch. */
  readonly gruneisen: number;
}

export interface CrystalParameters {
  /** V_c, volume of the primitive cell, m³. */
  readonly cellVolumeM3: number;
  /** n, atoms in the primitive cell. */
  readonly atomsPerCell: number;
  /** M̄, mean mass of an atom, kg. */
  readonly meanMassKg: number;
  readonly longitudinal: AcousticBranch;
  readonly transverse: AcousticBranch;
}

export interface SampleParameters {
  /** L, effective length, m, and p, the fraction of specular reflections, 0 ≤ p < 1; null for a piece without boundaries. */
  readonly boundary: { readonly effectiveLengthM: number; readonly specularity: number } | null;
  /** Γ, point-defect scattering parameter: isotopes and all other point defects together. */
  readonly massVariance: number;
  /** φ, volume fraction of round closed pores. */
  readonly porosity: number;
  /** s, factor on the Umklapp rate; 1 unless fitted or calibrated. */
  readonly umklappScale: number;
  /** The resistive mechanisms that take part. */
  readonly mechanisms: readonly MechanismName[];
}
