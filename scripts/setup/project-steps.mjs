import { existsSync } from 'node:fs';
import { mkdir, readFile, readdir, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import process from 'node:process';
import { databaseVariables } from './configuration.mjs';
import { readSeedStamp, writeSeedStamp } from './database.mjs';
import { SetupFailure, fileFailure, lastTellingLine, saysDiskFull, say } from './failure.mjs';
import { waitForLock } from './lock.mjs';
import { diskFull } from './npm-packages.mjs';
import { run } from './processes.mjs';
import { hashOf } from './stamps.mjs';

/** @typedef {import('./configuration.mjs').DatabaseUrls} DatabaseUrls */

/**
 * @param {DatabaseUrls} urls
 * @returns {Record<string, string>} the variables under which the server and the command line read them
 */
export function databaseEnvironment(urls) {
  return {
    [databaseVariables.wl_owner]: urls.wl_owner,
    [databaseVariables.wl_app]: urls.wl_app,
    [databaseVariables.wl_auth]: urls.wl_auth,
    [databaseVariables.wl_jobs]: urls.wl_jobs,
    [databaseVariables.wl_backup]: urls.wl_backup,
  };
}

/**
 * A program of the project's own packages, run with this very Node.js.
 * @param {string} projectFolder
 * @param {string} name
 * @returns {string}
 */
export function packageProgram(projectFolder, name) {
  return join(projectFolder, 'node_modules/.bin', name);
}

/**
 * @param {object} how
 * @param {string} how.projectFolder
 * @param {string} how.logFolder takes the whole output when the step fails
 * @param {string} how.what the step as the subject of a sentence
 * @param {readonly string[]} how.args for Node.js
 * @param {Record<string, string | undefined>} how.env added to the present environment
 * @returns {Promise<string>} the output
 */
async function runStep({ projectFolder, logFolder, what, args, env }) {
  const { code, output } = await run(process.execPath, args, {
    cwd: projectFolder,
    env: { ...process.env, ...env },
  });
  if (code === 0) return output;
  if (saysDiskFull(output)) throw diskFull(projectFolder);
  const logPath = join(logFolder, 'last-failure.log');
  const isKept = await mkdir(logFolder, { recursive: true })
    .then(() => writeFile(logPath, output, { mode: 0o600 }))
    .then(
      () => true,
      () => false,
    );
  throw new SetupFailure(
    `${what} failed: ${failureReason(output)}${isKept ? ` (everything it printed is in ${logPath})` : ''}`,
  );
}

/**
 * The line with the error when a program names one, else its last.
 * @param {string} output
 * @returns {string}
 */
function failureReason(output) {
  const named = output.split('\n').find((line) => /^\s*(\[?error\]?|[A-Z]\w*Error|error)\b[: ]/i.test(line));
  return lastTellingLine(named ?? output);
}

/**
 * Applies the migrations that the database has not seen.
 * @param {{ projectFolder: string, logFolder: string, urls: DatabaseUrls }} how
 */
export async function migrate({ projectFolder, logFolder, urls }) {
  await runStep({
    projectFolder,
    logFolder,
    what: 'Bringing the database up to date',
    args: [packageProgram(projectFolder, 'tsx'), 'src/cli/migrate.ts'],
    env: databaseEnvironment(urls),
  });
}

/**
 * Loads seed-data/ unless the database was last seeded from the same files.
 * @param {{ projectFolder: string, logFolder: string, urls: DatabaseUrls }} how
 */
export async function seedIfChanged({ projectFolder, logFolder, urls }) {
  const hash = await hashOf(projectFolder, ['seed-data']);
  if ((await readSeedStamp(urls.wl_owner)) === hash) return;
  say('Loading the data of seed-data/ …');
  await runStep({
    projectFolder,
    logFolder,
    what: 'Loading seed-data',
    args: [packageProgram(projectFolder, 'tsx'), 'src/cli/seed.ts'],
    env: databaseEnvironment(urls),
  });
  await writeSeedStamp(urls.wl_owner, hash);
}

/** Configuration that changes what a build gives. */
const buildConfiguration =
  /^((astro|tailwind|postcss|vite)\.config\.\w+|tsconfig\.json|package(-lock)?\.json)$/;
const buildStampName = '.wanderlength-build';

/**
 * Builds the site when its sources, its packages or PUBLIC_ORIGIN changed since the last whole build.
 * @param {object} how
 * @param {string} how.projectFolder
 * @param {string} how.logFolder
 * @param {string} how.outputFolder
 * @param {string | undefined} how.publicOrigin
 */
export async function buildIfStale({ projectFolder, logFolder, outputFolder, publicOrigin }) {
  const lock = await waitForLock(`build ${outputFolder}`);
  try {
    const topLevel = await readdir(projectFolder);
    const sources = ['src', 'public', ...topLevel.filter((name) => buildConfiguration.test(name))];
    const hash = await hashOf(projectFolder, sources, [publicOrigin ?? '']);
    const stampPath = join(outputFolder, buildStampName);
    const isCurrent =
      existsSync(join(outputFolder, 'server/entry.mjs')) &&
      (await readFile(stampPath, 'utf8').catch(() => '')) === hash;
    if (isCurrent) return;

    say('Building the pages (about half a minute) …');
    const startedMs = Date.now();
    await rm(stampPath, { force: true }).catch((error) => {
      throw fileFailure(error, outputFolder);
    });
    await runStep({
      projectFolder,
      logFolder,
      what: 'Building the pages',
      args: [packageProgram(projectFolder, 'astro'), 'build', '--outDir', outputFolder],
      env: { ASTRO_TELEMETRY_DISABLED: '1', NODE_ENV: 'production', PUBLIC_ORIGIN: publicOrigin },
    });
    await writeFile(stampPath, hash).catch((error) => {
      throw fileFailure(error, stampPath);
    });
    say(`Built in ${Math.round((Date.now() - startedMs) / 1000)} s`);
  } finally {
    await lock.release();
  }
}
