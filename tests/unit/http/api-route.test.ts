import { describe, expect, it } from 'vitest';
import { defineApiRoute } from '#src/http/api-route.ts';
import { publicJson } from '#src/http/respond.ts';
import { AppError } from '#src/lib/errors.ts';
import { fakeContext } from '#tests/unit/http/fake-context.ts';

const route = defineApiRoute({
  GET: ({ request }) => Promise.resolve(publicJson(request, { name: 'Silicon' })),
});

describe('an API route', () => {
  it('answers HEAD with the headers of GET and no body', async () => {
    const get = await route.GET(fakeContext('/'));
    const head = await route.HEAD(fakeContext('/', { method: 'HEAD' }));
    expect(head.body).toBeNull();
    expect(Object.fromEntries(head.headers)).toEqual(Object.fromEntries(get.headers));
  });

  it('answers OPTIONS with what it allows', async () => {
    const response = await route.OPTIONS(fakeContext('/', { method: 'OPTIONS' }));
    expect(response.status).toBe(204);
    expect(response.headers.get('allow')).toBe('GET, HEAD, OPTIONS');
  });

  it.each(['POST', 'PUT', 'PATCH', 'DELETE'])('refuses %s with 405 and Allow', async (method) => {
    const response = await route.ALL(fakeContext('/', { method }));
    expect(response.status).toBe(405);
    expect(response.headers.get('allow')).toBe('GET, HEAD, OPTIONS');
    expect(await response.json()).toMatchObject({ status: 405, code: 'METHOD_NOT_ALLOWED' });
  });

  it('answers an error with a problem document (RFC 9457) that carries the request id', async () => {
    const fields = [{ path: 'q', message: 'q is too long.' }];
    const failing = defineApiRoute({
      GET: () => Promise.reject(new AppError('INVALID_INPUT', 'q is too long.', { fields })),
    });
    const response = await failing.GET(fakeContext('/'));
    expect(response.headers.get('content-type')).toBe('application/problem+json');
    expect(await response.json()).toEqual({
      type: 'about:blank',
      title: 'Unprocessable Content',
      status: 422,
      detail: 'q is too long.',
      code: 'INVALID_INPUT',
      request_id: 'test-request',
      errors: fields,
    });
  });
});

describe('a public answer', () => {
  it('may be kept for a minute and carries a tag', async () => {
    const response = await route.GET(fakeContext('/'));
    expect(response.headers.get('cache-control')).toBe('public, max-age=60');
    expect(response.headers.get('etag')).toMatch(/^"[\w-]+"$/);
  });

  it('is not sent again to someone who has it (RFC 9110, 13.1.2)', async () => {
    const tag = (await route.GET(fakeContext('/'))).headers.get('etag') ?? '';
    for (const header of [tag, `W/${tag}`, `"other", ${tag}`, '*']) {
      const response = await route.GET(fakeContext('/', { headers: { 'if-none-match': header } }));
      expect(response.status, header).toBe(304);
      expect(response.body, header).toBeNull();
      expect(response.headers.get('etag'), header).toBe(tag);
    }
  });

  it('is sent to someone who has another version', async () => {
    const response = await route.GET(fakeContext('/', { headers: { 'if-none-match': '"other"' } }));
    expect(response.status).toBe(200);
  });
});
