import { positive, requireCount, requireInside } from './domain.ts';

/**
 * Slack's value for the lattice conductivity at high temperature, W/(m K).
 *
 *   κ = A M̄ θ_a³ δ n^(1/3)/(γ²T), A = 2.43e-6/(1 − 0.514/γ + 0.228/γ²)
 *
 * M̄ mean atomic mass, u; θ_a acoustic Debye temperature, K; δ cube root of the volume per atom, Å; n atoms in the
 * primitive cell; γ Grüneisen parameter. Pure three-phonon scattering by acoustic modes: for T ≳ θ_a only.
 * Source: Slack, Solid State Physics 34, 1 (1979); Morelli and Slack in High Thermal Conductivity Materials (2006).
 *
 * @throws RangeError for an argument that is not positive, or n that is not a whole number of at least 1.
 */
export function slackConductivityWPerMK(input: {
  readonly meanMassU: number;
  readonly acousticDebyeTemperatureK: number;
  readonly deltaAngstrom: number;
  readonly atomsPerCell: number;
  readonly gruneisen: number;
  readonly temperatureK: number;
}): number {
  const mass = requireInside('meanMassU', input.meanMassU, positive);
  const theta = requireInside('acousticDebyeTemperatureK', input.acousticDebyeTemperatureK, positive);
  const delta = requireInside('deltaAngstrom', input.deltaAngstrom, positive);
  const atoms = requireCount('atomsPerCell', input.atomsPerCell);
  const gamma = requireInside('gruneisen', input.gruneisen, positive);
  const temperature = requireInside('temperatureK', input.temperatureK, positive);
  const prefactor = 2.43e-6 / (1 - 0.514 / gamma + 0.228 / gamma ** 2);
  return (prefactor * mass * theta ** 3 * delta * Math.cbrt(atoms)) / (gamma ** 2 * temperature);
}
