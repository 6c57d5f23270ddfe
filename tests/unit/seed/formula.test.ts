import { describe, expect, it } from 'vitest';
import { parseFormula } from '#src/lib/formula.ts';

const counts = (formula: string): Record<string, number> =>
  Object.fromEntries(parseFormula(formula).map(({ element, count }) => [element, count]));

// Nomenclature of IUPAC (Red Book 2005, IR-4): symbols, subscripts, parentheses.
describe('a chemical formula', () => {
  it('gives the atoms of each element, whole or fractional', () => {
    expect(counts('Si')).toEqual({ Si: 1 });
    expect(counts('Al2O3')).toEqual({ Al: 2, O: 3 });
    expect(counts('Ba8Ga16Ge30')).toEqual({ Ba: 8, Ga: 16, Ge: 30 });
    expect(counts('Si0.8Ge0.2')).toEqual({ Si: 0.8, Ge: 0.2 });
    expect(counts('Y3Al5O12')).toEqual({ Y: 3, Al: 5, O: 12 });
  });

  it('multiplies what stands in parentheses and adds repeated elements up', () => {
    expect(counts('Ca(OH)2')).toEqual({ Ca: 1, O: 2, H: 2 });
    expect(counts('CO(NH2)2')).toEqual({ C: 1, O: 1, N: 2, H: 4 });
    expect(counts('CH3COOH')).toEqual({ C: 2, H: 4, O: 2 });
    expect(counts('K4(Fe(CN)6)')).toEqual({ K: 4, Fe: 1, C: 6, N: 6 });
  });

  it('tells cobalt from carbon monoxide', () => {
    expect(counts('Co')).toEqual({ Co: 1 });
    expect(counts('CO')).toEqual({ C: 1, O: 1 });
  });

  it.each([
    ['', 'no element'],
    ['Xx2', 'no element "Xx"'],
    ['si', 'character 1'],
    ['Al2O3)', 'never opened'],
    ['Ca(OH', 'not closed'],
    ['Si0', 'count of zero'],
    ['Si 2', 'character 3'],
  ])('is refused with its place when it cannot be read: "%s"', (formula, reason) => {
    expect(() => parseFormula(formula)).toThrow(reason);
    expect(() => parseFormula(formula)).toThrow(`"${formula}"`);
  });
});
