import { Fragment, type ReactNode } from 'react';

const superscriptDigits = '⁰¹²³⁴⁵⁶⁷⁸⁹';

function plainExponent(raised: string): string {
  return raised.replace(/./gu, (character) =>
    character === '⁻' ? '\u2212' : String(superscriptDigits.indexOf(character)),
  );
}

function split(text: string): { readonly words: string; readonly isRaised: boolean }[] {
  return text
    .split(/([⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+)/u)
    .filter((part) => part !== '')
    .map((part) =>
      /^[⁻⁰¹²³⁴⁵⁶⁷⁸⁹]/u.test(part)
        ? { words: plainExponent(part), isRaised: true }
        : { words: part, isRaised: false },
    );
}

/** A formatted number and unit that stay on one line; exponents raised by markup, since the serif has no raised minus. */
export function Figures({ text }: { readonly text: string }): ReactNode {
  return (
    <span className="figures whitespace-nowrap">
      {split(text).map(({ words, isRaised }, index) =>
        isRaised ? <sup key={index}>{words}</sup> : <Fragment key={index}>{words}</Fragment>,
      )}
    </span>
  );
}

/** The same inside an SVG text. */
export function SvgFigures({ text }: { readonly text: string }): ReactNode {
  return split(text).map(({ words, isRaised }, index) =>
    isRaised ? (
      <tspan key={index} dy="-5" fontSize="10">
        {words}
      </tspan>
    ) : (
      <Fragment key={index}>{words}</Fragment>
    ),
  );
}
