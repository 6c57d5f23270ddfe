import { createHash } from 'node:crypto';
import { spawnSync } from 'node:child_process';
import { closeSync, existsSync, openSync, readFileSync, statSync, truncateSync } from 'node:fs';
import { chown, mkdir, rename, rm, writeFile } from 'node:fs/promises';
import { basename, dirname, join } from 'node:path';
import process from 'node:process';
import { setTimeout as sleep } from 'node:timers/promises';
import {
  isCopiedNote,
  keepPasswords,
  readClusterNote,
  readIfThere,
  requireFreeSpace,
  writeClusterNote,
} from './data-folder.mjs';
import {
  SetupFailure,
  errorCode,
  errorMessage,
  fileFailure,
  lastTellingLine,
  saysDiskFull,
  say,
} from './failure.mjs';
import { chooseLoopbackPort, isLoopbackPortFree } from './ports.mjs';
import { ensurePostgresBinaries } from './postgres-binaries.mjs';
import {
  asAccount,
  environmentWithoutPostgres,
  findAccount,
  isRoot,
  run,
  startBound,
  stopChild,
} from './processes.mjs';

/** @typedef {import('./processes.mjs').Account} Account */
/** @typedef {import('./data-folder.mjs').Passwords} Passwords */

/**
 * @typedef {object} Cluster
 * @property {number} major PostgreSQL's version
 * @property {number} port on 127.0.0.1
 * @property {Passwords} passwords
 * @property {Promise<string>} ended resolves with the last log line when the server ends
 */

/**
 * @typedef {object} Place
 * @property {string} folder holds `pgdata` and `postgres.log`
 * @property {Account | undefined} account who runs the server; undefined: the present user
 */

/** A new cluster takes 40 MB, its first log segments and the seeded tables the rest. */
const newClusterMB = 250;
const oldClusterMB = 50;
const largestLogBytes = 5_000_000;

/**
 * Starts the project's own PostgreSQL, made on the first call, reachable on 127.0.0.1 only. Debian's cluster
 * `main` is never touched.
 * @param {object} how
 * @param {string} how.dataFolder its real path, as makeDataFolder gives it
 * @param {boolean} [how.durable] false: a throw-away cluster that need not survive a power cut
 * @param {(stop: () => Promise<void>) => void} how.onStop told how to stop it as soon as it runs
 * @returns {Promise<Cluster>}
 */
export async function startCluster({ dataFolder, durable = true, onStop }) {
  const note = await readClusterNote(dataFolder);
  const known = knownFolder(dataFolder, note);
  const pgdata = known && join(known, 'pgdata');
  const version = pgdata && (await readVersion(pgdata));
  const passwords = await keepPasswords(dataFolder, version !== undefined);
  const binaries = await ensurePostgresBinaries(version);
  const place =
    version === undefined || known === undefined ? await choosePlace(dataFolder) : existingPlace(known);

  if (version === undefined) {
    await requireFreeSpace(place.folder, newClusterMB);
    await setAside(place);
    await initialise({ place, binaries, password: passwords.postgres, durable });
  } else {
    await requireFreeSpace(place.folder, oldClusterMB);
    await recover(place);
  }

  const elsewhere = dirname(place.folder) === dataFolder ? {} : { elsewhere: place.folder };
  for (let attempt = 1; ; attempt += 1) {
    const kept = attempt === 1 && note.port !== undefined && (await isLoopbackPortFree(note.port));
    const port = kept && note.port !== undefined ? note.port : await chooseLoopbackPort();
    const started = await launch({ place, binaries, port, password: passwords.postgres, durable, onStop });
    if (started.kind === 'ready') {
      await writeClusterNote(dataFolder, { port, ...elsewhere });
      say(`PostgreSQL ${binaries.major} ready on 127.0.0.1:${port}`);
      return { major: binaries.major, port, passwords, ended: started.ended };
    }
    if (started.kind === 'failed' || attempt === 5) throw started.failure;
  }
}

/**
 * @param {string} dataFolder
 * @param {import('./data-folder.mjs').ClusterNote} note
 * @returns {string | undefined} where an earlier start put the cluster
 */
function knownFolder(dataFolder, note) {
  if (note.elsewhere === undefined) return join(dataFolder, 'postgres');
  return isCopiedNote(dataFolder, note) ? undefined : note.elsewhere;
}

/**
 * @param {string} pgdata
 * @returns {Promise<number | undefined>} undefined when there is no cluster
 */
async function readVersion(pgdata) {
  const text = await readIfThere(join(pgdata, 'PG_VERSION'));
  return text === undefined ? undefined : Number.parseInt(text, 10);
}

/**
 * PostgreSQL must run as the account that owns its files, also when root starts what a user once made.
 * @param {string} folder
 * @returns {Place}
 */
function existingPlace(folder) {
  const { uid, gid } = statSync(join(folder, 'pgdata'));
  if (isRoot()) return { folder, account: { uid, gid } };
  if (uid === process.getuid?.()) return { folder, account: undefined };
  throw new SetupFailure(
    `The database in ${folder} belongs to another user; start Wanderlength as that user, or set WL_DATA_DIR to another folder.`,
  );
}

/**
 * @param {string} dataFolder
 * @returns {Promise<Place>}
 */
async function choosePlace(dataFolder) {
  const inside = join(dataFolder, 'postgres');
  if (!isRoot()) {
    await makePrivate(inside, undefined);
    return { folder: inside, account: undefined };
  }
  const account = findAccount('postgres');
  if (account === undefined) {
    throw new SetupFailure(
      'PostgreSQL refuses to run as root and this machine has no user named postgres; start Wanderlength as an ordinary user.',
    );
  }
  if ((await makePrivate(inside, account)) && canWrite(inside, account)) return { folder: inside, account };
  await rm(inside, { recursive: true, force: true });

  // The user postgres cannot reach the data folder, for example below /root: a system folder takes the cluster.
  const hash = createHash('sha256').update(dataFolder).digest('hex').slice(0, 16);
  const outside = join('/var/lib/wanderlength', hash);
  try {
    await mkdir(dirname(outside), { recursive: true, mode: 0o755 });
  } catch (error) {
    throw fileFailure(error, dirname(outside));
  }
  if (!(await makePrivate(outside, account)) || !canWrite(outside, account)) {
    throw new SetupFailure(
      `The user postgres cannot write to ${inside} nor to ${outside}; set WL_DATA_DIR to a folder that user postgres can reach.`,
    );
  }
  say(`The database goes to ${outside}, since user postgres cannot enter ${dataFolder}`);
  return { folder: outside, account };
}

/**
 * @param {string} folder
 * @param {Account | undefined} account who is to own it
 * @returns {Promise<boolean>} false when the file system does not let it have that owner
 */
async function makePrivate(folder, account) {
  try {
    await mkdir(folder, { recursive: true, mode: 0o700 });
  } catch (error) {
    throw fileFailure(error, folder);
  }
  if (account === undefined) return true;
  return chown(folder, account.uid, account.gid).then(
    () => true,
    () => false,
  );
}

/**
 * @param {string} folder
 * @param {Account} account
 * @returns {boolean}
 */
function canWrite(folder, account) {
  const [command, args] = asAccount(account, 'test', ['-w', folder]);
  return spawnSync(command, args, { cwd: '/' }).status === 0;
}

/**
 * @typedef {import('./postgres-binaries.mjs').PostgresBinaries} PostgresBinaries
 */

/**
 * @param {{ place: Place, binaries: PostgresBinaries, password: string, durable: boolean }} how
 */
async function initialise({ place: { folder, account }, binaries, password, durable }) {
  const unfinished = join(folder, 'pgdata.new');
  const passwordFile = join(folder, 'password.new');
  try {
    await rm(unfinished, { recursive: true, force: true });
    await writeFile(passwordFile, password, { mode: 0o600 });
    if (account) await chown(passwordFile, account.uid, account.gid);
    const [command, args] = asAccount(account, join(binaries.folder, 'initdb'), [
      `--pgdata=${unfinished}`,
      '--username=postgres',
      `--pwfile=${passwordFile}`,
      '--auth=scram-sha-256',
      '--encoding=UTF8',
      '--locale=C.UTF-8',
      '--data-checksums',
      ...(durable ? [] : ['--no-sync']),
    ]);
    const { code, output } = await run(command, args, { cwd: folder, env: environmentWithoutPostgres() });
    if (code !== 0) {
      if (saysDiskFull(output)) throw fullDisk(folder);
      throw new SetupFailure(`The database could not be made in ${folder}: ${initdbReason(output)}.`);
    }
    // Only a whole cluster gets the name that later starts look for.
    await rename(unfinished, join(folder, 'pgdata'));
  } catch (error) {
    throw errorCode(error) === '' ? error : fileFailure(error, folder);
  } finally {
    await rm(passwordFile, { force: true });
  }
}

/**
 * A cluster outside the data folder outlives a data folder that was deleted. It is kept under another name, since
 * its passwords are gone but its contents may still be wanted.
 * @param {Place} place
 */
async function setAside(place) {
  const pgdata = join(place.folder, 'pgdata');
  if (!existsSync(pgdata)) return;
  await recover(place);
  const kept = `${pgdata}.${Date.now()}`;
  await rename(pgdata, kept);
  say(`A database without its passwords was found and put aside as ${kept}`);
}

/**
 * @param {string} folder
 * @returns {SetupFailure}
 */
function fullDisk(folder) {
  return new SetupFailure(
    `The disk that holds ${folder} is full; free some space, or set WL_DATA_DIR to a folder on another disk.`,
  );
}

/**
 * @param {string} output
 * @returns {string}
 */
function initdbReason(output) {
  const lines = output.split('\n').map((line) => line.trim());
  const error = lines.find((line) => /\b(error|fatal|could not)\b/i.test(line));
  return error?.replace(/^initdb: (error: )?/, '') ?? lastTellingLine(output);
}

/**
 * Clears up after a start that was killed: stops a server still running on these files and takes away a pid file
 * whose number now belongs to some other program.
 * @param {Place} place
 */
async function recover(place) {
  const pgdata = join(place.folder, 'pgdata');
  const pidFile = join(pgdata, 'postmaster.pid');
  if (!existsSync(pidFile)) return;
  const noted = Number.parseInt(readFileSync(pidFile, 'utf8'), 10);
  if (processesIn(pgdata, place.account).length > 0) {
    say('Stopping the database that an interrupted start left running …');
    // Orphaned workers end by themselves once they notice that the main process is gone.
    for (let waitedMs = 0; waitedMs < 60_000; waitedMs += 200) {
      const pids = processesIn(pgdata, place.account);
      if (pids.length === 0) break;
      if (waitedMs % 20_000 === 0 && pids.includes(noted))
        process.kill(noted, waitedMs < 40_000 ? 'SIGINT' : 'SIGQUIT');
      await sleep(200);
    }
    if (processesIn(pgdata, place.account).length > 0) {
      throw new SetupFailure(
        `PostgreSQL processes of an earlier start still run in ${pgdata} and do not end; stop them and start again.`,
      );
    }
  }
  await rm(pidFile, { force: true });
}

/**
 * The processes whose working folder is the cluster's, as all of PostgreSQL's are. Looked up as the account that
 * owns them, because root without the right to trace others may not see it.
 * @param {string} pgdata
 * @param {Account | undefined} account
 * @returns {number[]}
 */
function processesIn(pgdata, account) {
  const [command, args] = asAccount(account, 'find', [
    '/proc',
    '-maxdepth',
    '2',
    '-path',
    '/proc/[0-9]*/cwd',
    '-printf',
    '%h\\t%l\\n',
  ]);
  const { stdout } = spawnSync(command, args, { cwd: '/', encoding: 'utf8' });
  return stdout
    .split('\n')
    .map((line) => line.split('\t'))
    .filter(([, folder]) => folder === pgdata)
    .map(([path]) => Number(basename(path ?? '')));
}

/**
 * @typedef {{ kind: 'ready', ended: Promise<string> }
 *   | { kind: 'failed' | 'port-taken', failure: SetupFailure }} Launched
 */

/**
 * @param {object} how
 * @param {Place} how.place
 * @param {PostgresBinaries} how.binaries
 * @param {number} how.port
 * @param {string} how.password
 * @param {boolean} how.durable
 * @param {(stop: () => Promise<void>) => void} how.onStop
 * @returns {Promise<Launched>}
 */
async function launch({ place: { folder, account }, binaries, port, password, durable, onStop }) {
  const logPath = join(folder, 'postgres.log');
  const log = openLog(logPath);
  const logStart = statSync(logPath).size;
  const settings = {
    listen_addresses: '127.0.0.1',
    port: String(port),
    unix_socket_directories: '',
    ...(durable ? {} : { fsync: 'off', synchronous_commit: 'off', full_page_writes: 'off' }),
  };
  const child = startBound({
    account,
    parentDeathSignal: 'SIGINT',
    command: join(binaries.folder, 'postgres'),
    args: [
      '-D',
      join(folder, 'pgdata'),
      ...Object.entries(settings).flatMap(([name, value]) => ['-c', `${name}=${value}`]),
    ],
    cwd: folder,
    env: environmentWithoutPostgres(),
    stdio: ['ignore', log, log],
  });
  closeSync(log);
  const newLog = () => readFileSync(logPath).subarray(logStart).toString();
  /** @type {Promise<string>} */
  const ended = new Promise((resolve) => {
    child.once('error', (error) => resolve(error.message));
    child.once('exit', () => resolve(newLog()));
  });
  // SIGINT is PostgreSQL's fast shutdown: open transactions are rolled back, everything committed is kept.
  onStop(() => stopChild(child, 'SIGINT', 60_000, 'SIGQUIT'));

  const outcome = await Promise.race([ended, waitUntilReady({ port, password, child, logPath })]);
  if (outcome === 'ready') return { kind: 'ready', ended: ended.then(lastLogLine) };
  if (saysDiskFull(outcome)) return { kind: 'failed', failure: fullDisk(folder) };
  const failure = new SetupFailure(
    `PostgreSQL did not start: ${lastLogLine(outcome)}; its log is ${logPath}.`,
  );
  return { kind: /Address already in use|could not bind/.test(outcome) ? 'port-taken' : 'failed', failure };
}

/**
 * @param {string} path
 * @returns {number} a file descriptor, so that the server can write to it whoever it runs as
 */
function openLog(path) {
  try {
    if (existsSync(path) && statSync(path).size > largestLogBytes) truncateSync(path);
    return openSync(path, 'a', 0o600);
  } catch (error) {
    throw fileFailure(error, path);
  }
}

/**
 * @param {string} log
 * @returns {string} PostgreSQL's last complaint without its time and process number
 */
function lastLogLine(log) {
  const lines = log.split('\n').filter((line) => /(FATAL|PANIC|ERROR):/.test(line));
  return (lines.at(-1) ?? lastTellingLine(log)).replace(/^.*?(FATAL|PANIC|ERROR|LOG):\s*/, '');
}

/**
 * @param {{ port: number, password: string, child: import('node:child_process').ChildProcess, logPath: string }} how
 * @returns {Promise<'ready'>}
 */
async function waitUntilReady({ port, password, child, logPath }) {
  const { default: pg } = await import('pg');
  // Replaying the log after a crash can take a while; two minutes cover gigabytes of it.
  for (const deadline = Date.now() + 120_000; Date.now() < deadline; await sleep(100)) {
    if (child.exitCode !== null || child.signalCode !== null) break;
    const client = new pg.Client({
      host: '127.0.0.1',
      port,
      user: 'postgres',
      password,
      database: 'postgres',
      ssl: false,
      connectionTimeoutMillis: 5000,
    });
    client.on('error', () => undefined);
    try {
      await client.connect();
      await client.end();
      return 'ready';
    } catch (error) {
      if (errorCode(error) === '28P01') {
        throw new SetupFailure(
          'The database does not accept its own password: passwords.json in the data folder belongs to another database; put the right one back from a backup.',
        );
      }
      // 57P03 and a refused connection mean "not yet"; a full disk shows in the log.
      if (errorCode(error) === '53100')
        throw new SetupFailure(`The disk of the database is full: ${errorMessage(error)}.`);
    }
  }
  // The server's own end, raced against this, tells the reason when there is one.
  await sleep(1000);
  throw new SetupFailure(`PostgreSQL does not answer on 127.0.0.1:${port}; its log is ${logPath}.`);
}
