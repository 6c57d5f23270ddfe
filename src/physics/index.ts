/** The physics core: pure functions of numbers in SI units, importing nothing. Units at the edge: units.ts. */
export * from './constants.ts';
export * from './units.ts';
export type {
  AcousticBranch,
  BranchName,
  CrystalParameters,
  MechanismName,
  ModelName,
  SampleParameters,
} from './crystal.ts';
export { mechanismNames } from './crystal.ts';
export { modelTemperatureK } from './domain.ts';
export { UnboundedConductivityError } from './errors.ts';
export type { UnboundedReason } from './errors.ts';
export { estimateConductivity } from './conductivity.ts';
export type { ConductivityPoint, ConductivityRequest } from './conductivity.ts';
export {
  debyeHeatCapacityJPerKgK,
  debyeHeatCapacityJPerM3K,
  debyeHeatCapacityJPerMolK,
  debyeHeatCapacityRatio,
} from './heat-capacity.ts';
export {
  gruneisenFromVelocities,
  meanSoundVelocityMPerS,
  poissonRatio,
  soundVelocities,
} from './sound-velocity.ts';
export {
  acousticDebyeTemperatureK,
  branchCutoffTemperatureK,
  elasticDebyeTemperatureK,
  thetaFromFrequencyK,
} from './debye-temperature.ts';
export { voigtReussHill } from './elastic-averages.ts';
export type { ElasticAverages, ElasticConstants } from './elastic-averages.ts';
export {
  compoundMassVariance,
  elementMassVariance,
  isotopeMassVariance,
  meanIsotopeMassU,
} from './mass-variance.ts';
export type { ElementSite, Isotope, ScatteringSite } from './mass-variance.ts';
export { effectiveLengthM } from './effective-length.ts';
export type { PieceForm } from './effective-length.ts';
export { porosityFactor } from './porosity.ts';
export { slackConductivityWPerMK } from './slack.ts';
export { minimumConductivityWPerMK } from './minimum-conductivity.ts';
