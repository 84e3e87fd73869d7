// `npm start` and `npm run dev`: brings everything up on this machine, and ends it with Ctrl-C.

import process from 'node:process';
import { bringUp } from './setup/bring-up.mjs';
import { endRunning, findRunning, lastLines, rememberRunning, waitForStop } from './setup/children.mjs';
import { mainCluster, stopCluster } from './setup/cluster.mjs';
import { endCommands } from './setup/commands.mjs';
import { readAccounts } from './setup/demo-data.mjs';
import { processBirth } from './setup/lock.mjs';
import { bold, dim, reportFailure, SetupError, step } from './setup/progress.mjs';

const isDev = process.argv.includes('--dev');

/** @type {import('./setup/children.mjs').Running} */
const running = {
  pid: process.pid,
  birth: processBirth(process.pid) ?? '',
  url: '',
  startedCluster: false,
  isStopping: false,
  children: [],
};
/** @type {import('./setup/children.mjs').Child[]} */
const children = [];
/** @type {Promise<void> | undefined} */
let stopping;
/** Whether the note about what runs is ours: another start's must stay. */
let isRemembered = false;

function remember() {
  isRemembered = true;
  rememberRunning(running);
}

/** Ends what was started here, the last first; the database last of all, because the others write to it. */
async function stopAll() {
  endCommands();
  if (isRemembered) {
    running.isStopping = true;
    remember();
  }
  for (const child of [...children].reverse()) await step(`Stopping ${child.name}`, () => child.stop());
  if (running.startedCluster) await step('Stopping PostgreSQL', () => stopCluster(mainCluster));
  if (isRemembered) rememberRunning(null);
}

/** @param {number} code */
function stopAndExit(code) {
  stopping ??= stopAll().then(
    () => process.exit(code),
    (error) => {
      reportFailure(error);
      process.exit(1);
    },
  );
  return stopping;
}

/** @param {import('./setup/bring-up.mjs').Addresses} addresses */
function printWelcome(addresses) {
  const lines = [
    '',
    `  ${bold('Moiety is running:')} ${bold(addresses.app)}`,
    ...(addresses.inbox === undefined ? [] : [`  Inbox (every mail that it sends): ${addresses.inbox}`]),
    ...(addresses.payments === undefined
      ? []
      : [
          `  Card payments: a payment page on this machine (${addresses.payments}); no money moves. Enter a test card,`,
          '  such as 4242 4242 4242 4242 (accepted) or 4000 0000 0000 0002 (declined).',
        ]),
  ];
  const accounts = readAccounts();
  if (accounts.length > 0) {
    const width = (/** @type {'email' | 'password' | 'role'} */ key) =>
      Math.max(...accounts.map((row) => row[key].length));
    lines.push('', `  ${bold('Demo accounts')}`);
    for (const { email, password, role, name, what } of accounts) {
      const columns = [
        email.padEnd(width('email')),
        password.padEnd(width('password')),
        role.padEnd(width('role')),
      ];
      lines.push(`  ${columns.join('  ')}  ${dim(`${name}: ${what}`)}`);
    }
  }
  lines.push('', `  ${dim('Ctrl-C stops everything; the data stays. npm run reset starts over.')}`, '');
  console.log(lines.join('\n'));
}

async function main() {
  console.log(`\n${bold('Moiety')}${isDev ? ' (development)' : ''}\n`);
  if (findRunning()?.running.isStopping === true) await step('Waiting for the last one to stop', waitForStop);
  const found = findRunning();
  if (found?.isAlive) {
    throw new SetupError(
      `Moiety is running already${found.running.url === '' ? '' : ` at ${found.running.url}`} (process ${found.running.pid}).`,
      'Use that one, or stop it with Ctrl-C in its terminal.',
    );
  }
  if (found !== null) {
    await step('Ending what a killed start left behind', async () => {
      await endRunning(found.running);
      if (found.running.startedCluster) running.startedCluster = true;
    });
  }
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
    process.on(signal, () => {
      if (stopping === undefined) console.log('\n');
      void stopAndExit(0);
    });
  }
  remember();
  const addresses = await bringUp({
    isDev,
    onCluster: ({ started }) => {
      running.startedCluster ||= started;
      remember();
    },
    onChild: (child) => {
      children.push(child);
      running.children.push({ name: child.name, pid: child.pid, birth: child.birth });
      remember();
    },
  });
  if (stopping !== undefined) return;
  running.url = addresses.app;
  remember();
  printWelcome(addresses);
  for (const child of children) {
    void child.ended.then(() => {
      if (stopping !== undefined) return;
      reportFailure(
        new SetupError(
          `${child.name} ended unexpectedly.\n${lastLines(child.logFile)}`,
          `Its log is ${child.logFile}`,
        ),
      );
      void stopAndExit(1);
    });
  }
}

main().catch(async (error) => {
  // Being asked to stop makes the step fail that was under way: that is no error.
  if (stopping !== undefined) return;
  reportFailure(error);
  await stopAndExit(1);
});
