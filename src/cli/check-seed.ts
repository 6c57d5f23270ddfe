import { runCommand } from '#src/cli/run-command.ts';
import { parseSeed } from '#src/db/seed/parse-seed.ts';
import { readSeedTexts } from '#src/db/seed/read-seed.ts';
import { findDoubts } from '#src/services/seed-plausibility.ts';

/** `npm run seed:check [-- FOLDER]`: reads the seed files without a database and says what is wrong or doubtful. */
await runCommand('The seed data cannot be loaded', async () => {
  const data = parseSeed(await readSeedTexts(process.argv[2] ?? 'seed-data'));
  const doubts = findDoubts(data).map(({ material, message }) => `  ${material}: ${message}`);
  return [
    `Every row can be read, and every reference leads somewhere. ${doubts.length} pairs of values do not fit each other well:`,
    ...doubts,
  ].join('\n');
});
