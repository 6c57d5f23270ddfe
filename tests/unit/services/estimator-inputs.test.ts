import { describe, expect, it } from 'vitest';
import type { EstimateInput } from '#src/schemas/estimate.ts';
import { resolveEstimatorInputs } from '#src/services/estimator-inputs.ts';
import type { ResolvedInputs } from '#src/services/estimator-inputs.ts';
import { expectRelative } from '#tests/support/approx.ts';
import { averageVelocities, branchSet, cell, silicon, value } from '#tests/unit/services/facts.ts';

function input(resolved: ResolvedInputs, name: EstimateInput['name']): EstimateInput {
  const found = resolved.inputs.find((one) => one.name === name);
  if (found === undefined) throw new Error(`No input ${name}.`);
  return found;
}

const average = averageVelocities(8950, 5340);
const morelli = branchSet('morelli', {
  vL: 8430,
  vT: 5840,
  thetaL: 586,
  thetaT: 240,
  gammaL: 1.1,
  gammaT: 0.6,
});
const acousticGamma = value({ property: 'gruneisen', kind: 'acoustic', value: 1.06 });

describe('velocities, cut-offs and Grüneisen parameters of the branches', () => {
  it('come from one published set where there is one, whatever else is stored', () => {
    const { parameters, recommendedModel } = resolveEstimatorInputs({
      material: silicon([cell, ...average, acousticGamma, ...morelli]),
    });
    expect(parameters).toMatchObject({
      v_L_m_s: 8430,
      v_T_m_s: 5840,
      theta_L_K: 586,
      theta_T_K: 240,
      gamma_L: 1.1,
      gamma_T: 0.6,
    });
    expect(recommendedModel).toBe('callaway');
  });

  it('never mix a pair of one set with the cut-offs of another', () => {
    const onlyVelocities = branchSet('this', { vL: 8430, vT: 5840 });
    const onlyCutoffs = branchSet('that', { vL: 1, vT: 1, thetaL: 570, thetaT: 210 }, false);
    const resolved = resolveEstimatorInputs({ material: silicon([cell, ...onlyCutoffs, ...onlyVelocities]) });
    expect(resolved.parameters?.v_L_m_s).toBe(8430);
    expect(input(resolved, 'theta_L_K').basis).toBe('derived');
    expect(resolved.parameters?.theta_L_K).not.toBe(570);
  });

  it('are filled one by one where the set lacks one, and only there', () => {
    const set = branchSet('part', { vL: 8430, vT: 5840, thetaL: 586, gammaT: 0.6 });
    const resolved = resolveEstimatorInputs({ material: silicon([cell, ...average, acousticGamma, ...set]) });
    expect(input(resolved, 'theta_L_K')).toMatchObject({ value: 586, basis: 'published' });
    expect(input(resolved, 'theta_T_K')).toMatchObject({ basis: 'derived', source_key: null });
    expect(input(resolved, 'gamma_L')).toMatchObject({ value: 1.06, basis: 'published' });
    expect(input(resolved, 'gamma_T')).toMatchObject({ value: 0.6 });
    expect(resolved.recommendedModel).toBe('branch');
  });

  it('fall back to average velocities, derived cut-offs and the acoustic Grüneisen parameter', () => {
    const resolved = resolveEstimatorInputs({ material: silicon([cell, ...average, acousticGamma]) });
    expect(resolved.parameters).toMatchObject({ v_L_m_s: 8950, v_T_m_s: 5340, gamma_L: 1.06, gamma_T: 1.06 });
    expect(resolved.recommendedModel).toBe('branch');
    // θ = (ħ/k_B) v (6π²/V)^(1/3), by hand: 7.638233e-12 K s × 8950 m/s × (59.21763/4.0048e-29 m³)^(1/3).
    expectRelative(resolved.parameters?.theta_L_K ?? NaN, 778.82, {
      within: 1e-4,
      because: 'five figures by hand',
    });
    expect(input(resolved, 'theta_L_K').source).toContain('derived');
  });

  it('take a Grüneisen parameter from the velocities where none is published', () => {
    // Poisson's ratio of silicon 0.2238 from these velocities; γ = 1.5(1 + ν)/(2 − 3ν) (Belomestnykh 2004), by hand.
    const resolved = resolveEstimatorInputs({ material: silicon([cell, ...average]) });
    expectRelative(resolved.parameters?.gamma_L ?? NaN, 1.3817, {
      within: 1e-3,
      because: 'four figures by hand',
    });
    expect(input(resolved, 'gamma_L')).toMatchObject({ basis: 'derived', verification: null });
  });

  it('do not take thermal Grüneisen parameters, which are no conductivity parameters', () => {
    const thermal = value({ property: 'gruneisen', kind: 'thermal', value: 0.46, preferred: false });
    const resolved = resolveEstimatorInputs({ material: silicon([cell, ...average, thermal]) });
    expect(resolved.parameters?.gamma_L).not.toBe(0.46);
  });
});

describe('the average velocities', () => {
  it('serve the floor, next to a branch pair of their own', () => {
    const resolved = resolveEstimatorInputs({ material: silicon([cell, ...average, ...morelli]) });
    expect(resolved.average).toEqual({ longitudinalMPerS: 8950, transverseMPerS: 5340 });
    expect(input(resolved, 'average_v_L_m_s').value).toBe(8950);
  });

  it('are the branch pair where no others are known', () => {
    const resolved = resolveEstimatorInputs({ material: silicon([cell, ...morelli]) });
    expect(resolved.average).toEqual({ longitudinalMPerS: 8430, transverseMPerS: 5840 });
    expect(resolved.inputs.map(({ name }) => name)).not.toContain('average_v_L_m_s');
  });

  it('are no in-plane velocities', () => {
    const inPlane = average.map((record) => ({ ...record, kind: 'in-plane', preferred: false }));
    const resolved = resolveEstimatorInputs({ material: silicon([cell, ...inPlane]) });
    expect(resolved.parameters).toBeNull();
  });
});

describe('the Debye temperature', () => {
  const at298 = value({
    property: 'debye_temperature',
    kind: 'calorimetric-298K',
    value: 690,
    preferred: false,
  });
  const elastic = value({ property: 'debye_temperature', kind: 'elastic', value: 640 });

  it('is the preferred stored one', () => {
    const resolved = resolveEstimatorInputs({ material: silicon([cell, ...average, at298, elastic]) });
    expect(input(resolved, 'debye_temperature_K')).toMatchObject({ value: 640, kind: 'elastic' });
  });

  it('is derived from the average velocities where none is stored', () => {
    const resolved = resolveEstimatorInputs({ material: silicon([cell, ...average]) });
    // The calorimetric value of silicon at 0 K is 645 K (Kittel, Introduction to Solid State Physics, table of Debye
    // temperatures); an elastic one agrees within 1 % for such a crystal.
    expectRelative(resolved.parameters?.debye_temperature_K ?? NaN, 645, {
      within: 0.015,
      because: 'elastic against calorimetric',
    });
    expect(input(resolved, 'debye_temperature_K').basis).toBe('derived');
  });

  it('does not stand in the way of an estimate: κ does not use it', () => {
    const given = {
      cell_volume_A3: 40.05,
      atoms_per_cell: 2,
      mean_mass_u: 28.0855,
      v_L_m_s: 8430,
      v_T_m_s: 5840,
    };
    expect(resolveEstimatorInputs({ material: null, given }).parameters).not.toBeNull();
  });
});

describe('given parameters', () => {
  it('take the place of stored ones and are marked as given', () => {
    const resolved = resolveEstimatorInputs({
      material: silicon([cell, ...average, ...morelli]),
      given: { theta_T_K: 210, mass_variance: 0 },
    });
    expect(resolved.parameters).toMatchObject({ theta_L_K: 586, theta_T_K: 210, mass_variance: 0 });
    expect(input(resolved, 'theta_T_K')).toMatchObject({ basis: 'given', source_key: null });
  });

  it('carry on into what is derived from them', () => {
    const material = silicon([cell, ...average]);
    const before = resolveEstimatorInputs({ material }).parameters;
    const after = resolveEstimatorInputs({ material, given: { v_L_m_s: 2 * 8950 } }).parameters;
    expectRelative(after?.theta_L_K ?? NaN, 2 * (before?.theta_L_K ?? NaN), {
      within: 1e-12,
      because: 'θ is proportional to v',
    });
    expect(after?.theta_T_K).toBe(before?.theta_T_K);
  });

  it('come back the same when what was resolved is sent back, to the last bit', () => {
    for (const values of [
      [cell, ...average],
      [cell, ...average, acousticGamma, ...morelli],
    ]) {
      const material = silicon(values);
      const first = resolveEstimatorInputs({ material });
      if (first.parameters === null) throw new Error('Silicon must have an estimate.');
      const again = resolveEstimatorInputs({ material, given: first.parameters });
      expect(again.parameters).toEqual(first.parameters);
      expect(again.average).toEqual(first.average);
      expect(again.recommendedModel).toBe(first.recommendedModel);
    }
  });

  it('suffice without a material, with the rest derived', () => {
    const given = {
      cell_volume_A3: 40.05,
      atoms_per_cell: 2,
      mean_mass_u: 28.0855,
      v_L_m_s: 8950,
      v_T_m_s: 5340,
    };
    const resolved = resolveEstimatorInputs({ material: null, given });
    expect(resolved.parameters).toMatchObject({ ...given, mass_variance: 0 });
    expect(resolved.recommendedModel).toBe('branch');
    expect(
      resolveEstimatorInputs({ material: null, given: { ...given, theta_L_K: 586, theta_T_K: 240 } })
        .recommendedModel,
    ).toBe('callaway');
  });
});

describe('obstacles', () => {
  it('say that velocities are missing', () => {
    const resolved = resolveEstimatorInputs({ material: silicon([cell]) });
    expect(resolved.parameters).toBeNull();
    expect(resolved.obstacles.map(({ message }) => message)).toEqual([
      'No sound velocities are stored and none can be derived, so no estimate can be made.',
    ]);
  });

  it('name each thing that is missing', () => {
    const resolved = resolveEstimatorInputs({ material: silicon([], { atomsPerCell: null, isotopes: [] }) });
    expect(resolved.obstacles.flatMap(({ parameters }) => parameters)).toEqual([
      'cell_volume_A3',
      'atoms_per_cell',
      'mean_mass_u',
      'v_L_m_s',
      'v_T_m_s',
    ]);
  });

  it('say that a glass is no crystal', () => {
    const glass = silicon([...average], { class: 'glass', atomsPerCell: null });
    const { obstacles, parameters } = resolveEstimatorInputs({ material: glass });
    expect(parameters).toBeNull();
    expect(obstacles).toHaveLength(1);
    expect(obstacles[0]?.message).toContain('glass');
  });

  it('say when velocities are such that nothing follows from them', () => {
    // v_T above (√3/2) v_L would need a negative bulk modulus.
    const { obstacles } = resolveEstimatorInputs({
      material: silicon([cell, ...averageVelocities(5000, 4500)]),
    });
    expect(obstacles[0]?.parameters).toEqual(['gamma_L', 'gamma_T']);
    expect(obstacles[0]?.message).toContain('0.866');
  });
});
