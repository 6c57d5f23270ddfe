import { createHash } from 'node:crypto';
import { connect, createServer } from 'node:net';
import { setTimeout as sleep } from 'node:timers/promises';
import { errorCode } from './failure.mjs';

/**
 * @typedef {object} Lock
 * @property {(note: string) => void} describe what a second comer is told
 * @property {() => Promise<void>} release
 */

/**
 * Takes a lock that vanishes with this process however it ends: a Linux abstract socket leaves no file behind.
 * @param {string} subject what is locked, usually the path of a folder
 * @returns {Promise<Lock | { heldBy: string }>} the lock, or the note of the process that holds it
 */
export async function takeLock(subject) {
  const name = `\0wanderlength-${createHash('sha256').update(subject).digest('hex').slice(0, 32)}`;
  let note = '';
  const server = createServer((socket) => {
    socket.on('error', () => socket.destroy());
    socket.end(note);
  });
  try {
    await new Promise((resolve, reject) => {
      server.once('error', reject);
      server.listen(name, () => resolve(undefined));
    });
  } catch (error) {
    if (errorCode(error) === 'EADDRINUSE') return { heldBy: await askHolder(name) };
    throw error;
  }
  server.unref();
  return {
    describe: (text) => {
      note = text;
    },
    release: () => new Promise((resolve) => server.close(() => resolve())),
  };
}

/**
 * Waits for the lock as long as another process holds it.
 * @param {string} subject
 * @returns {Promise<Lock>}
 */
export async function waitForLock(subject) {
  for (;;) {
    const lock = await takeLock(subject);
    if (!('heldBy' in lock)) return lock;
    await sleep(250);
  }
}

/**
 * @param {string} name
 * @returns {Promise<string>}
 */
function askHolder(name) {
  return new Promise((resolve) => {
    let answer = '';
    const socket = connect(name);
    socket.setTimeout(1000, () => socket.destroy());
    socket.on('data', (chunk) => {
      answer += chunk.toString();
    });
    socket.on('error', () => resolve(answer));
    socket.on('close', () => resolve(answer));
  });
}
