import process from 'node:process';
import { SetupFailure, lastTellingLine, say, saysDiskFull } from './failure.mjs';
import { findProgram, isRoot, run } from './processes.mjs';

/**
 * Installs Debian packages as root or with a sudo that asks no password.
 * @param {readonly string[]} packages
 * @param {string} what what is missing, as the subject of a sentence: "No PostgreSQL server"
 * @param {string} otherRemedy what else would help, '' when nothing
 */
export async function installDebianPackages(packages, what, otherRemedy) {
  const names = packages.join(' ');
  const byHand = `sudo apt-get install ${names}`;
  const remedy = otherRemedy === '' ? `run "${byHand}"` : `run "${byHand}", or ${otherRemedy}`;
  if (findProgram('apt-get') === undefined) {
    throw new SetupFailure(
      `${what} was found and this is not Debian; install ${names}${otherRemedy && `, or ${otherRemedy}`}.`,
    );
  }
  const prefix = isRoot() ? [] : ['sudo', '-n'];
  if (!isRoot() && !(await hasPasswordlessSudo())) {
    throw new SetupFailure(`${what} was found and this user may not install it; ${remedy}, and start again.`);
  }
  say(`Installing ${names} from Debian …`);
  // A package list that could not be refreshed may still do, so only the installation decides.
  for (const step of [['update'], ['install', '--yes', '--no-install-recommends', ...packages]]) {
    const [command = 'env', ...args] = [
      ...prefix,
      'env',
      'DEBIAN_FRONTEND=noninteractive',
      'apt-get',
      '--quiet',
      '--option=DPkg::Lock::Timeout=180',
      ...step,
    ];
    const { code, output } = await run(command, args, { cwd: '/', env: process.env });
    if (code === 0 || step[0] === 'update') continue;
    if (saysDiskFull(output))
      throw new SetupFailure(`The disk is full: Debian's ${names} did not fit; free some space.`);
    throw new SetupFailure(
      `${what} was found and apt-get could not install ${names} (${lastTellingLine(output)}); ${remedy}.`,
    );
  }
}

/** @returns {Promise<boolean>} */
async function hasPasswordlessSudo() {
  if (findProgram('sudo') === undefined) return false;
  const { code } = await run('sudo', ['-n', 'true']);
  return code === 0;
}
