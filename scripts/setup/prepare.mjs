import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import process from 'node:process';
import { writeWhole } from './data-folder.mjs';
import { databaseVariables } from './configuration.mjs';
import { readSeedStamp, writeSeedStamp } from './database.mjs';
import { SetupFailure, errorCode, lastTellingLine, say, saysDiskFull } from './failure.mjs';
import { waitForLock } from './lock.mjs';
import { diskFull } from './npm-packages.mjs';
import { run } from './processes.mjs';
import { hashOf } from './stamps.mjs';

/** @typedef {import('./configuration.mjs').DatabaseUrls} DatabaseUrls */

/** What the built server is made from. A change of any of it builds again. */
const buildInputs = [
  'src',
  'public',
  'package-lock.json',
  'astro.config.mjs',
  'tailwind.config.mjs',
  'tsconfig.json',
];

/**
 * This process's environment with the five addresses of the database.
 * @param {DatabaseUrls} urls
 * @param {Record<string, string>} [further]
 * @returns {NodeJS.ProcessEnv}
 */
export function environmentWith(urls, further = {}) {
  return {
    ...process.env,
    [databaseVariables.wl_owner]: urls.wl_owner,
    [databaseVariables.wl_app]: urls.wl_app,
    [databaseVariables.wl_auth]: urls.wl_auth,
    [databaseVariables.wl_jobs]: urls.wl_jobs,
    [databaseVariables.wl_backup]: urls.wl_backup,
    ...further,
  };
}

/**
 * Runs a program of `src/cli`; its own last line is the reason when it fails.
 * @param {string} folder the project
 * @param {string} name for example `migrate`
 * @param {DatabaseUrls} urls
 */
async function runCli(folder, name, urls) {
  const { code, output } = await run(
    process.execPath,
    ['--import', 'tsx', join(folder, `src/cli/${name}.ts`)],
    { cwd: folder, env: environmentWith(urls) },
  );
  if (code === 0) return;
  if (saysDiskFull(output)) throw diskFull(folder);
  // A refusal may name many rows; all of them help.
  throw new SetupFailure(output.trim() || `src/cli/${name}.ts ended with ${code}`);
}

/**
 * Brings the database to the schema and the data of this clone: migrations each time, the seed data once and again
 * when the files change.
 * @param {string} folder the project
 * @param {DatabaseUrls} urls
 */
export async function migrateAndSeed(folder, urls) {
  await runCli(folder, 'migrate', urls);
  const hash = await hashOf(folder, ['seed-data']);
  if ((await readSeedStamp(urls.wl_owner)) === hash) return;
  say('Seeding the store …');
  await runCli(folder, 'seed', urls);
  await writeSeedStamp(urls.wl_owner, hash);
}

/**
 * Builds the server unless the built one was made from these very sources.
 * @param {string} folder the project
 * @param {string | undefined} publicOrigin part of the build: Astro fixes the accepted hosts there
 */
export async function buildWhenStale(folder, publicOrigin) {
  // Two starts from one folder (with two data folders) must not build into each other's files.
  const lock = await waitForLock(`build ${folder}`);
  try {
    const stamp = join(folder, 'dist/build-stamp');
    const hash = await hashOf(folder, buildInputs, [publicOrigin ?? '', process.version]);
    if ((await readStamp(stamp)) === hash) return;
    say('Building …');
    const { code, output } = await run(
      process.execPath,
      [join(folder, 'node_modules/astro/astro.js'), 'build'],
      {
        cwd: folder,
        env: {
          ...process.env,
          PUBLIC_ORIGIN: publicOrigin ?? '',
          ASTRO_TELEMETRY_DISABLED: '1',
          NODE_ENV: 'production',
        },
      },
    );
    if (code !== 0) {
      if (saysDiskFull(output)) throw diskFull(folder);
      process.stderr.write(output);
      throw new SetupFailure(`The build failed: ${lastTellingLine(output)}.`);
    }
    await writeWhole(stamp, hash, 0o644);
  } finally {
    await lock.release();
  }
}

/**
 * @param {string} path
 * @returns {Promise<string | undefined>}
 */
async function readStamp(path) {
  try {
    return await readFile(path, 'utf8');
  } catch (error) {
    if (errorCode(error) === 'ENOENT') return undefined;
    throw error;
  }
}
