import type { Composition, IsotopeRecord, ValueRecord } from '#src/db/queries/records.ts';
import {
  branchCutoffTemperatureK,
  elasticDebyeTemperatureK,
  gruneisenFromVelocities,
  m3PerCubicAngstrom,
  meanSoundVelocityMPerS,
} from '#src/physics/index.ts';
import type {
  EstimateInput,
  EstimateParameterName,
  EstimateParameters,
  IsotopeChoice,
  Model,
} from '#src/schemas/estimate.ts';
import { toEdgeUnit } from '#src/services/edge-units.ts';
import { mixIsotopes } from '#src/services/isotopes.ts';
import type { IsotopeMix } from '#src/services/isotopes.ts';

/**
 * From what is stored of a material, and what a request gives, to the numbers that the estimator takes: chosen,
 * derived where physics allows it, and marked with where each comes from. Pure.
 *
 * Order of preference for each number: given in the request; stored; derived. Velocities, θ and γ of the branches come
 * from one published set (`value_set`) or none of it, so that a pair of velocities never meets the cut-offs of another
 * row; a θ or γ that the set lacks is filled for that branch alone.
 */

/** What the resolver needs to know of a material. */
export interface MaterialFacts {
  readonly name: string;
  readonly formula: string;
  readonly class: string;
  readonly atomsPerCell: number | null;
  readonly composition: readonly Composition[];
  readonly values: readonly ValueRecord[];
  readonly isotopes: readonly IsotopeRecord[];
}

/** All numbers an estimate needs; `debye_temperature_K` serves other curves. */
export type CompleteParameters = Readonly<
  Record<Exclude<EstimateParameterName, 'debye_temperature_K'>, number>
> & {
  readonly debye_temperature_K?: number;
};

export interface Obstacle {
  /** Parameters that would take the obstacle away; none for what is no crystal. */
  readonly parameters: readonly EstimateParameterName[];
  /** One sentence for people. */
  readonly message: string;
}

export interface VelocityPair {
  readonly longitudinalMPerS: number;
  readonly transverseMPerS: number;
}

export interface ResolvedInputs {
  /** Null when something is missing; then the obstacles say what. */
  readonly parameters: CompleteParameters | null;
  /** For the floor, Poisson's ratio and the elastic Debye temperature; null where no velocities are known. */
  readonly average: VelocityPair | null;
  /** V_a = V_c/n, m³; null where the cell is not known. */
  readonly volumePerAtomM3: number | null;
  readonly inputs: readonly EstimateInput[];
  readonly obstacles: readonly Obstacle[];
  /** `callaway` where both zone-boundary temperatures are known and not derived, else `branch`. */
  readonly recommendedModel: Model;
}

/** A number with its provenance; the name is added last. */
type Slot = Omit<EstimateInput, 'name'>;

export function isGlass(material: Pick<MaterialFacts, 'class'>): boolean {
  return material.class === 'glass';
}

function givenSlot(value: number): Slot {
  return {
    value,
    uncertainty: null,
    basis: 'given',
    verification: null,
    kind: null,
    source: 'given in the request',
    source_key: null,
    note: null,
  };
}

function derivedSlot(value: number, kind: string | null, source: string, note: string | null = null): Slot {
  return {
    value,
    uncertainty: null,
    basis: 'derived',
    verification: null,
    kind,
    source,
    source_key: null,
    note,
  };
}

function storedSlot(record: ValueRecord, kind: string): Slot {
  const { value, uncertainty } = toEdgeUnit(record.property, record);
  return {
    value,
    uncertainty,
    basis: record.basis,
    verification: record.verification,
    kind,
    source: record.source.citation,
    source_key: record.source.key,
    note: record.note,
  };
}

type Branch = 'longitudinal' | 'transverse';
const branchLetter = { longitudinal: 'L', transverse: 'T' } as const;

/** The preferred published set of branch values, whole. */
interface BranchSet {
  readonly velocity: Readonly<Record<Branch, ValueRecord>>;
  readonly cutoff: Readonly<Record<Branch, ValueRecord | undefined>>;
  readonly gruneisen: Readonly<Record<Branch, ValueRecord | undefined>>;
}

function findBranchSet(values: readonly ValueRecord[]): BranchSet | null {
  const preferred = values.filter(
    ({ kind, preferred, valueSet }) => kind === 'branch' && preferred && valueSet !== null,
  );
  for (const name of new Set(preferred.map(({ valueSet }) => valueSet))) {
    const set = preferred.filter(({ valueSet }) => valueSet === name);
    const find = (quantity: string, branch: Branch): ValueRecord | undefined =>
      set.find(({ property }) => property === `${quantity}_${branch}`);
    const longitudinal = find('sound_velocity', 'longitudinal');
    const transverse = find('sound_velocity', 'transverse');
    if (longitudinal === undefined || transverse === undefined) continue;
    const both = (quantity: string): Readonly<Record<Branch, ValueRecord | undefined>> => ({
      longitudinal: find(quantity, 'longitudinal'),
      transverse: find(quantity, 'transverse'),
    });
    return {
      velocity: { longitudinal, transverse },
      cutoff: both('zone_boundary_temperature'),
      gruneisen: both('gruneisen'),
    };
  }
  return null;
}

type AveragePair = Readonly<Record<Branch, ValueRecord>>;

function findAveragePair(values: readonly ValueRecord[]): AveragePair | null {
  const find = (branch: Branch): ValueRecord | undefined =>
    values.find(
      ({ property, kind, preferred }) =>
        property === `sound_velocity_${branch}` && kind === 'average' && preferred,
    );
  const longitudinal = find('longitudinal');
  const transverse = find('transverse');
  return longitudinal === undefined || transverse === undefined ? null : { longitudinal, transverse };
}

function findPreferred(
  values: readonly ValueRecord[],
  property: string,
  kind?: string,
): ValueRecord | undefined {
  return values.find(
    (value) => value.property === property && value.preferred && (kind === undefined || value.kind === kind),
  );
}

const debyeKinds: readonly (readonly [string, string])[] = [
  ['calorimetric-0K', 'calorimetric, 0 K'],
  ['calorimetric-298K', 'calorimetric, 298 K'],
  ['elastic', 'elastic'],
];

/** The preferred Debye temperature: calorimetric at 0 K before 298 K before elastic. */
export function findDebyeTemperature(
  values: readonly ValueRecord[],
): { record: ValueRecord; kind: string } | null {
  for (const [kind, label] of debyeKinds) {
    const record = findPreferred(values, 'debye_temperature', kind);
    if (record !== undefined) return { record, kind: label };
  }
  return null;
}

/** Velocities for a list: the average pair, else the branch pair. */
export function findVelocityPair(
  values: readonly ValueRecord[],
): Readonly<Record<Branch, ValueRecord>> | null {
  return findAveragePair(values) ?? findBranchSet(values)?.velocity ?? null;
}

function directionText(record: ValueRecord): string {
  return record.direction === null ? '' : `, along ${record.direction}`;
}

/** A number in the order of preference: given, then the first of the others that there is. */
function choose(given: number | undefined, ...others: readonly (() => Slot | null)[]): Slot | null {
  if (given !== undefined) return givenSlot(given);
  for (const other of others) {
    const slot = other();
    if (slot !== null) return slot;
  }
  return null;
}

function fromStore(record: ValueRecord | undefined, kind: string): Slot | null {
  return record === undefined ? null : storedSlot(record, kind);
}

/** Derivations of physics that some inputs do not allow (no stable solid has such velocities) give nothing. */
function deriveOrNull(derive: () => Slot): Slot | null {
  try {
    return derive();
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}

function velocitySlot(
  name: Branch,
  given: number | undefined,
  set: BranchSet | null,
  average: AveragePair | null,
): Slot | null {
  return choose(
    given,
    () =>
      set === null ? null : storedSlot(set.velocity[name], `branch${directionText(set.velocity[name])}`),
    () =>
      average === null ? null : storedSlot(average[name], 'average over directions, serves the branch too'),
  );
}

function cutoffSlot(
  name: Branch,
  given: number | undefined,
  { set, velocity, cellVolume }: { set: BranchSet | null; velocity: Slot | null; cellVolume: Slot | null },
): Slot | null {
  const letter = branchLetter[name];
  return choose(
    given,
    () => fromStore(set?.cutoff[name], `zone boundary of the ${letter}A branch`),
    () => {
      if (velocity === null || cellVolume === null) return null;
      const cutoffK = branchCutoffTemperatureK({
        velocityMPerS: velocity.value,
        cellVolumeM3: cellVolume.value * m3PerCubicAngstrom,
      });
      return derivedSlot(
        cutoffK,
        `cut-off of the ${letter} branch`,
        `derived: θ_${letter} = (ħ/k_B) v_${letter} (6π²/V_c)^(1/3)`,
        'No zone-boundary frequency is stored; the cut-off holds one mode of the branch for each cell.',
      );
    },
  );
}

function gruneisenSlot(
  name: Branch,
  given: number | undefined,
  {
    set,
    values,
    average,
  }: { set: BranchSet | null; values: readonly ValueRecord[]; average: VelocityPair | null },
): Slot | null {
  const letter = branchLetter[name];
  return choose(
    given,
    () => fromStore(set?.gruneisen[name], `of the ${letter}A branch`),
    () => fromStore(findPreferred(values, 'gruneisen', 'acoustic'), 'acoustic, the same for both branches'),
    () =>
      average === null
        ? null
        : deriveOrNull(() =>
            derivedSlot(
              gruneisenFromVelocities(average),
              "from Poisson's ratio, the same for both branches",
              'derived from the average sound velocities: γ = (3/2)(1 + ν)/(2 − 3ν), Belomestnykh (2004)',
            ),
          ),
  );
}

function debyeSlot(
  given: number | undefined,
  {
    values,
    average,
    volumePerAtomM3,
  }: { values: readonly ValueRecord[]; average: VelocityPair | null; volumePerAtomM3: number | null },
): Slot | null {
  return choose(
    given,
    () => {
      const found = findDebyeTemperature(values);
      return found === null ? null : storedSlot(found.record, found.kind);
    },
    () => {
      if (average === null || volumePerAtomM3 === null) return null;
      const meanVelocityMPerS = meanSoundVelocityMPerS(average.longitudinalMPerS, average.transverseMPerS);
      return derivedSlot(
        elasticDebyeTemperatureK({ meanVelocityMPerS, volumePerAtomM3 }),
        'elastic',
        'derived from the average sound velocities: θ_el = (ħ/k_B) v_D (6π²/V_a)^(1/3)',
      );
    },
  );
}

function massSlot(given: number | undefined, mix: IsotopeMix | null, formula: string): Slot | null {
  return choose(given, () =>
    mix === null
      ? null
      : derivedSlot(
          mix.meanMassU,
          mix.kind,
          `derived from the composition ${formula} and the isotopes' masses`,
        ),
  );
}

function massVarianceSlot(given: number | undefined, mix: IsotopeMix | null, formula: string): Slot {
  const slot = choose(given, () =>
    mix === null
      ? null
      : derivedSlot(
          mix.massVariance,
          mix.kind,
          `derived from the composition ${formula} and the isotopes' masses: Γ = Σ c (m̄/M̄)² Σ f (1 − m/m̄)² / Σ c`,
        ),
  );
  return (
    slot ??
    derivedSlot(
      0,
      'no isotope scattering',
      'neither a composition nor a mass variance is given, so none is counted',
    )
  );
}

interface Slots {
  readonly cell_volume_A3: Slot | null;
  readonly atoms_per_cell: Slot | null;
  readonly mean_mass_u: Slot | null;
  readonly debye_temperature_K: Slot | null;
  readonly v_L_m_s: Slot | null;
  readonly v_T_m_s: Slot | null;
  readonly theta_L_K: Slot | null;
  readonly theta_T_K: Slot | null;
  readonly gamma_L: Slot | null;
  readonly gamma_T: Slot | null;
  readonly mass_variance: Slot;
}

/** All numbers, or null while one that κ needs is missing. */
function completeParameters(slots: Slots): CompleteParameters | null {
  const {
    cell_volume_A3,
    atoms_per_cell,
    mean_mass_u,
    v_L_m_s,
    v_T_m_s,
    theta_L_K,
    theta_T_K,
    gamma_L,
    gamma_T,
  } = slots;
  if (!cell_volume_A3 || !atoms_per_cell || !mean_mass_u || !v_L_m_s || !v_T_m_s) return null;
  if (!theta_L_K || !theta_T_K || !gamma_L || !gamma_T) return null;
  const debye = slots.debye_temperature_K;
  return {
    cell_volume_A3: cell_volume_A3.value,
    atoms_per_cell: atoms_per_cell.value,
    mean_mass_u: mean_mass_u.value,
    ...(debye === null ? {} : { debye_temperature_K: debye.value }),
    v_L_m_s: v_L_m_s.value,
    v_T_m_s: v_T_m_s.value,
    theta_L_K: theta_L_K.value,
    theta_T_K: theta_T_K.value,
    gamma_L: gamma_L.value,
    gamma_T: gamma_T.value,
    mass_variance: slots.mass_variance.value,
  };
}

/** Why the numbers do not suffice, a sentence for each thing missing. */
function findObstacles(slots: Slots, material: MaterialFacts | null): readonly Obstacle[] {
  const where = material === null ? 'given' : 'stored';
  const obstacles: Obstacle[] = [];
  const add = (message: string, ...parameters: readonly EstimateParameterName[]): void => {
    obstacles.push({ message, parameters });
  };
  if (slots.cell_volume_A3 === null) {
    if (material !== null && isGlass(material)) {
      add(
        'It is a glass: it has no primitive cell, and the models of a crystal do not describe it, so no estimate can be made.',
      );
    } else {
      add(`No volume of the primitive cell is ${where}, so no estimate can be made.`, 'cell_volume_A3');
    }
  }
  if (slots.atoms_per_cell === null && !(material !== null && isGlass(material))) {
    add(
      `The number of atoms in the primitive cell is not ${where}, so no estimate can be made.`,
      'atoms_per_cell',
    );
  }
  if (slots.mean_mass_u === null) {
    add(`No mean atomic mass is ${where} or can be derived, so no estimate can be made.`, 'mean_mass_u');
  }
  const missing = [slots.v_L_m_s === null && 'v_L_m_s', slots.v_T_m_s === null && 'v_T_m_s'] as const;
  if (missing[0] && missing[1]) {
    add(
      `No sound velocities are ${where} and none can be derived, so no estimate can be made.`,
      missing[0],
      missing[1],
    );
  } else if (missing[0]) {
    add(`No longitudinal sound velocity is ${where}, so no estimate can be made.`, missing[0]);
  } else if (missing[1]) {
    add(`No transverse sound velocity is ${where}, so no estimate can be made.`, missing[1]);
  } else if (slots.gamma_L === null || slots.gamma_T === null) {
    add(
      `No Grüneisen parameter is ${where}, and none can be derived from sound velocities that no stable solid has (v_T must be below 0.866 v_L), so no estimate can be made.`,
      'gamma_L',
      'gamma_T',
    );
  }
  return obstacles;
}

function averageVelocities(
  average: AveragePair | null,
  longitudinal: Slot | null,
  transverse: Slot | null,
): VelocityPair | null {
  if (average !== null) {
    return { longitudinalMPerS: average.longitudinal.value, transverseMPerS: average.transverse.value };
  }
  if (longitudinal === null || transverse === null) return null;
  return { longitudinalMPerS: longitudinal.value, transverseMPerS: transverse.value };
}

function listInputs(slots: Slots, average: AveragePair | null): readonly EstimateInput[] {
  const inputs: EstimateInput[] = [];
  const add = (name: EstimateInput['name'], slot: Slot | null): void => {
    if (slot !== null) inputs.push({ name, ...slot });
  };
  add('cell_volume_A3', slots.cell_volume_A3);
  add('atoms_per_cell', slots.atoms_per_cell);
  add('mean_mass_u', slots.mean_mass_u);
  add('debye_temperature_K', slots.debye_temperature_K);
  add('v_L_m_s', slots.v_L_m_s);
  add('v_T_m_s', slots.v_T_m_s);
  if (average !== null) {
    add('average_v_L_m_s', storedSlot(average.longitudinal, 'average over directions'));
    add('average_v_T_m_s', storedSlot(average.transverse, 'average over directions'));
  }
  add('theta_L_K', slots.theta_L_K);
  add('theta_T_K', slots.theta_T_K);
  add('gamma_L', slots.gamma_L);
  add('gamma_T', slots.gamma_T);
  add('mass_variance', slots.mass_variance);
  return inputs;
}

function atomsSlot(given: number | undefined, material: MaterialFacts | null): Slot | null {
  const stored = material?.atomsPerCell ?? null;
  return choose(given, () =>
    stored === null
      ? null
      : { ...derivedSlot(stored, 'primitive cell', 'crystal structure'), basis: 'published' },
  );
}

/** Both zone-boundary temperatures known and not derived: stored ones of a material, or given ones without a material. */
function recommendModel(
  material: MaterialFacts | null,
  set: BranchSet | null,
  given: EstimateParameters,
): Model {
  const known =
    material === null ? given : { theta_L_K: set?.cutoff.longitudinal, theta_T_K: set?.cutoff.transverse };
  return known.theta_L_K !== undefined && known.theta_T_K !== undefined ? 'callaway' : 'branch';
}

export interface ResolveRequest {
  /** Null: only what is given counts. */
  readonly material: MaterialFacts | null;
  readonly given?: EstimateParameters | undefined;
  readonly isotopes?: IsotopeChoice;
}

/**
 * The numbers an estimate takes, each with its provenance, or the obstacles that stand against it.
 *
 * @throws AppError INVALID_INPUT for isotopes that the material does not have.
 */
export function resolveEstimatorInputs({
  material,
  given = {},
  isotopes = 'natural',
}: ResolveRequest): ResolvedInputs {
  const values = material?.values ?? [];
  const set = findBranchSet(values);
  const averagePair = findAveragePair(values);
  const mix = material === null ? null : mixIsotopes(material.composition, material.isotopes, isotopes);
  const formula = material?.formula ?? '';
  const cellVolume = choose(given.cell_volume_A3, () =>
    fromStore(findPreferred(values, 'cell_volume'), 'primitive cell'),
  );
  const atoms = atomsSlot(given.atoms_per_cell, material);
  const longitudinal = velocitySlot('longitudinal', given.v_L_m_s, set, averagePair);
  const transverse = velocitySlot('transverse', given.v_T_m_s, set, averagePair);
  const average = averageVelocities(averagePair, longitudinal, transverse);
  const volumePerAtomM3 =
    cellVolume === null || atoms === null ? null : (cellVolume.value * m3PerCubicAngstrom) / atoms.value;
  const slots: Slots = {
    cell_volume_A3: cellVolume,
    atoms_per_cell: atoms,
    mean_mass_u: massSlot(given.mean_mass_u, mix, formula),
    debye_temperature_K: debyeSlot(given.debye_temperature_K, { values, average, volumePerAtomM3 }),
    v_L_m_s: longitudinal,
    v_T_m_s: transverse,
    theta_L_K: cutoffSlot('longitudinal', given.theta_L_K, { set, velocity: longitudinal, cellVolume }),
    theta_T_K: cutoffSlot('transverse', given.theta_T_K, { set, velocity: transverse, cellVolume }),
    gamma_L: gruneisenSlot('longitudinal', given.gamma_L, { set, values, average }),
    gamma_T: gruneisenSlot('transverse', given.gamma_T, { set, values, average }),
    mass_variance: massVarianceSlot(given.mass_variance, mix, formula),
  };
  return {
    parameters: completeParameters(slots),
    average,
    volumePerAtomM3,
    inputs: listInputs(slots, averagePair),
    obstacles: findObstacles(slots, material),
    recommendedModel: recommendModel(material, set, given),
  };
}
