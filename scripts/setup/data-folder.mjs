import { randomBytes } from 'node:crypto';
import { existsSync } from 'node:fs';
import { mkdir, open, readFile, realpath, rename, rm, statfs, writeFile } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import process from 'node:process';
import { SetupFailure, errorCode, fileFailure } from './failure.mjs';

/**
 * Makes the folder for the database and its passwords, and proves that it can be written to.
 * @param {string} folder
 * @returns {Promise<string>} its real path: two ways to write it are one folder
 */
export async function makeDataFolder(folder) {
  const probe = join(folder, `.write-${process.pid}`);
  try {
    await mkdir(folder, { recursive: true });
    await writeFile(probe, 'x');
    await rm(probe);
    return await realpath(folder);
  } catch (error) {
    throw fileFailure(error, folder);
  }
}

/**
 * Refuses to go on with too little room, since PostgreSQL stops hard when the disk fills under it.
 * @param {string} folder exists
 * @param {number} neededMB
 */
export async function requireFreeSpace(folder, neededMB) {
  const { bavail, bsize } = await statfs(folder);
  const freeMB = Math.floor((bavail * bsize) / 1_000_000);
  if (freeMB >= neededMB) return;
  throw new SetupFailure(
    `The disk that holds ${folder} is full or nearly so: ${freeMB} MB are free and ${neededMB} MB are needed; free some space, or set WL_DATA_DIR to a folder on another disk.`,
  );
}

/**
 * Writes a file so that a crash leaves either the old or the new text, never a part.
 * @param {string} path
 * @param {string} text
 * @param {number} mode
 */
export async function writeWhole(path, text, mode) {
  const fresh = `${path}.new`;
  try {
    const file = await open(fresh, 'w', mode);
    try {
      await file.writeFile(text);
      await file.sync();
    } finally {
      await file.close();
    }
    await rename(fresh, path);
  } catch (error) {
    await rm(fresh, { force: true }).catch(() => undefined);
    throw fileFailure(error, path);
  }
}

/**
 * @param {string} path
 * @returns {Promise<string | undefined>} undefined when there is no such file
 */
export async function readIfThere(path) {
  try {
    return await readFile(path, 'utf8');
  } catch (error) {
    if (errorCode(error) === 'ENOENT') return undefined;
    if (errorCode(error) === 'EACCES') {
      throw new SetupFailure(
        `The file ${path} belongs to another user; start Wanderlength as that user, or set WL_DATA_DIR to another folder.`,
      );
    }
    throw fileFailure(error, path);
  }
}

/** @typedef {import('./configuration.mjs').DatabaseRole} DatabaseRole */
/** @typedef {Record<DatabaseRole | 'postgres', string>} Passwords */

/** @type {readonly (DatabaseRole | 'postgres')[]} */
const accounts = ['postgres', 'wl_owner', 'wl_app', 'wl_auth', 'wl_jobs', 'wl_backup'];

/**
 * @param {unknown} value
 * @returns {value is Passwords}
 */
function arePasswords(value) {
  if (typeof value !== 'object' || value === null) return false;
  const entries = new Map(Object.entries(value));
  return accounts.every((name) => typeof entries.get(name) === 'string');
}

/**
 * The passwords of the database's accounts: random, made once, readable by the owner of the file alone.
 * @param {string} folder
 * @param {boolean} clusterExists then lost passwords cannot simply be made anew
 * @returns {Promise<Passwords>}
 */
export async function keepPasswords(folder, clusterExists) {
  const path = join(folder, 'passwords.json');
  const text = await readIfThere(path);
  if (text !== undefined) {
    try {
      const kept = JSON.parse(text);
      if (arePasswords(kept)) return kept;
    } catch {
      // Told below: a damaged file is like one that lacks a password.
    }
    throw new SetupFailure(`The file ${path} is damaged; put it back from a backup of ${dirname(path)}.`);
  }
  if (clusterExists) {
    throw new SetupFailure(
      `The file ${path} is missing while the database it opens exists; put it back from a backup of ${dirname(path)}.`,
    );
  }
  const fresh = () => randomBytes(24).toString('base64url');
  const passwords = {
    postgres: fresh(),
    wl_owner: fresh(),
    wl_app: fresh(),
    wl_auth: fresh(),
    wl_jobs: fresh(),
    wl_backup: fresh(),
  };
  await writeWhole(path, `${JSON.stringify(passwords, null, 2)}\n`, 0o600);
  return passwords;
}

/**
 * @typedef {object} ClusterNote
 * @property {number} [port] where it listened last
 * @property {string} [elsewhere] the cluster's folder when it cannot lie in the data folder
 * @property {string} [dataFolder] the data folder's path when this was written
 */

const noteName = 'cluster.json';

/**
 * @param {string} dataFolder
 * @returns {Promise<ClusterNote>}
 */
export async function readClusterNote(dataFolder) {
  const text = await readIfThere(join(dataFolder, noteName));
  if (text === undefined) return {};
  try {
    const { port, elsewhere, dataFolder: noted } = JSON.parse(text);
    return {
      ...(Number.isInteger(port) ? { port } : {}),
      ...(typeof elsewhere === 'string' ? { elsewhere } : {}),
      ...(typeof noted === 'string' ? { dataFolder: noted } : {}),
    };
  } catch {
    throw new SetupFailure(`The file ${join(dataFolder, noteName)} is damaged; put it back from a backup.`);
  }
}

/**
 * @param {string} dataFolder
 * @param {ClusterNote} note
 */
export async function writeClusterNote(dataFolder, note) {
  await writeWhole(
    join(dataFolder, noteName),
    `${JSON.stringify({ ...note, dataFolder }, null, 2)}\n`,
    0o644,
  );
}

/**
 * Whether a note that names a cluster elsewhere was copied here from a folder that still uses that cluster;
 * after a move, in contrast, the old folder is gone and the cluster is this folder's.
 * @param {string} dataFolder
 * @param {ClusterNote} note
 * @returns {boolean}
 */
export function isCopiedNote(dataFolder, note) {
  return (
    note.dataFolder !== undefined &&
    note.dataFolder !== dataFolder &&
    existsSync(join(note.dataFolder, noteName))
  );
}
