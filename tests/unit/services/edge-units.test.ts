import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { toEdgeUnit } from '#src/services/edge-units.ts';

describe('a stored value in the unit people use', () => {
  it.each([
    ['cell_volume', 'm^3', 1e-30, 'Å^3'],
    ['lattice_parameter_a', 'm', 1e-10, 'Å'],
    ['bulk_modulus', 'Pa', 1e9, 'GPa'],
    ['elastic_constant', 'Pa', 1e9, 'GPa'],
    ['zone_boundary_frequency', 'Hz', 1e12, 'THz'],
  ])('gives back what the source states of %s, to twelve figures', (property, unit, siPerEdge, edgeUnit) => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 999_999_999 }), (figures) => {
        const stated = figures / 1e4;
        const edge = toEdgeUnit(property, {
          value: stated * siPerEdge,
          unit,
          uncertainty: stated * siPerEdge,
        });
        expect(edge).toEqual({ value: stated, unit: edgeUnit, uncertainty: stated });
      }),
    );
  });

  it('is untouched where people use the SI unit', () => {
    const stored = { value: 645.3, unit: 'K', uncertainty: null };
    expect(toEdgeUnit('debye_temperature', stored)).toEqual(stored);
  });
});
