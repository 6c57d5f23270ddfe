import { existsSync, readdirSync, realpathSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { SetupFailure } from './failure.mjs';
import { installDebianPackages } from './debian-packages.mjs';
import { findProgram, run } from './processes.mjs';

/**
 * @typedef {object} PostgresBinaries
 * @property {number} major for example 15
 * @property {string} folder holds initdb and postgres
 */

const debianFolder = '/usr/lib/postgresql';

/** @returns {Promise<PostgresBinaries[]>} newest first */
async function findAll() {
  const majors = existsSync(debianFolder)
    ? readdirSync(debianFolder).filter((name) => /^\d+$/.test(name))
    : [];
  const found = majors
    .map((name) => ({ major: Number(name), folder: join(debianFolder, name, 'bin') }))
    .filter(({ folder }) => existsSync(join(folder, 'postgres')) && existsSync(join(folder, 'initdb')))
    .sort((a, b) => b.major - a.major);
  if (found.length > 0) return found;

  const onPath = findProgram('postgres');
  if (onPath === undefined) return [];
  const folder = dirname(realpathSync(onPath));
  const { output } = await run(onPath, ['--version']);
  const major = Number(/PostgreSQL\)? (\d+)/.exec(output)?.[1]);
  return Number.isNaN(major) || !existsSync(join(folder, 'initdb')) ? [] : [{ major, folder }];
}

/**
 * The search by name needs the extension pg_trgm, which some systems package apart from the server.
 * @param {PostgresBinaries} binaries
 * @returns {boolean}
 */
function hasTrigrams({ major, folder }) {
  const candidates = [
    `/usr/share/postgresql/${major}/extension/pg_trgm.control`,
    join(folder, '../share/extension/pg_trgm.control'),
    join(folder, '../share/postgresql/extension/pg_trgm.control'),
  ];
  return candidates.some((path) => existsSync(path));
}

/**
 * The server programs to use; installs Debian's when there are none.
 * @param {number | undefined} major the version an existing cluster was made with; undefined: the newest
 * @returns {Promise<PostgresBinaries>}
 */
export async function ensurePostgresBinaries(major) {
  const before = await choose(major);
  if (before) return before;
  // An existing cluster of another version cannot be served by what Debian would install today.
  if (major !== undefined && (await findAll()).length > 0) {
    throw new SetupFailure(
      `The database was made with PostgreSQL ${major}, whose programs are no longer installed; install the package postgresql-${major}.`,
    );
  }
  await installDebianPackages(
    ['postgresql', 'postgresql-contrib'],
    'No PostgreSQL server with pg_trgm',
    'set DATABASE_URL to a database of your own',
  );
  const after = await choose(major);
  if (after) return after;
  throw new SetupFailure(
    'PostgreSQL was installed but no server with pg_trgm was found in /usr/lib/postgresql; install postgresql and postgresql-contrib by hand.',
  );
}

/**
 * @param {number | undefined} major
 * @returns {Promise<PostgresBinaries | undefined>}
 */
async function choose(major) {
  for (const binaries of await findAll()) {
    if ((major === undefined ? binaries.major >= 15 : binaries.major === major) && hasTrigrams(binaries)) {
      return binaries;
    }
  }
  return undefined;
}
