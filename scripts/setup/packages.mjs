// The right Node.js, and the packages exactly as the lock file says.

import crypto from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import process from 'node:process';
import { run } from './commands.mjs';
import { withLock } from './lock.mjs';
import { ensureMoiety, inMoiety, readJson, root, writeJson } from './places.mjs';
import { SetupError } from './progress.mjs';

/** Stops with an explanation when this Node.js cannot run the product. */
export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  // 21 has no long-term support; below 20.12 the set-up lacks what it needs to read .env.local.
  if ((major === 20 && minor >= 12) || major >= 22) return process.versions.node;
  throw new SetupError(
    `Node.js ${process.versions.node} is running this, but 20.12 or newer (20, or 22 and later) is needed.`,
    'Install Node.js 20 from https://nodejs.org or with your version manager.',
  );
}

/**
 * Whether what lies in node_modules is what the lock file lists, by npm's own record of it. Packages for
 * other systems are optional and may be missing.
 */
function matchesLock() {
  const lock = readJson(path.join(root, 'package-lock.json'), { packages: {} });
  const present = readJson(path.join(root, 'node_modules/.package-lock.json'), { packages: {} });
  const wanted = Object.entries(/** @type {Record<string, LockEntry>} */ (lock.packages)).filter(
    ([place]) => place !== '',
  );
  const found = /** @type {Record<string, LockEntry>} */ (present.packages);
  if (wanted.length === 0 || Object.keys(found).length === 0) return false;
  return wanted.every(([place, entry]) => {
    const here = found[place];
    if (here === undefined)
      return entry.optional === true || entry.devOptional === true || entry.peer === true;
    return here.version === entry.version && fs.existsSync(path.join(root, place, 'package.json'));
  });
}

/** @typedef {{ version?: string, optional?: boolean, devOptional?: boolean, peer?: boolean }} LockEntry */

/**
 * Installs the packages from the lock file when node_modules is not what it says.
 * @returns {Promise<boolean>} whether something was installed
 */
export function ensurePackages() {
  return withLock('packages', async () => {
    const lockFile = path.join(root, 'package-lock.json');
    const hash = crypto.createHash('sha256').update(fs.readFileSync(lockFile)).digest('hex');
    const stamp = inMoiety('packages.json');
    const wanted = { lock: hash, node: process.versions.modules };
    const kept = readJson(stamp, { lock: '', node: '' });
    const isStamped = kept.lock === wanted.lock && kept.node === wanted.node;
    if (isStamped && fs.existsSync(path.join(root, 'node_modules/.package-lock.json'))) return false;
    if (matchesLock()) {
      writeJson(stamp, wanted);
      return false;
    }
    ensureMoiety();
    // No package needs an install script to run; leaving them out is quicker and safer.
    const args = ['ci', '--include=dev', '--include=optional', '--ignore-scripts', '--no-audit', '--no-fund'];
    const npm = process.env.npm_execpath;
    const [program, words] = npm?.endsWith('.js') ? [process.execPath, [npm, ...args]] : ['npm', args];
    await run(program, words, {
      cwd: root,
      what: 'npm ci',
      todo: 'Check the network and the registry (npm ping), then run the same command again.',
      logFile: inMoiety('logs/npm-ci.log'),
    });
    writeJson(stamp, wanted);
    return true;
  });
}
