import type { SeedData, SeedRow } from '#src/db/seed/files.ts';
import { parseFormula } from '#src/lib/formula.ts';
import {
  elasticDebyeTemperatureK,
  kgPerU,
  m3PerCubicAngstrom,
  meanSoundVelocityMPerS,
} from '#src/physics/index.ts';

/** Something that may be right, and that a curator should have looked at. */
export interface Doubt {
  readonly material: string;
  readonly message: string;
}

type PropertyRow = SeedRow<'property-values.csv'>;

/**
 * Values that do not fit each other: density against cell and mass by more than 3 %, Debye temperature against the
 * elastic one (Anderson 1963) by more than a quarter.
 */
export function findDoubts(data: SeedData): readonly Doubt[] {
  const meanMassU = elementMasses(data);
  return data['materials.csv'].flatMap((material) => {
    const rows = data['property-values.csv'].filter((row) => row.material === material.slug && row.preferred);
    const parts = parseFormula(material.formula);
    const atomsPerFormula = parts.reduce((sum, { count }) => sum + count, 0);
    const massPerFormulaU = parts.reduce(
      (sum, { element, count }) => sum + count * (meanMassU.get(element) ?? 0),
      0,
    );
    const cell = {
      atoms: material.atoms_per_cell,
      volumeA3: valueOf(rows, 'cell_volume'),
      massPerAtomU: massPerFormulaU / atomsPerFormula,
    };
    return [...doubtDensity(material.slug, rows, cell), ...doubtDebyeTemperature(material.slug, rows, cell)];
  });
}

interface Cell {
  readonly atoms: number | null;
  readonly volumeA3: number | undefined;
  readonly massPerAtomU: number;
}

function doubtDensity(material: string, rows: readonly PropertyRow[], cell: Cell): Doubt[] {
  const density = valueOf(rows, 'density');
  if (density === undefined || cell.volumeA3 === undefined || cell.atoms === null) return [];
  const fromCell = (cell.atoms * cell.massPerAtomU * kgPerU) / (cell.volumeA3 * m3PerCubicAngstrom);
  const deviation = density / fromCell - 1;
  if (Math.abs(deviation) <= 0.03) return [];
  const message = `density ${density} kg/m^3 is ${(100 * deviation).toFixed(1)} % off the ${fromCell.toFixed(0)} kg/m^3 of cell and mass`;
  return [{ material, message }];
}

function doubtDebyeTemperature(material: string, rows: readonly PropertyRow[], cell: Cell): Doubt[] {
  const stored = valueOf(rows, 'debye_temperature');
  const vL = valueOf(rows, 'sound_velocity_longitudinal', 'average');
  const vT = valueOf(rows, 'sound_velocity_transverse', 'average');
  if (stored === undefined || vL === undefined || vT === undefined) return [];
  if (cell.volumeA3 === undefined || cell.atoms === null) return [];
  const elastic = elasticDebyeTemperatureK({
    meanVelocityMPerS: meanSoundVelocityMPerS(vL, vT),
    volumePerAtomM3: (cell.volumeA3 * m3PerCubicAngstrom) / cell.atoms,
  });
  const ratio = stored / elastic;
  if (ratio > 0.75 && ratio < 1.25) return [];
  const message = `Debye temperature ${stored} K is ${ratio.toFixed(2)} times the ${elastic.toFixed(0)} K of velocities and cell`;
  return [{ material, message }];
}

function valueOf(
  rows: readonly PropertyRow[],
  property: PropertyRow['property'],
  kind?: string,
): number | undefined {
  return rows.find((row) => row.property === property && (kind === undefined || row.kind === kind))?.value;
}

function elementMasses(data: SeedData): ReadonlyMap<string, number> {
  const masses = new Map<string, number>();
  for (const { symbol, mass_u, abundance_fraction } of data['isotopes.csv']) {
    masses.set(symbol, (masses.get(symbol) ?? 0) + mass_u * abundance_fraction);
  }
  return masses;
}
