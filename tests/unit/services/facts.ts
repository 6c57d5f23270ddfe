import type { IsotopeRecord, ValueRecord } from '#src/db/queries/records.ts';
import type { MaterialFacts } from '#src/services/estimator-inputs.ts';

/** Small materials for tests of the resolver; the store itself is tested with the database. */

export function value(
  record: Pick<ValueRecord, 'property' | 'kind' | 'value'> & Partial<ValueRecord>,
): ValueRecord {
  return {
    valueSet: null,
    unit: '',
    uncertainty: null,
    temperatureK: null,
    direction: null,
    source: { key: 'a-source', citation: 'A. Source, Journal 1, 1 (2000)', doi: null },
    basis: 'published',
    verification: 'checked',
    preferred: true,
    note: null,
    ...record,
  };
}

export function averageVelocities(longitudinal: number, transverse: number): readonly ValueRecord[] {
  return [
    value({ property: 'sound_velocity_longitudinal', kind: 'average', value: longitudinal }),
    value({ property: 'sound_velocity_transverse', kind: 'average', value: transverse }),
  ];
}

interface BranchValues {
  readonly vL: number;
  readonly vT: number;
  readonly thetaL?: number;
  readonly thetaT?: number;
  readonly gammaL?: number;
  readonly gammaT?: number;
}

export function branchSet(valueSet: string, values: BranchValues, preferred = true): readonly ValueRecord[] {
  const rows: readonly (readonly [string, number | undefined])[] = [
    ['sound_velocity_longitudinal', values.vL],
    ['sound_velocity_transverse', values.vT],
    ['zone_boundary_temperature_longitudinal', values.thetaL],
    ['zone_boundary_temperature_transverse', values.thetaT],
    ['gruneisen_longitudinal', values.gammaL],
    ['gruneisen_transverse', values.gammaT],
  ];
  return rows.flatMap(([property, number]) =>
    number === undefined ? [] : [value({ property, kind: 'branch', value: number, valueSet, preferred })],
  );
}

/** Silicon's cell, 40.05 Å³. */
export const cell = value({ property: 'cell_volume', kind: 'primitive', value: 4.0048e-29, unit: 'm^3' });

/** Masses: AME2012; abundances: IUPAC 1997, as the element data of Debian's bodr have them. */
export const isotopes: readonly IsotopeRecord[] = [
  { element: 'Si', massNumber: 28, massU: 27.9769265, abundanceFraction: 0.92223 },
  { element: 'Si', massNumber: 29, massU: 28.9764947, abundanceFraction: 0.04685 },
  { element: 'Si', massNumber: 30, massU: 29.9737702, abundanceFraction: 0.03092 },
  { element: 'Ga', massNumber: 69, massU: 68.9255736, abundanceFraction: 0.60108 },
  { element: 'Ga', massNumber: 71, massU: 70.9247013, abundanceFraction: 0.39892 },
  { element: 'As', massNumber: 75, massU: 74.9215965, abundanceFraction: 1 },
];

export function silicon(values: readonly ValueRecord[], changes: Partial<MaterialFacts> = {}): MaterialFacts {
  return {
    name: 'Silicon',
    formula: 'Si',
    class: 'group-IV elemental semiconductor',
    atomsPerCell: 2,
    composition: [{ element: 'Si', count: 1 }],
    values,
    isotopes,
    ...changes,
  };
}
