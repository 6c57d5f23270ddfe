import { sql } from 'drizzle-orm';
import type { DatabaseHandle } from '#src/db/client.ts';
import { AppError } from '#src/lib/errors.ts';
import { version } from '#src/lib/version.ts';

export interface Health {
  readonly status: 'ok';
  readonly database: 'ok';
  readonly version: string;
}

/**
 * Whether requests can be served: the database answers.
 *
 * @throws AppError UNAVAILABLE while it does not.
 */
export async function checkHealth(db: DatabaseHandle): Promise<Health> {
  try {
    await db.run((tx) => tx.execute(sql`select 1`));
  } catch (error) {
    throw new AppError('UNAVAILABLE', 'The database cannot be reached at the moment.', { cause: error });
  }
  return { status: 'ok', database: 'ok', version };
}
