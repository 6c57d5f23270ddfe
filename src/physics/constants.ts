/**
 * Physical constants, CODATA 2018 (Tiesinga et al., Rev. Mod. Phys. 93, 025010 (2021)). SI units.
 * Those marked exact are fixed by the definition of the SI since 2019.
 */

/** k_B, J/K; exact. */
export const boltzmannJPerK = 1.380649e-23;
/** h, J s; exact. */
export const planckJS = 6.62607015e-34;
/** ħ = h/2π, J s; exact up to the rounding of π. */
export const reducedPlanckJS = planckJS / (2 * Math.PI);
/** N_A, 1/mol; exact. */
export const avogadroPerMol = 6.02214076e23;
/** R = N_A k_B, J/(mol K); exact. */
export const gasConstantJPerMolK = avogadroPerMol * boltzmannJPerK;
/** u, kg; relative standard uncertainty 3.0e-10. */
export const atomicMassKg = 1.6605390666e-27;
