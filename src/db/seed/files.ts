import { z } from 'zod';
import { hazardFlags, phononBranches, scatteringUnits, transitionKinds } from '#src/db/schema/materials.ts';
import { measuredQuantities, sampleForms, sampleIsotopes } from '#src/db/schema/measurements.ts';
import { propertyNames } from '#src/db/schema/properties.ts';
import * as cell from './cells.ts';

/**
 * The files of seed-data/ and their columns, in order; seed-data/README.md says the same for people. Units stand in
 * the column names, or in the `unit` column.
 */

const provenance = { source: cell.sourceKey, basis: cell.basis, verification: cell.verification };
const note = cell.optionalText;

export const seedFiles = {
  'sources.csv': z.object({
    key: cell.sourceKey,
    authors: cell.optionalText,
    year: cell.optionalWholePositive,
    title: cell.optionalText,
    container: cell.optionalText,
    volume: cell.optionalText,
    page: cell.optionalText,
    doi: z
      .string()
      .regex(/^10\.\d{4,9}\/\S+$/, {
        error: 'A DOI starts with 10. and has no spaces; leave it blank unless it is certain.',
      })
      .nullable(),
    verification: cell.verification,
  }),
  'isotopes.csv': z.object({
    symbol: cell.text,
    atomic_number: cell.wholePositive,
    mass_number: cell.wholePositive,
    mass_u: cell.positive,
    abundance_fraction: cell.fraction,
    ...provenance,
  }),
  'materials.csv': z.object({
    slug: cell.slug,
    name: cell.text,
    formula: cell.text,
    aliases: cell.list,
    structure: cell.text,
    space_group: cell.optionalText,
    space_group_number: cell.optionalWholePositive,
    class: cell.text,
    atoms_per_cell: cell.optionalWholePositive,
    hazards: cell.list.pipe(z.array(cell.oneOf(hazardFlags))),
    note,
  }),
  'property-values.csv': z.object({
    material: cell.slug,
    property: cell.oneOf(propertyNames),
    kind: cell.text,
    value_set: cell.optionalText,
    value: cell.finite,
    unit: cell.text,
    uncertainty: cell.optionalNotNegative,
    temperature_K: cell.optionalTemperatureK,
    direction: cell.optionalText,
    ...provenance,
    preferred: cell.flag,
    note,
  }),
  'elastic-constants.csv': z.object({
    material: cell.slug,
    C11_GPa: cell.positive,
    C12_GPa: cell.finite,
    C44_GPa: cell.optionalPositive,
    C13_GPa: cell.optionalFinite,
    C33_GPa: cell.optionalPositive,
    C66_GPa: cell.optionalPositive,
    C14_GPa: cell.optionalFinite,
    temperature_K: cell.optionalTemperatureK,
    ...provenance,
    note,
  }),
  'zone-boundary-frequencies.csv': z.object({
    material: cell.slug,
    point: cell.text,
    branch: cell.oneOf(phononBranches),
    frequency_THz: cell.positive,
    temperature_K: cell.optionalTemperatureK,
    ...provenance,
    note,
  }),
  'thermal-expansion.csv': z.object({
    material: cell.slug,
    alpha_linear_per_K: cell.finite,
    direction: cell.optionalText,
    temperature_K: cell.optionalTemperatureK,
    ...provenance,
    note,
  }),
  'transitions.csv': z.object({
    material: cell.slug,
    kind: cell.oneOf(transitionKinds),
    temperature_K: cell.temperatureK,
    ...provenance,
    note,
  }),
  'caveats.csv': z.object({
    material: cell.slug,
    caveat: cell.text,
    source: cell.sourceKey,
    verification: cell.verification,
  }),
  'samples.csv': z.object({
    material: cell.slug,
    sample: cell.slug,
    form: cell.oneOf(sampleForms),
    isotopes: cell.oneOf(sampleIsotopes),
    size_m: cell.optionalPositive,
    description: cell.text,
  }),
  'measurements.csv': z.object({
    material: cell.slug,
    series: cell.text,
    sample: cell.slug,
    quantity: cell.oneOf(measuredQuantities),
    direction: cell.optionalText,
    method: cell.optionalText,
    source: cell.sourceKey,
    preferred: cell.flag,
    note,
  }),
  'measurement-points.csv': z.object({
    material: cell.slug,
    series: cell.text,
    temperature_K: cell.temperatureK,
    kappa_W_mK: cell.positive,
    uncertainty_percent: cell.optionalNotNegative,
    basis: cell.basis,
    verification: cell.verification,
    note,
  }),
  'scattering-parameters.csv': z.object({
    material: cell.slug,
    sample: cell.optionalText,
    quantity: cell.text,
    value: cell.finite,
    unit: cell.oneOf(scatteringUnits),
    ...provenance,
    note,
  }),
} as const;

export type SeedFileName = keyof typeof seedFiles;
/** A row of a file, with the line it stands on. */
export type SeedRow<File extends SeedFileName> = z.output<(typeof seedFiles)[File]> & {
  readonly line: number;
};
export type SeedData = { readonly [File in SeedFileName]: readonly SeedRow<File>[] };

export const seedFileNames = [
  'sources.csv',
  'isotopes.csv',
  'materials.csv',
  'property-values.csv',
  'elastic-constants.csv',
  'zone-boundary-frequencies.csv',
  'thermal-expansion.csv',
  'transitions.csv',
  'caveats.csv',
  'samples.csv',
  'measurements.csv',
  'measurement-points.csv',
  'scattering-parameters.csv',
] as const satisfies readonly SeedFileName[];
