import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { seedFileNames } from './files.ts';
import type { SeedTexts } from './parse-seed.ts';

/**
 * @param folder where the CSV files are, `seed-data` in the project
 * @throws Error naming a file that cannot be read
 */
export async function readSeedTexts(folder: string): Promise<SeedTexts> {
  const entries = await Promise.all(
    seedFileNames.map(async (name) => [name, await readFile(join(folder, name), 'utf8')] as const),
  );
  // Each name of the list was read just above; fromEntries cannot know that the list is complete.
  return Object.fromEntries(entries) as SeedTexts;
}
