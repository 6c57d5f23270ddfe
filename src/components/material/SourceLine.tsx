import type { ReactNode } from 'react';
import type { SourceReference } from '#src/schemas/provenance.ts';

/** A citation on one line; it leads to the publication where a DOI is stored. */
export function SourceLine({ source }: { readonly source: SourceReference }): ReactNode {
  if (source.doi === null) return <span>{source.citation}.</span>;
  return (
    <span>
      <a href={`https://doi.org/${encodeURI(source.doi)}`} rel="external">
        {source.citation}
      </a>
      .
    </span>
  );
}
