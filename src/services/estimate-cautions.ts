import type { MaterialRecord, ValueRecord } from '#src/db/queries/records.ts';
import type { Caution, EstimateInput, EstimatePoint } from '#src/schemas/estimate.ts';
import { isGlass } from '#src/services/estimator-inputs.ts';

/** What a reader must know before using the numbers of an estimate. Pure. */

export interface CautionContext {
  /** Null where an estimate stands on given parameters alone. */
  readonly material: Pick<
    MaterialRecord,
    'name' | 'class' | 'structure' | 'spaceGroupNumber' | 'hazards'
  > | null;
  /** Melting, decomposition and transition temperatures that are stored. */
  readonly transitions: readonly ValueRecord[];
  readonly points: readonly EstimatePoint[];
  readonly inputs: readonly EstimateInput[];
  /** δ = V_a^(1/3), m. */
  readonly atomicSpacingM: number;
  readonly porosity: number;
  readonly defectMassVariance: number;
}

type Rule = (context: CautionContext) => Caution | null;

/** Space groups from 195 on are cubic (International Tables for Crystallography A). */
const firstCubicGroup = 195;
/** Beyond this share of pores, Maxwell's formula for round pores apart from each other no longer holds. */
const maxwellPorosityMax = 0.3;
/** From about here undoped semiconductors have carriers enough to carry heat (silicon: a few per cent at 1000 K). */
const carriersFromK = 600;

function temperatureSpan(points: readonly EstimatePoint[]): string {
  const temperatures = points.map(({ T_K }) => T_K);
  const [low, high] = [Math.min(...temperatures), Math.max(...temperatures)].map((value) =>
    String(Number(value.toPrecision(4))),
  );
  return low === high ? `at ${low ?? ''} K` : `between ${low ?? ''} K and ${high ?? ''} K`;
}

const screen: Rule = () => ({
  code: 'estimate-is-a-screen',
  message:
    'A kinetic-theory estimate screens candidates; it is not a design value. It is typically within a factor of 1.5 of measurements and sometimes off by more than 3. Measure, or cite a measurement, before you build on it.',
});

const interval: Rule = () => ({
  code: 'interval-not-calibrated',
  message:
    'No interval is given yet: how far estimates of this kind lie from measurements has not been calibrated.',
});

const glass: Rule = ({ material }) =>
  material !== null && isGlass(material)
    ? {
        code: 'glass',
        message: `${material.name} is a glass. The models are those of a crystal; the floor is the nearer guide.`,
      }
    : null;

const layered: Rule = ({ material }) => {
  if (material === null || !/layered|tetradymite|GeS-type/.test(`${material.class} ${material.structure}`))
    return null;
  return {
    code: 'layered',
    message: `${material.name} is layered: heat flows along the layers many times better than across them, and one number for all directions has little meaning.`,
  };
};

const orientation: Rule = ({ material }) => {
  const group = material?.spaceGroupNumber ?? null;
  if (material === null || group === null || group >= firstCubicGroup) return null;
  return {
    code: 'orientation-average',
    message: `${material.name} is not cubic: the estimate is an average over directions, while the crystal conducts differently along its axes.`,
  };
};

const electrons: Rule = ({ material, points }) => {
  if (material === null) return null;
  const code = 'electrons-carry-heat';
  const latticeOnly = 'The estimate is the lattice part only.';
  if (material.class === 'metal') {
    return {
      code,
      message: `In ${material.name}, a metal, electrons carry most of the heat. ${latticeOnly}`,
    };
  }
  if (material.class === 'semimetal') {
    return {
      code,
      message: `In ${material.name}, a semimetal, electrons carry part of the heat. ${latticeOnly}`,
    };
  }
  if (material.class === 'thermoelectric semiconductor') {
    return {
      code,
      message: `${material.name} is used doped, and its carriers then carry part of the heat. ${latticeOnly}`,
    };
  }
  const hot = points.filter(({ T_K }) => T_K > carriersFromK);
  if (!/semiconductor|III-V|II-VI/.test(material.class) || hot.length === 0) return null;
  return {
    code,
    message: `In a hot semiconductor electrons and holes carry part of the heat (points ${temperatureSpan(hot)}). ${latticeOnly}`,
  };
};

const disorder: Rule = ({ material, defectMassVariance }) => {
  if (material === null || !/alloy|disorder|weakly ordered/.test(`${material.class} ${material.structure}`))
    return null;
  const remedy =
    defectMassVariance > 0
      ? 'Only the defect_mass_variance of the request counts for it.'
      : 'Give it as defect_mass_variance; without it the estimate is far too high.';
  return {
    code: 'disordered',
    message: `In ${material.name} different atoms share the same sites. Γ holds the isotopes but not this disorder. ${remedy}`,
  };
};

function kelvin(value: number): string {
  return `${Number(value.toPrecision(5))} K`;
}

const aboveMelting: Rule = ({ material, transitions, points }) => {
  const ends = transitions.filter(({ kind }) => kind === 'melting' || kind === 'decomposition');
  const first = ends.toSorted((a, b) => a.value - b.value)[0];
  if (material === null || first === undefined) return null;
  const above = points.filter(({ T_K }) => T_K > first.value);
  if (above.length === 0) return null;
  const happening = first.kind === 'melting' ? 'melts' : 'decomposes';
  return {
    code: 'above-melting',
    message: `${material.name} ${happening} at ${kelvin(first.value)}: above that, the numbers are for a crystal that does not exist (points ${temperatureSpan(above)}).`,
  };
};

/** A stored transition does not say which side the crystal of the store belongs to: some are of its order, not its lattice. */
const phaseTransition: Rule = ({ material, transitions, points }) => {
  if (material === null) return null;
  const passed = transitions.filter(
    ({ kind, value }) => kind === 'transition' && points.some(({ T_K }) => T_K > value),
  );
  if (passed.length === 0) return null;
  const temperatures = passed.map(({ value }) => kelvin(value)).join(' and ');
  return {
    code: 'phase-transition',
    message: `${material.name} changes its structure or its order at ${temperatures}; the estimate knows one phase only and runs on through.`,
  };
};

const floor: Rule = ({ points }) => {
  const below = points.filter(({ kappa_W_mK, floor_W_mK }) => floor_W_mK !== null && kappa_W_mK < floor_W_mK);
  if (below.length === 0) return null;
  return {
    code: 'below-floor',
    message: `The estimate lies below the floor (minimum conductivity) ${temperatureSpan(below)}, where its picture of travelling waves no longer holds.`,
  };
};

const spacing: Rule = ({ points, atomicSpacingM }) => {
  const below = points.filter(({ mean_free_path_m }) => mean_free_path_m < atomicSpacingM);
  if (below.length === 0) return null;
  return {
    code: 'below-atomic-spacing',
    message: `The mean free path is shorter than the distance between atoms ${temperatureSpan(below)} (Ioffe–Regel limit), where its picture of travelling waves no longer holds.`,
  };
};

const longPath: Rule = ({ points }) => {
  const long = points.filter(({ mean_free_path_m }) => mean_free_path_m > 1);
  if (long.length === 0) return null;
  return {
    code: 'mean-free-path-over-1-m',
    message: `The mean free path is over 1 m ${temperatureSpan(long)}, longer than any sample: give the piece a size.`,
  };
};

const inputNames: Readonly<Partial<Record<EstimateInput['name'], string>>> = {
  theta_L_K: 'the cut-off θ_L',
  theta_T_K: 'the cut-off θ_T',
  gamma_L: 'the Grüneisen parameter γ_L',
  gamma_T: 'the Grüneisen parameter γ_T',
};

/** Derived masses and isotope Γ are as good as stored ones; derived cut-offs and Grüneisen parameters are not. */
const derived: Rule = ({ inputs }) => {
  const missing = inputs.filter(({ basis, source_key }) => basis === 'derived' && source_key === null);
  const names = missing.flatMap(({ name }) => inputNames[name] ?? []);
  if (names.length === 0) return null;
  const hasCutoff = missing.some(({ name }) => name === 'theta_L_K' || name === 'theta_T_K');
  const consequence = hasCutoff
    ? ' Real branches bend down towards the zone boundary, so derived cut-offs tend to be too high.'
    : '';
  return {
    code: 'derived-inputs',
    message: `Not known from a source and derived instead: ${names.join(', ')}.${consequence}`,
  };
};

const pores: Rule = ({ porosity }) =>
  porosity > maxwellPorosityMax
    ? {
        code: 'porosity-outside-maxwell',
        message: `A porosity of ${porosity} is outside the range of the formula for round closed pores (up to about ${maxwellPorosityMax}).`,
      }
    : null;

const rules: readonly Rule[] = [
  screen,
  interval,
  glass,
  disorder,
  layered,
  orientation,
  electrons,
  aboveMelting,
  phaseTransition,
  floor,
  spacing,
  longPath,
  derived,
  pores,
];

const hazardNames: Readonly<Record<string, string>> = {
  beryllium: 'Beryllium and its dust are poisonous when breathed in.',
  cadmium: 'Contains cadmium, which is poisonous.',
  thallium: 'Contains thallium, which is very poisonous.',
  lead: 'Contains lead, which is poisonous.',
  arsenic: 'Contains arsenic, which is poisonous.',
  antimony: 'Contains antimony, which is harmful.',
  tellurium: 'Contains tellurium, which is harmful.',
  selenium: 'Contains selenium, which is poisonous.',
  uranium: 'Contains uranium: radioactive and poisonous.',
  thorium: 'Contains thorium: radioactive.',
  mercury: 'Contains mercury, which is poisonous.',
  'lithium-hydride': 'Lithium hydride reacts violently with water.',
  'alkali-metal': 'An alkali metal: reacts violently with water.',
  fluoride: 'A fluoride: dust and solutions are harmful.',
  asphyxiant: 'As a gas it displaces the air that people breathe.',
  cryogenic: 'Solid only when very cold: cold burns and pressure build-up.',
  'fine-dust': 'Fine dust harms the lungs.',
};

const licensedPractice = 'Local rules and licensed practice say how it is handled.';

/** A caution for each hazard flag. It flags; it does not teach handling. */
export function hazardCautions(hazards: readonly string[]): readonly Caution[] {
  return hazards.map((flag) => ({
    code: `hazard-${flag}`,
    message: `${hazardNames[flag] ?? `Hazard: ${flag}.`} ${licensedPractice}`,
  }));
}

/** Every caution that applies, the general ones first. */
export function listCautions(context: CautionContext): readonly Caution[] {
  const applying = rules.map((rule) => rule(context)).filter((caution) => caution !== null);
  return [...applying, ...hazardCautions(context.material?.hazards ?? [])];
}
