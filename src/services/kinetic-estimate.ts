import { AppError } from '#src/lib/errors.ts';
import type { FieldError } from '#src/lib/errors.ts';
import {
  estimateConductivity as estimatePoint,
  kgPerU,
  m3PerCubicAngstrom,
  minimumConductivityWPerMK,
  UnboundedConductivityError,
} from '#src/physics/index.ts';
import type { CrystalParameters, SampleParameters } from '#src/physics/index.ts';
import type { EstimatePoint, Model } from '#src/schemas/estimate.ts';
import type { CompleteParameters, VelocityPair } from '#src/services/estimator-inputs.ts';

/** From numbers in the units of the edge to points of κ(T) in the units of the edge, through the physics core. */

export function toCrystal(parameters: CompleteParameters): CrystalParameters {
  return {
    cellVolumeM3: parameters.cell_volume_A3 * m3PerCubicAngstrom,
    atomsPerCell: parameters.atoms_per_cell,
    meanMassKg: parameters.mean_mass_u * kgPerU,
    longitudinal: {
      velocityMPerS: parameters.v_L_m_s,
      cutoffK: parameters.theta_L_K,
      gruneisen: parameters.gamma_L,
    },
    transverse: {
      velocityMPerS: parameters.v_T_m_s,
      cutoffK: parameters.theta_T_K,
      gruneisen: parameters.gamma_T,
    },
  };
}

export interface PointsRequest {
  readonly model: Model;
  readonly parameters: CompleteParameters;
  readonly average: VelocityPair;
  readonly sample: SampleParameters;
  readonly temperaturesK: readonly number[];
}

/** Arguments of the physics core and the fields of the request they come from. */
const fieldOfArgument: readonly (readonly [string, string])[] = [
  ['crystal.cellVolumeM3', 'parameters.cell_volume_A3'],
  ['crystal.atomsPerCell', 'parameters.atoms_per_cell'],
  ['crystal.meanMassKg', 'parameters.mean_mass_u'],
  ['crystal.longitudinal.velocityMPerS', 'parameters.v_L_m_s'],
  ['crystal.longitudinal.cutoffK', 'parameters.theta_L_K'],
  ['crystal.longitudinal.gruneisen', 'parameters.gamma_L'],
  ['crystal.transverse.velocityMPerS', 'parameters.v_T_m_s'],
  ['crystal.transverse.cutoffK', 'parameters.theta_T_K'],
  ['crystal.transverse.gruneisen', 'parameters.gamma_T'],
  ['sample.boundary.effectiveLengthM', 'sample.boundary_length_m'],
  ['sample.boundary.specularity', 'sample.specularity'],
  ['sample.massVariance', 'sample.defect_mass_variance'],
  ['sample.umklappScale', 'umklapp_scale'],
  ['temperatureK', 'temperatures_K'],
  ['porosity', 'sample.porosity'],
];

/** A refusal of the physics core in the words of the request. */
function toRefusal(error: unknown): unknown {
  if (!(error instanceof RangeError)) return error;
  if (error instanceof UnboundedConductivityError) {
    const fields: readonly FieldError[] = [{ path: 'mechanisms', message: error.message }];
    return new AppError('UNPROCESSABLE', error.message, { fields, cause: error });
  }
  const known = fieldOfArgument.find(([argument]) => error.message.startsWith(argument));
  if (known === undefined) return error;
  const message = error.message.replace(known[0], known[1]);
  return new AppError('UNPROCESSABLE', message, { fields: [{ path: known[1], message }], cause: error });
}

/**
 * κ and its factors at each temperature, in the order given.
 *
 * @throws AppError UNPROCESSABLE where the model has no finite value, with the physical reason.
 */
export function estimatePoints(request: PointsRequest): readonly EstimatePoint[] {
  const { model, parameters, average, sample, temperaturesK } = request;
  const crystal = toCrystal(parameters);
  const volumePerAtomM3 = crystal.cellVolumeM3 / crystal.atomsPerCell;
  try {
    return temperaturesK.map((temperatureK) => {
      const point = estimatePoint({ model, crystal, sample, temperatureK });
      return {
        T_K: temperatureK,
        kappa_W_mK: point.kappaWPerMK,
        low_W_mK: null,
        high_W_mK: null,
        heat_capacity_J_m3K: point.heatCapacityJPerM3K,
        velocity_m_s: point.velocityMPerS,
        mean_free_path_m: point.meanFreePathM,
        porosity_factor: point.porosityFactor,
        share: point.share,
        floor_W_mK: minimumConductivityWPerMK({ volumePerAtomM3, ...average, temperatureK }),
      };
    });
  } catch (error) {
    throw toRefusal(error);
  }
}

/** The sample an estimate is made for when nothing is said: natural isotopes, 5 mm, nothing else. */
export function plainSample(massVariance: number, effectiveLengthM: number): SampleParameters {
  return {
    boundary: { effectiveLengthM, specularity: 0 },
    massVariance,
    porosity: 0,
    umklappScale: 1,
    mechanisms: ['boundary', 'defect', 'umklapp'],
  };
}
