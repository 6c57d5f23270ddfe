import { bulkSampleForms } from '#src/db/schema/measurements.ts';
import { propertyUnits } from '#src/db/schema/properties.ts';
import { parseFormula } from '#src/lib/formula.ts';
import type { SeedData, SeedFileName } from './files.ts';
import type { SeedProblem } from './table.ts';

/**
 * What no single cell can show: references that lead nowhere, rows that stand twice, two preferred values of one
 * quantity, pairs of values that no crystal has.
 */
export function checkSeed(data: SeedData): readonly SeedProblem[] {
  return [
    ...checkKeys(data),
    ...checkReferences(data),
    ...checkMaterials(data),
    ...checkProvenance(data),
    ...checkProperties(data),
    ...checkVelocityPairs(data),
    ...checkElasticStability(data),
    ...checkMeasurements(data),
    ...checkAbundances(data),
  ];
}

/** Files whose rows say how a value came about. */
const filesWithBasis = [
  'isotopes.csv',
  'property-values.csv',
  'elastic-constants.csv',
  'zone-boundary-frequencies.csv',
  'thermal-expansion.csv',
  'transitions.csv',
  'measurement-points.csv',
  'scattering-parameters.csv',
] as const satisfies readonly SeedFileName[];

const filesWithSource = [
  'isotopes.csv',
  'property-values.csv',
  'elastic-constants.csv',
  'zone-boundary-frequencies.csv',
  'thermal-expansion.csv',
  'transitions.csv',
  'caveats.csv',
  'measurements.csv',
  'scattering-parameters.csv',
] as const satisfies readonly SeedFileName[];

const filesOfMaterials = [
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

interface Repeatable<Row> {
  readonly file: SeedFileName;
  readonly rows: readonly Row[];
  readonly column: string;
  readonly key: (row: Row) => string;
  readonly remedy: string;
}

function findRepeated<Row extends { readonly line: number }>(about: Repeatable<Row>): SeedProblem[] {
  const firstLine = new Map<string, number>();
  return about.rows.flatMap((row) => {
    const key = about.key(row);
    const first = firstLine.get(key);
    if (first === undefined) {
      firstLine.set(key, row.line);
      return [];
    }
    const remedy = `It stands on line ${first} already. ${about.remedy}`;
    return [{ file: about.file, line: row.line, column: about.column, value: key, remedy }];
  });
}

function checkKeys(data: SeedData): SeedProblem[] {
  return [
    ...findRepeated({
      file: 'sources.csv',
      rows: data['sources.csv'],
      column: 'key',
      key: (row) => row.key,
      remedy: 'Give each source one row.',
    }),
    ...findRepeated({
      file: 'materials.csv',
      rows: data['materials.csv'],
      column: 'slug',
      key: (row) => row.slug,
      remedy: 'Give each material one row.',
    }),
    ...findRepeated({
      file: 'isotopes.csv',
      rows: data['isotopes.csv'],
      column: 'mass_number',
      key: (row) => `${row.symbol}-${row.mass_number}`,
      remedy: 'Give each isotope one row.',
    }),
    ...findRepeated({
      file: 'samples.csv',
      rows: data['samples.csv'],
      column: 'sample',
      key: (row) => `${row.material} ${row.sample}`,
      remedy: 'Give each sample of a material a slug of its own.',
    }),
    ...findRepeated({
      file: 'measurements.csv',
      rows: data['measurements.csv'],
      column: 'series',
      key: (row) => `${row.material} ${row.series}`,
      remedy: 'Give each series of a material a name of its own.',
    }),
    ...findRepeated({
      file: 'measurement-points.csv',
      rows: data['measurement-points.csv'],
      column: 'temperature_K',
      key: (row) => `${row.material} ${row.series} ${row.temperature_K} K`,
      remedy: 'Give each temperature of a series one value.',
    }),
  ];
}

function checkReferences(data: SeedData): SeedProblem[] {
  const sources = new Set(data['sources.csv'].map((row) => row.key));
  const materials = new Set(data['materials.csv'].map((row) => row.slug));
  const samples = new Set(data['samples.csv'].map((row) => `${row.material} ${row.sample}`));
  const series = new Set(data['measurements.csv'].map((row) => `${row.material} ${row.series}`));
  return [
    ...filesWithSource.flatMap((file) =>
      data[file]
        .filter((row) => !sources.has(row.source))
        .map((row) => missing(file, row.line, 'source', row.source, 'Add the source to sources.csv.')),
    ),
    ...filesOfMaterials.flatMap((file) =>
      data[file]
        .filter((row) => !materials.has(row.material))
        .map((row) =>
          missing(file, row.line, 'material', row.material, 'Add the material to materials.csv.'),
        ),
    ),
    ...data['measurements.csv']
      .filter((row) => !samples.has(`${row.material} ${row.sample}`))
      .map((row) =>
        missing(
          'measurements.csv',
          row.line,
          'sample',
          row.sample,
          `Add the sample of ${row.material} to samples.csv.`,
        ),
      ),
    ...data['measurement-points.csv']
      .filter((row) => !series.has(`${row.material} ${row.series}`))
      .map((row) =>
        missing(
          'measurement-points.csv',
          row.line,
          'series',
          row.series,
          `Add the series of ${row.material} to measurements.csv.`,
        ),
      ),
  ];
}

function missing(
  file: SeedFileName,
  line: number,
  column: string,
  value: string,
  remedy: string,
): SeedProblem {
  return { file, line, column, value, remedy };
}

function checkMaterials(data: SeedData): SeedProblem[] {
  const weighed = new Set(data['isotopes.csv'].map((row) => row.symbol));
  return data['materials.csv'].flatMap((row) => {
    const at = { file: 'materials.csv', line: row.line } as const;
    const problems: SeedProblem[] = [];
    if (row.space_group_number !== null && row.space_group_number > 230) {
      problems.push({
        ...at,
        column: 'space_group_number',
        value: String(row.space_group_number),
        remedy: 'Space groups are numbered from 1 to 230.',
      });
    }
    try {
      const unknown = parseFormula(row.formula).filter(({ element }) => !weighed.has(element));
      problems.push(
        ...unknown.map(({ element }) => ({
          ...at,
          column: 'formula',
          value: row.formula,
          remedy: `isotopes.csv has no ${element}: add its isotopes, or the material has no mass.`,
        })),
      );
    } catch (error) {
      if (!(error instanceof RangeError)) throw error;
      problems.push({ ...at, column: 'formula', value: row.formula, remedy: error.message });
    }
    return problems;
  });
}

function checkProvenance(data: SeedData): SeedProblem[] {
  return filesWithBasis.flatMap((file) =>
    data[file].flatMap((row) => {
      const fromSource = row.basis === 'measured' || row.basis === 'published';
      if (fromSource === (row.verification !== null)) return [];
      const remedy = fromSource
        ? `A ${row.basis} value says whether it was compared with its source: "checked" or "from memory".`
        : `A value that is ${row.basis} has nothing to be compared with: leave verification blank.`;
      return [{ file, line: row.line, column: 'verification', value: row.verification ?? '', remedy }];
    }),
  );
}

function checkProperties(data: SeedData): SeedProblem[] {
  const file = 'property-values.csv';
  const rows = data[file];
  const bad = rows.flatMap((row) => {
    const { csv } = propertyUnits[row.property];
    const problems: SeedProblem[] = [];
    if (row.unit !== csv) {
      problems.push({
        file,
        line: row.line,
        column: 'unit',
        value: row.unit,
        remedy: `${row.property} is given in ${csv} here, and in nothing else.`,
      });
    }
    const isGruneisen = row.property.startsWith('gruneisen');
    if (isGruneisen ? Math.abs(row.value) > 20 : row.value <= 0) {
      const remedy = isGruneisen
        ? 'A Grüneisen parameter lies between −20 and 20.'
        : `${row.property} must be above zero.`;
      problems.push({ file, line: row.line, column: 'value', value: String(row.value), remedy });
    }
    return problems;
  });
  return [
    ...bad,
    ...findRepeated({
      file,
      rows,
      column: 'value',
      key: (row) =>
        [
          row.material,
          row.property,
          row.kind,
          row.value_set,
          row.temperature_K,
          row.direction,
          row.source,
          row.value,
        ]
          .filter((part) => part !== null)
          .join(' '),
      remedy: 'Store one value of one source once.',
    }),
    ...rows
      .filter((row) => row.preferred && !isPreferable(row))
      .map((row) => ({
        file,
        line: row.line,
        column: 'preferred',
        value: 'true',
        remedy: `An estimate has no use for ${row.property} of the kind "${row.kind}": leave it blank here.`,
      })),
    ...findRepeated({
      file,
      rows: rows.filter((row) => row.preferred),
      column: 'preferred',
      key: (row) => `${row.material} ${row.property}${row.kind === 'branch' ? ' branch' : ''}`,
      remedy: 'Prefer one value of a quantity.',
    }),
    ...checkBranchSets(rows),
  ];
}

/** A velocity within a plane is no average; a thermal Grüneisen parameter weighs other modes than those that carry heat. */
function isPreferable(row: SeedData['property-values.csv'][number]): boolean {
  if (row.kind === 'in-plane') return false;
  return row.property !== 'gruneisen' || row.kind === 'acoustic';
}

function checkBranchSets(rows: SeedData['property-values.csv']): SeedProblem[] {
  const preferredSet = new Map<string, string>();
  return rows
    .filter((row) => row.kind === 'branch')
    .flatMap((row) => {
      const at = {
        file: 'property-values.csv',
        line: row.line,
        column: 'value_set',
        value: row.value_set ?? '',
      };
      if (row.value_set === null) {
        return [
          {
            ...at,
            remedy: 'A branch value names the published row it belongs to, so that pairs are not mixed.',
          },
        ];
      }
      if (!row.preferred) return [];
      const chosen = preferredSet.get(row.material) ?? row.value_set;
      preferredSet.set(row.material, chosen);
      return chosen === row.value_set
        ? []
        : [
            {
              ...at,
              remedy: `Other preferred branch values of ${row.material} belong to "${chosen}": prefer one set.`,
            },
          ];
    });
}

/** K = ρ(v_L² − 4/3 v_T²) > 0 for averages over directions: v_T < v_L·√3/2. */
function checkVelocityPairs(data: SeedData): SeedProblem[] {
  const averages = data['property-values.csv'].filter((row) => row.kind === 'average' && row.preferred);
  const longitudinal = new Map(
    averages
      .filter((row) => row.property === 'sound_velocity_longitudinal')
      .map((row) => [row.material, row.value]),
  );
  return averages
    .filter((row) => row.property === 'sound_velocity_transverse')
    .flatMap((row) => {
      const limit = (longitudinal.get(row.material) ?? Number.POSITIVE_INFINITY) * (Math.sqrt(3) / 2);
      if (row.value < limit) return [];
      const remedy = `With the stored v_L, an averaged v_T must lie below ${limit.toFixed(0)} m/s: the bulk modulus would be negative.`;
      return [
        { file: 'property-values.csv', line: row.line, column: 'value', value: String(row.value), remedy },
      ];
    });
}

function checkElasticStability(data: SeedData): SeedProblem[] {
  return data['elastic-constants.csv']
    .filter((row) => row.C11_GPa <= Math.abs(row.C12_GPa))
    .map((row) => ({
      file: 'elastic-constants.csv',
      line: row.line,
      column: 'C12_GPa',
      value: String(row.C12_GPa),
      remedy: 'A crystal with |C12| ≥ C11 is not stable: check both.',
    }));
}

function checkMeasurements(data: SeedData): SeedProblem[] {
  const withPoints = new Set(data['measurement-points.csv'].map((row) => `${row.material} ${row.series}`));
  const bulkNatural = new Set(
    data['samples.csv']
      .filter((row) => bulkSampleForms.includes(row.form) && row.isotopes === 'natural')
      .map((row) => `${row.material} ${row.sample}`),
  );
  return [
    ...data['measurements.csv']
      .filter((row) => row.preferred && !bulkNatural.has(`${row.material} ${row.sample}`))
      .map((row) =>
        missing(
          'measurements.csv',
          row.line,
          'preferred',
          'true',
          `Only a bulk sample of natural isotopes stands for its material; "${row.sample}" is none. Leave it blank.`,
        ),
      ),
    ...findRepeated({
      file: 'measurements.csv',
      rows: data['measurements.csv'].filter((row) => row.preferred),
      column: 'preferred',
      key: (row) => row.material,
      remedy: 'Prefer one series of a material.',
    }),
    ...data['measurements.csv']
      .filter((row) => !withPoints.has(`${row.material} ${row.series}`))
      .map((row) =>
        missing(
          'measurements.csv',
          row.line,
          'series',
          row.series,
          'It has no points: add them to measurement-points.csv.',
        ),
      ),
  ];
}

/** Abundances as tabulated add up to 1 within their rounding. */
function checkAbundances(data: SeedData): SeedProblem[] {
  const sums = new Map<string, { line: number; sum: number }>();
  for (const row of data['isotopes.csv']) {
    const before = sums.get(row.symbol) ?? { line: row.line, sum: 0 };
    sums.set(row.symbol, { line: row.line, sum: before.sum + row.abundance_fraction });
  }
  return [...sums]
    .filter(([, { sum }]) => Math.abs(sum - 1) > 1e-3)
    .map(([symbol, { line, sum }]) => ({
      file: 'isotopes.csv',
      line,
      column: 'abundance_fraction',
      value: symbol,
      remedy: `The abundances of ${symbol} add up to ${sum.toFixed(4)}; they must add up to 1.`,
    }));
}
