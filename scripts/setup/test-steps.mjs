// What `npm test` runs, and how each step says how many of its tests passed.

import fs from 'node:fs';
import path from 'node:path';
import process from 'node:process';
import { ensureBuild } from './build.mjs';
import { run, runVisibly } from './commands.mjs';
import { plainVariables } from './environment.mjs';
import { inMoiety, readJson, root } from './places.mjs';
import { SetupError } from './progress.mjs';

/** @typedef {{ passed: number, failed: number, skipped: number }} Count */
/** @typedef {{ part: 'checks' | 'core' | 'api' | 'browser', title: string, work: () => Promise<Count> }} TestStep */

const environment = () => ({ ...plainVariables(), NEXT_TELEMETRY_DISABLED: '1' });

/** @param {string} file below node_modules @param {string[]} args */
const runModule = (file, args) =>
  run(process.execPath, [path.join(root, 'node_modules', file), ...args], {
    cwd: root,
    env: environment(),
    what: path.basename(file),
    shownLines: 200,
  });

/**
 * A check that passes or fails as a whole; what it says is shown when it fails.
 * @param {() => Promise<unknown>} work
 * @returns {() => Promise<Count>}
 */
const asOne = (work) => async () => {
  try {
    await work();
    return { passed: 1, failed: 0, skipped: 0 };
  } catch (error) {
    if (!(error instanceof SetupError)) throw error;
    console.error(error.message);
    return { passed: 0, failed: 1, skipped: 0 };
  }
};

/**
 * @typedef {object} VitestReport what vitest's json reporter writes, as far as it is needed
 * @property {number} numPassedTests
 * @property {number} numFailedTests
 * @property {number} numPendingTests
 * @property {number} numTodoTests
 * @property {{ status: string, assertionResults: unknown[] }[]} testResults
 */

/**
 * Counts a run of vitest. A file that could not be loaded counts as one failed test, and so does a run that
 * ended with an error without naming one.
 * @param {VitestReport | null} report null when none was written
 * @param {number} exitCode
 * @returns {Count}
 */
export function countTests(report, exitCode) {
  if (report === null) return { passed: 0, failed: 1, skipped: 0 };
  const unloaded = report.testResults.filter(
    (file) => file.status === 'failed' && file.assertionResults.length === 0,
  ).length;
  const failed = report.numFailedTests + unloaded;
  return {
    passed: report.numPassedTests,
    failed: failed === 0 && exitCode !== 0 ? 1 : failed,
    skipped: report.numPendingTests + report.numTodoTests,
  };
}

/** @param {string} project @param {string[]} filters */
const vitest = (project, filters) => async () => {
  const output = inMoiety('test-results', `${project}.json`);
  fs.rmSync(output, { force: true });
  const code = await runVisibly(
    process.execPath,
    [
      path.join(root, 'node_modules/vitest/vitest.mjs'),
      ...[
        'run',
        '--project',
        project,
        '--reporter=default',
        '--reporter=json',
        `--outputFile.json=${output}`,
      ],
      ...filters,
    ],
    { cwd: root, env: environment() },
  );
  return countTests(readJson(output, null), code);
};

/**
 * @param {string[]} parts which parts to run; all when empty
 * @returns {TestStep[]} in the order in which they run: the quick ones first
 */
export function testSteps(parts) {
  /** @type {TestStep[]} */
  const steps = [
    {
      part: 'checks',
      title: 'Types',
      work: asOne(async () => {
        await runModule('next/dist/bin/next', ['typegen']);
        await runModule('typescript/bin/tsc', ['--noEmit']);
      }),
    },
    {
      part: 'checks',
      title: 'Lint',
      work: asOne(() => runModule('eslint/bin/eslint.js', ['.', '--max-warnings', '0'])),
    },
    { part: 'checks', title: 'Directions of imports', work: asOne(() => runNpm('depcheck')) },
    { part: 'checks', title: 'Dead code', work: asOne(() => runNpm('deadcode')) },
    { part: 'core', title: 'Tests of the core', work: vitest('core', []) },
    { part: 'api', title: 'Tests of the API', work: vitest('api', []) },
    { part: 'browser', title: 'Build', work: asOne(() => ensureBuild()) },
    { part: 'browser', title: 'Tests in the browser', work: vitest('browser', []) },
  ];
  return parts.length === 0 ? steps : steps.filter((step) => parts.includes(step.part));
}

/**
 * Runs a script of package.json as npm would, without npm.
 * @param {'depcheck' | 'deadcode'} name
 */
function runNpm(name) {
  const { scripts } = readJson(path.join(root, 'package.json'), {
    scripts: /** @type {Record<string, string>} */ ({}),
  });
  return run('/bin/sh', ['-c', scripts[name] ?? 'false'], {
    cwd: root,
    env: { ...environment(), PATH: `${path.join(root, 'node_modules/.bin')}:${process.env.PATH ?? ''}` },
    what: `npm run ${name}`,
    shownLines: 200,
  });
}
