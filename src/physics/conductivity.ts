import { boltzmannJPerK, reducedPlanckJS } from './constants.ts';
import { branchIntegrals } from './conductivity-branch.ts';
import { callawayIntegrals } from './conductivity-callaway.ts';
import { grayIntegrals } from './conductivity-gray.ts';
import type { BranchName, CrystalParameters, MechanismName, ModelName, SampleParameters } from './crystal.ts';
import { mechanismNames } from './crystal.ts';
import { modelTemperatureK, notNegative, positive, requireCount, requireInside } from './domain.ts';
import { UnboundedConductivityError } from './errors.ts';
import { porosityFactor } from './porosity.ts';
import { branchRates, resistiveRate } from './scattering-rates.ts';
import type { ResistiveRate } from './scattering-rates.ts';
import type { BranchProblem, TransportIntegrals } from './transport-integrals.ts';

export interface ConductivityRequest {
  readonly model: ModelName;
  readonly crystal: CrystalParameters;
  readonly sample: SampleParameters;
  readonly temperatureK: number;
}

/** κ at one temperature with its factors: κ = porosityFactor · ⅓ · C · v · l. */
export interface ConductivityPoint {
  readonly temperatureK: number;
  /** κ of the piece, pores included, W/(m K). */
  readonly kappaWPerMK: number;
  /** C = ΣC_j, heat capacity of the acoustic modes below the cut-offs, J/(m³ K). Not the Debye curve of all modes. */
  readonly heatCapacityJPerM3K: number;
  /** v = ΣC_j v_j/C, m/s. */
  readonly velocityMPerS: number;
  /** l = 3κ/(C v) of the solid between the pores, m. */
  readonly meanFreePathM: number;
  readonly porosityFactor: number;
  /** Part of the resistive collisions, weighted by the heat each phonon carries, that a mechanism makes; adds up to 1. */
  readonly share: Readonly<Record<MechanismName, number>>;
}

interface BranchResult {
  readonly velocityMPerS: number;
  readonly heatCapacityJPerM3K: number;
  readonly kappaWPerMK: number;
  /** ln of the common factor of the weights below. */
  readonly logWeightScale: number;
  readonly weights: Readonly<Record<MechanismName, number>>;
  readonly relativeError: number;
}

/** Number of branches that a name stands for. */
const branchWeight: Readonly<Record<BranchName, number>> = { longitudinal: 1, transverse: 2 };

const unresistedRemedy =
  'Switch on a mechanism whose rate is above zero: boundary (give the piece a size), defect (mass variance above 0) or ' +
  'umklapp (scale above 0; at low temperature its rate can still be zero).';

function requireResistance(
  request: ConductivityRequest,
  name: BranchName,
  resistive: ResistiveRate | null,
): ResistiveRate {
  const { model, sample, temperatureK } = request;
  const switchedOn = mechanismNames.filter((mechanism) => sample.mechanisms.includes(mechanism));
  const listed =
    switchedOn.length === 0 ? 'no mechanism is switched on' : `switched on: ${switchedOn.join(', ')}`;
  if (resistive === null) {
    throw new UnboundedConductivityError(
      'no-resistive-rate',
      switchedOn,
      `At ${temperatureK} K nothing resists the heat flow of the ${name} branch (${listed}, with a rate of zero), so ` +
        `its conductivity has no bound. ${unresistedRemedy}`,
    );
  }
  if (model === 'branch' && resistive.lowestPower === 4) {
    throw new UnboundedConductivityError(
      'long-waves-unscattered',
      switchedOn,
      `At ${temperatureK} K only point defects scatter the ${name} branch (${listed}). Their rate falls as the fourth power ` +
        'of the frequency, so the longest waves carry heat without bound in the model "branch". Add boundary or umklapp ' +
        'scattering with a rate above zero, or use the model "callaway" or "gray".',
    );
  }
  return resistive;
}

function modelIntegrals(model: ModelName, problem: BranchProblem): TransportIntegrals {
  switch (model) {
    case 'gray':
      return grayIntegrals(problem);
    case 'branch':
      return branchIntegrals(problem);
    case 'callaway':
      return callawayIntegrals(problem);
  }
}

/**
 * One branch:  C_j = w k_B⁴T³/(2π²ħ³v³) ∫ W dx,  κ_j = (w/3) k_B⁴T³/(2π²ħ³v) · transport integral.
 */
function solveBranch(request: ConductivityRequest, name: BranchName): BranchResult {
  const { model, crystal, sample, temperatureK } = request;
  const { velocityMPerS, cutoffK } = crystal[name];
  const rates = branchRates({ branchName: name, crystal, sample, temperatureK });
  const resistive = requireResistance(request, name, resistiveRate(rates));
  const integrals = modelIntegrals(model, { cutoffOverT: cutoffK / temperatureK, rates, resistive });
  const modes =
    (branchWeight[name] * boltzmannJPerK * ((boltzmannJPerK * temperatureK) / reducedPlanckJS) ** 3) /
    (2 * Math.PI ** 2);
  const weights: Record<MechanismName, number> = { boundary: 0, defect: 0, umklapp: 0 };
  resistive.mechanisms.forEach((mechanism, index) => {
    if (mechanism === null) return;
    weights[mechanism] = (branchWeight[name] / velocityMPerS) * (integrals.resistance[index] ?? NaN);
  });
  return {
    velocityMPerS,
    heatCapacityJPerM3K: (modes / velocityMPerS ** 3) * integrals.heat,
    kappaWPerMK: (modes / (3 * velocityMPerS)) * integrals.transport * Math.exp(-resistive.logScale),
    logWeightScale: -resistive.logScale,
    weights,
    relativeError: integrals.relativeError,
  };
}

function shares(branches: readonly BranchResult[]): Readonly<Record<MechanismName, number>> {
  const logScale = Math.max(...branches.map((branch) => branch.logWeightScale));
  const weight = (mechanism: MechanismName): number =>
    branches.reduce(
      (sum, branch) => sum + branch.weights[mechanism] * Math.exp(branch.logWeightScale - logScale),
      0,
    );
  const [boundary, defect, umklapp] = [weight('boundary'), weight('defect'), weight('umklapp')];
  const total = boundary + defect + umklapp;
  return { boundary: boundary / total, defect: defect / total, umklapp: umklapp / total };
}

function requireRequest({ crystal, sample, temperatureK }: ConductivityRequest): void {
  requireInside('temperatureK', temperatureK, modelTemperatureK);
  requireInside('crystal.cellVolumeM3', crystal.cellVolumeM3, positive);
  requireCount('crystal.atomsPerCell', crystal.atomsPerCell);
  requireInside('crystal.meanMassKg', crystal.meanMassKg, positive);
  for (const name of ['longitudinal', 'transverse'] as const) {
    requireInside(`crystal.${name}.velocityMPerS`, crystal[name].velocityMPerS, positive);
    requireInside(`crystal.${name}.cutoffK`, crystal[name].cutoffK, positive);
    requireInside(`crystal.${name}.gruneisen`, crystal[name].gruneisen, positive);
  }
  if (sample.boundary !== null) {
    requireInside('sample.boundary.effectiveLengthM', sample.boundary.effectiveLengthM, positive);
    requireInside('sample.boundary.specularity', sample.boundary.specularity, {
      min: 0,
      max: 1,
      maxExcluded: true,
    });
  }
  requireInside('sample.massVariance', sample.massVariance, notNegative);
  requireInside('sample.umklappScale', sample.umklappScale, notNegative);
}

function requireDouble(request: ConductivityRequest, quantity: string, value: number): number {
  if (value > 0 && value < Infinity) return value;
  const size = value === 0 ? 'small' : 'large';
  throw new UnboundedConductivityError(
    'beyond-double',
    mechanismNames.filter((mechanism) => request.sample.mechanisms.includes(mechanism)),
    `At ${request.temperatureK} K the ${quantity} is too ${size} for a number of the computer (beyond about 1e±308): ` +
      `the scattering that is switched on hardly acts. ${unresistedRemedy}`,
  );
}

/** As `estimateConductivity`, with the estimated relative error of the integrals (an upper estimate). */
export function estimateConductivityWithError(request: ConductivityRequest): {
  readonly point: ConductivityPoint;
  readonly relativeError: number;
} {
  requireRequest(request);
  const poreFactor = porosityFactor(request.sample.porosity);
  const longitudinal = solveBranch(request, 'longitudinal');
  const transverse = solveBranch(request, 'transverse');
  const branches = [longitudinal, transverse];
  const kappaOfSolid = requireDouble(
    request,
    'conductivity',
    longitudinal.kappaWPerMK + transverse.kappaWPerMK,
  );
  const heatCapacity = longitudinal.heatCapacityJPerM3K + transverse.heatCapacityJPerM3K;
  const flux =
    longitudinal.heatCapacityJPerM3K * longitudinal.velocityMPerS +
    transverse.heatCapacityJPerM3K * transverse.velocityMPerS;
  const point: ConductivityPoint = {
    temperatureK: request.temperatureK,
    kappaWPerMK: kappaOfSolid * poreFactor,
    heatCapacityJPerM3K: heatCapacity,
    velocityMPerS: flux / heatCapacity,
    meanFreePathM: requireDouble(request, 'mean free path', (3 * kappaOfSolid) / flux),
    porosityFactor: poreFactor,
    share: shares(branches),
  };
  return { point, relativeError: Math.max(longitudinal.relativeError, transverse.relativeError) };
}

/**
 * Lattice thermal conductivity of a crystal at one temperature by kinetic theory, κ = ⅓ C v l, W/(m K).
 *
 * One longitudinal and two transverse acoustic branches with linear dispersion up to their cut-offs; boundary, point-defect
 * and Umklapp scattering as in scattering-rates.ts; models `gray`, `branch` and `callaway` as in their files. For the same
 * inputs κ(gray) ≤ κ(callaway) ≤ κ(branch).
 *
 *   share_i ∝ Σ_j (w_j/v_j) ∫₀^{θ_j/T} W φ_j² (1/τ_ij) dx, scaled to add up to 1
 *
 * Range: 1–3000 K. Electrons are not in it. Numbers: within 1e-10 relative of SciPy's quadrature for the same equations;
 * nature: typically within a factor of 1.5 of measurements, sometimes over 3.
 * Source: Callaway 1959, Holland 1963, Morelli, Heremans and Slack 2002; Casimir 1938, Klemens 1955, Slack and Galginaitis 1964.
 *
 * @throws RangeError for an argument outside its domain.
 * @throws UnboundedConductivityError where the model has no finite value for the inputs.
 */
export function estimateConductivity(request: ConductivityRequest): ConductivityPoint {
  return estimateConductivityWithError(request).point;
}
