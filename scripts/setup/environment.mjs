// The environment of the app and its services: what the person has set wins, the rest points at this machine.

import fs from 'node:fs';
import path from 'node:path';
import process from 'node:process';
import { inMoiety, root } from './places.mjs';
import { SetupError } from './progress.mjs';
import { localSecrets } from './secrets.mjs';

/** Where the app takes the messages of the card-payment service. */
export const WEBHOOK_PATH = '/api/webhooks/stripe';

/**
 * What is set: .env.local and the environment, which wins. An empty value counts as not set.
 * @returns {Record<string, string>}
 */
export function givenVariables() {
  const file = path.join(root, '.env.local');
  if (fs.existsSync(file)) process.loadEnvFile(file);
  return Object.fromEntries(
    Object.entries(process.env).flatMap(([name, value]) =>
      value === undefined || value === '' ? [] : [[name, value]],
    ),
  );
}

const OURS =
  /^(APP_URL|DEMO|DEMO_ACCOUNTS_FILE|LOG_LEVEL|JOBS|PORT|INBOX_URL|NODE_ENV|NODE_OPTIONS|FORCE_COLOR|(AUTH|DATABASE|STRIPE|SMTP|MAIL|STORAGE|VITEST|NEXT)_.*|VITEST|TEST)$/;

/**
 * The environment without anything that speaks to the product: for tests, which must not reach real services.
 * @returns {Record<string, string>}
 */
export function plainVariables() {
  return Object.fromEntries(
    Object.entries(process.env).flatMap(([name, value]) =>
      value === undefined || OURS.test(name) ? [] : [[name, value]],
    ),
  );
}

/**
 * Which services are ours to run.
 * @param {Record<string, string>} given
 */
export function localServices(given) {
  const hasDatabase = given.DATABASE_URL !== undefined;
  if (hasDatabase && given.DATABASE_OWNER_URL === undefined) {
    throw new SetupError(
      'DATABASE_URL is set, but DATABASE_OWNER_URL is not.',
      'Migrations run as the owner of the tables, the app as moiety_app. Set both, or neither for the demo.',
    );
  }
  const hasPayments = given.STRIPE_SECRET_KEY !== undefined || given.STRIPE_API_BASE !== undefined;
  if (hasPayments && (given.STRIPE_SECRET_KEY === undefined || given.STRIPE_WEBHOOK_SECRET === undefined)) {
    throw new SetupError(
      'Card payments are set only in part.',
      'Set STRIPE_SECRET_KEY and STRIPE_WEBHOOK_SECRET, or none of STRIPE_* for the local payment page.',
    );
  }
  return { database: !hasDatabase, payments: !hasPayments, mail: given.SMTP_URL === undefined };
}

/**
 * The variables of the app.
 * @param {{
 *   given: Record<string, string>,
 *   app: { port: number },
 *   database?: { app: string, owner: string },
 *   payments?: { port: number },
 *   mail?: { smtp: number, web: number },
 *   storage?: string,
 * }} local addresses of the services that run on this machine
 * @returns {NodeJS.ProcessEnv}
 */
export function appEnvironment({ given, app, database, payments, mail, storage = inMoiety('storage') }) {
  const secrets = localSecrets();
  const isDemo = database !== undefined;
  const local = {
    APP_URL: `http://127.0.0.1:${app.port}`,
    DEMO: isDemo ? '1' : '0',
    LOG_LEVEL: 'info',
    ...(isDemo ? { AUTH_SECRET: secrets.authSecret } : {}),
    ...(database === undefined ? {} : { DATABASE_URL: database.app, DATABASE_OWNER_URL: database.owner }),
    ...(payments === undefined
      ? {}
      : {
          STRIPE_SECRET_KEY: 'sk_test_local',
          STRIPE_WEBHOOK_SECRET: secrets.stripeWebhookSecret,
          STRIPE_API_BASE: `http://127.0.0.1:${payments.port}`,
        }),
    ...(mail === undefined
      ? {}
      : {
          SMTP_URL: `smtp://127.0.0.1:${mail.smtp}`,
          INBOX_URL: `http://127.0.0.1:${mail.web}`,
          MAIL_FROM: 'Moiety <no-reply@moiety.example>',
        }),
    STORAGE_URL: `file:${storage}`,
  };
  return { ...local, ...given, NEXT_TELEMETRY_DISABLED: '1' };
}
