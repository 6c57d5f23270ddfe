import { startCluster } from './cluster.mjs';
import { ensureDatabase, requireReachable } from './database.mjs';
import { SetupFailure } from './failure.mjs';
import { takeLock } from './lock.mjs';
import { makeDataFolder } from './data-folder.mjs';

/** @typedef {import('./configuration.mjs').Configuration} Configuration */
/** @typedef {import('./configuration.mjs').DatabaseUrls} DatabaseUrls */
/** @typedef {import('./session.mjs').Session} Session */

/**
 * @typedef {object} DatabaseSession
 * @property {DatabaseUrls} urls
 * @property {Promise<string>} ended resolves with PostgreSQL's last word should it end by itself
 */

/**
 * The database to work with: the one of DATABASE_URL, else a cluster of our own in the data folder, one process at
 * a time.
 * @param {{ configuration: Configuration, projectFolder: string, session: Session, address: string }} how
 * @returns {Promise<DatabaseSession>}
 */
export async function openDatabase({ configuration, projectFolder, session, address }) {
  const { databaseUrls, dataFolder } = configuration;
  if (databaseUrls !== undefined) {
    await requireReachable(databaseUrls);
    return { urls: databaseUrls, ended: new Promise(() => undefined) };
  }
  await makeDataFolder(dataFolder);
  const lock = await takeLock(dataFolder);
  if ('heldBy' in lock) {
    const where = lock.heldBy === '' ? '' : ` (${lock.heldBy})`;
    throw new SetupFailure(
      `Wanderlength is running from this folder already${where}; stop it first, or set WL_DATA_DIR and PORT for a second one.`,
    );
  }
  lock.describe(address);
  session.onStop(lock.release);
  const cluster = await startCluster({ dataFolder, onStop: session.onStop });
  const urls = await ensureDatabase({
    projectFolder,
    port: cluster.port,
    passwords: cluster.passwords,
    database: 'wanderlength',
  });
  return { urls, ended: cluster.ended };
}
