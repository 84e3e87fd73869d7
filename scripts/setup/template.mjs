// Template databases of the tests: one per state of the migrations, cloned by every run instead of migrating again.

import crypto from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import process from 'node:process';
import { run } from './commands.mjs';
import { databaseUrls, ensureDatabase, runSql } from './databases.mjs';
import { isAlive, processName } from './lease.mjs';
import { withLock } from './lock.mjs';
import { inMoiety, root } from './places.mjs';
import { SetupError } from './progress.mjs';

/** Templates of earlier states of the migrations that are kept, because another run may be cloning one. */
const KEPT_TEMPLATES = 3;

/**
 * Refuses a database that is not on this machine: tests write, and drop what they made.
 * @param {string} url
 */
export function refuseRemote(url) {
  const host = new URL(url).hostname;
  if (!/^(127(\.\d{1,3}){3}|localhost|\[::1\])$/.test(host)) {
    throw new SetupError(`Tests refuse to use a database on ${host}: only one on this machine.`);
  }
}

/** What the template depends on: the migrations and the program that runs them. */
function migrationHash() {
  const hash = crypto.createHash('sha256');
  const files = [path.join(root, 'db/migrate.ts'), path.join(root, 'package-lock.json')];
  const folder = path.join(root, 'drizzle');
  if (fs.existsSync(folder)) {
    for (const name of fs.readdirSync(folder).sort())
      if (name.endsWith('.sql')) files.push(path.join(folder, name));
  }
  for (const file of files) hash.update(path.basename(file)).update('\0').update(fs.readFileSync(file));
  return hash.digest('hex').slice(0, 12);
}

/** The part of a name that says whose databases these are. */
export const runPrefix = () => `moiety_run_${processName()}`;

/**
 * Drops what runs that are over have left behind, and templates of older migrations.
 * @param {{ port: number, bin: string }} cluster
 * @param {string} current the template that must stay
 */
async function dropLeftovers(cluster, current) {
  const rows = await runSql(
    cluster,
    'postgres',
    "SELECT datname FROM pg_database WHERE datname LIKE 'moiety\\_%' ORDER BY oid DESC",
  );
  const names = rows.split('\n').filter((name) => name !== '');
  const owners = (/** @type {string} */ name) => /^moiety_(?:run|build)_(\d+_\d*)/.exec(name)?.[1];
  const dead = names.filter((name) => {
    const owner = owners(name);
    return owner !== undefined && !isAlive(owner);
  });
  const templates = names.filter((name) => name.startsWith('moiety_template_') && name !== current);
  for (const name of [...dead, ...templates.slice(KEPT_TEMPLATES)]) {
    await runSql(cluster, 'postgres', `DROP DATABASE IF EXISTS ${name} WITH (FORCE)`);
  }
}

/**
 * The migrated template database for the present migrations; made when it is missing.
 * @param {{ port: number, bin: string }} cluster
 * @returns {Promise<string>} its name
 */
export async function ensureTemplate(cluster) {
  const name = `moiety_template_${migrationHash()}`;
  await withLock('postgres-template', async () => {
    const found = await runSql(cluster, 'postgres', `SELECT 1 FROM pg_database WHERE datname = '${name}'`);
    if (found.trim() !== '') return;
    // Under another name until it is complete, so that a run that was cut off leaves no half template.
    const draft = `moiety_build_${processName()}`;
    await runSql(cluster, 'postgres', `DROP DATABASE IF EXISTS ${draft} WITH (FORCE)`);
    await ensureDatabase(cluster, draft);
    const urls = databaseUrls(cluster.port, draft);
    refuseRemote(urls.owner);
    await run(process.execPath, ['--import', 'tsx', 'db/migrate.ts'], {
      cwd: root,
      env: { ...process.env, NODE_OPTIONS: '', DATABASE_OWNER_URL: urls.owner },
      what: 'Migrating the template database',
    });
    await runSql(cluster, 'postgres', `ALTER DATABASE ${draft} RENAME TO ${name}`);
  });
  await dropLeftovers(cluster, name);
  return name;
}

/**
 * Clones the template.
 * @param {{ port: number, bin: string }} cluster
 * @param {string} template
 * @param {string} name
 */
export async function cloneTemplate(cluster, template, name) {
  await runSql(
    cluster,
    'postgres',
    `DROP DATABASE IF EXISTS ${name} WITH (FORCE);
     CREATE DATABASE ${name} TEMPLATE ${template} OWNER moiety_owner;
     REVOKE ALL ON DATABASE ${name} FROM PUBLIC;
     GRANT CONNECT ON DATABASE ${name} TO moiety_app;`,
  );
}

/**
 * Drops the databases of this run that a kind of test has made, and the folders where their files were stored.
 * @param {{ port: number, bin: string }} cluster
 * @param {'w' | 'browser'} kind what follows the prefix in their names
 */
export async function dropRunDatabases(cluster, kind) {
  const mine = `${runPrefix()}_${kind}`;
  const rows = await runSql(
    cluster,
    'postgres',
    `SELECT datname FROM pg_database WHERE starts_with(datname, '${mine}')`,
  );
  for (const name of rows.split('\n').filter((line) => line !== '')) {
    await runSql(cluster, 'postgres', `DROP DATABASE IF EXISTS ${name} WITH (FORCE)`);
  }
  const storage = inMoiety('test-storage');
  for (const name of fs.existsSync(storage) ? fs.readdirSync(storage) : []) {
    const owner = /^moiety_run_(\d+_\d*)/.exec(name)?.[1] ?? '';
    if (name.startsWith(mine) || !isAlive(owner))
      fs.rmSync(path.join(storage, name), { recursive: true, force: true });
  }
}
