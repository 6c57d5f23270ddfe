import { createHash } from 'node:crypto';
import { propertyUnits } from '#src/db/schema/properties.ts';
import type * as schema from '#src/db/schema/index.ts';
import { parseFormula } from '#src/lib/formula.ts';
import type { SeedData } from './files.ts';

/** Rows of the tables, in SI units, made from the rows of the seed files. */
export interface SeedRows {
  readonly source: (typeof schema.source.$inferInsert)[];
  readonly isotope: (typeof schema.isotope.$inferInsert)[];
  readonly material: Identified<typeof schema.material.$inferInsert>[];
  readonly propertyValue: Identified<typeof schema.propertyValue.$inferInsert>[];
  readonly elasticConstantSet: Identified<typeof schema.elasticConstantSet.$inferInsert>[];
  readonly zoneBoundaryFrequency: Identified<typeof schema.zoneBoundaryFrequency.$inferInsert>[];
  readonly thermalExpansion: Identified<typeof schema.thermalExpansion.$inferInsert>[];
  readonly transition: Identified<typeof schema.transition.$inferInsert>[];
  readonly caveat: Identified<typeof schema.caveat.$inferInsert>[];
  readonly sample: Identified<typeof schema.sample.$inferInsert>[];
  readonly measurement: Identified<typeof schema.measurement.$inferInsert>[];
  readonly measurementPoint: Identified<typeof schema.measurementPoint.$inferInsert>[];
  readonly scatteringParameter: Identified<typeof schema.scatteringParameter.$inferInsert>[];
}

type Identified<Row> = Row & { readonly id: string };

const paPerGPa = 1e9;
const hzPerTHz = 1e12;

/**
 * Ids that follow from what a row is about, so that loading twice finds the same rows. They tell nothing and count
 * nothing: they are the first half of a SHA-256, in the form of a version 8 UUID (RFC 9562).
 */
function createIdentifier(): (table: string, ...about: readonly (string | number | null)[]) => string {
  const seen = new Map<string, number>();
  return (table, ...about) => {
    const key = JSON.stringify([table, ...about]);
    // Rows about the same thing (two values of one kind from one source) differ by the order in which they stand.
    const occurrence = seen.get(key) ?? 0;
    seen.set(key, occurrence + 1);
    const hex = createHash('sha256').update(`${key}#${occurrence}`).digest('hex');
    return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-8${hex.slice(13, 16)}-a${hex.slice(17, 20)}-${hex.slice(20, 32)}`;
  };
}

export function toRows(data: SeedData): SeedRows {
  const identify = createIdentifier();
  const materialIds = new Map(data['materials.csv'].map(({ slug }) => [slug, identify('material', slug)]));
  const sampleIds = new Map(
    data['samples.csv'].map((row) => [
      `${row.material} ${row.sample}`,
      identify('sample', row.material, row.sample),
    ]),
  );
  const measurementIds = new Map(
    data['measurements.csv'].map((row) => [
      `${row.material} ${row.series}`,
      identify('measurement', row.material, row.series),
    ]),
  );
  const materialId = (slug: string): string => idOf(materialIds, slug);
  return {
    source: data['sources.csv'].map(({ line: _, ...row }) => row),
    isotope: data['isotopes.csv'].map((row) => ({
      symbol: row.symbol,
      atomicNumber: row.atomic_number,
      massNumber: row.mass_number,
      massU: row.mass_u,
      abundanceFraction: row.abundance_fraction,
      ...provenanceOf(row),
    })),
    material: data['materials.csv'].map((row) => ({
      id: materialId(row.slug),
      slug: row.slug,
      name: row.name,
      formula: row.formula,
      aliases: row.aliases,
      composition: parseFormula(row.formula),
      structure: row.structure,
      spaceGroup: row.space_group,
      spaceGroupNumber: row.space_group_number,
      class: row.class,
      atomsPerCell: row.atoms_per_cell,
      hazards: row.hazards,
      note: row.note,
      searchText: [row.name, row.formula, row.slug, ...row.aliases].join(' ').toLowerCase(),
    })),
    propertyValue: data['property-values.csv'].map((row) => {
      const { si, siPerCsv } = propertyUnits[row.property];
      return {
        id: identify(
          'property',
          row.material,
          row.property,
          row.kind,
          row.value_set,
          row.source,
          row.temperature_K,
        ),
        materialId: materialId(row.material),
        property: row.property,
        kind: row.kind,
        valueSet: row.value_set,
        value: scale(row.value, siPerCsv),
        unit: si,
        uncertainty: row.uncertainty === null ? null : scale(row.uncertainty, siPerCsv),
        temperatureK: row.temperature_K,
        direction: row.direction,
        ...provenanceOf(row),
        isPreferred: row.preferred,
        note: row.note,
      };
    }),
    elasticConstantSet: data['elastic-constants.csv'].map((row) => ({
      id: identify('elastic', row.material, row.source, row.temperature_K),
      materialId: materialId(row.material),
      c11Pa: row.C11_GPa * paPerGPa,
      c12Pa: row.C12_GPa * paPerGPa,
      c44Pa: inPa(row.C44_GPa),
      c13Pa: inPa(row.C13_GPa),
      c33Pa: inPa(row.C33_GPa),
      c66Pa: inPa(row.C66_GPa),
      c14Pa: inPa(row.C14_GPa),
      temperatureK: row.temperature_K,
      ...provenanceOf(row),
      note: row.note,
    })),
    zoneBoundaryFrequency: data['zone-boundary-frequencies.csv'].map((row) => ({
      id: identify('zone-boundary', row.material, row.point, row.branch, row.source, row.temperature_K),
      materialId: materialId(row.material),
      point: row.point,
      branch: row.branch,
      frequencyHz: row.frequency_THz * hzPerTHz,
      temperatureK: row.temperature_K,
      ...provenanceOf(row),
      note: row.note,
    })),
    thermalExpansion: data['thermal-expansion.csv'].map((row) => ({
      id: identify('expansion', row.material, row.direction, row.source, row.temperature_K),
      materialId: materialId(row.material),
      alphaLinearPerK: row.alpha_linear_per_K,
      direction: row.direction,
      temperatureK: row.temperature_K,
      ...provenanceOf(row),
      note: row.note,
    })),
    transition: data['transitions.csv'].map((row) => ({
      id: identify('transition', row.material, row.kind, row.source, row.temperature_K),
      materialId: materialId(row.material),
      kind: row.kind,
      temperatureK: row.temperature_K,
      ...provenanceOf(row),
      note: row.note,
    })),
    caveat: data['caveats.csv'].map((row) => ({
      id: identify('caveat', row.material, row.caveat),
      materialId: materialId(row.material),
      text: row.caveat,
      sourceKey: row.source,
      verification: row.verification,
    })),
    sample: data['samples.csv'].map((row) => ({
      id: idOf(sampleIds, `${row.material} ${row.sample}`),
      materialId: materialId(row.material),
      slug: row.sample,
      form: row.form,
      isotopes: row.isotopes,
      sizeM: row.size_m,
      description: row.description,
    })),
    measurement: data['measurements.csv'].map((row, position) => ({
      id: idOf(measurementIds, `${row.material} ${row.series}`),
      materialId: materialId(row.material),
      sampleId: idOf(sampleIds, `${row.material} ${row.sample}`),
      series: row.series,
      quantity: row.quantity,
      direction: row.direction,
      method: row.method,
      sourceKey: row.source,
      isPreferred: row.preferred,
      note: row.note,
      position,
    })),
    measurementPoint: data['measurement-points.csv'].map((row) => ({
      id: identify('point', row.material, row.series, row.temperature_K),
      measurementId: idOf(measurementIds, `${row.material} ${row.series}`),
      temperatureK: row.temperature_K,
      kappaWPerMK: row.kappa_W_mK,
      uncertaintyWPerMK:
        row.uncertainty_percent === null ? null : (row.kappa_W_mK * row.uncertainty_percent) / 100,
      basis: row.basis,
      verification: row.verification,
      note: row.note,
    })),
    scatteringParameter: data['scattering-parameters.csv'].map((row) => ({
      id: identify('scattering', row.material, row.sample, row.quantity, row.source),
      materialId: materialId(row.material),
      sample: row.sample,
      quantity: row.quantity,
      value: row.value,
      unit: row.unit,
      ...provenanceOf(row),
      note: row.note,
    })),
  };
}

interface ProvenanceCells {
  readonly source: string;
  readonly basis: 'measured' | 'published' | 'derived' | 'estimated';
  readonly verification: 'checked' | 'from memory' | null;
}

function provenanceOf({ source, basis, verification }: ProvenanceCells) {
  return { sourceKey: source, basis, verification };
}

/** Ten digits are more than any source prints; without rounding 5.431 Å would be stored as 5.430999… × 10⁻¹⁰ m. */
function scale(value: number, factor: number): number {
  return factor === 1 ? value : Number((value * factor).toPrecision(12));
}

function inPa(constantGPa: number | null): number | null {
  return constantGPa === null ? null : constantGPa * paPerGPa;
}

function idOf(ids: ReadonlyMap<string, string>, key: string): string {
  const id = ids.get(key);
  // The check before this has refused every reference that leads nowhere.
  if (id === undefined) throw new Error(`No id was made for ${key}.`);
  return id;
}
