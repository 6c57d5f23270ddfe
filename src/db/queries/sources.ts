import { source } from '#src/db/schema/index.ts';
import { formatCitation } from '#src/lib/citation.ts';
import type { CitedSource } from '#src/lib/citation.ts';
import type { SourceReference } from '#src/schemas/provenance.ts';

/** What a join with `source` selects so that a value can cite it. */
export const citedSourceColumns = {
  key: source.key,
  authors: source.authors,
  year: source.year,
  title: source.title,
  container: source.container,
  volume: source.volume,
  page: source.page,
  doi: source.doi,
};

export type CitedSourceRow = CitedSource & { readonly key: string; readonly doi: string | null };

export function toSourceReference(row: CitedSourceRow): SourceReference {
  const citation = formatCitation(row);
  return { key: row.key, citation: citation === '' ? row.key : citation, doi: row.doi };
}
