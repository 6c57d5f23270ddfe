import type { ApiContext, ApiHandler } from '#src/http/api-context.ts';
import { problemResponse } from '#src/http/problem.ts';
import { AppError } from '#src/lib/errors.ts';

type Method = 'GET' | 'POST';

export interface ApiRoute {
  readonly GET: ApiHandler;
  readonly HEAD: ApiHandler;
  readonly POST: ApiHandler;
  readonly OPTIONS: ApiHandler;
  /** Any other method: 405. A route exports this and the methods it has. */
  readonly ALL: ApiHandler;
}

function withProblems(handler: ApiHandler): ApiHandler {
  return async (context) => {
    try {
      return await handler(context);
    } catch (error) {
      return problemResponse(error, context.locals);
    }
  };
}

function withoutBody(handler: ApiHandler): ApiHandler {
  return async (context) => {
    const { status, headers } = await handler(context);
    return new Response(null, { status, headers });
  };
}

/**
 * The exports of an API route: its handlers with errors as problem documents, HEAD beside GET, OPTIONS, and 405 with
 * `Allow` for the rest.
 */
export function defineApiRoute(handlers: Partial<Record<Method, ApiHandler>>): ApiRoute {
  const { GET, POST } = handlers;
  const allow = [GET && 'GET, HEAD', POST && 'POST', 'OPTIONS'].filter(Boolean).join(', ');
  const refuse = withProblems(({ request }: ApiContext) => {
    const message = `${request.method} is not possible here: use ${allow}.`;
    return Promise.reject(new AppError('METHOD_NOT_ALLOWED', message, { headers: { allow } }));
  });
  const get = GET === undefined ? refuse : withProblems(GET);
  return {
    GET: get,
    HEAD: withoutBody(get),
    POST: POST === undefined ? refuse : withProblems(POST),
    OPTIONS: () => Promise.resolve(new Response(null, { status: 204, headers: { allow } })),
    ALL: refuse,
  };
}
