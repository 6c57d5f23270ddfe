import { Fragment, type ReactNode } from 'react';

const spelling: readonly (readonly [RegExp, string])[] = [
  [/angstrom/g, 'Å'],
  [/\bohm\b/g, 'Ω'],
  [/\*/g, '\u2009'],
  [/ /g, '\u2009'],
];

/** A unit as the store spells it ("kg/m^3", "J/(mol K)") set as people write it. */
export function Unit({ unit }: { readonly unit: string }): ReactNode {
  if (unit === '' || unit === '1') return null;
  const spelled = spelling.reduce((text, [pattern, replacement]) => text.replace(pattern, replacement), unit);
  return (
    <span className="whitespace-nowrap">
      {spelled
        .split(/\^?([-\u2212]?\d+)/)
        .map((part, index) =>
          index % 2 === 1 ? (
            <sup key={index}>{part.replace('-', '\u2212')}</sup>
          ) : (
            <Fragment key={index}>{part}</Fragment>
          ),
        )}
    </span>
  );
}
