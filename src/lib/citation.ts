/** What is known of a source; blanks stay blank. */
export interface CitedSource {
  readonly authors: string | null;
  readonly year: number | null;
  readonly title: string | null;
  readonly container: string | null;
  readonly volume: string | null;
  readonly page: string | null;
}

/** "Physical Review 131, 1906" */
function place({ container, volume, page }: CitedSource): string | null {
  if (container === null) return null;
  const inside = volume === null ? container : `${container} ${volume}`;
  return page === null ? inside : `${inside}, ${page}`;
}

function authorList(authors: string): string {
  return authors
    .split(';')
    .map((author) => author.trim())
    .filter((author) => author !== '')
    .join(', ');
}

/** One line for people: "B. Abeles, Physical Review 131, 1906 (1963)". The title stands in where there is no journal. */
export function formatCitation(source: CitedSource): string {
  const parts = [source.authors === null ? null : authorList(source.authors), place(source) ?? source.title];
  const text = parts.filter((part) => part !== null && part !== '').join(', ');
  if (source.year === null) return text;
  return text === '' ? String(source.year) : `${text} (${source.year})`;
}
