import { randomUUID } from 'node:crypto';
import type { MiddlewareHandler } from 'astro';
import { visitor } from '#src/auth/actor.ts';
import type { Logger } from '#src/lib/logger.ts';

/** Ids that callers may choose: enough for a UUID or a trace id, nothing that could forge a line of a log. */
const acceptableId = /^[A-Za-z0-9._-]{8,64}$/;

interface KnownRequest {
  readonly requestId: string;
  readonly startedAt: number;
}

/**
 * Astro runs the middleware again, with empty locals, to draw an error page for the same request: the id and the clock
 * stay with the request.
 */
const knownRequests = new WeakMap<Request, KnownRequest>();

function knowRequest(request: Request): KnownRequest {
  const known = knownRequests.get(request);
  if (known !== undefined) return known;
  const given = request.headers.get('x-request-id');
  const requestId = given !== null && acceptableId.test(given) ? given : randomUUID();
  const created = { requestId, startedAt: performance.now() };
  knownRequests.set(request, created);
  return created;
}

/**
 * First step: an id for the request (the caller's, where it has one), who is asking, a log that carries the id, and one
 * line when the answer stands. A thrown error is logged here and left to Astro, which draws the error page.
 */
export function requestContext(log: () => Logger): MiddlewareHandler {
  return async (context, next) => {
    const { requestId, startedAt } = knowRequest(context.request);
    const { locals, request, url } = context;
    locals.requestId = requestId;
    locals.log = log().child({ requestId });
    locals.actor = visitor;
    let response: Response;
    try {
      response = await next();
    } catch (error) {
      locals.log.error({ err: error, method: request.method, path: url.pathname }, 'page failed');
      throw error;
    }
    response.headers.set('x-request-id', requestId);
    locals.log.info(
      {
        method: request.method,
        path: url.pathname,
        status: response.status,
        ms: Math.round(performance.now() - startedAt),
      },
      'request',
    );
    return response;
  };
}
