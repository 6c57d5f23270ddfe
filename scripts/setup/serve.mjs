import { join } from 'node:path';
import { projectFolder } from './configuration.mjs';
import { SetupFailure, say } from './failure.mjs';
import { requireFreeAddress } from './ports.mjs';
import { prepare } from './prepare.mjs';
import { buildIfStale, databaseEnvironment, packageProgram } from './project-steps.mjs';
import { startServer } from './server.mjs';
import { runSession } from './session.mjs';

/**
 * Prepares everything and serves until interrupted.
 * @param {'built' | 'development'} mode
 */
export async function serve(mode) {
  const isBuilt = mode === 'built';
  await runSession(async (onStop, markReady) => {
    const { configuration, urls, databaseLost, announce } = await prepare({
      withDevelopment: !isBuilt,
      onStop,
    });
    const { host, port, publicOrigin, dataFolder } = configuration;
    const outputFolder = join(projectFolder, 'dist');
    if (isBuilt) {
      const build = buildIfStale({ projectFolder, logFolder: dataFolder, outputFolder, publicOrigin });
      await Promise.race([build, databaseLost]);
    }
    await requireFreeAddress(host, port);
    const astroArgs = [packageProgram(projectFolder, 'astro'), 'dev', '--host', host, '--port', String(port)];
    const server = await startServer({
      projectFolder,
      args: isBuilt ? [join(outputFolder, 'server/entry.mjs')] : astroArgs,
      host,
      port,
      env: {
        ...databaseEnvironment(urls),
        ASTRO_TELEMETRY_DISABLED: '1',
        ...(isBuilt ? { NODE_ENV: 'production' } : {}),
      },
      show: true,
      onStop,
    });
    markReady();
    announce(server.origin);
    say(
      `Wanderlength is ready at ${server.origin}${publicOrigin ? `, for the world at ${publicOrigin}` : ''}`,
    );
    const line = await Promise.race([server.ended, databaseLost]);
    throw new SetupFailure(`The server ended by itself; its last line was: ${line}`);
  });
}
