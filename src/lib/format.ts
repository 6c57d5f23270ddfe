/**
 * Numbers for people. One place decides figures, grouping and spaces, on the server and in the browser.
 * Meant to be set in tabular lining figures.
 */

/** Between groups of three digits and before a unit (SI Brochure, 9th edition, 5.4.3 and 5.4.4). */
export const thinSpace = '\u2009';
const minusSign = '\u2212';
/** Shown where nothing is known; never a guess, never a zero. */
export const notKnown = 'not known';

export interface QuantityFormat {
  /** Standard uncertainty in the same unit: figures end where it does. */
  readonly uncertainty?: number | null | undefined;
  /** Exactly so many significant figures, trailing zeros included. Left out: as stored, at most six. */
  readonly significant?: number | undefined;
  readonly unit?: string | undefined;
}

const superscripts: Readonly<Record<string, string>> = {
  '-': '⁻',
  '0': '⁰',
  '1': '¹',
  '2': '²',
  '3': '³',
  '4': '⁴',
  '5': '⁵',
  '6': '⁶',
  '7': '⁷',
  '8': '⁸',
  '9': '⁹',
};

function superscript(exponent: number): string {
  return String(exponent).replace(/./g, (character) => superscripts[character] ?? character);
}

/** 12345.67 as "12 345.67": whole part in groups of three, a real minus sign. */
function groupDigits(plain: string): string {
  const [whole = '', decimals] = plain.replace('-', '').split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, thinSpace);
  const sign = plain.startsWith('-') ? minusSign : '';
  return `${sign}${grouped}${decimals === undefined ? '' : `.${decimals}`}`;
}

/** Decimal exponent of the leading figure: 2 for 148, −4 for 2.01e-4. Zero has 0. */
function leadingExponent(value: number): number {
  return value === 0 ? 0 : Number(value.toExponential().split('e')[1] ?? 0);
}

/** Plain decimal figures up to `lastPlace` (−2: hundredths; 1: tens). */
function decimal(value: number, lastPlace: number): string {
  if (lastPlace <= 0) return groupDigits(value.toFixed(Math.min(-lastPlace, 100)));
  const step = 10 ** lastPlace;
  return groupDigits((Math.round(value / step) * step).toFixed(0));
}

/** Values this small or large are written with a power of ten. */
function needsPowerOfTen(exponent: number): boolean {
  return exponent < -3 || exponent >= 6;
}

/** Figures up to `lastPlace`, with a power of ten where the number would be long. */
function toPlace(value: number, lastPlace: number): string {
  const rounded = Number(value.toExponential(Math.max(0, Math.min(leadingExponent(value) - lastPlace, 100))));
  const exponent = leadingExponent(rounded);
  if (!needsPowerOfTen(exponent) || rounded === 0) return decimal(rounded, lastPlace);
  return `${decimal(rounded / 10 ** exponent, lastPlace - exponent)}${thinSpace}×${thinSpace}10${superscript(exponent)}`;
}

/** Place of the last figure an uncertainty allows: two figures where it starts with 1, else one (common practice). */
function uncertaintyPlace(uncertainty: number): number {
  const exponent = leadingExponent(uncertainty);
  const startsWithOne = uncertainty.toExponential(1).startsWith('1');
  return startsWithOne ? exponent - 1 : exponent;
}

/** Place of the last figure: by the uncertainty, the figures asked for, or what is stored (at most six figures). */
function lastPlaceOf(value: number, { uncertainty, significant }: QuantityFormat): number {
  if (typeof uncertainty === 'number' && uncertainty > 0) return uncertaintyPlace(uncertainty);
  if (significant !== undefined) {
    const exponent = leadingExponent(Number(value.toPrecision(significant)));
    return exponent - significant + 1;
  }
  const [mantissa = '', exponent = '0'] = Number(value.toPrecision(6)).toExponential().split('e');
  const decimals = mantissa.split('.')[1]?.length ?? 0;
  return Number(exponent) - decimals;
}

function withUnit(text: string, unit: string | undefined): string {
  return unit === undefined || unit === '' || unit === '1' ? text : `${text}${thinSpace}${unit}`;
}

/**
 * A number with as many figures as are meant: `8430` → "8 430", `2.01e-4` → "2.01 × 10⁻⁴", `40.0479` with
 * `significant: 3` → "40.0". Null and NaN are "not known".
 */
export function formatQuantity(value: number | null | undefined, format: QuantityFormat = {}): string {
  if (value === null || value === undefined || Number.isNaN(value)) return notKnown;
  if (!Number.isFinite(value)) return withUnit(value > 0 ? '∞' : `${minusSign}∞`, format.unit);
  return withUnit(toPlace(value, lastPlaceOf(value, format)), format.unit);
}

/** A value with its standard uncertainty: "148 ± 7 W/(m K)"; "(2.01 ± 0.03) × 10⁻⁴". Without one, the value alone. */
export function formatWithUncertainty(
  value: number | null | undefined,
  uncertainty: number | null | undefined,
  unit?: string,
): string {
  if (value === null || value === undefined || typeof uncertainty !== 'number' || !(uncertainty > 0)) {
    return formatQuantity(value, { unit });
  }
  const place = uncertaintyPlace(uncertainty);
  const exponent = leadingExponent(value);
  const plusMinus = `${thinSpace}±${thinSpace}`;
  if (!needsPowerOfTen(exponent)) {
    return withUnit(`${decimal(value, place)}${plusMinus}${decimal(uncertainty, place)}`, unit);
  }
  const scale = 10 ** exponent;
  const both = `${decimal(value / scale, place - exponent)}${plusMinus}${decimal(uncertainty / scale, place - exponent)}`;
  return withUnit(`(${both})${thinSpace}×${thinSpace}10${superscript(exponent)}`, unit);
}

const lengthUnits = [
  { unit: 'km', size: 1e3 },
  { unit: 'm', size: 1 },
  { unit: 'mm', size: 1e-3 },
  { unit: 'µm', size: 1e-6 },
  { unit: 'nm', size: 1e-9 },
  { unit: 'pm', size: 1e-12 },
] as const;

/** A length in the unit that keeps its number between 1 and 1000: `4.3e-8` → "43 nm", `0.005` → "5 mm". */
export function formatLengthM(lengthM: number | null | undefined, significant = 3): string {
  if (lengthM === null || lengthM === undefined || Number.isNaN(lengthM)) return notKnown;
  if (lengthM === 0) return `0${thinSpace}m`;
  const rounded = Number(lengthM.toPrecision(significant));
  const { unit, size } = lengthUnits.find(
    (candidate) => Math.abs(rounded) >= candidate.size * (1 - 1e-12),
  ) ?? {
    unit: 'pm',
    size: 1e-12,
  };
  return formatQuantity(Number((rounded / size).toPrecision(significant)), { unit });
}

/** A share or a fraction as a percentage: `0.284` → "28 %"; what is above zero never reads "0 %". */
export function formatPercent(fraction: number | null | undefined): string {
  if (fraction === null || fraction === undefined || Number.isNaN(fraction)) return notKnown;
  if (fraction > 0 && fraction < 0.005) return `<${thinSpace}1${thinSpace}%`;
  return `${groupDigits((fraction * 100).toFixed(0))}${thinSpace}%`;
}
