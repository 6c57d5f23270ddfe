import process from 'node:process';
import { loadEnvFile, projectFolder, readConfiguration } from './setup/configuration.mjs';
import { openDatabase } from './setup/database-session.mjs';
import { SetupFailure, say } from './setup/failure.mjs';
import { requireSupportedNode } from './setup/node-version.mjs';
import { ensureNpmPackages } from './setup/npm-packages.mjs';
import { requireFreeAddress } from './setup/ports.mjs';
import { buildWhenStale, environmentWith, migrateAndSeed } from './setup/prepare.mjs';
import { runSession } from './setup/session.mjs';
import { startWebServer } from './setup/web-server.mjs';

/**
 * `npm start`: from a bare clone to a running service. Nothing here needs an npm package until they are installed.
 * Order matters: what a person may have set wrongly is found before anything slow is done.
 */
await runSession(async (session) => {
  requireSupportedNode(process.versions.node);
  loadEnvFile(projectFolder);
  const configuration = readConfiguration(process.env, projectFolder);
  const { host, port, publicOrigin } = configuration;
  await requireFreeAddress(host, port);
  await ensureNpmPackages(projectFolder, { withDevelopment: true });

  const reachable = host === '0.0.0.0' || host === '::' ? '127.0.0.1' : host;
  const address = `http://${reachable.includes(':') ? `[${reachable}]` : reachable}:${port}`;
  const database = await openDatabase({ configuration, projectFolder, session, address });
  await migrateAndSeed(projectFolder, database.urls);
  await buildWhenStale(projectFolder, publicOrigin);

  const server = await startWebServer({
    projectFolder,
    env: environmentWith(database.urls, {
      HOST: host,
      PORT: String(port),
      PUBLIC_ORIGIN: publicOrigin ?? '',
      NODE_ENV: 'production',
    }),
    healthUrl: `${address}/api/health`,
    onStop: session.onStop,
  });
  say(`Wanderlength is ready: ${publicOrigin ?? address}`);

  const failure = await Promise.race([
    server.ended.then((line) => `The server stopped: ${line}`),
    database.ended.then((line) => `The database stopped: ${line}`),
  ]);
  if (session.isStopping()) return 0;
  throw new SetupFailure(failure);
});
