import { AppError } from '#src/lib/errors.ts';

/** What PostgreSQL reports with an error: https://www.postgresql.org/docs/15/errcodes-appendix.html */
interface PostgresFields {
  readonly code: string;
  readonly constraint: string | undefined;
}

function postgresFields(error: unknown): PostgresFields | undefined {
  // Drizzle wraps the driver's error as its cause.
  for (let current = error; current instanceof Error; current = current.cause) {
    if ('code' in current && typeof current.code === 'string' && /^[0-9A-Z]{5}$/.test(current.code)) {
      const constraint = 'constraint' in current ? current.constraint : undefined;
      return { code: current.code, constraint: typeof constraint === 'string' ? constraint : undefined };
    }
  }
  return undefined;
}

/** Connection refused, lost or timed out; the server is starting or shutting down; too many connections. */
const unavailableCodes = new Set(['57P01', '57P02', '57P03', '53300', '08000', '08001', '08003', '08006']);
const unavailableSystemCodes = new Set(['ECONNREFUSED', 'ECONNRESET', 'ETIMEDOUT', 'ENOTFOUND', 'EPIPE']);

function isConnectionFailure(error: unknown): boolean {
  for (let current = error; current instanceof Error; current = current.cause) {
    if ('code' in current && typeof current.code === 'string' && unavailableSystemCodes.has(current.code))
      return true;
    if (current instanceof AggregateError && current.errors.some(isConnectionFailure)) return true;
    if (/timeout exceeded when trying to connect|Connection terminated/.test(current.message)) return true;
  }
  return false;
}

/**
 * Turns what the database refused into an error that a caller may read; anything else comes back unchanged.
 * The database's own words stay in the cause: they may quote values of rows the asker may not see.
 */
export function fromDatabaseError(error: unknown): unknown {
  if (error instanceof AppError) return error;
  const fields = postgresFields(error);
  if (fields === undefined) {
    return isConnectionFailure(error)
      ? new AppError('UNAVAILABLE', 'The database does not answer. Try again in a moment.', { cause: error })
      : error;
  }
  if (unavailableCodes.has(fields.code)) {
    return new AppError('UNAVAILABLE', 'The database does not answer. Try again in a moment.', {
      cause: error,
    });
  }
  switch (fields.code) {
    case '23505':
      return new AppError('CONFLICT', 'An entry with this name is there already. Choose another name.', {
        cause: error,
      });
    case '23503':
      return new AppError('CONFLICT', 'The entry refers to something that is no longer there.', {
        cause: error,
      });
    case '23514':
      return new AppError('UNPROCESSABLE', 'A value lies outside what is physically possible.', {
        cause: error,
      });
    case '40001':
    case '40P01':
      return new AppError('CONFLICT', 'Somebody changed the same entry at the same moment. Try again.', {
        cause: error,
      });
    default:
      return error;
  }
}
