import { Fragment, type ReactNode } from 'react';

/** A Hermann–Mauguin symbol: letters italic, screw components lowered, a bar over what was written with a minus. */
export function SpaceGroup({ symbol }: { readonly symbol: string }): ReactNode {
  const parts = symbol.match(/-\d|_\d|[A-Za-z]+|./g) ?? [];
  return (
    <span className="whitespace-nowrap">
      {parts.map((part, index) => {
        if (/^-\d$/.test(part)) {
          return (
            <span key={index} className="overbar">
              <span className="sr-only">-</span>
              {part.slice(1)}
            </span>
          );
        }
        if (/^_\d$/.test(part)) return <sub key={index}>{part.slice(1)}</sub>;
        if (/^[A-Za-z]+$/.test(part)) return <i key={index}>{part}</i>;
        return <Fragment key={index}>{part}</Fragment>;
      })}
    </span>
  );
}
