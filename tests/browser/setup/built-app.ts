import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { ensureBuild } from '../../../scripts/setup/build.mjs';
import type { Child } from '../../../scripts/setup/children.mjs';
import { databaseUrls } from '../../../scripts/setup/databases.mjs';
import { readAccounts } from '../../../scripts/setup/demo-data.mjs';
import { appEnvironment, plainVariables } from '../../../scripts/setup/environment.mjs';
import { leaseTestCluster } from '../../../scripts/setup/lease.mjs';
import { inMoiety } from '../../../scripts/setup/places.mjs';
import { anyFreePort } from '../../../scripts/setup/ports.mjs';
import { runServerProgram, startApp, startMail, startPayments } from '../../../scripts/setup/services.mjs';
import {
  cloneTemplate,
  dropRunDatabases,
  ensureTemplate,
  refuseRemote,
  runPrefix,
} from '../../../scripts/setup/template.mjs';
import { ensureChromium } from '../../../scripts/setup/test-tools.mjs';
import type { TestProject } from 'vitest/node';

/** One person of the demo scenario who can sign in. */
interface Account {
  email: string;
  password: string;
  role: string;
  name: string;
  what: string;
}

declare module 'vitest' {
  interface ProvidedContext {
    builtApp: {
      /** Without a slash at its end, as are the others. */
      appUrl: string;
      /** The local inbox: its page at `/`, its mails as JSON at `/api/emails`. */
      inboxUrl: string;
      paymentsUrl: string;
      /** As the app connects, as the owner of the tables, and past row-level security. */
      database: { app: string; owner: string; superuser: string };
      accounts: Account[];
      /** Path of the browser to start. */
      chromium: string;
      webhookSecret: string;
    };
  }
}

/**
 * Before the browser tests: the built app runs on a freshly sown database of its own, with card payments and mail.
 * After them: all of it is ended, and the database is dropped.
 */
export default async function startBuiltApp(project: TestProject): Promise<() => Promise<void>> {
  const undo: (() => Promise<unknown>)[] = [];
  const undoAll = async () => {
    for (const work of undo.reverse()) await work();
  };
  const keep = ({ child, ready }: { child: Child; ready: Promise<void> }) => {
    undo.push(child.stop);
    return ready;
  };
  try {
    const chromium = await ensureChromium();
    const cluster = await leaseTestCluster();
    undo.push(cluster.release);
    const template = await ensureTemplate(cluster);
    await ensureBuild();

    const name = `${runPrefix()}_browser`;
    const database = databaseUrls(cluster.port, name);
    refuseRemote(database.superuser);
    undo.push(() => dropRunDatabases(cluster, 'browser'));
    await cloneTemplate(cluster, template, name);

    const folder = inMoiety('test-storage', name);
    mkdirSync(folder, { recursive: true });
    const log = (service: string) => inMoiety('logs', `browser-tests-${service}.log`);
    const accountsFile = path.join(folder, 'demo-accounts.json');
    const ports = {
      app: await anyFreePort(),
      payments: await anyFreePort(),
      smtp: await anyFreePort(),
      web: await anyFreePort(),
    };
    const env = appEnvironment({
      given: {
        ...plainVariables(),
        AUTH_RATE_LIMIT: '0',
        LOG_LEVEL: 'warn',
        DEMO_ACCOUNTS_FILE: accountsFile,
      },
      app: { port: ports.app },
      database,
      payments: { port: ports.payments },
      mail: { smtp: ports.smtp, web: ports.web },
      storage: path.join(folder, 'files'),
    });
    const appUrl = `http://127.0.0.1:${ports.app}`;
    await runServerProgram('seeds/main.ts', env, { what: 'Sowing the demo data', logFile: log('seeds') });
    await Promise.all([
      keep(
        startPayments({
          port: ports.payments,
          appUrl,
          env: { ...env, LOCAL_PAYMENTS_FOLDER: path.join(folder, 'payments') },
          logFile: log('payments'),
        }),
      ),
      keep(startMail({ ...ports, folder: path.join(folder, 'mail'), env, logFile: log('mail') })),
    ]);
    await keep(startApp({ port: ports.app, env, logFile: log('app') }));

    project.provide('builtApp', {
      appUrl,
      inboxUrl: `http://127.0.0.1:${ports.web}`,
      paymentsUrl: `http://127.0.0.1:${ports.payments}`,
      database,
      accounts: readAccounts(accountsFile),
      chromium,
      webhookSecret: String(env.STRIPE_WEBHOOK_SECRET),
    });
    return undoAll;
  } catch (error) {
    await undoAll();
    throw error;
  }
}
