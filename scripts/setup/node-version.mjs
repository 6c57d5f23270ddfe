import { SetupFailure } from './failure.mjs';

/**
 * Refuses a Node.js that the packages do not support: 20.20 or a newer even (long-term) release.
 * @param {string} version for example '20.20.2'
 */
export function requireSupportedNode(version) {
  const [major = 0, minor = 0] = version.split('.').map(Number);
  if (major === 20 ? minor >= 20 : major > 20 && major % 2 === 0) return;
  throw new SetupFailure(
    `Wanderlength needs Node.js 20.20 or newer of an even release (20, 22, 24), but this is ${version}; install Node.js 20 and start again.`,
  );
}
