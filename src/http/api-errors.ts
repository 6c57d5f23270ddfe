import type { MiddlewareHandler } from 'astro';
import { problemContentType, problemResponse } from '#src/http/problem.ts';
import { AppError } from '#src/lib/errors.ts';

function isApiPath(pathname: string): boolean {
  return pathname === '/api' || pathname.startsWith('/api/');
}

/** Under /api a failure is a problem document, also where no route is found or a step before the handler fails. */
export const apiErrors: MiddlewareHandler = async ({ locals, url }, next) => {
  if (!isApiPath(url.pathname)) return next();
  try {
    const response = await next();
    const isProblem = response.headers.get('content-type') === problemContentType;
    if (response.status !== 404 || isProblem) return response;
    const notFound = new AppError('NOT_FOUND', `There is nothing at ${url.pathname}: check the address.`);
    return problemResponse(notFound, locals);
  } catch (error) {
    return problemResponse(error, locals);
  }
};
