import { spawn, spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import process from 'node:process';
import { SetupFailure } from './failure.mjs';

/**
 * @typedef {object} RunOptions
 * @property {string} [cwd]
 * @property {NodeJS.ProcessEnv} [env]
 * @property {boolean} [show] pass the output through to the terminal as well
 */

/**
 * @typedef {object} RunResult
 * @property {number} code exit status; 128 + signal number is not used, a signal counts as 1
 * @property {string} output standard output and error in the order they came
 */

/** Programs being waited for, which must not outlive a Ctrl-C. */
const running = new Set();
let isInterrupted = false;

/** Once interrupted, nothing new is started while the rest is being stopped. */
function refuseWhenInterrupted() {
  if (isInterrupted) throw new SetupFailure('Interrupted.');
}

/**
 * Runs a program to its end.
 * @param {string} command
 * @param {readonly string[]} args
 * @param {RunOptions} [options]
 * @returns {Promise<RunResult>}
 */
export function run(command, args, { cwd, env, show = false } = {}) {
  return new Promise((resolve, reject) => {
    refuseWhenInterrupted();
    const child = spawn(command, args, {
      cwd,
      env: env ?? process.env,
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    running.add(child);
    let output = '';
    child.stdout.on('data', (chunk) => {
      output += chunk.toString();
      if (show) process.stdout.write(chunk);
    });
    child.stderr.on('data', (chunk) => {
      output += chunk.toString();
      if (show) process.stderr.write(chunk);
    });
    child.once('error', (error) => {
      running.delete(child);
      reject(error);
    });
    child.once('close', (code) => {
      running.delete(child);
      resolve({ code: code ?? 1, output });
    });
  });
}

/** Passes an interruption on to the programs that `run` is waiting for. */
export function interruptRunning() {
  isInterrupted = true;
  for (const child of running) child.kill('SIGTERM');
}

/**
 * @param {string} name
 * @returns {string | undefined} the program's path, looked up as the shell would
 */
export function findProgram(name) {
  const folders = (process.env.PATH ?? '').split(':').concat('/usr/sbin', '/sbin');
  return folders.map((folder) => `${folder}/${name}`).find((path) => existsSync(path));
}

/** @returns {boolean} */
export function isRoot() {
  return process.getuid?.() === 0;
}

/**
 * @typedef {object} Account
 * @property {number} uid
 * @property {number} gid
 */

/**
 * @param {string} name
 * @returns {Account | undefined}
 */
export function findAccount(name) {
  const answer = spawnSync('getent', ['passwd', name], { encoding: 'utf8' });
  const [, , uid, gid] = answer.status === 0 ? answer.stdout.split(':') : [];
  return uid === undefined || gid === undefined ? undefined : { uid: Number(uid), gid: Number(gid) };
}

/**
 * The command line that runs a program as another account; PostgreSQL refuses to run as root.
 * @param {Account | undefined} account undefined: as the present user
 * @param {string} command
 * @param {readonly string[]} args
 * @returns {[string, string[]]}
 */
export function asAccount(account, command, args) {
  if (account === undefined) return [command, [...args]];
  return [
    'setpriv',
    [`--reuid=${account.uid}`, `--regid=${account.gid}`, '--clear-groups', '--', command, ...args],
  ];
}

/**
 * Starts a program that is to end with this process, also when this process is killed outright: the kernel
 * then sends it the signal. It has a session of its own, so a Ctrl-C at the terminal reaches only us and we
 * stop things in order.
 * @param {object} how
 * @param {Account | undefined} [how.account]
 * @param {NodeJS.Signals} how.parentDeathSignal
 * @param {string} how.command
 * @param {readonly string[]} how.args
 * @param {string} how.cwd
 * @param {NodeJS.ProcessEnv} how.env
 * @param {import('node:child_process').StdioOptions} how.stdio
 * @returns {import('node:child_process').ChildProcess}
 */
export function startBound({ account, parentDeathSignal, command, args, cwd, env, stdio }) {
  const identity =
    account === undefined ? [] : [`--reuid=${account.uid}`, `--regid=${account.gid}`, '--clear-groups'];
  refuseWhenInterrupted();
  if (findProgram('setpriv') === undefined) {
    throw new SetupFailure('The program setpriv is missing; install the Debian package util-linux.');
  }
  return spawn(
    'setpriv',
    [`--pdeathsig=${parentDeathSignal.replace('SIG', '')}`, ...identity, '--', command, ...args],
    { cwd, env, stdio, detached: true },
  );
}

/**
 * Asks a child to stop and waits; a harder signal follows when it does not.
 * @param {import('node:child_process').ChildProcess} child
 * @param {NodeJS.Signals} signal
 * @param {number} patienceMs
 * @param {NodeJS.Signals} harderSignal
 * @returns {Promise<void>}
 */
export function stopChild(child, signal, patienceMs, harderSignal) {
  return new Promise((resolve) => {
    if (child.exitCode !== null || child.signalCode !== null) {
      resolve();
      return;
    }
    const timer = setTimeout(() => child.kill(harderSignal), patienceMs);
    child.once('exit', () => {
      clearTimeout(timer);
      resolve();
    });
    child.kill(signal);
  });
}

/**
 * This process's environment without the PG… variables, which would point PostgreSQL programs elsewhere.
 * @returns {NodeJS.ProcessEnv}
 */
export function environmentWithoutPostgres() {
  return Object.fromEntries(Object.entries(process.env).filter(([name]) => !/^PG[A-Z]/.test(name)));
}

/** Takes the PG… variables, meant for databases of the user's, out of this process: they would bend our addresses. */
export function forgetPostgresEnvironment() {
  for (const name of Object.keys(process.env)) if (/^PG[A-Z]/.test(name)) delete process.env[name];
}
