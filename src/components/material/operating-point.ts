import type { EstimateRequestInput, Mechanism, Model, PieceForm } from '#src/schemas/estimate.ts';

/**
 * The operating point as the reader writes it: the words and digits of the controls, kept as typed so that
 * a mistake stays on the screen beside its remedy. The page's address holds the same, defaults left out.
 */
export interface OperatingPoint {
  readonly form: PieceChoice;
  readonly size: string;
  readonly unit: LengthUnit;
  readonly isotopes: 'natural' | 'pure' | 'enriched';
  /** By element, "28 99.99; 29 0.01": mass number and share in per cent. */
  readonly abundances: Readonly<Record<string, string>>;
  /** Γ of point defects beyond isotopes. */
  readonly defects: string;
  /** In per cent. */
  readonly porosity: string;
  readonly model: 'recommended' | Model;
  readonly scale: string;
  readonly specularity: string;
  readonly mechanisms: readonly Mechanism[];
  /** Temperature pointed at, K. */
  readonly at: string;
}

/** A form of the piece, an effective length as such, or a crystal without end. */
export type PieceChoice = PieceForm | 'length' | 'endless';

export const lengthUnitsM = { nm: 1e-9, um: 1e-6, mm: 1e-3, m: 1 } as const;
export type LengthUnit = keyof typeof lengthUnitsM;

export const allMechanisms = ['boundary', 'defect', 'umklapp'] as const satisfies readonly Mechanism[];
export const pieceChoices = [
  'round-rod',
  'square-rod',
  'grains',
  'length',
  'endless',
] as const satisfies readonly PieceChoice[];
export const modelChoices = ['gray', 'branch', 'callaway'] as const satisfies readonly Model[];
export const isotopeChoices = ['natural', 'pure', 'enriched'] as const;

export type Field =
  'size' | 'isotopes' | 'defects' | 'porosity' | 'model' | 'scale' | 'specularity' | 'mechanisms' | 'at';

/** What is wrong with one control, in a sentence that names value and remedy. */
export interface Problem {
  readonly field: Field;
  readonly message: string;
}

/** A good crystal: a round rod of 5 mm, natural isotopes, nothing else in it, the recommended model. */
export function defaultOperatingPoint(at: string): OperatingPoint {
  return {
    form: 'round-rod',
    size: '5',
    unit: 'mm',
    isotopes: 'natural',
    abundances: {},
    defects: '0',
    porosity: '0',
    model: 'recommended',
    scale: '1',
    specularity: '0',
    mechanisms: allMechanisms,
    at,
  };
}

function oneOf<Choice extends string>(
  value: string | null,
  choices: readonly Choice[],
  otherwise: Choice,
): Choice {
  return choices.find((choice) => choice === value) ?? otherwise;
}

/** Reads the page's address. Words that no control offers fall back to the default; numbers are kept as typed. */
export function readOperatingPoint(query: URLSearchParams, defaults: OperatingPoint): OperatingPoint {
  const text = (name: string, otherwise: string): string => query.get(name)?.trim().slice(0, 40) ?? otherwise;
  const abundances: Record<string, string> = {};
  for (const [name, value] of query) {
    const element = /^iso-([A-Z][a-z]?)$/.exec(name)?.[1];
    if (element !== undefined && value.trim() !== '') abundances[element] = value.trim().slice(0, 200);
  }
  const named = query.getAll('mechanism');
  const mechanisms = allMechanisms.filter((mechanism) => named.includes(mechanism));
  return {
    form: oneOf(query.get('form'), pieceChoices, defaults.form),
    size: text('size', defaults.size),
    unit: oneOf(query.get('unit'), ['nm', 'um', 'mm', 'm'], defaults.unit),
    isotopes: oneOf(query.get('isotopes'), isotopeChoices, defaults.isotopes),
    abundances,
    defects: text('defects', defaults.defects),
    porosity: text('porosity', defaults.porosity),
    model: oneOf(query.get('model'), ['recommended', ...modelChoices], defaults.model),
    scale: text('scale', defaults.scale),
    specularity: text('specularity', defaults.specularity),
    mechanisms: mechanisms.length === 0 ? defaults.mechanisms : mechanisms,
    at: text('at', defaults.at),
  };
}

/** Writes what differs from the defaults into an address; `readOperatingPoint` gives the same point back. */
export function writeOperatingPoint(point: OperatingPoint, defaults: OperatingPoint): URLSearchParams {
  const query = new URLSearchParams();
  for (const key of ['at', 'form', 'size', 'unit', 'isotopes'] as const) {
    if (point[key] !== defaults[key]) query.set(key, point[key]);
  }
  if (point.isotopes === 'enriched') {
    for (const [element, share] of Object.entries(point.abundances)) {
      if (share !== '') query.set(`iso-${element}`, share);
    }
  }
  for (const key of ['defects', 'porosity', 'model', 'scale', 'specularity'] as const) {
    if (point[key] !== defaults[key]) query.set(key, point[key]);
  }
  if (point.mechanisms.length < allMechanisms.length) {
    for (const mechanism of point.mechanisms) query.append('mechanism', mechanism);
  }
  return query;
}

/** A number as people type it: spaces, a typographic minus and "2 × 10^-4" are understood. NaN for anything else. */
export function readNumber(text: string): number {
  const plain = text
    .replace(/[\s\u2009\u202f\u00a0]/g, '')
    .replace(/\u2212/g, '-')
    .replace(/[×·*]10\^?/, 'e');
  return /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(plain) ? Number(plain) : Number.NaN;
}

interface Bounds {
  readonly field: Field;
  /** As the sentence begins: "The porosity". */
  readonly name: string;
  readonly min: number;
  readonly max: number;
  readonly isMaxExcluded?: boolean;
  /** As the sentence ends: "between 0 and 100 %". */
  readonly allowed: string;
}

function readWithin(text: string, bounds: Bounds, problems: Problem[]): number {
  const value = readNumber(text);
  const isInside =
    value >= bounds.min && (bounds.isMaxExcluded === true ? value < bounds.max : value <= bounds.max);
  if (isInside) return value;
  const what =
    text.trim() === ''
      ? 'is empty'
      : Number.isNaN(value)
        ? `“${text}” is not a number${text.includes(',') ? ' (write the decimal with a point)' : ''}`
        : `${text} is out of range`;
  problems.push({ field: bounds.field, message: `${bounds.name} ${what}: give a number ${bounds.allowed}.` });
  return Number.NaN;
}

/** Shares may miss 100 % by the rounding of two printed decimals. */
const abundanceSumTolerancePercent = 0.02;

function readAbundances(
  elements: readonly string[],
  typed: Readonly<Record<string, string>>,
  problems: Problem[],
): Record<string, Record<string, number>> {
  const abundances: Record<string, Record<string, number>> = {};
  for (const element of elements) {
    const text = typed[element]?.trim() ?? '';
    if (text === '') continue;
    const shares: Record<string, number> = {};
    let sum = 0;
    for (const part of text.split(';')) {
      if (part.trim() === '') continue;
      const [, massNumber, percent] = /^\s*(\d{1,3})\s*[:=\s]\s*(\S+?)\s*%?\s*$/.exec(part) ?? [];
      const value = readNumber(percent ?? '');
      if (massNumber === undefined || !(value >= 0 && value <= 100)) {
        problems.push({
          field: 'isotopes',
          message: `Isotopes of ${element}: “${part.trim()}” is not a mass number and a share in per cent. Write for instance “28 99.99; 29 0.01”.`,
        });
        return {};
      }
      shares[massNumber] = Number((value / 100).toPrecision(12));
      sum += value;
    }
    if (Math.abs(sum - 100) > abundanceSumTolerancePercent) {
      problems.push({
        field: 'isotopes',
        message: `Isotopes of ${element}: the shares add up to ${Number(sum.toPrecision(6))} %. Make them add up to 100 %.`,
      });
    }
    abundances[element] = shares;
  }
  if (Object.keys(abundances).length === 0 && !problems.some(({ field }) => field === 'isotopes')) {
    problems.push({
      field: 'isotopes',
      message: 'Enriched isotopes need abundances: give mass numbers and shares, or choose natural or pure.',
    });
  }
  return abundances;
}

export interface EstimateQuestion {
  readonly material: string;
  readonly elements: readonly string[];
  readonly point: OperatingPoint;
  /** Temperatures of the curve, K; the one pointed at joins them. */
  readonly temperaturesK: readonly number[];
  /** Where the curve runs, K. */
  readonly extentK: readonly [number, number];
}

export type ReadQuestion =
  | { readonly kind: 'request'; readonly request: EstimateRequestInput }
  | { readonly kind: 'problems'; readonly problems: readonly Problem[] };

/** From the reader's words to what `POST /api/v1/estimates` takes, or to sentences on what to mend. */
export function readQuestion({
  material,
  elements,
  point,
  temperaturesK,
  extentK,
}: EstimateQuestion): ReadQuestion {
  const problems: Problem[] = [];
  const sizeM =
    point.form === 'endless'
      ? null
      : readWithin(
          point.size,
          {
            field: 'size',
            name: 'The size of the crystal',
            min: 1e-10 / lengthUnitsM[point.unit],
            max: 1e3 / lengthUnitsM[point.unit],
            allowed: 'with its unit, from 0.1 nm to 1000 m',
          },
          problems,
        ) * lengthUnitsM[point.unit];
  const defects = readWithin(
    point.defects,
    { field: 'defects', name: 'Γ of other defects', min: 0, max: 1, allowed: 'from 0 to 1, such as 1e-4' },
    problems,
  );
  const porosity = readWithin(
    point.porosity,
    {
      field: 'porosity',
      name: 'The porosity',
      min: 0,
      max: 100,
      isMaxExcluded: true,
      allowed: 'of per cent, from 0 to below 100',
    },
    problems,
  );
  const scale = readWithin(
    point.scale,
    { field: 'scale', name: 'The Umklapp scale', min: 0, max: 1e6, allowed: 'from 0 up; 1 means unscaled' },
    problems,
  );
  const specularity = readWithin(
    point.specularity,
    {
      field: 'specularity',
      name: 'The specular fraction',
      min: 0,
      max: 1,
      isMaxExcluded: true,
      allowed: 'from 0 (all diffuse) to below 1',
    },
    problems,
  );
  const atK = readWithin(
    point.at,
    {
      field: 'at',
      name: 'The temperature',
      min: extentK[0],
      max: extentK[1],
      allowed: `of kelvin, from ${extentK[0]} to ${extentK[1]}`,
    },
    problems,
  );
  const isotopes =
    point.isotopes === 'enriched' ? readAbundances(elements, point.abundances, problems) : point.isotopes;
  if (point.mechanisms.length === 0) {
    problems.push({
      field: 'mechanisms',
      message: 'No mechanism is left, and nothing would bound κ: keep at least one.',
    });
  }
  if (problems.length > 0) return { kind: 'problems', problems };

  return {
    kind: 'request',
    request: {
      material,
      ...(point.model === 'recommended' ? {} : { model: point.model }),
      temperatures_K: withTemperature(temperaturesK, atK),
      sample: {
        ...(point.form === 'endless' || point.form === 'length' || sizeM === null
          ? { boundary_length_m: sizeM }
          : { piece: { form: point.form, size_m: sizeM } }),
        specularity,
        isotopes,
        defect_mass_variance: defects,
        porosity: porosity / 100,
      },
      umklapp_scale: scale,
      ...(point.mechanisms.length < allMechanisms.length ? { mechanisms: [...point.mechanisms] } : {}),
    },
  };
}

function withTemperature(temperaturesK: readonly number[], atK: number): number[] {
  if (temperaturesK.includes(atK)) return [...temperaturesK];
  return [...temperaturesK, atK].sort((a, b) => a - b);
}

/** Which control a path of the API's problem document speaks of; null for the request as a whole. */
export function fieldOfPath(path: string): Field | null {
  const fields: readonly (readonly [RegExp, Field])[] = [
    [/piece|boundary_length/, 'size'],
    [/isotopes|mass_variance$/, 'isotopes'],
    [/defect_mass_variance/, 'defects'],
    [/porosity/, 'porosity'],
    [/specularity/, 'specularity'],
    [/umklapp_scale/, 'scale'],
    [/mechanisms/, 'mechanisms'],
    [/model/, 'model'],
    [/temperatures/, 'at'],
  ];
  if (/defect_mass_variance/.test(path)) return 'defects';
  return fields.find(([pattern]) => pattern.test(path))?.[1] ?? null;
}
