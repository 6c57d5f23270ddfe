import { describe, expect, it } from 'vitest';
import { apiErrors } from '#src/http/api-errors.ts';
import { requestContext } from '#src/http/request-context.ts';
import { requireListedRoute } from '#src/http/route-access.ts';
import { sameOrigin } from '#src/http/same-origin.ts';
import { securityHeaders } from '#src/http/security-headers.ts';
import { AppError } from '#src/lib/errors.ts';
import { fakeContext, runStep } from '#tests/unit/http/fake-context.ts';

const ok = (body = 'fine', headers: Record<string, string> = {}): (() => Promise<Response>) => {
  return () => Promise.resolve(new Response(body, { headers }));
};

describe('the request id', () => {
  it('is made up for a request that has none, and stands on the answer', async () => {
    const context = fakeContext('/');
    const response = await runStep(
      requestContext(() => context.locals.log),
      context,
      ok(),
    );
    expect(response.headers.get('x-request-id')).toMatch(/^[0-9a-f-]{36}$/);
    expect(context.locals.requestId).toBe(response.headers.get('x-request-id'));
  });

  it("is the caller's where it has a harmless one", async () => {
    const context = fakeContext('/', { headers: { 'x-request-id': 'trace-0123.abc' } });
    const response = await runStep(
      requestContext(() => context.locals.log),
      context,
      ok(),
    );
    expect(response.headers.get('x-request-id')).toBe('trace-0123.abc');
  });

  it.each(['short', 'a'.repeat(65), 'has space in it', '{"level":"fatal"}'])(
    'is not taken over when it could muddle the log: %s',
    async (given) => {
      const context = fakeContext('/', { headers: { 'x-request-id': given } });
      const response = await runStep(
        requestContext(() => context.locals.log),
        context,
        ok(),
      );
      expect(response.headers.get('x-request-id')).not.toBe(given);
    },
  );

  it('stays the same when Astro runs the middleware again to draw an error page', async () => {
    const context = fakeContext('/');
    const step = requestContext(() => context.locals.log);
    const first = runStep(step, context, () => Promise.reject(new Error('page broke')));
    await expect(first).rejects.toThrow('page broke');
    const firstId = context.locals.requestId;
    const response = await runStep(step, context, ok());
    expect(response.headers.get('x-request-id')).toBe(firstId);
  });
});

describe('the access log', () => {
  it('has one line for a request: method, path, status, time and id, without the query', async () => {
    const context = fakeContext('/materials?q=secret');
    await runStep(
      requestContext(() => context.locals.log),
      context,
      ok(),
    );
    expect(context.lines).toHaveLength(1);
    expect(context.lines[0]).toMatchObject({
      method: 'GET',
      path: '/materials',
      status: 200,
      msg: 'request',
    });
    expect(context.lines[0]).toHaveProperty('ms');
    expect(context.lines[0]?.['requestId']).toBe(context.locals.requestId);
  });

  it('has the error of a page that broke', async () => {
    const context = fakeContext('/materials/si');
    const run = runStep(
      requestContext(() => context.locals.log),
      context,
      () => Promise.reject(new Error('page broke')),
    );
    await expect(run).rejects.toThrow('page broke');
    expect(context.lines[0]).toMatchObject({
      level: 'error',
      path: '/materials/si',
      err: { message: 'page broke' },
    });
  });
});

describe('the security headers', () => {
  it('forbid sniffing, framing and what pages do not need', async () => {
    const response = await runStep(
      securityHeaders,
      fakeContext('/'),
      ok('<html>', { 'content-type': 'text/html' }),
    );
    expect(response.headers.get('x-content-type-options')).toBe('nosniff');
    expect(response.headers.get('referrer-policy')).toBe('strict-origin-when-cross-origin');
    expect(response.headers.get('cross-origin-opener-policy')).toBe('same-origin');
    expect(response.headers.get('permissions-policy')).toContain('camera=()');
    expect(response.headers.get('content-security-policy')).toContain("frame-ancestors 'none'");
  });

  it("keep Astro's policy of a page word for word and add what it leaves open", async () => {
    const ofAstro = "script-src 'self' 'sha256-abc='; style-src 'self' 'sha256-def=';";
    const headers = { 'content-type': 'text/html', 'content-security-policy': ofAstro };
    const response = await runStep(securityHeaders, fakeContext('/'), ok('<html>', headers));
    const policy = response.headers.get('content-security-policy') ?? '';
    expect(policy).toContain("script-src 'self' 'sha256-abc='; style-src 'self' 'sha256-def=';");
    expect(policy).toContain("default-src 'self'");
    expect(policy).toContain("base-uri 'self'");
    expect(policy).toContain("object-src 'none'");
    expect(policy).not.toContain('unsafe');
    expect(policy.match(/script-src/g)).toHaveLength(1);
  });

  it('let an answer of the API load nothing at all', async () => {
    const response = await runStep(
      securityHeaders,
      fakeContext('/api/health'),
      ok('{}', { 'content-type': 'application/json' }),
    );
    expect(response.headers.get('content-security-policy')).toBe(
      "default-src 'none'; frame-ancestors 'none'",
    );
  });
});

describe('failures under /api', () => {
  it('answer an unknown path with a problem document, not with a page', async () => {
    const page = (): Promise<Response> =>
      Promise.resolve(new Response('<html>', { status: 404, headers: { 'content-type': 'text/html' } }));
    const response = await runStep(apiErrors, fakeContext('/api/v1/nope'), page);
    expect(response.status).toBe(404);
    expect(response.headers.get('content-type')).toBe('application/problem+json');
    expect(await response.json()).toMatchObject({
      status: 404,
      title: 'Not Found',
      request_id: 'test-request',
    });
  });

  it('answer an error of an earlier step with its own status', async () => {
    const refuse = (): Promise<Response> =>
      Promise.reject(new AppError('UNAVAILABLE', 'The database is away.'));
    const response = await runStep(apiErrors, fakeContext('/api/health'), refuse);
    expect(response.status).toBe(503);
    expect(response.headers.get('retry-after')).toMatch(/^\d+$/);
  });

  it('answer a defect generically and keep its words in the log', async () => {
    const context = fakeContext('/api/v1/materials');
    const response = await runStep(apiErrors, context, () =>
      Promise.reject(new Error('column "hush" does not exist')),
    );
    expect(response.status).toBe(500);
    expect(await response.text()).not.toContain('hush');
    expect(JSON.stringify(context.lines)).toContain('hush');
  });

  it('leave pages to Astro: their errors go on, their 404 stays a page', async () => {
    const run = runStep(apiErrors, fakeContext('/materials'), () => Promise.reject(new Error('page broke')));
    await expect(run).rejects.toThrow('page broke');
    const notFound = (): Promise<Response> => Promise.resolve(new Response('<html>', { status: 404 }));
    expect(await (await runStep(apiErrors, fakeContext('/apiary'), notFound)).text()).toBe('<html>');
  });
});

describe('forms of another site', () => {
  const form = { method: 'POST', body: 'a=b' };

  it.each([
    'application/x-www-form-urlencoded',
    'text/plain; charset=utf-8',
    'multipart/form-data; boundary=x',
  ])('are refused with %s', async (contentType) => {
    const context = fakeContext('/materials', {
      ...form,
      headers: { 'content-type': contentType, origin: 'https://evil.example' },
    });
    expect((await runStep(sameOrigin, context, ok())).status).toBe(403);
  });

  it('are refused without an origin or a content type', async () => {
    expect((await runStep(sameOrigin, fakeContext('/materials', { method: 'POST' }), ok())).status).toBe(403);
  });

  it('pass from our own pages', async () => {
    const headers = { 'content-type': 'application/x-www-form-urlencoded', origin: 'http://127.0.0.1:4321' };
    expect((await runStep(sameOrigin, fakeContext('/materials', { ...form, headers }), ok())).status).toBe(
      200,
    );
  });

  it('do not concern reading, or the JSON API, which takes no form', async () => {
    expect((await runStep(sameOrigin, fakeContext('/materials'), ok())).status).toBe(200);
    expect((await runStep(sameOrigin, fakeContext('/api/v1/estimates', form), ok())).status).toBe(200);
  });
});

describe('a route that is not listed', () => {
  it('is refused', async () => {
    const response = await runStep(requireListedRoute, fakeContext('/secret'), ok(), {
      routePattern: '/secret',
    });
    expect(response.status).toBe(404);
    expect(response.body).toBeNull();
  });

  it('does not stop a listed one', async () => {
    const response = await runStep(requireListedRoute, fakeContext('/materials/si'), ok(), {
      routePattern: '/materials/[slug]',
    });
    expect(response.status).toBe(200);
  });

  it.each(['constructor', 'toString', '__proto__'])(
    'is not let in by a name every object has: %s',
    async (routePattern) => {
      const response = await runStep(requireListedRoute, fakeContext('/'), ok(), { routePattern });
      expect(response.status).toBe(404);
    },
  );
});
