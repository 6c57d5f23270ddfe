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
    await requirePreparedDatabase(client);
    await migrate(drizzle(client), { migrationsFolder: 'drizzle' });
  } finally {
    await client.end();
  }
  return 'The database schema is up to date.';
});

/** What drizzle/roles.sql makes, which only a superuser may; without it the first migration would stop half-way with words about one table. */
async function requirePreparedDatabase(client: pg.Client): Promise<void> {
  const { rows } = await client.query<{ missing: string | null; user: string; has_trigrams: boolean }>(`
    select
      (select string_agg(wanted, ', ') from unnest(array['wl_owner', 'wl_app', 'wl_auth', 'wl_jobs', 'wl_backup']) wanted
        where not exists (select from pg_roles where rolname = wanted)) as missing,
      current_user as user,
      exists (select from pg_extension where extname = 'pg_trgm') as has_trigrams`);
  const [found] = rows;
  if (found === undefined) throw new Error('the database answered nothing.');
  const remedy =
    'Let a superuser run drizzle/roles.sql in this database first; running it again does no harm.';
  if (found.missing !== null) throw new Error(`the roles ${found.missing} do not exist. ${remedy}`);
  if (!found.has_trigrams) throw new Error(`the extension pg_trgm is not installed. ${remedy}`);
  if (found.user !== 'wl_owner') {
    throw new Error(
      `DATABASE_URL connects as ${found.user}, who would own the tables; give the address of wl_owner.`,
    );
  }
}
