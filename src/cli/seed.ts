import { runCommand } from '#src/cli/run-command.ts';
import { loadSeed } from '#src/db/seed/load-seed.ts';
import { parseSeed } from '#src/db/seed/parse-seed.ts';
import { readSeedTexts } from '#src/db/seed/read-seed.ts';
import { ownerEnvironment } from '#src/lib/env.ts';

/** `npm run db:seed [-- FOLDER]`: makes the published store what the files of seed-data/ say. */
await runCommand('The seed data could not be loaded, and nothing was changed', async () => {
  const { databaseUrl } = ownerEnvironment();
  const counts = await loadSeed(databaseUrl, parseSeed(await readSeedTexts(process.argv[2] ?? 'seed-data')));
  return `The store holds ${counts.materials} materials, ${counts.values} values, ${counts.series} measured series with ${counts.points} points, and ${counts.sources} sources.`;
});
