import { describe, expect, it } from 'vitest';
import type { EstimatePoint } from '#src/schemas/estimate.ts';
import { hazardCautions, listCautions } from '#src/services/estimate-cautions.ts';
import type { CautionContext } from '#src/services/estimate-cautions.ts';
import { value } from '#tests/unit/services/facts.ts';

function point(changes: Partial<EstimatePoint> = {}): EstimatePoint {
  return {
    T_K: 300,
    kappa_W_mK: 150,
    low_W_mK: null,
    high_W_mK: null,
    heat_capacity_J_m3K: 2.2e5,
    velocity_m_s: 7600,
    mean_free_path_m: 2.75e-7,
    porosity_factor: 1,
    share: { boundary: 0, defect: 0.1, umklapp: 0.9 },
    floor_W_mK: 1,
    ...changes,
  };
}

const silicon = {
  name: 'Silicon',
  class: 'group-IV elemental semiconductor',
  structure: 'diamond',
  spaceGroupNumber: 227,
  hazards: [],
};

function codes(changes: Partial<CautionContext> = {}): readonly string[] {
  const cautions = listCautions({
    material: silicon,
    transitions: [],
    points: [point()],
    inputs: [],
    atomicSpacingM: 2.7e-10,
    porosity: 0,
    defectMassVariance: 0,
    ...changes,
  });
  return cautions.map(({ code }) => code);
}

/** On every estimate. */
const always = ['estimate-is-a-screen', 'interval-not-calibrated'];

describe('cautions', () => {
  it('of a plain cubic crystal are the two that every estimate carries', () => {
    expect(codes()).toEqual(always);
    expect(codes({ material: null })).toEqual(always);
  });

  it.each([
    ['a crystal that is not cubic', { spaceGroupNumber: 186 }, 'orientation-average'],
    ['a layered crystal', { class: 'layered van der Waals', spaceGroupNumber: 194 }, 'layered'],
    ['a layered telluride', { structure: 'tetradymite', spaceGroupNumber: 166 }, 'layered'],
    ['a metal', { class: 'metal' }, 'electrons-carry-heat'],
    ['a semimetal', { class: 'semimetal' }, 'electrons-carry-heat'],
    ['a thermoelectric', { class: 'thermoelectric semiconductor' }, 'electrons-carry-heat'],
    ['a random alloy', { class: 'semiconductor alloy' }, 'disordered'],
    ['a disordered oxide', { structure: 'fluorite (disordered)' }, 'disordered'],
    ['a glass', { class: 'glass' }, 'glass'],
    ['a poisonous material', { hazards: ['beryllium'] }, 'hazard-beryllium'],
  ])('are more for %s', (_what, changes, code) => {
    expect(codes({ material: { ...silicon, ...changes } })).toContain(code);
  });

  it('say that carriers take part in a semiconductor only when it is hot', () => {
    expect(codes({ points: [point({ T_K: 500 })] })).toEqual(always);
    expect(codes({ points: [point({ T_K: 1200 })] })).toContain('electrons-carry-heat');
    expect(
      codes({ material: { ...silicon, class: 'alkali halide' }, points: [point({ T_K: 1200 })] }),
    ).toEqual(always);
  });

  const melting = value({ property: 'transition_temperature', kind: 'melting', value: 1687 });
  const transition = value({ property: 'transition_temperature', kind: 'transition', value: 105 });

  it('say where the crystal has melted, from above the melting point on', () => {
    expect(codes({ transitions: [melting], points: [point({ T_K: 1687 })] })).not.toContain('above-melting');
    const cautions = listCautions({
      material: silicon,
      transitions: [melting],
      points: [point({ T_K: 300 }), point({ T_K: 1700 }), point({ T_K: 2000 })],
      inputs: [],
      atomicSpacingM: 2.7e-10,
      porosity: 0,
      defectMassVariance: 0,
    });
    const [caution] = cautions.filter(({ code }) => code === 'above-melting');
    expect(caution?.message).toContain('melts at 1687 K');
    expect(caution?.message).toContain('between 1700 K and 2000 K');
  });

  it('tell a change of phase from melting', () => {
    expect(codes({ transitions: [transition] })).toEqual([...always, 'phase-transition']);
  });

  it('say where the picture of waves ends: below the floor, below the atomic spacing', () => {
    expect(codes({ points: [point({ kappa_W_mK: 0.9 })] })).toContain('below-floor');
    expect(codes({ points: [point({ mean_free_path_m: 2.6e-10 })] })).toContain('below-atomic-spacing');
    expect(codes({ points: [point({ kappa_W_mK: 0.9, floor_W_mK: null })] })).toEqual(always);
  });

  it('say when the mean free path is longer than any sample', () => {
    expect(codes({ points: [point({ mean_free_path_m: 1 })] })).toEqual(always);
    expect(codes({ points: [point({ mean_free_path_m: 1.01 })] })).toContain('mean-free-path-over-1-m');
  });

  it('say when the porosity is outside its formula', () => {
    expect(codes({ porosity: 0.3 })).toEqual(always);
    expect(codes({ porosity: 0.31 })).toContain('porosity-outside-maxwell');
  });

  it('flag a hazard and leave handling to those who are licensed', () => {
    const [caution] = hazardCautions(['thallium']);
    expect(caution?.message).toContain('thallium');
    expect(caution?.message).toContain('Local rules and licensed practice');
  });

  it('name inputs that were derived here, not those derived by a source of the store', () => {
    const input = {
      name: 'theta_L_K',
      value: 600,
      uncertainty: null,
      basis: 'derived',
      verification: null,
      kind: null,
      source: 'derived',
      note: null,
    } as const;
    expect(codes({ inputs: [{ ...input, source_key: null }] })).toContain('derived-inputs');
    expect(codes({ inputs: [{ ...input, source_key: 'warren-1967' }] })).toEqual(always);
  });
});
