// The cluster for tests is shared by every test run on this machine: the first starts it, the last one ends it.

import fs from 'node:fs';
import path from 'node:path';
import process from 'node:process';
import { ensureCluster, stopCluster, testCluster } from './cluster.mjs';
import { ensureRoles } from './databases.mjs';
import { processBirth, withLock } from './lock.mjs';
import { inMoiety } from './places.mjs';

const folder = inMoiety('postgres-test.users');

/**
 * The name of a process among those of this machine's present and past.
 * @param {number} [pid]
 */
export const processName = (pid = process.pid) => `${pid}_${processBirth(pid) ?? ''}`;

/**
 * Whether the process with such a name still runs.
 * @param {string} name
 */
export function isAlive(name) {
  const [pid, birth] = name.split('_');
  return processBirth(Number(pid)) === birth;
}

/** Runs that use the cluster now; forgets those that are over. */
export function livingUsers() {
  const names = fs.existsSync(folder) ? fs.readdirSync(folder) : [];
  for (const name of names)
    if (!isAlive(name.split('.')[0] ?? '')) fs.rmSync(path.join(folder, name), { force: true });
  return fs.existsSync(folder) ? fs.readdirSync(folder) : [];
}

let count = 0;

/**
 * Starts the cluster for tests unless it runs, with its roles, and keeps it running until `release` is called.
 * @returns {Promise<{ port: number, bin: string, release: () => Promise<void> }>}
 */
export function leaseTestCluster() {
  return withLock('postgres-test-users', async () => {
    fs.mkdirSync(folder, { recursive: true });
    const cluster = await ensureCluster(testCluster);
    await ensureRoles(cluster);
    count += 1;
    const mine = path.join(folder, `${processName()}.${count}`);
    fs.writeFileSync(mine, '');
    return {
      port: cluster.port,
      bin: cluster.bin,
      release: () =>
        withLock('postgres-test-users', async () => {
          fs.rmSync(mine, { force: true });
          if (livingUsers().length === 0) await stopCluster(testCluster);
        }),
    };
  });
}
