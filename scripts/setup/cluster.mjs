// A PostgreSQL cluster of the project's own: on loopback, without a socket in the tree, with generated passwords.

import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import process from 'node:process';
import { clusterFolder, clusterOwner, makeClusterFolder } from './cluster-place.mjs';
import { processBirth, withLock } from './lock.mjs';
import { run } from './commands.mjs';
import { inMoiety } from './places.mjs';
import { choosePort } from './ports.mjs';
import { asClusterUser, findPostgres } from './postgres-binaries.mjs';
import { SetupError } from './progress.mjs';
import { localSecrets } from './secrets.mjs';

/**
 * @typedef {object} ClusterKind
 * @property {string} name folder and port name
 * @property {number} usualPort
 * @property {string[]} settings lines for postgresql.conf
 */

const shared = [
  "listen_addresses = '127.0.0.1'",
  // A socket in the tree stops the build, which reads every file that git does not ignore.
  "unix_socket_directories = ''",
  "timezone = 'UTC'",
  "log_timezone = 'UTC'",
  'password_encryption = scram-sha-256',
  'max_connections = 100',
];

/** The cluster with the data of the demo: as safe as PostgreSQL is by default. @type {ClusterKind} */
export const mainCluster = { name: 'postgres', usualPort: 54329, settings: shared };

/** The cluster for tests: nothing in it has to survive a power cut, so that it does not wait for the disk. @type {ClusterKind} */
export const testCluster = {
  name: 'postgres-test',
  usualPort: 54339,
  settings: [
    ...shared,
    'fsync = off',
    'synchronous_commit = off',
    'full_page_writes = off',
    'autovacuum_naptime = 5min',
    'max_wal_size = 2GB',
  ],
};

/**
 * Runs one of PostgreSQL's programs as the user of the cluster.
 * @param {string} program
 * @param {string[]} args
 * @param {Parameters<typeof run>[2]} [options]
 */
function runAsClusterUser(program, args, options = {}) {
  const [command, words] = asClusterUser(program, args);
  // Its own folder may be closed to the system user, and PostgreSQL's programs complain about that.
  return run(command, words, { cwd: '/', ...options, env: { ...process.env, LC_ALL: 'C.UTF-8' } });
}

/** @param {string} bin @param {string} folder @param {ClusterKind} kind */
async function createCluster(bin, folder, kind) {
  makeClusterFolder(folder);
  const owner = clusterOwner();
  const passwordFile = path.join(os.tmpdir(), `moiety-${process.pid}-${Date.now()}`);
  fs.writeFileSync(passwordFile, localSecrets().databaseSuperuser, { mode: 0o600, flag: 'wx' });
  if (owner !== null) fs.chownSync(passwordFile, owner.uid, owner.gid);
  try {
    await runAsClusterUser(
      path.join(bin, 'initdb'),
      [
        ...['-D', folder, '-U', 'postgres', '--locale=C.UTF-8', '-E', 'UTF8', '--no-instructions'],
        ...['--auth=scram-sha-256', `--pwfile=${passwordFile}`],
      ],
      { what: 'initdb' },
    );
  } catch (error) {
    fs.rmSync(folder, { recursive: true, force: true });
    throw error;
  } finally {
    fs.rmSync(passwordFile, { force: true });
  }
  fs.appendFileSync(path.join(folder, 'postgresql.conf'), `\n# Moiety\n${kind.settings.join('\n')}\n`);
}

/**
 * The port on which the cluster in this folder answers now, or null when it is not running.
 * @param {string} folder
 */
function runningPort(folder) {
  try {
    // Lines of this file: process id, data folder, start time, port …
    const lines = fs.readFileSync(path.join(folder, 'postmaster.pid'), 'utf8').split('\n');
    return processBirth(Number(lines[0])) === null ? null : Number(lines[3]);
  } catch {
    return null;
  }
}

/**
 * Makes the cluster when it is missing and starts it when it is not running.
 * @param {ClusterKind} kind
 * @returns {Promise<{ port: number, bin: string, folder: string, created: boolean, started: boolean, version: number }>}
 *   `started` is false when it ran already: whoever started it ends it
 */
export async function ensureCluster(kind) {
  const { bin, major } = await findPostgres();
  return withLock(kind.name, async () => {
    const folder = clusterFolder(kind.name);
    const versionFile = path.join(folder, 'PG_VERSION');
    const created = !fs.existsSync(versionFile);
    if (created) await createCluster(bin, folder, kind);
    const madeBy = Number(fs.readFileSync(versionFile, 'utf8'));
    const programs = madeBy === major ? bin : `/usr/lib/postgresql/${madeBy}/bin`;
    if (!fs.existsSync(path.join(programs, 'pg_ctl'))) {
      throw new SetupError(
        `The data in ${folder} was made by PostgreSQL ${madeBy}, but version ${major} is installed.`,
        `Install PostgreSQL ${madeBy} again, or start over with:\n  npm run reset`,
      );
    }
    const answering = runningPort(folder);
    const about = { bin: programs, folder, created, version: madeBy };
    if (answering !== null) return { ...about, port: answering, started: false };
    const port = await choosePort(kind.name, kind.usualPort);
    const log = path.join(folder, 'server.log');
    await runAsClusterUser(
      path.join(programs, 'pg_ctl'),
      ['-D', folder, '-l', log, '-w', '-t', '60', '-s', '-o', `-p ${port}`, 'start'],
      { what: 'Starting PostgreSQL', todo: `Its log is ${log}` },
    );
    return { ...about, port, started: true };
  });
}

/**
 * Stops the cluster when it is running; open connections are closed, committed work is kept.
 * @param {ClusterKind} kind
 */
export async function stopCluster(kind) {
  const pointer = inMoiety(`${kind.name}.folder`);
  if (!fs.existsSync(pointer) && !fs.existsSync(inMoiety(kind.name))) return;
  const folder = clusterFolder(kind.name);
  if (runningPort(folder) === null) return;
  const madeBy = fs.readFileSync(path.join(folder, 'PG_VERSION'), 'utf8').trim();
  const debian = `/usr/lib/postgresql/${madeBy}/bin`;
  const bin = fs.existsSync(debian) ? debian : (await findPostgres()).bin;
  await runAsClusterUser(path.join(bin, 'pg_ctl'), ['-D', folder, '-m', 'fast', '-w', '-s', 'stop'], {
    what: 'Stopping PostgreSQL',
  });
}
