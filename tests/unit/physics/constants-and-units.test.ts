import { describe, expect, it } from 'vitest';
import {
  atomicMassKg,
  avogadroPerMol,
  boltzmannJPerK,
  gasConstantJPerMolK,
  kPerTHz,
  planckJS,
  reducedPlanckJS,
} from '#src/physics/index.ts';
import { expectRelative } from '#tests/support/approx.ts';
import { checksNamed } from '#tests/support/checks.ts';

describe('constants', () => {
  // Outside source: CODATA 2018 as in SciPy 1.10.1's constants module (tests/fixtures/checks.csv, checked).
  it.each([
    ['Boltzmann constant', boltzmannJPerK],
    ['Planck constant', planckJS],
    ['reduced Planck constant', reducedPlanckJS],
    ['Avogadro constant', avogadroPerMol],
    ['molar gas constant', gasConstantJPerMolK],
    ['atomic mass constant', atomicMassKg],
  ])('the %s is that of CODATA 2018', (name, value) => {
    for (const row of checksNamed(`constant: ${name}`)) {
      expectRelative(value, parseFloat(row.expected), { within: 1e-9, because: 'digits printed in the row' });
    }
  });

  it('one terahertz is as many kelvin as CODATA says', () => {
    // Outside source: h/k_B of CODATA 2018, row "unit: 1 THz in K".
    for (const row of checksNamed('unit: 1 THz in K')) {
      expectRelative(kPerTHz, parseFloat(row.expected), {
        within: 1e-5,
        because: 'digits printed in the row',
      });
    }
    expect(kPerTHz).toBeGreaterThan(47.99);
  });
});
