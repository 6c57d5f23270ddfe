import { join } from 'node:path';
import process from 'node:process';
import { loadEnvFile, projectFolder, readConfiguration } from './setup/configuration.mjs';
import { openDatabase } from './setup/database-session.mjs';
import { SetupFailure } from './setup/failure.mjs';
import { requireSupportedNode } from './setup/node-version.mjs';
import { ensureNpmPackages } from './setup/npm-packages.mjs';
import { requireFreeAddress } from './setup/ports.mjs';
import { environmentWith, migrateAndSeed } from './setup/prepare.mjs';
import { startBound, stopChild } from './setup/processes.mjs';
import { runSession } from './setup/session.mjs';

/** `npm run dev`: the database of `npm start`, with Astro's development server in front of it. */
await runSession(async (session) => {
  requireSupportedNode(process.versions.node);
  loadEnvFile(projectFolder);
  const configuration = readConfiguration(process.env, projectFolder);
  const { host, port } = configuration;
  await requireFreeAddress(host, port);
  await ensureNpmPackages(projectFolder, { withDevelopment: true });
  const database = await openDatabase({
    configuration,
    projectFolder,
    session,
    address: `http://${host}:${port}`,
  });
  await migrateAndSeed(projectFolder, database.urls);

  const child = startBound({
    parentDeathSignal: 'SIGTERM',
    command: process.execPath,
    args: [join(projectFolder, 'node_modules/astro/astro.js'), 'dev', '--host', host, '--port', String(port)],
    cwd: projectFolder,
    env: environmentWith(database.urls, {
      HOST: host,
      PORT: String(port),
      NODE_ENV: 'development',
      ASTRO_TELEMETRY_DISABLED: '1',
    }),
    stdio: 'inherit',
  });
  session.onStop(() => stopChild(child, 'SIGTERM', 10_000, 'SIGKILL'));
  const code = await new Promise((resolve) => {
    child.once('exit', (exitCode) => resolve(exitCode ?? 0));
  });
  if (code === 0 || session.isStopping()) return 0;
  throw new SetupFailure(`Astro's development server ended with ${code}; its output is above.`);
});
