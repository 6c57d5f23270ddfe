import { readFileSync } from 'node:fs';
import { parse } from 'csv-parse/sync';
import { describe, expect, it } from 'vitest';
import { canonicalFormula, parseFormula, rankMaterials } from '#src/services/material-search.ts';

const rows = parse<Record<'slug' | 'name' | 'formula' | 'aliases', string>>(
  readFileSync('seed-data/materials.csv', 'utf8'),
  { columns: true },
);

const store = rows.map(({ slug, name, formula, aliases }) => ({
  slug,
  name,
  formula,
  aliases: aliases.split(';').filter((alias) => alias !== ''),
  composition: parseFormula(formula) ?? [],
}));

function best(words: string): string | undefined {
  return rankMaterials(store, words)[0]?.material.slug;
}

describe('the best match among the materials of the store', () => {
  it.each([
    ['silcon', 'si'],
    ['Silicon', 'si'],
    ['galium arsenide', 'gaas'],
    ['saphire', 'al2o3'],
    ['diamnd', 'diamond'],
    ['coper', 'cu'],
    ['germanum', 'ge'],
    ['bismuth teluride', 'bi2te3'],
    ['magnesium oxid', 'mgo'],
    ['quarz', 'sio2'],
    ['sodium cloride', 'nacl'],
  ])('for the misspelling "%s" is %s', (words, slug) => {
    expect(best(words)).toBe(slug);
  });

  it.each([
    ['salt', 'nacl'],
    ['table salt', 'nacl'],
    ['alumina', 'al2o3'],
    ['wolfram', 'w'],
    ['yag', 'yag'],
    ['dry ice', 'co2'],
    ['boron', 'b'],
    ['tin', 'sn'],
  ])('for another name, "%s", is %s', (words, slug) => {
    expect(best(words)).toBe(slug);
  });

  it.each([
    ['NaCl', 'nacl'],
    ['ClNa', 'nacl'],
    ['GaAs', 'gaas'],
    ['AsGa', 'gaas'],
    ['O3Al2', 'al2o3'],
    ['Te3Bi2', 'bi2te3'],
    ['Cu', 'cu'],
    ['Co', 'co'],
  ])('for the formula "%s" is %s, in any order of its elements', (words, slug) => {
    expect(best(words)).toBe(slug);
  });

  it('for a formula of several forms lists all of them first', () => {
    const found = rankMaterials(store, 'CSi').map(({ material }) => material.slug);
    expect(found.slice(0, 3)).toEqual(['sic-3c', 'sic-4h', 'sic-6h']);
  });

  it('for nonsense is none', () => {
    expect(rankMaterials(store, 'qqqqqqqq')).toEqual([]);
  });

  it('does not depend on the order of the candidates', () => {
    const forwards = rankMaterials(store, 'zinc').map(({ material }) => material.slug);
    const backwards = rankMaterials(store.toReversed(), 'zinc').map(({ material }) => material.slug);
    expect(backwards).toEqual(forwards);
  });
});

describe('a formula', () => {
  it('is read with its counts, fractions too', () => {
    expect(parseFormula('Si0.8Ge0.2')).toEqual([
      { element: 'Si', count: 0.8 },
      { element: 'Ge', count: 0.2 },
    ]);
    expect(parseFormula('CH3OH')).toEqual([
      { element: 'C', count: 1 },
      { element: 'H', count: 4 },
      { element: 'O', count: 1 },
    ]);
  });

  it('is not read into words', () => {
    expect(parseFormula('salt')).toBeNull();
    expect(parseFormula('Silicon')).toBeNull();
    expect(parseFormula('')).toBeNull();
  });

  it('is the same in any order', () => {
    expect(canonicalFormula(parseFormula('O3Al2') ?? [])).toBe(canonicalFormula(parseFormula('Al2O3') ?? []));
    expect(canonicalFormula(parseFormula('Al2O3') ?? [])).not.toBe(
      canonicalFormula(parseFormula('Al3O2') ?? []),
    );
  });
});
