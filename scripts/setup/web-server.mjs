import { join } from 'node:path';
import process from 'node:process';
import { setTimeout as sleep } from 'node:timers/promises';
import { SetupFailure, lastTellingLine } from './failure.mjs';
import { startBound, stopChild } from './processes.mjs';

/**
 * @typedef {object} WebServer
 * @property {Promise<string>} ended resolves with its last line should it end by itself
 */

/**
 * Starts the built server and waits until it says that it is well. Its log goes to the terminal.
 * @param {object} how
 * @param {string} how.projectFolder
 * @param {NodeJS.ProcessEnv} how.env with HOST, PORT and the addresses of the database
 * @param {string} how.healthUrl
 * @param {(stop: () => Promise<void>) => void} how.onStop
 * @returns {Promise<WebServer>}
 */
export async function startWebServer({ projectFolder, env, healthUrl, onStop }) {
  const child = startBound({
    parentDeathSignal: 'SIGTERM',
    command: process.execPath,
    args: [join(projectFolder, 'dist/server/entry.mjs')],
    cwd: projectFolder,
    env,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let recent = '';
  for (const stream of [child.stdout, child.stderr]) {
    stream?.on('data', (chunk) => {
      recent = (recent + chunk.toString()).slice(-4000);
      process.stdout.write(chunk);
    });
  }
  onStop(() => stopChild(child, 'SIGTERM', 10_000, 'SIGKILL'));
  /** @type {Promise<string>} */
  const ended = new Promise((resolve) => {
    child.once('error', (error) => resolve(error.message));
    child.once('close', () => resolve(lastTellingLine(recent)));
  });
  const outcome = await Promise.race([ended.then((line) => ({ line })), waitUntilHealthy(healthUrl)]);
  if (outcome === 'healthy') return { ended };
  if (outcome === 'silent') {
    throw new SetupFailure(
      `The server started but did not answer at ${healthUrl} within a minute; its log is above.`,
    );
  }
  throw new SetupFailure(`The server stopped while starting: ${outcome.line}`);
}

/**
 * @param {string} url
 * @returns {Promise<'healthy' | 'silent'>}
 */
async function waitUntilHealthy(url) {
  for (const deadline = Date.now() + 60_000; Date.now() < deadline; await sleep(100)) {
    const answer = await fetch(url, { signal: AbortSignal.timeout(5_000) }).catch(() => undefined);
    if (answer?.ok && (await answer.json()).status === 'ok') return 'healthy';
  }
  return 'silent';
}
