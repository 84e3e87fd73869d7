// The programs of a running product: card payments and mail on this machine, and the app itself.

import fs from 'node:fs';
import path from 'node:path';
import process from 'node:process';
import { startChild, waitForAnswer } from './children.mjs';
import { run } from './commands.mjs';
import { WEBHOOK_PATH } from './environment.mjs';
import { root } from './places.mjs';
import { localSecrets } from './secrets.mjs';

/** @param {...string} parts */
const inModules = (...parts) => path.join(root, 'node_modules', ...parts);

/**
 * The local card-payment server, with a payment page of its own.
 * @param {{ port: number, appUrl: string, env: NodeJS.ProcessEnv, logFile?: string }} options
 */
export function startPayments({ port, appUrl, env, logFile }) {
  const child = startChild({
    name: 'payments',
    program: process.execPath,
    args: ['--import', 'tsx', 'scripts/local-payments/main.ts'],
    env: {
      ...env,
      PORT: String(port),
      STRIPE_WEBHOOK_URL: `${appUrl}${WEBHOOK_PATH}`,
      STRIPE_WEBHOOK_SECRET: env.STRIPE_WEBHOOK_SECRET ?? localSecrets().stripeWebhookSecret,
    },
    logFile,
  });
  return { child, ready: waitForAnswer(child, `http://127.0.0.1:${port}/`) };
}

/**
 * The local mail server with an inbox to look into; it sends nothing on.
 * @param {{ smtp: number, web: number, folder: string, env: NodeJS.ProcessEnv, logFile?: string }} options
 */
export function startMail({ smtp, web, folder, env, logFile }) {
  fs.mkdirSync(folder, { recursive: true });
  const child = startChild({
    name: 'mail',
    program: process.execPath,
    args: [
      inModules('maildev/dist/bin/maildev.js'),
      ...['--smtp', String(smtp), '--ip', '127.0.0.1', '--web', String(web), '--web-ip', '127.0.0.1'],
      ...['--mail-directory', folder, '--max-emails', '2000'],
    ],
    env,
    logFile,
  });
  return { child, ready: waitForAnswer(child, `http://127.0.0.1:${web}/`) };
}

/**
 * The app, from its build or in development.
 * @param {{ port: number, env: NodeJS.ProcessEnv, isDev?: boolean, distDir?: string, logFile?: string }} options
 */
export function startApp({ port, env, isDev = false, distDir, logFile }) {
  const child = startChild({
    name: 'app',
    program: process.execPath,
    args: [inModules('next/dist/bin/next'), isDev ? 'dev' : 'start', '-p', String(port), '-H', '127.0.0.1'],
    env: {
      ...env,
      NODE_ENV: isDev ? 'development' : 'production',
      ...(distDir === undefined ? {} : { NEXT_DIST_DIR: distDir }),
    },
    logFile,
  });
  return { child, ready: waitForAnswer(child, `http://127.0.0.1:${port}/`, isDev ? 180_000 : 60_000) };
}

/**
 * Runs a TypeScript program of the server to its end.
 * @param {string} file relative to the root
 * @param {NodeJS.ProcessEnv} env
 * @param {Omit<NonNullable<Parameters<typeof run>[2]>, 'env' | 'cwd'>} options
 */
export function runServerProgram(file, env, options) {
  // Modules of the server refuse to load elsewhere; this condition says that we are the server.
  return run(process.execPath, ['--conditions=react-server', '--import', 'tsx', file], {
    cwd: root,
    env,
    ...options,
  });
}
