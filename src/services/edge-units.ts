/** Units of the store (SI) and those people use for the same property. */

interface EdgeUnit {
  readonly unit: string;
  /** Value at the edge = stored value × factor. */
  readonly factor: number;
}

/** Properties whose edge unit is not the one of the store; all others keep theirs. */
const edgeUnits: Readonly<Record<string, EdgeUnit>> = {
  cell_volume: { unit: 'Å^3', factor: 1e30 },
  lattice_parameter_a: { unit: 'Å', factor: 1e10 },
  lattice_parameter_b: { unit: 'Å', factor: 1e10 },
  lattice_parameter_c: { unit: 'Å', factor: 1e10 },
  bulk_modulus: { unit: 'GPa', factor: 1e-9 },
  elastic_constant: { unit: 'GPa', factor: 1e-9 },
  zone_boundary_frequency: { unit: 'THz', factor: 1e-12 },
};

/**
 * A double holds 15 to 17 figures and a conversion there and back disturbs the last ones; no stored value has more
 * than 12, so rounding there gives back what the source states.
 */
export function withoutConversionNoise(value: number): number {
  return Number(value.toPrecision(12));
}

export interface EdgeValue {
  readonly value: number;
  readonly unit: string;
  readonly uncertainty: number | null;
}

/** A stored value in the unit people use. */
export function toEdgeUnit(
  property: string,
  stored: { readonly value: number; readonly unit: string; readonly uncertainty: number | null },
): EdgeValue {
  const edge = edgeUnits[property];
  if (edge === undefined) return { value: stored.value, unit: stored.unit, uncertainty: stored.uncertainty };
  const convert = (value: number): number => withoutConversionNoise(value * edge.factor);
  return {
    value: convert(stored.value),
    unit: edge.unit,
    uncertainty: stored.uncertainty === null ? null : convert(stored.uncertainty),
  };
}
