import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import pg from 'pg';
import { ownerEnvironment } from '#src/lib/env.ts';
import { runCommand } from '#src/cli/run-command.ts';

/** `npm run db:migrate`: brings the database of DATABASE_URL (the owner's) to the schema of this code. */
await runCommand('The database could not be migrated', async () => {
  const client = new pg.Client({
    connectionString: ownerEnvironment().databaseUrl,
    connectionTimeoutMillis: 10_000,
  });
  await client.connect();
  try {
    // Two processes that start at once must not both migrate. Any number will do, as long as it is ours alone.
    await client.query('select pg_advisory_lock(726519)');
    await migrate(drizzle(client), { migrationsFolder: 'drizzle' });
  } finally {
    await client.end();
  }
  return 'The database schema is up to date.';
});
