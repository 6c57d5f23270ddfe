import type { APIContext, MiddlewareHandler } from 'astro';
import type { ApiContext } from '#src/http/api-context.ts';
import { visitor } from '#src/auth/actor.ts';
import type { DatabaseHandle } from '#src/db/client.ts';
import { createLogger } from '#src/lib/logger.ts';

/** Lines of the log of one test, as objects. */
export interface LogLines {
  readonly lines: readonly Record<string, unknown>[];
}

const noDatabase: DatabaseHandle = { run: () => Promise.reject(new Error('This test has no database.')) };

/** A context as the middleware makes it, for a request to `path`. */
export function fakeContext(
  path: string,
  init: RequestInit & { duplex?: 'half' } = {},
): ApiContext & LogLines {
  const url = new URL(path, 'http://127.0.0.1:4321');
  const lines: Record<string, unknown>[] = [];
  const log = createLogger({
    level: 'info',
    destination: { write: (line: string) => lines.push(JSON.parse(line) as Record<string, unknown>) },
  });
  return {
    request: new Request(url, init),
    url,
    params: {},
    locals: { db: noDatabase, actor: visitor, requestId: 'test-request', log },
    lines,
  };
}

/** Runs one middleware step in front of `next`. */
export async function runStep(
  step: MiddlewareHandler,
  context: ApiContext,
  next: () => Promise<Response>,
  extra: { routePattern?: string } = {},
): Promise<Response> {
  // Steps use only these parts of Astro's context; building a whole one would need a running server.
  const response = await step({ ...context, isPrerendered: false, ...extra } as unknown as APIContext, next);
  if (!(response instanceof Response)) throw new Error('The step gave no response.');
  return response;
}
