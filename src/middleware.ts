import { sequence } from 'astro:middleware';
import type { MiddlewareHandler } from 'astro';
import { actorKey } from '#src/auth/actor.ts';
import { createDatabase } from '#src/db/client.ts';
import type { Database } from '#src/db/client.ts';
import { apiErrors } from '#src/http/api-errors.ts';
import { requestContext } from '#src/http/request-context.ts';
import { requireListedRoute } from '#src/http/route-access.ts';
import { sameOrigin } from '#src/http/same-origin.ts';
import { securityHeaders } from '#src/http/security-headers.ts';
import { serverEnvironment } from '#src/lib/env.ts';
import { createLogger } from '#src/lib/logger.ts';
import type { Logger } from '#src/lib/logger.ts';

/** Kept for the life of the process: the development server loads this module anew after each change. */
interface ProcessState {
  logger?: Logger;
  database?: Database;
}

const stateKey = Symbol.for('wanderlength.server');

function processState(): ProcessState {
  const holder = globalThis as unknown as Record<symbol, ProcessState | undefined>;
  return (holder[stateKey] ??= {});
}

function logger(): Logger {
  const state = processState();
  return (state.logger ??= createLogger({ level: serverEnvironment().logLevel }));
}

function database(): Database {
  const state = processState();
  return (state.database ??= createDatabase(serverEnvironment().databaseUrlApp, {
    onIdleError: (error) => {
      logger().warn({ err: error }, 'an idle connection to the database broke');
    },
  }));
}

const databaseHandle: MiddlewareHandler = ({ locals }, next) => {
  locals.db = database().forActor(actorKey(locals.actor));
  return next();
};

export const onRequest = sequence(
  requestContext(logger),
  securityHeaders,
  apiErrors,
  sameOrigin,
  databaseHandle,
  requireListedRoute,
);
