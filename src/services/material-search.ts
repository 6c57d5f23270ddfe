import Fuse from 'fuse.js';
import type { Composition, MaterialRecord } from '#src/db/queries/records.ts';

/** Ranking of search candidates: exact names and formulas first, then by resemblance. Pure. */

type Searchable = Pick<MaterialRecord, 'slug' | 'name' | 'formula' | 'aliases' | 'composition'>;

/**
 * A formula in any order of its elements, as counts: "ClNa" and "NaCl" are the same. Null for text that is no formula.
 * Knows plain formulas ("Al2O3", "Si0.8Ge0.2"), not parentheses; the store has none.
 */
export function parseFormula(text: string): readonly Composition[] | null {
  const compact = text.replace(/\s+/g, '');
  if (!/^(?:[A-Z][a-z]?(?:\d+(?:\.\d+)?)?)+$/.test(compact)) return null;
  const counts = new Map<string, number>();
  for (const [, element = '', count = ''] of compact.matchAll(/([A-Z][a-z]?)(\d+(?:\.\d+)?)?/g)) {
    counts.set(element, (counts.get(element) ?? 0) + (count === '' ? 1 : Number(count)));
  }
  return [...counts].map(([element, count]) => ({ element, count }));
}

/** Elements in alphabetical order with their counts: the same for every way to write a formula. */
export function canonicalFormula(composition: readonly Composition[]): string {
  return composition
    .map(({ element, count }) => `${element}${count}`)
    .toSorted()
    .join('');
}

/** Ranks: the smaller the better. Below 0: exact; above: the matcher's score and how much longer the term is. */
const rank = { exactFormula: -2, exactName: -1 } as const;

function normalise(text: string): string {
  return text.trim().toLowerCase().replace(/\s+/g, ' ');
}

function exactRank(
  material: Searchable,
  words: string,
  formula: readonly Composition[] | null,
): number | null {
  if (formula !== null && canonicalFormula(formula) === canonicalFormula(material.composition))
    return rank.exactFormula;
  // "Boron (beta-rhombohedral)" is what "boron" means.
  const plainName = material.name.replace(/\s*\(.*\)$/, '');
  const names = [material.name, plainName, material.slug, material.formula, ...material.aliases].map(
    normalise,
  );
  return names.includes(normalise(words)) ? rank.exactName : null;
}

/** One thing that a material may be called: a whole name, or a word of one. */
interface Term {
  readonly text: string;
  readonly slug: string;
}

function termsOf({ slug, name, formula, aliases }: Searchable): readonly Term[] {
  const names = [name, ...aliases];
  const words = names.flatMap((one) => one.split(/[^\p{L}\p{N}]+/u)).filter((word) => word.length > 1);
  return [...new Set([...names, ...words, formula, slug])].map((text) => ({ text, slug }));
}

/** A match may stand anywhere in a term, and about two of five letters may differ. */
const fuzzyMatching = {
  keys: ['text'],
  includeScore: true,
  ignoreLocation: true,
  ignoreFieldNorm: true,
  threshold: 0.4,
};

/** Part of a term that the words do not account for, 0 to 1: "sil" is nearer to "silica" than to "silicon carbide". */
function excess(words: string, text: string): number {
  return Math.abs(text.length - words.length) / Math.max(text.length, words.length);
}

type Scores = ReadonlyMap<string, number>;

/** Best score of each material over its terms; lengths only order what matches equally well. */
function scoreTerms(index: Fuse<Term>, candidates: readonly Searchable[], words: string): Scores {
  const lengthOfTerm = 0.2;
  const lengthOfName = 0.01;
  const names = new Map(candidates.map(({ slug, name }) => [slug, name]));
  const best = new Map<string, number>();
  for (const { item, score = 1 } of index.search(words)) {
    const { text, slug } = item;
    const total =
      score + lengthOfTerm * excess(words, text) + lengthOfName * excess(words, names.get(slug) ?? text);
    best.set(slug, Math.min(total, best.get(slug) ?? Infinity));
  }
  return best;
}

/** The words as a whole, or one by one ("chloride of sodium"); a word that nothing resembles counts as 1. */
function fuzzyRanks(candidates: readonly Searchable[], words: string): Scores {
  const index = new Fuse(candidates.flatMap(termsOf), fuzzyMatching);
  const whole = scoreTerms(index, candidates, words);
  const tokens = words.split(/\s+/).filter((token) => token !== '');
  if (tokens.length < 2) return whole;
  const single = tokens.map((token) => scoreTerms(index, candidates, token));
  const ranks = new Map(whole);
  for (const { slug } of candidates) {
    const mean = single.reduce((sum, scores) => sum + (scores.get(slug) ?? 1), 0) / tokens.length;
    if (mean < 1) ranks.set(slug, Math.min(mean, whole.get(slug) ?? Infinity));
  }
  return ranks;
}

export interface Ranked<Material> {
  readonly material: Material;
  readonly rank: number;
}

/** Candidates that match, best first; equals in the order of their slugs. Those that do not match are left out. */
export function rankMaterials<Material extends Searchable>(
  candidates: readonly Material[],
  words: string,
): readonly Ranked<Material>[] {
  const formula = parseFormula(words);
  const fuzzy = fuzzyRanks(candidates, words);
  const ranked = candidates.flatMap((material): readonly Ranked<Material>[] => {
    const found = exactRank(material, words, formula) ?? fuzzy.get(material.slug);
    return found === undefined ? [] : [{ material, rank: found }];
  });
  return ranked.toSorted((a, b) => a.rank - b.rank || (a.material.slug < b.material.slug ? -1 : 1));
}
