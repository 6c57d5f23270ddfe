import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { bodyLimitBytes, parseBody, parseQuery } from '#src/http/parse.ts';
import { AppError } from '#src/lib/errors.ts';

const schema = z.strictObject({ name: z.string(), limit: z.coerce.number().int().min(1).max(10).default(5) });

async function refusal(work: () => unknown): Promise<AppError> {
  try {
    await work();
  } catch (error) {
    if (error instanceof AppError) return error;
    throw error;
  }
  throw new Error('It was accepted.');
}

function post(body: BodyInit, contentType: string | null = 'application/json'): Request {
  const headers = contentType === null ? {} : { 'content-type': contentType };
  // Node asks for half duplex where the body is a stream; its types do not know the field yet.
  return new Request('http://127.0.0.1/', { method: 'POST', body, headers, duplex: 'half' } as RequestInit);
}

describe('the body of a request', () => {
  it('is parsed, with defaults filled in', async () => {
    expect(await parseBody(schema, post('{"name":"a"}', 'application/json; charset=utf-8'))).toEqual({
      name: 'a',
      limit: 5,
    });
  });

  it.each([
    ['text/plain', 415],
    ['application/x-www-form-urlencoded', 415],
    ['application/jsonp', 415],
  ])('is refused as %s with %d', async (contentType, status) => {
    expect((await refusal(() => parseBody(schema, post('{"name":"a"}', contentType)))).status).toBe(status);
  });

  it('is refused without a content type', async () => {
    const bytes = new TextEncoder().encode('{"name":"a"}');
    const error = await refusal(() => parseBody(schema, post(bytes, null)));
    expect(error.status).toBe(415);
    expect(error.message).toContain('application/json');
  });

  it.each(['{', '', '{"name":"a",}', "{'name':'a'}"])(
    'is refused as malformed when it is no JSON: %j',
    async (body) => {
      expect((await refusal(() => parseBody(schema, post(body)))).status).toBe(400);
    },
  );

  it('is refused as malformed when it is not UTF-8', async () => {
    const latin1 = new Uint8Array([0x7b, 0x22, 0xe9, 0x22, 0x3a, 0x31, 0x7d]);
    const error = await refusal(() => parseBody(schema, post(latin1)));
    expect(error.status).toBe(400);
    expect(error.message).toContain('UTF-8');
  });

  it('may have exactly the limit and not a byte more', async () => {
    const padded = (length: number): string => `{"name":"a"}${' '.repeat(length - '{"name":"a"}'.length)}`;
    expect(await parseBody(schema, post(padded(bodyLimitBytes)))).toMatchObject({ name: 'a' });
    expect((await refusal(() => parseBody(schema, post(padded(bodyLimitBytes + 1))))).status).toBe(413);
  });

  it('is not read on past the limit when its length is not declared', async () => {
    let chunks = 0;
    const endless = new ReadableStream<Uint8Array>({
      pull: (controller) => {
        chunks += 1;
        controller.enqueue(new Uint8Array(16 * 1024).fill(0x20));
      },
    });
    expect((await refusal(() => parseBody(schema, post(endless)))).status).toBe(413);
    expect(chunks).toBeLessThan(10);
  });

  it('names each bad field with its value and what to give', async () => {
    const error = await refusal(() => parseBody(schema, post('{"limit":11,"nmae":"a"}')));
    expect(error.status).toBe(422);
    expect(error.fields).toEqual([
      { path: 'name', message: 'name is missing: give text.' },
      { path: 'limit', message: 'limit must be at most 10; it is 11.' },
      { path: 'nmae', message: 'nmae is not a field that exists here: check its spelling or leave it out.' },
    ]);
  });
});

describe('the query of a request', () => {
  it('takes an empty value as not given, as a form sends it', () => {
    expect(parseQuery(schema, new URL('http://h/?name=a&limit='))).toEqual({ name: 'a', limit: 5 });
  });

  it('does not read a blank as the number zero', () => {
    expect(parseQuery(schema, new URL('http://h/?name=a&limit=%20'))).toEqual({ name: 'a', limit: 5 });
  });

  it.each([
    ['?name=a&foo=1', 'foo'],
    ['?name=a&limit=abc', 'limit'],
    ['?name=a&limit=1.5', 'limit'],
    ['?name=a&name=b', 'name'],
    ['?limit=3', 'name'],
  ])('is refused by name: %s', async (query, path) => {
    const error = await refusal(() => parseQuery(schema, new URL(`http://h/${query}`)));
    expect(error.status).toBe(422);
    expect(error.fields.map((field) => field.path)).toEqual([path]);
  });
});
