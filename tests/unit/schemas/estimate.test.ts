import { describe, expect, it } from 'vitest';
import { toFieldErrors } from '#src/http/field-errors.ts';
import { estimateRequestSchema } from '#src/schemas/estimate.ts';

const smallest = { material: 'si', temperatures_K: [300] };

/** Paths of the bad fields; empty when the request is accepted. */
function badFields(request: unknown): readonly string[] {
  const result = estimateRequestSchema.safeParse(request);
  return result.success ? [] : toFieldErrors(result.error, request).map(({ path }) => path);
}

function message(request: unknown): string {
  const result = estimateRequestSchema.safeParse(request);
  return result.success ? '' : (toFieldErrors(result.error, request)[0]?.message ?? '');
}

describe('a request for an estimate', () => {
  it('has the defaults of the contract', () => {
    expect(estimateRequestSchema.parse(smallest)).toEqual({
      material: 'si',
      temperatures_K: [300],
      sample: { specularity: 0, isotopes: 'natural', defect_mass_variance: 0, porosity: 0 },
      umklapp_scale: 1,
      interval: true,
    });
  });

  // The ranges are those of the HTTP contract: 1 ≤ T ≤ 3000 K, 0 ≤ specularity < 1, 0 ≤ porosity < 1, 0 ≤ Γ ≤ 1, scale ≥ 0.
  it.each([
    { ...smallest, temperatures_K: [1, 3000] },
    { ...smallest, temperatures_K: { from: 1, to: 3000, points: 1000 } },
    { ...smallest, temperatures_K: { from: 300, to: 300, points: 1, spacing: 'linear' } },
    { ...smallest, sample: { specularity: 0.999, porosity: 0.999, defect_mass_variance: 1 } },
    { ...smallest, sample: { boundary_length_m: null } },
    { ...smallest, sample: { piece: { form: 'square-rod', size_m: 0.004 } } },
    { ...smallest, umklapp_scale: 0 },
    { ...smallest, mechanisms: ['umklapp'] },
    { parameters: { mass_variance: 0 }, temperatures_K: [300] },
  ])('may go to the ends of the ranges: %j', (request) => {
    expect(badFields(request)).toEqual([]);
  });

  it.each([
    [{ ...smallest, temperatures_K: [0.999] }, 'temperatures_K.0'],
    [{ ...smallest, temperatures_K: [300, 3000.001] }, 'temperatures_K.1'],
    [{ ...smallest, temperatures_K: [] }, 'temperatures_K'],
    [{ ...smallest, temperatures_K: 300 }, 'temperatures_K'],
    [{ ...smallest, temperatures_K: Array.from({ length: 1001 }, () => 300) }, 'temperatures_K'],
    [{ ...smallest, temperatures_K: { from: 10, to: 5, points: 2 } }, 'temperatures_K.to'],
    [{ ...smallest, temperatures_K: { from: 1, to: 5, points: 1001 } }, 'temperatures_K.points'],
    [{ ...smallest, temperatures_K: { from: 1, to: 5, points: 2, step: 1 } }, 'temperatures_K.step'],
    [{ ...smallest, sample: { specularity: 1 } }, 'sample.specularity'],
    [{ ...smallest, sample: { specularity: -0.001 } }, 'sample.specularity'],
    [{ ...smallest, sample: { porosity: 1 } }, 'sample.porosity'],
    [{ ...smallest, sample: { defect_mass_variance: 1.001 } }, 'sample.defect_mass_variance'],
    [{ ...smallest, sample: { boundary_length_m: 0 } }, 'sample.boundary_length_m'],
    [{ ...smallest, sample: { piece: { form: 'cube', size_m: 1 } } }, 'sample.piece.form'],
    [
      { ...smallest, sample: { piece: { form: 'grains', size_m: 1e-6 }, boundary_length_m: 1e-6 } },
      'sample.piece',
    ],
    [{ ...smallest, sample: { isotopes: 'enriched' } }, 'sample.isotopes'],
    [{ ...smallest, sample: { isotopes: { Si: { '28': 2 } } } }, 'sample.isotopes.Si.28'],
    [{ ...smallest, sample: { isotopes: { silicon: { '28': 1 } } } }, 'sample.isotopes.silicon'],
    [{ ...smallest, sample: { thickness: 1 } }, 'sample.thickness'],
    [{ ...smallest, umklapp_scale: -1 }, 'umklapp_scale'],
    [{ ...smallest, mechanisms: [] }, 'mechanisms'],
    [{ ...smallest, mechanisms: ['normal'] }, 'mechanisms.0'],
    [{ ...smallest, model: 'debye' }, 'model'],
    [{ ...smallest, interval: 'yes' }, 'interval'],
    [{ ...smallest, parameters: { atoms_per_cell: 2.5 } }, 'parameters.atoms_per_cell'],
    [{ ...smallest, parameters: { v_L_m_s: 0 } }, 'parameters.v_L_m_s'],
    [{ ...smallest, parameters: { gamma: 1 } }, 'parameters.gamma'],
    [{ temperatures_K: [300] }, 'material'],
    [{ material: 'si' }, 'temperatures_K'],
    [{ ...smallest, temperature: 300 }, 'temperature'],
    ['si', ''],
  ])('is refused beyond them by the name of the field: %j', (request, path) => {
    expect(badFields(request)).toEqual([path]);
  });

  it('is refused in words that name field, value and remedy', () => {
    expect(message({ ...smallest, sample: { porosity: 1 } })).toBe(
      'sample.porosity must be below 1; it is 1.',
    );
    expect(message({ ...smallest, model: 'debye' })).toBe(
      'model is "debye": give "gray", "branch" or "callaway".',
    );
    expect(message({ ...smallest, temperatures_K: 300 })).toMatch(
      /^temperatures_K is 300: give a list .*\[10, 77, 300\]/,
    );
    expect(message({ material: 'si' })).toMatch(/^temperatures_K is missing: give a list/);
    expect(message({ ...smallest, sample: { isotopes: 'enriched' } })).toMatch(
      /"natural", "pure" or abundances/,
    );
  });

  it('is refused with every bad field named, not only the first', () => {
    expect(badFields({ material: 'si', temperatures_K: [0, 'x'], sample: { porosity: 2 }, foo: 1 })).toEqual([
      'temperatures_K.0',
      'temperatures_K.1',
      'sample.porosity',
      'foo',
    ]);
  });
});
