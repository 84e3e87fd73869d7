// The demo scenario: sown into an empty database, never into one that holds something.

import fs from 'node:fs';
import { ensureDatabase, runSql } from './databases.mjs';
import { inMoiety, readJson } from './places.mjs';
import { runServerProgram } from './services.mjs';

/** Left behind by a seeding that was cut off: what it has written is not complete. */
const unfinished = inMoiety('seeding');

/** @typedef {{ email: string, password: string, role: string, name: string, what: string }} DemoAccount */

/** Where the seeding writes the demo accounts of the database on this machine. */
export const accountsFile = inMoiety('demo-accounts.json');

/**
 * @param {string} [file]
 * @returns {DemoAccount[]}
 */
export const readAccounts = (file = accountsFile) => readJson(file, /** @type {DemoAccount[]} */ ([]));

/**
 * Throws away a local database whose seeding was cut off, so that it can be sown again.
 * @param {{ port: number, bin: string }} cluster
 * @param {string} database
 */
export async function discardUnfinished(cluster, database) {
  if (!fs.existsSync(unfinished)) return false;
  await runSql(cluster, 'postgres', `DROP DATABASE IF EXISTS ${database} WITH (FORCE)`);
  await ensureDatabase(cluster, database);
  fs.rmSync(unfinished, { force: true });
  return true;
}

/**
 * Whether a database on this machine has no workspace yet. Asked as the superuser: row-level security would
 * show everybody else an empty table.
 * @param {{ port: number, bin: string }} cluster
 * @param {string} database
 */
export async function isEmpty(cluster, database) {
  const answer = await runSql(cluster, database, 'SELECT EXISTS (SELECT FROM workspaces)');
  return answer.trim() === 'f';
}

/**
 * Whether a database elsewhere has nobody signed up.
 * @param {string} ownerUrl
 */
export async function hasNobody(ownerUrl) {
  const { default: postgres } = await import('postgres');
  const sql = postgres(ownerUrl, { max: 1, onnotice: () => {}, connect_timeout: 15 });
  try {
    const [row] = await sql`SELECT EXISTS (SELECT FROM users) AS found`;
    return row?.found === false;
  } finally {
    await sql.end({ timeout: 5 });
  }
}

/**
 * Sows the demo scenario into an empty database.
 * @param {NodeJS.ProcessEnv} env of the app
 * @param {{ isOurs: boolean }} database only one on this machine is thrown away when this is cut off
 */
export async function sow(env, { isOurs }) {
  if (isOurs) fs.writeFileSync(unfinished, new Date().toISOString());
  await runServerProgram(
    'seeds/main.ts',
    { DEMO_ACCOUNTS_FILE: accountsFile, ...env },
    {
      what: 'Sowing the demo data',
      todo: 'The whole output is in .moiety/logs/seeds.log; start over with: npm run reset',
      logFile: inMoiety('logs/seeds.log'),
    },
  );
  fs.rmSync(unfinished, { force: true });
}
