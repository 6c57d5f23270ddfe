import { Fragment, type ReactNode } from 'react';

/** A chemical formula with its counts lowered: Si0.8Ge0.2, Bi2Te3. */
export function Formula({ formula }: { readonly formula: string }): ReactNode {
  return (
    <span className="whitespace-nowrap">
      {formula
        .split(/(?<=[A-Za-z)\]])(\d+(?:\.\d+)?)/)
        .map((part, index) =>
          index % 2 === 1 ? <sub key={index}>{part}</sub> : <Fragment key={index}>{part}</Fragment>,
        )}
    </span>
  );
}
