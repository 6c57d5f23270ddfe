import { createServer } from 'node:net';
import { randomInt } from 'node:crypto';
import { SetupFailure, errorCode, errorMessage } from './failure.mjs';

/**
 * Tries to listen; resolves with the error, or null when the port is ours to take.
 * @param {string} host
 * @param {number} port
 * @returns {Promise<Error | null>}
 */
function tryToListen(host, port) {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', resolve);
    server.listen({ host, port, exclusive: true }, () => server.close(() => resolve(null)));
  });
}

/**
 * @param {number} port
 * @returns {Promise<boolean>} whether nothing on 127.0.0.1 uses the port
 */
export async function isLoopbackPortFree(port) {
  return (await tryToListen('127.0.0.1', port)) === null;
}

/**
 * A free port on 127.0.0.1 from below the range that the kernel hands out by itself (32768 and up), so that
 * a port kept in a file is seldom taken by a passing connection later.
 * @returns {Promise<number>}
 */
export async function chooseLoopbackPort() {
  for (let attempt = 0; attempt < 100; attempt += 1) {
    const port = randomInt(20_000, 32_000);
    if (await isLoopbackPortFree(port)) return port;
  }
  throw new SetupFailure('No free port was found between 20000 and 32000 on 127.0.0.1 for the database.');
}

/**
 * Refuses an address the web server could not listen on, before anything slow is done.
 * @param {string} host
 * @param {number} port
 */
export async function requireFreeAddress(host, port) {
  const error = await tryToListen(host, port);
  if (error === null) return;
  switch (errorCode(error)) {
    case 'EADDRINUSE':
      throw new SetupFailure(
        `Port ${port} on ${host} is in use by another program; stop that program or set PORT to another number.`,
      );
    case 'EACCES':
      throw new SetupFailure(
        `This user may not listen on port ${port}; set PORT to a number from 1024 to 65535.`,
      );
    case 'EADDRNOTAVAIL':
    case 'ENOTFOUND':
    case 'EAI_AGAIN':
      throw new SetupFailure(
        `HOST=${host} is not an address of this machine; use 127.0.0.1, or 0.0.0.0 for every network.`,
      );
    default:
      throw new SetupFailure(`Cannot listen on ${host}, port ${port}: ${errorMessage(error)}.`);
  }
}
