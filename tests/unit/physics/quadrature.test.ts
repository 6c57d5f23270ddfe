import { describe, expect, it } from 'vitest';
import { boseWeight, modeHeatCapacityRatio } from '#src/physics/bose-weight.ts';
import { headLimitOf, integrateSpectrum } from '#src/physics/quadrature.ts';
import { expectRelative, relativeDeviation } from '#tests/support/approx.ts';
import { checksNamed } from '#tests/support/checks.ts';

function integrateOne(
  f: (x: number) => number,
  { upperLimit, headLimit }: { readonly upperLimit: number; readonly headLimit: number },
): { readonly value: number; readonly error: number } {
  const { values, relativeErrors } = integrateSpectrum({
    upperLimit,
    headLimit,
    integrandCount: 1,
    integrands: (x, out) => {
      out[0] = f(x);
    },
  });
  return { value: values[0] ?? NaN, error: relativeErrors[0] ?? NaN };
}

describe('the quadrature', () => {
  it('integrates polynomials up to degree 31 exactly on its first panel', () => {
    // Outside source: the degree of the 21-point Kronrod rule, 3·10 + 1 (Kronrod 1965). A wrong digit in a node shows here.
    for (let degree = 0; degree <= 31; degree += 1) {
      const { value } = integrateOne((x) => x ** degree, { upperLimit: 1, headLimit: 1 });
      expectRelative(value, 1 / (degree + 1), { within: 4e-15, because: `rounding; degree ${degree}` });
    }
  });

  it('gives 4π⁴/15 for the weight of heat over all frequencies', () => {
    // Outside source: the Bose integral 4! ζ(4) = 4π⁴/15 (Debye 1912).
    const { value } = integrateOne(boseWeight, { upperLimit: Infinity, headLimit: 1 });
    expectRelative(value, (4 * Math.PI ** 4) / 15, { within: 1e-13, because: 'rounding' });
    for (const row of checksNamed('transport_integral_J4_inf')) {
      expectRelative(value, parseFloat(row.expected), { within: 1e-8, because: 'digits printed in the row' });
    }
  });

  it.each([1, 1e-3, 1e-6, 1e-20, 1e-100])('finds the narrow feature of width %s next to zero', (width) => {
    // Outside source: the elementary integrals ∫₀¹ dx/(1 + (x/w)²) = w atan(1/w) and, for a Lorentzian of x²,
    // ∫₀¹ x² dx/(1 + (x/w)⁴) = w³ F(1/w) with F → π/(2√2) − w for small w.
    const lorentzian = integrateOne((x) => 1 / (1 + (x / width) ** 2), {
      upperLimit: 1,
      headLimit: width / 2,
    });
    expectRelative(lorentzian.value, width * Math.atan(1 / width), { within: 1e-13, because: 'rounding' });
    if (width <= 1e-6 && width > 1e-50) {
      const quartic = integrateOne((x) => (x / width) ** 2 / (1 + (x / width) ** 4), {
        upperLimit: 1,
        headLimit: width / 2,
      });
      expectRelative(quartic.value / width, Math.PI / (2 * Math.SQRT2) - width, {
        within: 1e-12,
        because: 'the next term of F is below 1e-29',
      });
    }
  });

  it('reports an error that covers the true one, also where an integrand is rougher than promised', () => {
    // A pole at a distance of 0.05 in ln x, five times nearer than any scattering rate has one.
    const depth = 0.05;
    const f = (x: number): number => 1 / (x * ((Math.log(x) + 1) ** 2 + depth ** 2));
    const from = 1e-4;
    const exact = (Math.atan(1 / depth) - Math.atan((Math.log(from) + 1) / depth)) / depth;
    const rough = integrateOne((x) => (x < from ? 0 : f(x)), { upperLimit: 1, headLimit: from });
    const deviation = relativeDeviation(rough.value, exact);
    expect(deviation).toBeLessThanOrEqual(rough.error);
    expect(rough.error).toBeLessThan(1e-6);
    expect(rough.error).toBeGreaterThan(0);
  });

  it('passes NaN on', () => {
    expect(integrateOne(() => NaN, { upperLimit: 1, headLimit: 1 }).value).toBeNaN();
  });

  it('puts the first panel below every root of a polynomial', () => {
    // 1e-6 + x² has its roots at ±1e-3 i, 1e-12 + x + x⁴ one at −1e-12.
    expect(
      headLimitOf([
        { coefficient: 1e-6, power: 0 },
        { coefficient: 1, power: 2 },
      ]),
    ).toBeLessThan(1e-3);
    expect(
      headLimitOf([
        { coefficient: 1e-12, power: 0 },
        { coefficient: 1, power: 1 },
        { coefficient: 1, power: 4 },
      ]),
    ).toBeLessThan(1e-12);
    expect(
      headLimitOf([
        { coefficient: 5, power: 4 },
        { coefficient: 0, power: 0 },
      ]),
    ).toBe(1);
  });
});

describe('the heat capacity of one mode', () => {
  it('neither cancels at small x nor overflows at large x', () => {
    // Outside source: the series x²eˣ/(eˣ−1)² = 1 − x²/12 + … (Abramowitz and Stegun 23.1, Bernoulli numbers).
    expect(modeHeatCapacityRatio(0)).toBe(1);
    expectRelative(modeHeatCapacityRatio(1e-3), 1 - 1e-6 / 12, {
      within: 1e-13,
      because: 'the next term is x⁴/240',
    });
    expectRelative(modeHeatCapacityRatio(600), 600 ** 2 * Math.exp(-600), {
      within: 1e-12,
      because: 'e⁻⁶⁰⁰ is small',
    });
    expect(modeHeatCapacityRatio(1e4)).toBe(0);
    expect(modeHeatCapacityRatio(NaN)).toBeNaN();
  });
});
