import { AppError } from '#src/lib/errors.ts';
import type { FieldError } from '#src/lib/errors.ts';

/** Problem documents (RFC 9457) for everything under /api that fails. */

/** Titles are the status phrases of RFC 9110; `about:blank` means just that (RFC 9457, 4.2.1). */
const statusPhrases: Readonly<Record<number, string>> = {
  400: 'Bad Request',
  401: 'Unauthorized',
  403: 'Forbidden',
  404: 'Not Found',
  405: 'Method Not Allowed',
  409: 'Conflict',
  413: 'Content Too Large',
  415: 'Unsupported Media Type',
  422: 'Unprocessable Content',
  429: 'Too Many Requests',
  500: 'Internal Server Error',
  503: 'Service Unavailable',
};

export const problemContentType = 'application/problem+json';

export interface ProblemDocument {
  readonly type: 'about:blank';
  readonly title: string;
  readonly status: number;
  readonly detail: string;
  readonly code: string;
  readonly request_id: string;
  readonly errors?: readonly FieldError[];
}

/** What the caller may know of an error. A defect becomes a generic sentence; its text stays in the log. */
export function toAppError(error: unknown): AppError {
  if (error instanceof AppError) return error;
  return new AppError(
    'INTERNAL',
    'Something went wrong on our side. Try again; if it happens again, report it with the request id.',
    { cause: error },
  );
}

/** A database that is away is back in seconds, or somebody is needed. */
const retryAfterSeconds = '30';

/** The answer to a request that failed; errors of ours (500 and up) are logged with their cause. */
export function problemResponse(error: unknown, locals: Pick<App.Locals, 'requestId' | 'log'>): Response {
  const { code, status, message, fields, headers, cause } = toAppError(error);
  if (status >= 500) locals.log.error({ err: cause ?? error }, 'request failed');
  const problem: ProblemDocument = {
    type: 'about:blank',
    title: statusPhrases[status] ?? 'Error',
    status,
    detail: message,
    code,
    request_id: locals.requestId,
    ...(fields.length > 0 ? { errors: fields } : {}),
  };
  return new Response(JSON.stringify(problem), {
    status,
    headers: {
      'content-type': problemContentType,
      'cache-control': 'no-store',
      ...(code === 'UNAVAILABLE' ? { 'retry-after': retryAfterSeconds } : {}),
      ...headers,
    },
  });
}
