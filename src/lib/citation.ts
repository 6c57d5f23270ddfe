/** What is known of a source; blanks stay blank. */
export interface CitedSource {
  readonly authors: string | null;
  readonly year: number | null;
  readonly title: string | null;
  readonly container: string | null;
  readonly volume: string | null;
  readonly page: string | null;
}

/** "Physical Review 131, 1906"; a book or a page on the web has its title before it. */
function place({ title, container, volume, page }: CitedSource): readonly (string | null)[] {
  if (container === null || volume === null) return [title, container, page];
  return [`${container} ${volume}`, page];
}

function authorList(authors: string): string {
  return authors
    .split(';')
    .map((author) => author.trim())
    .filter((author) => author !== '')
    .join(', ');
}

/** One line for people: "B. Abeles, Physical Review 131, 1906 (1963)". Blanks leave no trace. */
export function formatCitation(source: CitedSource): string {
  const parts = [source.authors === null ? null : authorList(source.authors), ...place(source)];
  const text = parts.filter((part) => part !== null && part !== '').join(', ');
  if (source.year === null) return text;
  return text === '' ? String(source.year) : `${text} (${source.year})`;
}
