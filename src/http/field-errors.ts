import type { z } from 'zod';
import type { FieldError } from '#src/lib/errors.ts';

/** zod's issues in plain words: each names the field, the value that was given and what to give instead. */

type Issue = z.core.$ZodIssue;
type Path = readonly PropertyKey[];

/** What a field takes, where the schema alone cannot say it in people's words. */
const expectations: Readonly<Record<string, string>> = {
  material: 'the slug of a material of the store, such as "si"',
  temperatures_K:
    'a list of 1 to 1000 temperatures in kelvin, such as [10, 77, 300], or a range {"from": 2, "to": 1500, "points": 200, "spacing": "log"}',
  'sample.isotopes':
    '"natural", "pure" or abundances by element and mass number, such as {"Si": {"28": 0.9999, "29": 0.0001}}',
  'sample.piece': 'a piece such as {"form": "round-rod", "size_m": 0.004}',
  'sample.boundary_length_m': 'an effective length in metres, or null for a piece without boundaries',
};

function spellPath(path: Path): string {
  return path.map(String).join('.');
}

function valueAt(input: unknown, path: Path): unknown {
  let value = input;
  for (const key of path) {
    if (typeof value !== 'object' || value === null) return undefined;
    value = (value as Readonly<Record<PropertyKey, unknown>>)[key];
  }
  return value;
}

/** The value as JSON, cut where it is long. */
function showValue(value: unknown): string {
  if (typeof value === 'number') return String(value);
  if (typeof value === 'string' && value.length <= 60) return JSON.stringify(value);
  const text = JSON.stringify(value);
  return text.length <= 60 ? text : `${text.slice(0, 57)}…`;
}

function listOptions(options: readonly unknown[]): string {
  const shown = options.map((option) => JSON.stringify(option));
  const last = shown.pop() ?? '';
  return shown.length === 0 ? last : `${shown.join(', ')} or ${last}`;
}

const kindNames: Readonly<Record<string, string>> = {
  number: 'a number',
  int: 'a whole number',
  string: 'text',
  boolean: 'true or false',
  array: 'a list',
  object: 'an object',
  record: 'an object',
};

/** How many parts a list or a text has, as its limits count them. */
function countedThing(origin: string): string | null {
  if (origin === 'array') return 'entries';
  if (origin === 'string') return 'characters';
  return null;
}

function describeLimit(issue: Extract<Issue, { code: 'too_small' | 'too_big' }>): string {
  const limit = issue.code === 'too_small' ? issue.minimum : issue.maximum;
  const words = issue.code === 'too_small' ? ['at least', 'above'] : ['at most', 'below'];
  const bound = `${(issue.inclusive === false ? words[1] : words[0]) ?? ''} ${String(limit)}`;
  const counted = countedThing(issue.origin);
  return counted === null ? `must be ${bound}` : `must have ${bound} ${counted}`;
}

function describe(issue: Issue, path: Path, input: unknown): string {
  const field = path.length === 0 ? 'The request' : spellPath(path);
  const value = valueAt(input, path);
  const expected = expectations[spellPath(path)];
  const given = value === undefined ? `${field} is missing` : `${field} is ${showValue(value)}`;
  if (issue.code === 'custom') return issue.message;
  if (expected !== undefined && issue.code !== 'too_small' && issue.code !== 'too_big') {
    return `${given}: give ${expected}.`;
  }
  switch (issue.code) {
    case 'invalid_type':
      return `${given}: give ${kindNames[issue.expected] ?? issue.expected}.`;
    case 'too_small':
    case 'too_big': {
      const size = countedThing(issue.origin) === null ? showValue(value) : '';
      return `${field} ${describeLimit(issue)}${size === '' ? '.' : `; it is ${size}.`}`;
    }
    case 'invalid_value':
      return `${given}: give ${listOptions(issue.values)}.`;
    case 'invalid_format':
      // A pattern's own message, where the schema has one, says what is meant.
      return issue.message.startsWith('Invalid')
        ? `${given}, which is not in the form expected.`
        : `${given}. ${issue.message}`;
    case 'not_multiple_of':
      return `${given}: give a multiple of ${issue.divisor}.`;
    // The rest is taken apart before it comes here, or belongs to kinds of schema that no contract uses.
    case 'invalid_union':
    case 'invalid_key':
    case 'invalid_element':
    case 'unrecognized_keys':
      return `${given}, which is not accepted.`;
  }
}

/** Of a union's choices, the one the input was evidently meant for: its own kind fits, only parts of it do not. */
function intendedChoice(issue: Extract<Issue, { code: 'invalid_union' }>): readonly Issue[] | null {
  const isOfThisKind = (choice: readonly Issue[]): boolean =>
    choice.length > 0 &&
    choice.every(
      ({ path, code }) =>
        path.length > 0 || code === 'unrecognized_keys' || code === 'too_big' || code === 'too_small',
    );
  return issue.errors.find(isOfThisKind) ?? null;
}

function flatten(issue: Issue, parent: Path, input: unknown): readonly FieldError[] {
  const path = [...parent, ...issue.path];
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => {
      const unknown = spellPath([...path, key]);
      return {
        path: unknown,
        message: `${unknown} is not a field that exists here: check its spelling or leave it out.`,
      };
    });
  }
  if (issue.code === 'invalid_union') {
    const choice = intendedChoice(issue);
    if (choice !== null) return choice.flatMap((inner) => flatten(inner, path, input));
  }
  if (issue.code === 'invalid_key') {
    const expected = path.includes('isotopes')
      ? 'element symbols such as "Si", and mass numbers such as "28"'
      : 'other names';
    return [
      {
        path: spellPath(path),
        message: `${spellPath(path)} is not a name that can stand here: give ${expected}.`,
      },
    ];
  }
  return [{ path: spellPath(path), message: describe(issue, path, input) }];
}

/** One entry for each bad field. `input` is what was parsed: messages repeat the value that was given. */
export function toFieldErrors(error: z.ZodError, input: unknown): readonly FieldError[] {
  return error.issues.flatMap((issue) => flatten(issue, [], input));
}
