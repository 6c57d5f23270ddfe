import { readFileSync } from 'node:fs';
import { parse } from 'csv-parse/sync';

/**
 * Rows of tests/fixtures/checks.csv: values that a program can be checked against. `basis` says what a row is worth:
 * `checked` was seen in the named source, `from memory` was recalled from it, `computed` was worked out by another
 * program than ours from the named source's equation, and is no printed value.
 */
export interface Check {
  readonly name: string;
  readonly inputs: string;
  readonly expected: string;
  readonly tolerance: string;
  readonly source: string;
  readonly basis: string;
}

const rows = parse<Check>(readFileSync(new URL('../fixtures/checks.csv', import.meta.url), 'utf8'), {
  columns: true,
});

/** All rows of one name; never empty, so that a test over them cannot pass by checking nothing. */
export function checksNamed(name: string): readonly Check[] {
  const found = rows.filter((row) => row.name === name);
  if (found.length === 0) throw new Error(`tests/fixtures/checks.csv has no row named "${name}".`);
  return found;
}

/** The number that follows `label` in the text of a row, such as 300 for "T" in "v=6400 m/s, T=300 K". */
export function numberAfter(label: string, text: string): number {
  const match = new RegExp(`(?:^|[^\\w.])${label}\\s*=\\s*([-+]?[\\d.]+(?:e[-+]?\\d+)?)`).exec(text);
  if (match?.[1] === undefined) throw new Error(`No number for "${label}" in "${text}".`);
  return Number(match[1]);
}
