import { createHash } from 'node:crypto';
import { readFile, readdir, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { errorCode } from './failure.mjs';

/**
 * One hash over files and folders: names relative to the base and contents, not times or owners, so that a copy
 * of the project has the hash of the original. A path that does not exist counts as such.
 * @param {string} base
 * @param {readonly string[]} paths relative to the base
 * @param {readonly string[]} [facts] further text that counts
 * @returns {Promise<string>}
 */
export async function hashOf(base, paths, facts = []) {
  const hash = createHash('sha256');
  for (const fact of facts) hash.update(`${fact}\0`);
  for (const path of await listFiles(base, [...paths].sort())) {
    hash.update(`${path}\0`);
    hash.update(
      createHash('sha256')
        .update(await readFile(join(base, path)))
        .digest(),
    );
  }
  return hash.digest('hex');
}

/**
 * @param {string} base
 * @param {readonly string[]} paths
 * @returns {Promise<string[]>} files only, in an order that does not depend on the disk
 */
async function listFiles(base, paths) {
  /** @type {string[]} */
  const files = [];
  for (const path of paths) {
    const kind = await stat(join(base, path)).catch((error) => {
      if (errorCode(error) === 'ENOENT') return undefined;
      throw error;
    });
    if (kind?.isDirectory()) {
      const names = (await readdir(join(base, path))).sort();
      files.push(
        ...(await listFiles(
          base,
          names.map((name) => `${path}/${name}`),
        )),
      );
    } else if (kind) {
      files.push(path);
    }
  }
  return files;
}
