import { describe, expect, it } from 'vitest';
import { parseSeed, type SeedTexts } from '#src/db/seed/parse-seed.ts';
import { readSeedTexts } from '#src/db/seed/read-seed.ts';
import { toRows } from '#src/db/seed/rows.ts';
import { SeedError, type SeedProblem } from '#src/db/seed/table.ts';
import type { SeedFileName } from '#src/db/seed/files.ts';

/** A complete small store: one material, one source, one series. The bad rows of the tests are put into it. */
const small: SeedTexts = {
  'sources.csv':
    'key,authors,year,title,container,volume,page,doi,verification\ndesk-2020,A. Desk,2020,"On salt, dry",Journal of Desks,1,2,,checked\n',
  'isotopes.csv':
    'symbol,atomic_number,mass_number,mass_u,abundance_fraction,source,basis,verification\n' +
    'Na,11,23,22.98977,1,desk-2020,published,checked\n' +
    'Cl,17,35,34.96885,0.7576,desk-2020,published,checked\n' +
    'Cl,17,37,36.96590,0.2424,desk-2020,published,checked\n',
  'materials.csv':
    'slug,name,formula,aliases,structure,space_group,space_group_number,class,atoms_per_cell,hazards,note\n' +
    'nacl,Sodium chloride,NaCl,halite;rock salt,rocksalt,Fm-3m,225,alkali halide,2,,\n',
  'property-values.csv':
    'material,property,kind,value_set,value,unit,uncertainty,temperature_K,direction,source,basis,verification,preferred,note\n' +
    'nacl,sound_velocity_longitudinal,average,,4550,m/s,,300,,desk-2020,derived,,true,\n' +
    'nacl,sound_velocity_transverse,average,,2620,m/s,,300,,desk-2020,derived,,true,\n' +
    'nacl,lattice_parameter_a,conventional,,5.6402,angstrom,0.0001,,,desk-2020,published,checked,true,\n' +
    'nacl,bulk_modulus,isothermal-or-adiabatic,,25.08,GPa,,298,,desk-2020,published,from memory,true,\n',
  'elastic-constants.csv':
    'material,C11_GPa,C12_GPa,C44_GPa,C13_GPa,C33_GPa,C66_GPa,C14_GPa,temperature_K,source,basis,verification,note\n' +
    'nacl,49.5,12.9,12.8,,,,,300,desk-2020,published,checked,\n',
  'zone-boundary-frequencies.csv':
    'material,point,branch,frequency_THz,temperature_K,source,basis,verification,note\nnacl,X,TA,2.58,300,desk-2020,derived,,\n',
  'thermal-expansion.csv':
    'material,alpha_linear_per_K,direction,temperature_K,source,basis,verification,note\nnacl,3.98e-05,,298,desk-2020,published,checked,\n',
  'transitions.csv':
    'material,kind,temperature_K,source,basis,verification,note\nnacl,melting,1074,desk-2020,published,checked,\n',
  'caveats.csv': 'material,caveat,source,verification\nnacl,draws water,desk-2020,checked\n',
  'samples.csv':
    'material,sample,form,isotopes,size_m,description\nnacl,crystal,single crystal,natural,,halite\n',
  'measurements.csv':
    'material,series,sample,quantity,direction,method,source,preferred,note\nnacl,plain,crystal,total,,steady state,desk-2020,true,\n',
  'measurement-points.csv':
    'material,series,temperature_K,kappa_W_mK,uncertainty_percent,basis,verification,note\nnacl,plain,300,6.5,10,measured,checked,\n',
  'scattering-parameters.csv': 'material,sample,quantity,value,unit,source,basis,verification,note\n',
};

function problemsOf(change: Partial<SeedTexts>): readonly SeedProblem[] {
  try {
    parseSeed({ ...small, ...change });
    return [];
  } catch (error) {
    if (error instanceof SeedError) return error.problems;
    throw error;
  }
}

const withRow = (file: SeedFileName, row: string): Partial<SeedTexts> => ({
  [file]: `${small[file]}${row}\n`,
});
const replacing = (file: SeedFileName, from: string, to: string): Partial<SeedTexts> => {
  expect(small[file]).toContain(from);
  return { [file]: small[file].replace(from, to) };
};

describe('seed files', () => {
  it('are read whole when every row is right', () => {
    const data = parseSeed(small);
    expect(data['materials.csv'][0]).toMatchObject({
      slug: 'nacl',
      aliases: ['halite', 'rock salt'],
      line: 2,
    });
    expect(data['measurement-points.csv']).toHaveLength(1);
  });

  it('reach the database in SI units', () => {
    const rows = toRows(parseSeed(small));
    expect(rows.propertyValue.find((row) => row.property === 'lattice_parameter_a')).toMatchObject({
      value: 5.6402e-10,
      uncertainty: 1e-14,
      unit: 'm',
    });
    expect(rows.propertyValue.find((row) => row.property === 'bulk_modulus')?.value).toBe(25.08e9);
    expect(rows.elasticConstantSet[0]).toMatchObject({ c11Pa: 49.5e9, c13Pa: null });
    expect(rows.zoneBoundaryFrequency[0]?.frequencyHz).toBeCloseTo(2.58e12, 0);
    expect(rows.measurementPoint[0]?.uncertaintyWPerMK).toBeCloseTo(0.65, 12);
  });

  it('keep a blank as null', () => {
    const [velocity] = toRows(parseSeed(small)).propertyValue;
    expect(velocity).toMatchObject({ uncertainty: null, verification: null, valueSet: null, note: null });
  });

  it('count a line inside a quoted cell', () => {
    const twoLines = withRow(
      'caveats.csv',
      'nacl,"first\nsecond",desk-2020,checked\nnacl,,desk-2020,checked',
    );
    expect(problemsOf(twoLines)).toMatchObject([{ file: 'caveats.csv', line: 5, column: 'caveat' }]);
  });

  it('give one row the same ids each time, and two rows different ones', () => {
    const ids = toRows(parseSeed(small)).propertyValue.map((row) => row.id);
    expect(new Set(ids).size).toBe(ids.length);
    expect(toRows(parseSeed(small)).propertyValue.map((row) => row.id)).toEqual(ids);
  });
});

/** Each bad row with what the message must name: line, column, value, and a word of the remedy. */
const badRows: readonly {
  readonly what: string;
  readonly change: () => Partial<SeedTexts>;
  readonly problem: Omit<SeedProblem, 'remedy' | 'value'> & { readonly value: string | null };
  readonly remedy: RegExp;
}[] = [
  {
    what: 'a conductivity of zero',
    change: () => withRow('measurement-points.csv', 'nacl,plain,400,0,,measured,checked,'),
    problem: { file: 'measurement-points.csv', line: 3, column: 'kappa_W_mK', value: '0' },
    remedy: /above zero/,
  },
  {
    what: 'a temperature below absolute zero',
    change: () => withRow('measurement-points.csv', 'nacl,plain,-4,6.5,,measured,checked,'),
    problem: { file: 'measurement-points.csv', line: 3, column: 'temperature_K', value: '-4' },
    remedy: /above 0 K/,
  },
  {
    what: 'a decimal comma',
    change: () => withRow('measurement-points.csv', 'nacl,plain,400,"5,1",,measured,checked,'),
    problem: { file: 'measurement-points.csv', line: 3, column: 'kappa_W_mK', value: '5,1' },
    remedy: /point for decimals/,
  },
  {
    what: 'a number in hexadecimal',
    change: () => withRow('measurement-points.csv', 'nacl,plain,400,0x10,,measured,checked,'),
    problem: { file: 'measurement-points.csv', line: 3, column: 'kappa_W_mK', value: '0x10' },
    remedy: /Give a number/,
  },
  {
    what: 'a blank where a number must stand',
    change: () => withRow('measurement-points.csv', 'nacl,plain,400,,,measured,checked,'),
    problem: { file: 'measurement-points.csv', line: 3, column: 'kappa_W_mK', value: '' },
    remedy: /Give a number/,
  },
  {
    what: 'a unit that is not the one of the quantity',
    change: () => replacing('property-values.csv', '25.08,GPa', '25.08,Pa'),
    problem: { file: 'property-values.csv', line: 5, column: 'unit', value: 'Pa' },
    remedy: /GPa/,
  },
  {
    what: 'an unknown quantity',
    change: () => withRow('property-values.csv', 'nacl,colour,plain,,1,K,,,,desk-2020,derived,,,'),
    problem: { file: 'property-values.csv', line: 6, column: 'property', value: 'colour' },
    remedy: /debye_temperature/,
  },
  {
    what: 'averaged velocities that need a negative bulk modulus',
    change: () => replacing('property-values.csv', ',2620,', ',4000,'),
    problem: { file: 'property-values.csv', line: 3, column: 'value', value: '4000' },
    remedy: /below 3940 m\/s/,
  },
  {
    what: 'a source that is not in sources.csv',
    change: () => replacing('transitions.csv', 'desk-2020', 'desk-2021'),
    problem: { file: 'transitions.csv', line: 2, column: 'source', value: 'desk-2021' },
    remedy: /sources\.csv/,
  },
  {
    what: 'a material that is not in materials.csv',
    change: () => replacing('caveats.csv', 'nacl', 'kcl'),
    problem: { file: 'caveats.csv', line: 2, column: 'material', value: 'kcl' },
    remedy: /materials\.csv/,
  },
  {
    what: 'a point of a series that is not in measurements.csv',
    change: () => withRow('measurement-points.csv', 'nacl,other,400,5,,measured,checked,'),
    problem: { file: 'measurement-points.csv', line: 3, column: 'series', value: 'other' },
    remedy: /measurements\.csv/,
  },
  {
    what: 'two values at one temperature of a series',
    change: () => withRow('measurement-points.csv', 'nacl,plain,300,7,,measured,checked,'),
    problem: { file: 'measurement-points.csv', line: 3, column: 'temperature_K', value: 'nacl plain 300 K' },
    remedy: /line 2 already/,
  },
  {
    what: 'two preferred values of one quantity',
    change: () =>
      withRow(
        'property-values.csv',
        'nacl,bulk_modulus,isothermal-or-adiabatic,,24,GPa,,,,desk-2020,derived,,true,',
      ),
    problem: { file: 'property-values.csv', line: 6, column: 'preferred', value: 'nacl bulk_modulus' },
    remedy: /Prefer one/,
  },
  {
    what: 'a preferred thermal Grüneisen parameter, which heat conduction does not ask for',
    change: () =>
      withRow('property-values.csv', 'nacl,gruneisen,thermal,,1.6,1,,298,,desk-2020,derived,,true,'),
    problem: { file: 'property-values.csv', line: 6, column: 'preferred', value: 'true' },
    remedy: /leave it blank/,
  },
  {
    what: 'one value of one source twice',
    change: () =>
      withRow(
        'property-values.csv',
        'nacl,bulk_modulus,isothermal-or-adiabatic,,25.08,GPa,,298,,desk-2020,published,checked,,',
      ),
    problem: {
      file: 'property-values.csv',
      line: 6,
      column: 'value',
      value: 'nacl bulk_modulus isothermal-or-adiabatic 298 desk-2020 25.08',
    },
    remedy: /line 5 already/,
  },
  {
    what: 'a preferred series of a thin film',
    change: () => replacing('samples.csv', 'single crystal', 'film'),
    problem: { file: 'measurements.csv', line: 2, column: 'preferred', value: 'true' },
    remedy: /bulk sample of natural isotopes/,
  },
  {
    what: 'a preferred series of an enriched crystal',
    change: () => replacing('samples.csv', 'natural', 'enriched'),
    problem: { file: 'measurements.csv', line: 2, column: 'preferred', value: 'true' },
    remedy: /bulk sample of natural isotopes/,
  },
  {
    what: 'a scattering parameter in a unit that is not SI',
    change: () =>
      withRow('scattering-parameters.csv', 'nacl,,boundary_length,0.7,cm,desk-2020,published,checked,'),
    problem: { file: 'scattering-parameters.csv', line: 2, column: 'unit', value: 'cm' },
    remedy: /K\^-4/,
  },
  {
    what: 'preferred branch values of two published rows',
    change: () =>
      withRow(
        'property-values.csv',
        'nacl,sound_velocity_transverse,branch,desk-a,2438,m/s,,,[100],desk-2020,derived,,true,\n' +
          'nacl,zone_boundary_temperature_transverse,branch,desk-b,124,K,,,,desk-2020,derived,,true,',
      ),
    problem: { file: 'property-values.csv', line: 7, column: 'value_set', value: 'desk-b' },
    remedy: /prefer one set/,
  },
  {
    what: 'a branch velocity without the row it belongs to',
    change: () =>
      withRow(
        'property-values.csv',
        'nacl,sound_velocity_transverse,branch,,2438,m/s,,,[100],desk-2020,derived,,true,',
      ),
    problem: { file: 'property-values.csv', line: 6, column: 'value_set', value: '' },
    remedy: /pairs are not mixed/,
  },
  {
    what: 'a preferred velocity within a plane, which is no average',
    change: () =>
      withRow(
        'property-values.csv',
        'nacl,sound_velocity_transverse,in-plane,,2438,m/s,,,in-plane,desk-2020,derived,,true,',
      ),
    problem: { file: 'property-values.csv', line: 6, column: 'preferred', value: 'true' },
    remedy: /in-plane/,
  },
  {
    what: 'a published value that does not say whether it was checked',
    change: () => replacing('thermal-expansion.csv', 'published,checked', 'published,'),
    problem: { file: 'thermal-expansion.csv', line: 2, column: 'verification', value: '' },
    remedy: /"checked" or "from memory"/,
  },
  {
    what: 'a derived value that claims to be checked',
    change: () => replacing('zone-boundary-frequencies.csv', 'derived,,', 'derived,checked,'),
    problem: { file: 'zone-boundary-frequencies.csv', line: 2, column: 'verification', value: 'checked' },
    remedy: /leave verification blank/,
  },
  {
    what: 'a formula that cannot be read',
    change: () => replacing('materials.csv', 'NaCl,', 'NaXl,'),
    problem: { file: 'materials.csv', line: 2, column: 'formula', value: 'NaXl' },
    remedy: /character 3/,
  },
  {
    what: 'an element without isotopes',
    change: () => replacing('materials.csv', 'NaCl,', 'KCl,'),
    problem: { file: 'materials.csv', line: 2, column: 'formula', value: 'KCl' },
    remedy: /isotopes\.csv has no K/,
  },
  {
    what: 'a hazard nobody knows',
    change: () => replacing('materials.csv', 'alkali halide,2,,', 'alkali halide,2,salty,'),
    problem: { file: 'materials.csv', line: 2, column: 'hazards', value: 'salty' },
    remedy: /beryllium/,
  },
  {
    what: 'abundances that do not add up to one',
    change: () => replacing('isotopes.csv', '0.2424', '0.1424'),
    problem: { file: 'isotopes.csv', line: 4, column: 'abundance_fraction', value: 'Cl' },
    remedy: /0\.9000/,
  },
  {
    what: 'an elastic constant that no stable crystal has',
    change: () => replacing('elastic-constants.csv', '49.5,12.9', '49.5,59.9'),
    problem: { file: 'elastic-constants.csv', line: 2, column: 'C12_GPa', value: '59.9' },
    remedy: /not stable/,
  },
  {
    what: 'a DOI with a web address in front',
    change: () => replacing('sources.csv', '1,2,,checked', '1,2,https://doi.org/10.1000/1,checked'),
    problem: { file: 'sources.csv', line: 2, column: 'doi', value: 'https://doi.org/10.1000/1' },
    remedy: /starts with 10\./,
  },
  {
    what: 'a row with a cell too many',
    change: () => withRow('caveats.csv', 'nacl,dry, and white,desk-2020,checked'),
    problem: { file: 'caveats.csv', line: 3, column: null, value: null },
    remedy: /5 cells; the header has 4/,
  },
  {
    what: 'another header',
    change: () => replacing('caveats.csv', 'caveat,source', 'remark,source'),
    problem: { file: 'caveats.csv', line: 1, column: null, value: 'material,remark,source,verification' },
    remedy: /header must be material,caveat,source,verification/,
  },
  {
    what: 'a quotation mark that is not closed',
    change: () => withRow('caveats.csv', 'nacl,"dry,desk-2020,checked'),
    problem: { file: 'caveats.csv', line: 3, column: null, value: null },
    remedy: /RFC 4180/,
  },
];

describe('a seed row is refused by file, line, column and value, with a remedy:', () => {
  it.each(badRows)('$what', ({ change, problem, remedy }) => {
    const problems = problemsOf(change());
    expect(problems).toHaveLength(1);
    expect(problems[0]).toMatchObject(problem);
    expect(problems[0]?.remedy).toMatch(remedy);
  });
});

describe('the message of a refusal', () => {
  it('reads as a sentence that names everything', () => {
    expect(() =>
      parseSeed({ ...small, ...withRow('measurement-points.csv', 'nacl,plain,400,0,,measured,checked,') }),
    ).toThrow('measurement-points.csv, line 3, column kappa_W_mK: "0". Give a number above zero');
  });
});

describe('the seed data of the project', async () => {
  const data = parseSeed(await readSeedTexts('seed-data'));
  const preferred = data['property-values.csv'].filter((row) => row.preferred);

  it('has at least 110 materials with cell and velocities, the inputs of an estimate', () => {
    const has = (property: string): Set<string> =>
      new Set(preferred.filter((row) => row.property === property).map((row) => row.material));
    const [volumes, longitudinal, transverse] = [
      has('cell_volume'),
      has('sound_velocity_longitudinal'),
      has('sound_velocity_transverse'),
    ];
    const complete = data['materials.csv'].filter(
      ({ slug, atoms_per_cell }) =>
        atoms_per_cell !== null && volumes.has(slug) && longitudinal.has(slug) && transverse.has(slug),
    );
    expect(complete.length).toBeGreaterThanOrEqual(110);
  });

  it('never gives a value to what was not checked without saying so', () => {
    const silicon = data['property-values.csv'].filter((row) => row.material === 'si');
    const gruneisen = silicon.find((row) => row.property === 'gruneisen' && row.preferred);
    const debye = silicon.find((row) => row.property === 'debye_temperature' && row.preferred);
    // The facts' row of silicon is "checked" as a whole and says in its note that γ was recalled.
    expect(gruneisen).toMatchObject({ value: 1.06, verification: 'from memory' });
    expect(debye).toMatchObject({ value: 645, verification: 'checked', kind: 'calorimetric-0K' });
  });

  it('holds values as printed: natural silicon at 300 K in the tables of 1964 and 1972', () => {
    const at300 = data['measurement-points.csv'].filter(
      (row) => row.material === 'si' && row.temperature_K === 300,
    );
    // Glassbrenner and Slack, Phys. Rev. 134, A1058 (1964), table: 1.56 W/(cm K). Ho, Powell, Liley,
    // J. Phys. Chem. Ref. Data 1, 279 (1972): 148 W/(m K), from memory.
    expect(at300.find((row) => row.series === 'natural-1964')?.kappa_W_mK).toBe(156);
    expect(at300.find((row) => row.series === 'natural-recommended-1972')?.kappa_W_mK).toBe(148);
  });

  it('never mixes a velocity pair of one published row with cut-offs of another', () => {
    const sets = new Map<string, Set<string | null>>();
    for (const row of preferred.filter(({ kind }) => kind === 'branch')) {
      sets.set(row.material, (sets.get(row.material) ?? new Set()).add(row.value_set));
    }
    expect(sets.size).toBeGreaterThan(40);
    for (const [material, names] of sets) expect([material, names.size]).toEqual([material, 1]);
  });
});
