import process from 'node:process';
import { startCluster } from './cluster.mjs';
import { loadEnvFile, projectFolder, readConfiguration } from './configuration.mjs';
import { makeDataFolder } from './data-folder.mjs';
import { ensureDatabase, requireReachable } from './database.mjs';
import { SetupFailure } from './failure.mjs';
import { takeLock } from './lock.mjs';
import { ensureNpmPackages } from './npm-packages.mjs';
import { requireFreeAddress } from './ports.mjs';
import { forgetPostgresEnvironment } from './processes.mjs';
import { migrate, seedIfChanged } from './project-steps.mjs';

/** @typedef {import('./configuration.mjs').Configuration} Configuration */
/** @typedef {import('./configuration.mjs').DatabaseUrls} DatabaseUrls */

/**
 * @typedef {object} Prepared
 * @property {Configuration} configuration
 * @property {DatabaseUrls} urls of a migrated and seeded database
 * @property {Promise<never>} databaseLost rejects when our own PostgreSQL ends by itself
 * @property {(address: string) => void} announce tells a second start where this one serves
 */

/**
 * All that `npm start` and `npm run dev` share: settings, packages, database. What cannot work is refused before
 * anything slow is done.
 * @param {{ withDevelopment: boolean, onStop: import('./session.mjs').OnStop }} options
 * @returns {Promise<Prepared>}
 */
export async function prepare({ withDevelopment, onStop }) {
  loadEnvFile(projectFolder);
  const configuration = readConfiguration(process.env, projectFolder);
  const { host, port, databaseUrls } = configuration;
  const dataFolder = databaseUrls ? configuration.dataFolder : await makeDataFolder(configuration.dataFolder);

  const lock = await takeLock(`data ${dataFolder}`);
  if ('heldBy' in lock) {
    throw new SetupFailure(
      `Wanderlength already runs from this folder${lock.heldBy && ` (${lock.heldBy})`}; stop it first, or set WL_DATA_DIR and PORT for a second copy.`,
    );
  }
  lock.describe(`process ${process.pid}, still starting`);
  onStop(lock.release);

  await requireFreeAddress(host, port);
  await ensureNpmPackages(projectFolder, { withDevelopment });

  /** @type {Promise<never>} */
  let databaseLost = new Promise(() => undefined);
  let urls = databaseUrls;
  if (urls) {
    await requireReachable(urls);
  } else {
    forgetPostgresEnvironment();
    const cluster = await startCluster({ dataFolder, onStop });
    databaseLost = cluster.ended.then((line) => {
      throw new SetupFailure(`PostgreSQL ended unexpectedly: ${line}`);
    });
    // Stopping ends it as well; the failure counts only where it is awaited.
    databaseLost.catch(() => undefined);
    urls = await ensureDatabase({
      projectFolder,
      port: cluster.port,
      passwords: cluster.passwords,
      database: 'wanderlength',
    });
  }
  const step = { projectFolder, logFolder: dataFolder, urls };
  await Promise.race([migrate(step).then(() => seedIfChanged(step)), databaseLost]);
  return {
    configuration: { ...configuration, dataFolder },
    urls,
    databaseLost,
    announce: (address) => lock.describe(`process ${process.pid}, ${address}`),
  };
}
