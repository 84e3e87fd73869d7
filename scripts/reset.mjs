// `npm run reset`: stops what runs and removes what the commands have made on this machine.

import fs from 'node:fs';
import path from 'node:path';
import process from 'node:process';
import readline from 'node:readline/promises';
import { endRunning, findRunning } from './setup/children.mjs';
import { mainCluster, stopCluster, testCluster } from './setup/cluster.mjs';
import { livingUsers } from './setup/lease.mjs';
import { folderHash, moiety } from './setup/places.mjs';
import { reportFailure, SetupError, step } from './setup/progress.mjs';

async function isConfirmed() {
  if (process.argv.includes('--yes')) return true;
  if (!process.stdin.isTTY) {
    throw new SetupError(
      'Nobody is there to confirm.',
      'Confirm on the command line:\n  npm run reset -- --yes',
    );
  }
  const terminal = readline.createInterface({ input: process.stdin, output: process.stdout });
  const answer = await terminal.question(
    'This deletes the database, uploads and mails on this machine (.moiety). Type "yes" to go on: ',
  );
  terminal.close();
  return answer.trim().toLowerCase() === 'yes';
}

async function main() {
  if (!fs.existsSync(moiety)) {
    console.log('There is nothing to remove.');
    return;
  }
  if (livingUsers().length > 0) {
    throw new SetupError(
      'Tests are running on the database for tests.',
      'Wait for them to end, then run this again.',
    );
  }
  if (!(await isConfirmed())) {
    console.log('Nothing was changed.');
    return;
  }
  const found = findRunning();
  if (found !== null) await step('Stopping Moiety', () => endRunning(found.running));
  await step('Stopping PostgreSQL', async () => {
    await stopCluster(mainCluster);
    await stopCluster(testCluster);
  });
  await step('Removing .moiety', () => {
    fs.rmSync(path.join('/var/tmp', `moiety-${folderHash()}`), { recursive: true, force: true });
    fs.rmSync(moiety, { recursive: true, force: true });
  });
  console.log('\nThe next npm start begins with a new database and the demo data.');
}

main().catch((error) => {
  reportFailure(error);
  process.exitCode = 1;
});
