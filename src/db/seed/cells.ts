import { z } from 'zod';
import { basisValues, verificationValues } from '#src/db/schema/columns.ts';

/** What a cell of a seed file may hold. The message of each is the remedy a reader of the error gets. */

const numberPattern = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;

function numeric(remedy: string, accepts: (value: number) => boolean): z.ZodType<number> {
  return z
    .string({ error: remedy })
    .refine((text) => numberPattern.test(text) && accepts(Number(text)), { error: remedy })
    .transform(Number);
}

export const text = z.string({ error: 'This cell must not be blank.' });
export const optionalText = z.string().nullable();

export const slug = z.string({ error: 'Give a slug.' }).regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, {
  error: 'A slug has lower-case letters, digits and single hyphens, such as sic-4h.',
});

export const sourceKey = z
  .string({ error: 'Every value names its source: give a key of sources.csv, or derived-here.' })
  .regex(/^[a-z0-9][a-z0-9.-]*$/, {
    error: 'A source key has lower-case letters, digits, dots and hyphens.',
  });

export const positive = numeric(
  'Give a number above zero, with a point for decimals.',
  (value) => value > 0 && Number.isFinite(value),
);
export const optionalPositive = positive.nullable();
export const notNegative = numeric(
  'Give a number of at least zero.',
  (value) => value >= 0 && Number.isFinite(value),
);
export const optionalNotNegative = notNegative.nullable();
export const finite = numeric('Give a number, with a point for decimals.', Number.isFinite);
export const optionalFinite = finite.nullable();
export const fraction = numeric('Give a fraction from 0 to 1.', (value) => value >= 0 && value <= 1);
export const temperatureK = numeric(
  'Give a temperature above 0 K, or leave it blank where none is stated.',
  (value) => value > 0 && value < 1e5,
);
export const optionalTemperatureK = temperatureK.nullable();
export const wholePositive = numeric(
  'Give a whole number above zero.',
  (value) => Number.isInteger(value) && value > 0,
);
export const optionalWholePositive = wholePositive.nullable();

export function oneOf<const Values extends readonly [string, ...string[]]>(
  values: Values,
): z.ZodEnum<{ [Value in Values[number]]: Value }> {
  return z.enum(values, { error: `Give one of: ${values.join(', ')}.` });
}

export const basis = oneOf(basisValues);
export const verification = z
  .enum(verificationValues, {
    error: 'Give "checked" or "from memory", or leave it blank for a derived or estimated value.',
  })
  .nullable();

/** `true` or blank. */
export const flag = z
  .literal('true', { error: 'Give true, or leave it blank.' })
  .nullable()
  .transform((cell) => cell === 'true');

/** Separated by semicolons; blank is an empty list. */
export const list = z
  .string()
  .nullable()
  .transform((cell) =>
    (cell ?? '')
      .split(';')
      .map((part) => part.trim())
      .filter((part) => part !== ''),
  );
