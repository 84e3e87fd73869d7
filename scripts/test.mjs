// `npm test`: sets up what the tests need, runs every part, and ends with the sum of them all.
// `npm test -- checks core api browser` runs the named parts only.

import process from 'node:process';
import { endCommands } from './setup/commands.mjs';
import { leaseTestCluster } from './setup/lease.mjs';
import { preparePackages } from './setup/bring-up.mjs';
import { bold, reportFailure, SetupError, showDuration, step } from './setup/progress.mjs';
import { testSteps } from './setup/test-steps.mjs';
import { ensureCheckers, ensureChromium } from './setup/test-tools.mjs';

const PARTS = ['checks', 'core', 'api', 'browser'];

/** @type {Awaited<ReturnType<typeof leaseTestCluster>> | undefined} */
let cluster;
let isAborted = false;

/** @param {string[]} parts */
async function prepare(parts) {
  /** @param {string[]} names */
  const needs = (...names) => parts.length === 0 || names.some((name) => parts.includes(name));
  await preparePackages();
  if (needs('core', 'api', 'browser')) {
    await step('Programs that check exports', async (remark) => {
      const installed = await ensureCheckers();
      remark(installed.length === 0 ? 'there' : `installed ${installed.join(', ')}`);
    });
  }
  if (needs('browser')) await step('Browser', async (remark) => remark(await ensureChromium()));
  if (needs('api', 'browser')) {
    await step('PostgreSQL for the tests', async (remark) => {
      cluster = await leaseTestCluster();
      remark(`port ${cluster.port}`);
    });
  }
}

async function main() {
  const parts = process.argv.slice(2);
  const unknown = parts.filter((part) => !PARTS.includes(part));
  if (unknown.length > 0) {
    throw new SetupError(
      `Unknown part: ${unknown.join(', ')}.`,
      `Parts are: ${PARTS.join(', ')}. Without any, all run.`,
    );
  }
  const begun = Date.now();
  console.log(`\n${bold('Moiety: setting up the tests')}\n`);
  await prepare(parts);
  const sum = { passed: 0, failed: 0 };
  const lines = [];
  for (const { title, work } of testSteps(parts)) {
    if (isAborted) break;
    console.log(`\n${bold(title)}`);
    const from = Date.now();
    const count = await work();
    sum.passed += count.passed;
    sum.failed += count.failed;
    const skipped = count.skipped === 0 ? '' : `, ${count.skipped} skipped`;
    const mark = count.failed === 0 ? '✓' : '✗';
    lines.push(
      `  ${mark} ${title}: ${count.passed} passed, ${count.failed} failed${skipped} in ${showDuration(Date.now() - from)}`,
    );
    console.log(lines.at(-1));
  }
  if (isAborted) return 130;
  console.log(`\n${bold('All together')} in ${showDuration(Date.now() - begun)}\n${lines.join('\n')}\n`);
  console.log(`${sum.passed} passed, ${sum.failed} failed`);
  return sum.failed === 0 ? 0 : 1;
}

for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
  process.on(signal, () => {
    isAborted = true;
    endCommands();
  });
}

main()
  .catch((error) => {
    if (isAborted) return 130;
    reportFailure(error);
    return 1;
  })
  .then(async (code) => {
    process.exitCode = code;
    await cluster?.release();
  })
  .catch((error) => {
    reportFailure(error);
    process.exitCode = 1;
  });
