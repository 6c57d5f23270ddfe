import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import process from 'node:process';
import { SetupFailure, fileFailure, errorCode, lastTellingLine, say, saysDiskFull } from './failure.mjs';
import { run } from './processes.mjs';

/**
 * @typedef {object} LockedPackage
 * @property {string} [version]
 * @property {boolean} [dev]
 * @property {boolean} [optional]
 * @property {boolean} [devOptional]
 * @property {boolean} [peer]
 * @property {boolean} [inBundle]
 */

/**
 * Whether what npm noted as installed agrees with the lock file. npm writes its note
 * (node_modules/.package-lock.json) last, so an interrupted installation does not pass for a whole one.
 * @param {Record<string, LockedPackage>} locked
 * @param {Record<string, LockedPackage>} installed
 * @param {boolean} withDevelopment whether packages for development count too
 * @returns {boolean}
 */
export function agreesWithLock(locked, installed, withDevelopment) {
  return Object.entries(locked).every(([path, wanted]) => {
    const found = installed[path];
    if (path === '' || (found !== undefined && found.version === wanted.version)) return true;
    if (found !== undefined) return false;
    // Packages for other processors and systems are locked but never installed here.
    if (wanted.optional || wanted.devOptional || wanted.inBundle) return true;
    return wanted.dev === true && !withDevelopment;
  });
}

/**
 * Installs the npm packages unless the installed ones are those of package-lock.json.
 * @param {string} folder the project
 * @param {{ withDevelopment: boolean }} options
 */
export async function ensureNpmPackages(folder, { withDevelopment }) {
  const locked = await readPackages(join(folder, 'package-lock.json'));
  if (locked === undefined) {
    throw new SetupFailure(`The file package-lock.json is missing in ${folder}; clone the project again.`);
  }
  const installed = await readPackages(join(folder, 'node_modules/.package-lock.json'));
  if (installed && agreesWithLock(locked, installed, withDevelopment)) return;

  say('Installing npm packages (a minute or two) …');
  const [command, leading] = npmCommand();
  const { code, output } = await run(
    command,
    [...leading, 'ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'],
    { cwd: folder },
  ).catch((error) => {
    if (errorCode(error) === 'ENOENT') throw new SetupFailure('npm was not found; install it with Node.js.');
    throw error;
  });
  if (code === 0) return;
  if (saysDiskFull(output)) throw diskFull(folder);
  if (/EACCES|EPERM|EROFS/.test(output)) {
    throw new SetupFailure(
      `The npm packages cannot be installed: this user may not write to ${join(folder, 'node_modules')}; start as the owner of the folder.`,
    );
  }
  throw new SetupFailure(
    `The npm packages could not be installed: ${npmReason(output)}; check the network and start again.`,
  );
}

/**
 * @param {string} folder
 * @returns {SetupFailure}
 */
export function diskFull(folder) {
  return new SetupFailure(`The disk that holds ${folder} is full; free some space and start again.`);
}

/**
 * npm's first error line with words in it says what happened; its last names a log file.
 * @param {string} output
 * @returns {string}
 */
function npmReason(output) {
  const lines = output.split('\n').map((line) => line.replace(/^npm (ERR!|error)\s*/, '').trim());
  return lines.find((line) => /\s/.test(line) && !/^code /.test(line)) ?? lastTellingLine(output);
}

/** @returns {[string, string[]]} */
function npmCommand() {
  const running = process.env.npm_execpath;
  return running?.endsWith('.js') ? [process.execPath, [running]] : ['npm', []];
}

/**
 * @param {string} path
 * @returns {Promise<Record<string, LockedPackage> | undefined>}
 */
async function readPackages(path) {
  try {
    return JSON.parse(await readFile(path, 'utf8')).packages ?? {};
  } catch (error) {
    if (errorCode(error) === 'ENOENT') return undefined;
    if (error instanceof SyntaxError) return undefined;
    throw fileFailure(error, path);
  }
}
