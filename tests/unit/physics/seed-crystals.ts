import { readFileSync } from 'node:fs';
import { parse } from 'csv-parse/sync';
import {
  gruneisenFromVelocities,
  isotopeMassVariance,
  kgPerU,
  m3PerCubicAngstrom,
} from '#src/physics/index.ts';
import type { CrystalParameters, ElementSite, Isotope } from '#src/physics/index.ts';

/** Crystals and measured conductivities straight from seed-data, so that these tests need no database. */

type Row = Readonly<Record<string, string>>;

function readSeed(file: string): readonly Row[] {
  const text = readFileSync(new URL(`../../../seed-data/${file}`, import.meta.url), 'utf8');
  return parse<Row>(text, { columns: true });
}

const properties = readSeed('property-values.csv');
const materials = readSeed('materials.csv');
const isotopeRows = readSeed('isotopes.csv');
const points = readSeed('measurement-points.csv');

function preferredValue(slug: string, property: string, kind: string): number | null {
  const row = properties.find(
    (one) =>
      one['material'] === slug &&
      one['property'] === property &&
      one['kind'] === kind &&
      one['preferred'] === 'true',
  );
  return row === undefined ? null : Number(row['value']);
}

function required(slug: string, property: string, kind: string): number {
  const value = preferredValue(slug, property, kind);
  if (value === null) throw new Error(`seed-data has no preferred ${property} (${kind}) of ${slug}.`);
  return value;
}

function naturalIsotopes(symbol: string): readonly Isotope[] {
  return isotopeRows
    .filter((row) => row['symbol'] === symbol)
    .map((row) => ({ massU: Number(row['mass_u']), fraction: Number(row['abundance_fraction']) }));
}

/** Elements and counts of a plain formula such as "CaF2". */
export function naturalComposition(formula: string): readonly ElementSite[] {
  return [...formula.matchAll(/([A-Z][a-z]?)([\d.]*)/g)].map(([, symbol = '', count = '']) => ({
    atomsPerFormula: count === '' ? 1 : Number(count),
    isotopes: naturalIsotopes(symbol),
  }));
}

export interface SeedCrystal {
  readonly crystal: CrystalParameters;
  /** Γ of natural isotopes. */
  readonly massVariance: number;
}

/**
 * A crystal as the product sets it up: branch velocities and cut-offs of the preferred set; γ of each branch from the
 * same set, else the acoustic γ, else the one that follows from the average velocities; natural isotopes.
 */
export function seedCrystal(slug: string): SeedCrystal {
  const material = materials.find((row) => row['slug'] === slug);
  if (material === undefined) throw new Error(`seed-data has no material ${slug}.`);
  const composition = naturalComposition(material['formula'] ?? '');
  const atoms = composition.reduce((sum, site) => sum + site.atomsPerFormula, 0);
  const massU = composition.reduce(
    (sum, site) =>
      sum +
      site.atomsPerFormula *
        site.isotopes.reduce((mean, isotope) => mean + isotope.fraction * isotope.massU, 0),
    0,
  );
  const gamma =
    preferredValue(slug, 'gruneisen', 'acoustic') ??
    gruneisenFromVelocities({
      longitudinalMPerS: required(slug, 'sound_velocity_longitudinal', 'average'),
      transverseMPerS: required(slug, 'sound_velocity_transverse', 'average'),
    });
  const branch = (name: 'longitudinal' | 'transverse'): CrystalParameters['longitudinal'] => ({
    velocityMPerS: required(slug, `sound_velocity_${name}`, 'branch'),
    cutoffK: required(slug, `zone_boundary_temperature_${name}`, 'branch'),
    gruneisen: preferredValue(slug, `gruneisen_${name}`, 'branch') ?? gamma,
  });
  return {
    crystal: {
      cellVolumeM3: required(slug, 'cell_volume', 'primitive') * m3PerCubicAngstrom,
      atomsPerCell: Number(material['atoms_per_cell']),
      meanMassKg: (massU / atoms) * kgPerU,
      longitudinal: branch('longitudinal'),
      transverse: branch('transverse'),
    },
    massVariance: isotopeMassVariance(composition),
  };
}

export interface MeasuredPoint {
  readonly temperatureK: number;
  readonly kappaWPerMK: number;
}

/** The points of one measured series within a range of temperature. */
export function measuredSeries(
  slug: string,
  series: string,
  fromK: number,
  toK: number,
): readonly MeasuredPoint[] {
  return points
    .filter((row) => row['material'] === slug && row['series'] === series)
    .map((row) => ({ temperatureK: Number(row['temperature_K']), kappaWPerMK: Number(row['kappa_W_mK']) }))
    .filter(({ temperatureK }) => temperatureK >= fromK && temperatureK <= toK);
}
