import process from 'node:process';
import { setTimeout as sleep } from 'node:timers/promises';
import { SetupFailure, lastTellingLine } from './failure.mjs';
import { startBound, stopChild } from './processes.mjs';

/**
 * @typedef {object} RunningServer
 * @property {string} origin where this machine reaches it
 * @property {Promise<string>} ended resolves with its last line when it ends
 * @property {() => string} output what it printed so far, at most the last 100 kB
 * @property {() => Promise<void>} stop
 */

/**
 * @param {string} host
 * @param {number} port
 * @returns {string} an address that a browser on this machine can open
 */
export function localOrigin(host, port) {
  const reachable = host === '0.0.0.0' || host === '::' ? '127.0.0.1' : host;
  return `http://${reachable.includes(':') ? `[${reachable}]` : reachable}:${port}`;
}

/**
 * Starts the web server as a child of its own and waits until GET /api/health says that all is well.
 * @param {object} how
 * @param {string} how.projectFolder
 * @param {readonly string[]} how.args for Node.js: the built server, or astro dev
 * @param {string} how.host
 * @param {number} how.port
 * @param {Record<string, string | undefined>} how.env added to the present environment
 * @param {boolean} how.show pass its output through
 * @param {(stop: () => Promise<void>) => void} how.onStop
 * @returns {Promise<RunningServer>}
 */
export async function startServer({ projectFolder, args, host, port, env, show, onStop }) {
  const child = startBound({
    parentDeathSignal: 'SIGTERM',
    command: process.execPath,
    args,
    cwd: projectFolder,
    env: { ...process.env, ...env, HOST: host, PORT: String(port) },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  /** @param {import('node:stream').Readable | null} from @param {NodeJS.WriteStream} to */
  const follow = (from, to) =>
    from?.on('data', (chunk) => {
      output = (output + chunk.toString()).slice(-100_000);
      if (show) to.write(chunk);
    });
  follow(child.stdout, process.stdout);
  follow(child.stderr, process.stderr);
  /** @type {Promise<string>} */
  const ended = new Promise((resolve) => {
    child.once('error', (error) => resolve(error.message));
    child.once('close', () => resolve(lastTellingLine(output)));
  });
  const stop = () => stopChild(child, 'SIGTERM', 10_000, 'SIGKILL');
  onStop(stop);

  const origin = localOrigin(host, port);
  const outcome = await Promise.race([ended.then((line) => ({ line })), waitForHealth(origin)]);
  if ('line' in outcome) {
    if (/EADDRINUSE/.test(output)) {
      throw new SetupFailure(
        `Port ${port} on ${host} is in use by another program; stop that program or set PORT to another number.`,
      );
    }
    throw new SetupFailure(`The server ended while starting; its last line was: ${outcome.line}`);
  }
  if (!outcome.isWell) {
    throw new SetupFailure(
      `The server does not become healthy: ${origin}/api/health answers ${outcome.answer}; its last line was: ${lastTellingLine(output)}`,
    );
  }
  return { origin, ended, output: () => output, stop };
}

/**
 * @param {string} origin
 * @returns {Promise<{ isWell: boolean, answer: string }>}
 */
async function waitForHealth(origin) {
  let answer = 'nothing';
  for (const deadline = Date.now() + 60_000; Date.now() < deadline; await sleep(100)) {
    try {
      const response = await fetch(`${origin}/api/health`, { signal: AbortSignal.timeout(10_000) });
      const text = await response.text();
      answer = `${response.status} ${text.slice(0, 200)}`;
      if (response.ok && JSON.parse(text).status === 'ok') return { isWell: true, answer };
    } catch {
      // Not listening yet, or the answer is not JSON: asked again until the deadline.
    }
  }
  return { isWell: false, answer };
}
