import { describe, expect, it } from 'vitest';
import {
  formatLengthM,
  formatPercent,
  formatQuantity,
  formatWithUncertainty,
  notKnown,
  thinSpace,
} from '#src/lib/format.ts';

/** Thin spaces are written as ordinary ones here. */
function plain(text: string): string {
  return text.replaceAll(thinSpace, ' ');
}

describe('a number for people', () => {
  // SI Brochure, 9th edition, 5.4.4: groups of three digits are separated by a thin space, neither dots nor commas.
  it.each([
    [10_000, '10 000'],
    [8430, '8 430'],
    [100, '100'],
    [999_999, '999 999'],
    [40.0479, '40.0479'],
    [0.001, '0.001'],
    [0, '0'],
    [-0.5, '−0.5'],
    [-1234.5, '−1 234.5'],
  ])('reads %d as "%s"', (value, text) => {
    expect(plain(formatQuantity(value))).toBe(text);
  });

  it.each([
    [2.01e-4, '2.01 × 10⁻⁴'],
    [1e6, '1 × 10⁶'],
    [1.543e-8, '1.543 × 10⁻⁸'],
    [-3.5e-7, '−3.5 × 10⁻⁷'],
  ])('writes the far ends of the scale with a power of ten: %d as "%s"', (value, text) => {
    expect(plain(formatQuantity(value))).toBe(text);
  });

  it('shows six figures at most of what is stored, without the noise of a conversion', () => {
    expect(plain(formatQuantity(40.047_900_000_000_01))).toBe('40.0479');
    expect(plain(formatQuantity(28.085_384_75))).toBe('28.0854');
  });

  it.each([
    [150.774, 3, '151'],
    [14_834, 3, '14 800'],
    [0.5, 3, '0.500'],
    [9.996, 3, '10.0'],
    [99_960, 3, '100 000'],
    [999_600, 3, '1.00 × 10⁶'],
    [2.004_67e-4, 3, '2.00 × 10⁻⁴'],
    [9.999e-4, 2, '0.0010'],
  ])('keeps exactly the figures asked for: %d to %d figures is "%s"', (value, significant, text) => {
    expect(plain(formatQuantity(value, { significant }))).toBe(text);
  });

  it('puts a thin space before the unit, and no unit behind a pure number', () => {
    expect(formatQuantity(148, { unit: 'W/(m K)' })).toBe(`148${thinSpace}W/(m K)`);
    expect(formatQuantity(1.06, { unit: '1' })).toBe('1.06');
  });

  it('says that nothing is known instead of showing a zero', () => {
    expect(formatQuantity(null)).toBe(notKnown);
    expect(formatQuantity(Number.NaN)).toBe(notKnown);
    expect(formatQuantity(Infinity)).toBe('∞');
  });
});

describe('a value with its uncertainty', () => {
  // Common practice (GUM 7.2.6): one or two figures of the uncertainty, and the value ends at the same place.
  it.each([
    [148.23, 7.4, '148 ± 7'],
    [148.23, 12.4, '148 ± 12'],
    [344.3, 0.2, '344.3 ± 0.2'],
    [12_345, 678, '12 300 ± 700'],
    [0.84, 0.09, '0.84 ± 0.09'],
    [2.013e-4, 3e-6, '(2.01 ± 0.03) × 10⁻⁴'],
  ])('%d with %d reads "%s"', (value, uncertainty, text) => {
    expect(plain(formatWithUncertainty(value, uncertainty))).toBe(text);
  });

  it('stands alone where no uncertainty is stated', () => {
    expect(plain(formatWithUncertainty(148, null, 'W/(m K)'))).toBe('148 W/(m K)');
    expect(plain(formatWithUncertainty(148, 0))).toBe('148');
  });

  it('cuts the value alone at the place the uncertainty allows', () => {
    expect(plain(formatQuantity(148.23, { uncertainty: 7.4 }))).toBe('148');
  });
});

describe('a length', () => {
  it.each([
    [4.3e-8, '43 nm'],
    [0.005, '5 mm'],
    [2.751e-7, '275 nm'],
    [9.9999e-7, '1 µm'],
    [1e-6, '1 µm'],
    [1, '1 m'],
    [1500, '1.5 km'],
    [1e-10, '100 pm'],
    [0, '0 m'],
    [1e20, '1 × 10¹⁷ km'],
  ])('%d m reads "%s"', (lengthM, text) => {
    expect(plain(formatLengthM(lengthM))).toBe(text);
  });
});

describe('a share', () => {
  it('never reads zero when there is some', () => {
    expect(plain(formatPercent(0.0001))).toBe('< 1 %');
    expect(plain(formatPercent(0))).toBe('0 %');
    expect(plain(formatPercent(0.8823))).toBe('88 %');
    expect(plain(formatPercent(1))).toBe('100 %');
  });
});
