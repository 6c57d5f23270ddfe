-- The roles of Wanderlength and what they may do in the database this is run in. A superuser runs it once in an
-- empty database; running it again changes nothing. `npm start` does so for the database it makes by itself.
--
-- With a PostgreSQL server of your own (15 or newer, UTF-8):
--   createdb --encoding=UTF8 --template=template0 wanderlength
--   psql --dbname=wanderlength --file=drizzle/roles.sql
--   psql --dbname=wanderlength --command='\password wl_owner'     (and so on for the five roles)
-- then set DATABASE_URL (wl_owner), DATABASE_URL_APP, DATABASE_URL_AUTH, DATABASE_URL_JOBS and
-- DATABASE_URL_BACKUP. Passwords are not in this file on purpose.
--
-- wl_owner   owns the database and its tables; migrates and seeds
-- wl_app     serves requests; row-level security always applies to it
-- wl_auth    reads and writes accounts and sessions only
-- wl_jobs    runs work in the background
-- wl_backup  reads everything, past row-level security, and writes nothing

DO $roles$
DECLARE
  wanted text;
BEGIN
  FOREACH wanted IN ARRAY ARRAY['wl_owner', 'wl_app', 'wl_auth', 'wl_jobs', 'wl_backup'] LOOP
    IF NOT EXISTS (SELECT FROM pg_roles WHERE rolname = wanted) THEN
      BEGIN
        EXECUTE format('CREATE ROLE %I', wanted);
      EXCEPTION WHEN duplicate_object OR unique_violation THEN
        NULL; -- made by another session in the meantime
      END;
    END IF;
  END LOOP;
END
$roles$;

ALTER ROLE wl_owner LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOREPLICATION NOBYPASSRLS;
ALTER ROLE wl_app LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOREPLICATION NOBYPASSRLS;
ALTER ROLE wl_auth LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOREPLICATION NOBYPASSRLS;
ALTER ROLE wl_jobs LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOREPLICATION NOBYPASSRLS;
ALTER ROLE wl_backup LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOREPLICATION BYPASSRLS;
ALTER ROLE wl_backup SET default_transaction_read_only = on;
GRANT pg_read_all_data TO wl_backup;

-- Nobody but the five roles connects, and only the owner makes schemas and tables.
DO $database$
BEGIN
  EXECUTE format('ALTER DATABASE %I OWNER TO wl_owner', current_database());
  EXECUTE format('REVOKE ALL ON DATABASE %I FROM PUBLIC', current_database());
  EXECUTE format('GRANT CONNECT ON DATABASE %I TO wl_app, wl_auth, wl_jobs, wl_backup', current_database());
END
$database$;

ALTER SCHEMA public OWNER TO wl_owner;
REVOKE ALL ON SCHEMA public FROM PUBLIC;
GRANT USAGE ON SCHEMA public TO wl_app, wl_auth, wl_jobs, wl_backup;

-- Search by misspelled name.
CREATE EXTENSION IF NOT EXISTS pg_trgm SCHEMA public;
