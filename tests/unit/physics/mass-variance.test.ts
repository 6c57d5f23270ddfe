import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  compoundMassVariance,
  elementMassVariance,
  isotopeMassVariance,
  meanIsotopeMassU,
} from '#src/physics/index.ts';
import { expectRelative } from '#tests/support/approx.ts';
import { checksNamed } from '#tests/support/checks.ts';
import { naturalComposition } from '#tests/unit/physics/seed-crystals.ts';

function naturalElement(symbol: string): number {
  return isotopeMassVariance(naturalComposition(symbol));
}

describe('the mass variance of natural elements', () => {
  it.each(
    checksNamed('isotope_mass_variance_published').map((row) => [row.inputs, row.source, row] as const),
  )('%s: as published (%s)', (inputs, _source, row) => {
    // Outside source: the isotope literature, Tamura 1983 for germanium (tests/fixtures/checks.csv, from memory).
    const symbol = inputs.split(' ')[0] ?? '';
    expectRelative(naturalElement(symbol), Number(row.expected), {
      within: 0.03,
      because: 'abundance tables differ',
    });
  });

  it('of gallium arsenide is 9.16e-5, as printed', () => {
    // Outside source: printed value for natural GaAs, 9.16e-5.
    expectRelative(isotopeMassVariance(naturalComposition('GaAs')), 9.16e-5, {
      within: 3e-3,
      because: 'three figures',
    });
  });

  it('agrees with what another program makes of the same isotope table', () => {
    // Computed from Debian's bodr data by another program (tests/fixtures/checks.csv); no printed values.
    for (const row of checksNamed('isotope_mass_variance')) {
      const symbol = row.inputs.split(' ')[0] ?? '';
      const expected = Number(row.expected);
      if (expected === 0) expect(naturalElement(symbol), symbol).toBe(0);
      else
        expectRelative(naturalElement(symbol), expected, {
          within: 1e-3,
          because: `four figures; ${symbol}`,
        });
    }
    for (const row of checksNamed('isotope_mass_variance_compound')) {
      const formula = row.inputs.split(' ')[0] ?? '';
      expectRelative(isotopeMassVariance(naturalComposition(formula)), Number(row.expected), {
        within: 3e-3,
        because: `three or four figures; ${formula}`,
      });
    }
  });
});

describe('the mass variance in general', () => {
  const isotopes = fc.array(
    fc.record({
      massU: fc.double({ min: 1, max: 250, noNaN: true }),
      weight: fc.double({ min: 0.01, max: 1, noNaN: true }),
    }),
    { minLength: 1, maxLength: 6 },
  );
  const toFractions = (
    list: readonly { massU: number; weight: number }[],
  ): { massU: number; fraction: number }[] => {
    const sum = list.reduce((total, { weight }) => total + weight, 0);
    return list.map(({ massU, weight }) => ({ massU, fraction: weight / sum }));
  };

  it('is never negative, vanishes for one isotope, and does not see the unit of mass', () => {
    fc.assert(
      fc.property(isotopes, (list) => {
        const element = toFractions(list);
        const variance = elementMassVariance(element);
        expect(variance).toBeGreaterThanOrEqual(0);
        const heavier = element.map((isotope) => ({ ...isotope, massU: isotope.massU * 2 }));
        expect(elementMassVariance(heavier)).toBeCloseTo(variance, 12);
        const [first] = element;
        if (first !== undefined) expect(elementMassVariance([{ ...first, fraction: 1 }])).toBe(0);
      }),
    );
  });

  it('of two isotopes with fraction f and masses 1 ± d apart is f(1 − f)(Δm/m̄)²', () => {
    // Outside source: Klemens 1955, the variance of two values.
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 0.99, noNaN: true }),
        fc.double({ min: 0.01, max: 0.9, noNaN: true }),
        (f, d) => {
          const pair = [
            { massU: 10 * (1 + d), fraction: f },
            { massU: 10 * (1 - d), fraction: 1 - f },
          ];
          const mean = meanIsotopeMassU(pair);
          expectRelative(elementMassVariance(pair), f * (1 - f) * ((20 * d) / mean) ** 2, {
            within: 1e-11,
            because: 'rounding',
          });
        },
      ),
    );
  });

  it('of a compound weights each site with the square of its mass', () => {
    // Two sites of one atom each, masses 3 and 1, mean 2: Γ = [(3/2)² Γ₁ + (1/2)² Γ₂]/2.
    const gamma = compoundMassVariance([
      { atomsPerFormula: 1, meanMassU: 3, parameter: 0.1 },
      { atomsPerFormula: 1, meanMassU: 1, parameter: 0.2 },
    ]);
    expectRelative(gamma, (2.25 * 0.1 + 0.25 * 0.2) / 2, { within: 1e-14, because: 'rounding' });
  });

  it('refuses fractions that do not add up, and masses that are not positive', () => {
    expect(() => elementMassVariance([{ massU: 28, fraction: 0.9 }])).toThrow(
      /must add up to 1 .* they add up to 0\.9/,
    );
    expect(() => elementMassVariance([{ massU: 0, fraction: 1 }])).toThrow(/isotopes\[0\]\.massU/);
    expect(() =>
      elementMassVariance([
        { massU: 1, fraction: 1.5 },
        { massU: 2, fraction: -0.5 },
      ]),
    ).toThrow(/fraction/);
    expect(() => compoundMassVariance([])).toThrow(/at least one site/);
  });
});
