// The steps from an empty machine to a running product, each with its own line.

import fs from 'node:fs';
import process from 'node:process';
import { ensureBuild } from './build.mjs';
import { ensureCluster, mainCluster } from './cluster.mjs';
import { run } from './commands.mjs';
import { databaseUrls, ensureDatabase, ensureRoles } from './databases.mjs';
import { accountsFile, discardUnfinished, hasNobody, isEmpty, sow } from './demo-data.mjs';
import { appEnvironment, givenVariables, localServices } from './environment.mjs';
import { checkNode, ensurePackages } from './packages.mjs';
import { inMoiety, root } from './places.mjs';
import { choosePort, requirePort } from './ports.mjs';
import { step } from './progress.mjs';
import { runServerProgram, startApp, startMail, startPayments } from './services.mjs';

const DATABASE = 'moiety';

/** Node.js and the packages; before it, nothing but Node.js itself may be used. */
export async function preparePackages() {
  await step('Node.js', (remark) => remark(checkNode()));
  await step('Packages', async (remark) => {
    const installed = await ensurePackages();
    remark(installed ? 'installed from package-lock.json' : 'as in package-lock.json');
  });
}

/**
 * The cluster of this machine, running, with roles and database.
 * @param {(cluster: { started: boolean }) => void} onStarted
 */
async function prepareCluster(onStarted) {
  return step('PostgreSQL', async (remark) => {
    const cluster = await ensureCluster(mainCluster);
    onStarted(cluster);
    await ensureRoles(cluster);
    const redone = await discardUnfinished(cluster, DATABASE);
    await ensureDatabase(cluster, DATABASE);
    const how = cluster.created ? 'new cluster, ' : cluster.started ? '' : 'running already, ';
    remark(
      `${how}version ${cluster.version}, port ${cluster.port}${redone ? ', incomplete demo data removed' : ''}`,
    );
    return cluster;
  });
}

/** @param {NodeJS.ProcessEnv} env @param {{ port: number, bin: string } | undefined} cluster */
async function prepareDatabase(env, cluster) {
  await step('Migrations', async (remark) => {
    const out = await run(process.execPath, ['--import', 'tsx', 'db/migrate.ts'], {
      cwd: root,
      env,
      what: 'Migrating the database',
    });
    remark(out.trim());
  });
  await step('Demo data', async (remark) => {
    const wanted = cluster !== undefined || env.DEMO === '1';
    if (!wanted) return remark('none, because the database is not ours');
    const empty =
      cluster !== undefined
        ? await isEmpty(cluster, DATABASE)
        : await hasNobody(String(env.DATABASE_OWNER_URL));
    if (!empty) return remark('kept as it is');
    fs.rmSync(accountsFile, { force: true });
    await sow(env, { isOurs: cluster !== undefined });
    return remark('sown');
  });
}

/**
 * @typedef {object} Addresses
 * @property {string} app
 * @property {string | undefined} inbox
 * @property {string | undefined} payments
 */

/**
 * Brings everything up.
 * @param {{
 *   isDev: boolean,
 *   onCluster: (cluster: { started: boolean }) => void,
 *   onChild: (child: import('./children.mjs').Child) => void,
 * }} options told at once what was started, so that it can be ended also when a later step fails
 * @returns {Promise<Addresses>}
 */
export async function bringUp({ isDev, onCluster, onChild }) {
  await preparePackages();
  const given = givenVariables();
  const local = localServices(given);
  const cluster = local.database ? await prepareCluster(onCluster) : undefined;
  const ports = {
    app: given.PORT === undefined ? await choosePort('app', 3000) : await requirePort(given.PORT),
    payments: await choosePort('payments', 12111),
    smtp: await choosePort('smtp', 1025),
    inbox: await choosePort('inbox', 1080),
  };
  const env = appEnvironment({
    given,
    app: { port: ports.app },
    database: cluster === undefined ? undefined : databaseUrls(cluster.port, DATABASE),
    payments: local.payments ? { port: ports.payments } : undefined,
    mail: local.mail ? { smtp: ports.smtp, web: ports.inbox } : undefined,
  });
  await step('Configuration', async (remark) => {
    await runServerProgram('scripts/setup/check-configuration.ts', env, {
      what: 'Checking the configuration',
      todo: 'README.md lists every variable. Set them in the environment or in .env.local.',
    });
    const outside = [
      !local.database && 'database',
      !local.payments && 'card payments',
      !local.mail && 'mail',
    ].filter(Boolean);
    remark(outside.length === 0 ? 'all on this machine' : `${outside.join(', ')} as set by you`);
  });
  await prepareDatabase(env, cluster);
  if (!isDev) {
    await step('Build', async (remark) => remark((await ensureBuild()) ? 'built' : 'unchanged'));
  }
  const appUrl = `http://127.0.0.1:${ports.app}`;
  if (local.payments) {
    await step('Card payments', async (remark) => {
      const { child, ready } = startPayments({ port: ports.payments, appUrl, env });
      onChild(child);
      await ready;
      remark(`local server, port ${ports.payments}`);
    });
  }
  if (local.mail) {
    await step('Mail', async (remark) => {
      const folder = inMoiety('mail');
      const { child, ready } = startMail({ smtp: ports.smtp, web: ports.inbox, folder, env });
      onChild(child);
      await ready;
      remark(`local inbox, port ${ports.inbox}`);
    });
  }
  await step('App', async (remark) => {
    const { child, ready } = startApp({ port: ports.app, env, isDev });
    onChild(child);
    await ready;
    remark(`port ${ports.app}`);
  });
  return {
    app: String(env.APP_URL),
    inbox: local.mail ? `http://127.0.0.1:${ports.inbox}` : undefined,
    payments: local.payments ? `http://127.0.0.1:${ports.payments}` : undefined,
  };
}
