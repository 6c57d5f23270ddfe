import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { estimateConductivityWithError } from '#src/physics/conductivity.ts';
import { UnboundedConductivityError, kgPerU, m3PerCubicAngstrom } from '#src/physics/index.ts';
import type { ConductivityRequest, CrystalParameters, MechanismName, ModelName } from '#src/physics/index.ts';
import { relativeDeviation } from '#tests/support/approx.ts';

/**
 * Outside source: tests/fixtures/conductivity-reference.json, written by the Python program of the same name with
 * SciPy's adaptive quadrature (QUADPACK) in ln x, relative tolerance 1e-10. The program shares no code with the core.
 */
interface Reference {
  readonly program: string;
  readonly crystals: Readonly<Record<string, ReferenceCrystal>>;
  readonly cases: readonly ReferenceCase[];
}
type BranchRow = readonly [velocityMPerS: number, cutoffK: number, gruneisen: number];
interface ReferenceCrystal {
  readonly cellVolumeA3: number;
  readonly atomsPerCell: number;
  readonly meanMassU: number;
  readonly longitudinal: BranchRow;
  readonly transverse: BranchRow;
}
interface ReferenceValues {
  readonly kappa: number;
  readonly heatCapacity: number;
  readonly velocity: number;
  readonly share: readonly [boundary: number, defect: number, umklapp: number];
}
interface ReferenceCase {
  readonly crystal: string;
  readonly model: ModelName;
  readonly mechanisms: readonly MechanismName[];
  readonly temperatureK: number;
  readonly lengthM: number | null;
  readonly specularity: number;
  readonly massVariance: number;
  readonly umklappScale: number;
  readonly expected: ReferenceValues | { readonly refused: string };
}

// The file is our own program's output; its shape is what the types above say.
const reference = JSON.parse(
  readFileSync(new URL('../../fixtures/conductivity-reference.json', import.meta.url), 'utf8'),
) as Reference;

function toBranch([velocityMPerS, cutoffK, gruneisen]: BranchRow): CrystalParameters['longitudinal'] {
  return { velocityMPerS, cutoffK, gruneisen };
}

function toRequest(row: ReferenceCase): ConductivityRequest {
  const crystal = reference.crystals[row.crystal];
  if (crystal === undefined) throw new Error(`The reference names no crystal "${row.crystal}".`);
  return {
    model: row.model,
    temperatureK: row.temperatureK,
    crystal: {
      cellVolumeM3: crystal.cellVolumeA3 * m3PerCubicAngstrom,
      atomsPerCell: crystal.atomsPerCell,
      meanMassKg: crystal.meanMassU * kgPerU,
      longitudinal: toBranch(crystal.longitudinal),
      transverse: toBranch(crystal.transverse),
    },
    sample: {
      boundary: row.lengthM === null ? null : { effectiveLengthM: row.lengthM, specularity: row.specularity },
      massVariance: row.massVariance,
      porosity: 0,
      umklappScale: row.umklappScale,
      mechanisms: row.mechanisms,
    },
  };
}

const solved = reference.cases.flatMap((row) =>
  'refused' in row.expected ? [] : [{ row, expected: row.expected }],
);
const refused = reference.cases.flatMap((row) =>
  'refused' in row.expected ? [{ row, reason: row.expected.refused }] : [],
);

/** Relative accuracy that the product promises for every integral. */
const promised = 1e-6;
/** Relative accuracy that the doc blocks of the models claim; the reference was asked for the same. */
const claimed = 1e-10;

describe(`the conductivity models against ${reference.program}`, () => {
  it.each(['gray', 'branch', 'callaway'] as const)(
    '%s agrees within 1e-10 in every hard case, where 1e-6 is promised',
    (model) => {
      const rows = solved.filter(({ row }) => row.model === model);
      expect(rows.length).toBeGreaterThan(200);
      const worst = { kappa: 0, heatCapacity: 0, velocity: 0, share: 0 };
      for (const { row, expected } of rows) {
        const { point } = estimateConductivityWithError(toRequest(row));
        const [boundary, defect, umklapp] = expected.share;
        const deviations = {
          kappa: relativeDeviation(point.kappaWPerMK, expected.kappa),
          heatCapacity: relativeDeviation(point.heatCapacityJPerM3K, expected.heatCapacity),
          velocity: relativeDeviation(point.velocityMPerS, expected.velocity),
          // Absolute: a share is a part of 1.
          share: Math.max(
            Math.abs(point.share.boundary - boundary),
            Math.abs(point.share.defect - defect),
            Math.abs(point.share.umklapp - umklapp),
          ),
        };
        for (const quantity of ['kappa', 'heatCapacity', 'velocity', 'share'] as const) {
          const deviation = deviations[quantity];
          expect(deviation <= claimed, `${quantity} is ${deviation} off for ${JSON.stringify(row)}`).toBe(
            true,
          );
          worst[quantity] = Math.max(worst[quantity], deviation);
        }
      }
      console.info(`${model}: ${rows.length} cases, largest deviations ${JSON.stringify(worst)}`);
    },
  );

  it('is within the error that it reports, give or take the reference itself', () => {
    for (const { row, expected } of solved) {
      const { point, relativeError } = estimateConductivityWithError(toRequest(row));
      const deviation = relativeDeviation(point.kappaWPerMK, expected.kappa);
      // The reference was asked for 1e-10.
      expect(
        deviation <= relativeError + 2e-10,
        `${deviation} > ${relativeError}: ${JSON.stringify(row)}`,
      ).toBe(true);
      expect(relativeError, JSON.stringify(row)).toBeLessThan(promised);
    }
  });

  it('refuses the cases that the reference finds unbounded, for the same reason', () => {
    expect(refused.length).toBeGreaterThan(50);
    for (const { row, reason } of refused) {
      const attempt = (): unknown => estimateConductivityWithError(toRequest(row));
      expect(attempt, JSON.stringify(row)).toThrow(UnboundedConductivityError);
      expect(attempt, JSON.stringify(row)).toThrow(expect.objectContaining({ reason }));
    }
  });
});
