import type { AcousticBranch, BranchName, CrystalParameters } from './crystal.ts';
import { notNegative, requireInside } from './domain.ts';

export interface AlloyHost {
  /** Fraction of formula units of this end member. */
  readonly fraction: number;
  readonly crystal: CrystalParameters;
}

/**
 * Host lattice of an alloy in the virtual-crystal approximation: M̄, V_c, θ_j, γ_j and the branch moduli ρv_j² are
 * linear in composition; velocities follow from modulus and density.
 *
 * The disorder itself is not in it: add Γ of the substitution. Mark the result as derived.
 * Source: Abeles, Phys. Rev. 131, 1906 (1963).
 *
 * @throws RangeError for fractions that are negative or do not add up to 1, or end members with different atoms per cell.
 */
export function virtualCrystal(hosts: readonly AlloyHost[]): CrystalParameters {
  const sum = hosts.reduce((total, host, index) => {
    return total + requireInside(`hosts[${index}].fraction`, host.fraction, notNegative);
  }, 0);
  if (!(Math.abs(sum - 1) <= 1e-9)) {
    throw new RangeError(`The fractions of hosts must add up to 1; they add up to ${sum}.`);
  }
  const [first] = hosts;
  const atomsPerCell = first?.crystal.atomsPerCell ?? NaN;
  if (hosts.some((host) => host.crystal.atomsPerCell !== atomsPerCell)) {
    throw new RangeError('hosts must all have the same number of atomsPerCell; an alloy has one structure.');
  }
  const mean = (of: (crystal: CrystalParameters) => number): number =>
    hosts.reduce((total, { fraction, crystal }) => total + fraction * of(crystal), 0);
  const density = (crystal: CrystalParameters): number =>
    (atomsPerCell * crystal.meanMassKg) / crystal.cellVolumeM3;
  const cellVolumeM3 = mean((crystal) => crystal.cellVolumeM3);
  const meanMassKg = mean((crystal) => crystal.meanMassKg);
  const branch = (name: BranchName): AcousticBranch => {
    const modulusPa = mean((crystal) => density(crystal) * crystal[name].velocityMPerS ** 2);
    return {
      velocityMPerS: Math.sqrt((modulusPa * cellVolumeM3) / (atomsPerCell * meanMassKg)),
      cutoffK: mean((crystal) => crystal[name].cutoffK),
      gruneisen: mean((crystal) => crystal[name].gruneisen),
    };
  };
  return {
    cellVolumeM3,
    atomsPerCell,
    meanMassKg,
    longitudinal: branch('longitudinal'),
    transverse: branch('transverse'),
  };
}
