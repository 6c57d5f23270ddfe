import type { z } from 'zod';
import { toFieldErrors } from '#src/http/field-errors.ts';
import { AppError } from '#src/lib/errors.ts';

/** What comes in: read with a limit, checked against a schema, refused with the field named. */

/** An estimate with a thousand temperatures has about 20 kB. */
export const bodyLimitBytes = 64 * 1024;

function parseWith<Schema extends z.ZodType>(schema: Schema, input: unknown): z.output<Schema> {
  const result = schema.safeParse(input);
  if (result.success) return result.data;
  const fields = toFieldErrors(result.error, input);
  const [first] = fields;
  const others = fields.length > 1 ? ` (and ${fields.length - 1} more, listed under "errors")` : '';
  throw new AppError('INVALID_INPUT', `${first?.message ?? 'The request cannot be used.'}${others}`, {
    fields,
  });
}

/**
 * Parameters after the question mark. An empty value counts as not given, as a form sends it.
 *
 * @throws AppError INVALID_INPUT naming each unknown, repeated or wrong parameter.
 */
export function parseQuery<Schema extends z.ZodType>(schema: Schema, url: URL): z.output<Schema> {
  const given = new Map<string, string>();
  for (const [name, value] of url.searchParams) {
    if (given.has(name)) {
      const message = `${name} is given more than once: give it once.`;
      throw new AppError('INVALID_INPUT', message, { fields: [{ path: name, message }] });
    }
    given.set(name, value.trim());
  }
  return parseWith(schema, Object.fromEntries([...given].filter(([, value]) => value !== '')));
}

function requireJson(request: Request): void {
  const contentType = request.headers.get('content-type');
  const mediaType = contentType?.split(';')[0]?.trim().toLowerCase();
  if (mediaType === 'application/json') return;
  const given =
    contentType === null
      ? 'The request has no content type'
      : `The content type is ${JSON.stringify(contentType)}`;
  throw new AppError(
    'UNSUPPORTED_MEDIA_TYPE',
    `${given}: send JSON with the header "content-type: application/json".`,
  );
}

function tooLarge(): AppError {
  return new AppError(
    'TOO_LARGE',
    `The body is larger than ${bodyLimitBytes / 1024} kB: ask for less in one request.`,
  );
}

/** Counts while it reads and stops at the limit; a declared length is not relied on. */
async function readLimited(request: Request): Promise<Uint8Array> {
  if (Number(request.headers.get('content-length') ?? 0) > bodyLimitBytes) throw tooLarge();
  if (request.body === null) return new Uint8Array();
  const reader: ReadableStreamDefaultReader<Uint8Array> = request.body.getReader();
  const chunks: Uint8Array[] = [];
  let size = 0;
  for (;;) {
    const { done, value } = await reader.read();
    if (done) return Buffer.concat(chunks);
    size += value.byteLength;
    if (size > bodyLimitBytes) {
      await reader.cancel();
      throw tooLarge();
    }
    chunks.push(value);
  }
}

function parseJson(bytes: Uint8Array): unknown {
  if (bytes.byteLength === 0) {
    throw new AppError('MALFORMED', 'The body is empty: send a JSON object.');
  }
  try {
    return JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
  } catch (error) {
    const reason = error instanceof SyntaxError ? error.message : 'it is not UTF-8';
    throw new AppError('MALFORMED', `The body is not JSON: ${reason}.`, { cause: error });
  }
}

/**
 * The JSON body of a request.
 *
 * @throws AppError UNSUPPORTED_MEDIA_TYPE, TOO_LARGE, MALFORMED, or INVALID_INPUT naming each unknown or wrong field.
 */
export async function parseBody<Schema extends z.ZodType>(
  schema: Schema,
  request: Request,
): Promise<z.output<Schema>> {
  requireJson(request);
  return parseWith(schema, parseJson(await readLimited(request)));
}
