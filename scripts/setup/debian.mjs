// Debian's packages, for what npm does not bring: PostgreSQL, a browser for the tests, programs that check exports.

import process from 'node:process';
import { findOnPath, run, succeeds } from './commands.mjs';
import { SetupError } from './progress.mjs';

let listsAreFresh = false;

/**
 * Installs packages with apt-get, as root or through sudo.
 * @param {string[]} packages
 * @param {string} purpose for the error message: "PostgreSQL", "a browser for the tests" …
 * @param {string} otherwise what a person can do where this is not possible
 */
export async function installFromDebian(packages, purpose, otherwise) {
  const byHand = `apt-get install ${packages.join(' ')}`;
  if (findOnPath('apt-get') === null) {
    throw new SetupError(`${purpose} is missing, and this system has no apt-get to install it.`, otherwise);
  }
  const isRoot = process.getuid?.() === 0;
  if (!isRoot && !(findOnPath('sudo') !== null && succeeds('sudo', ['-n', 'true']))) {
    throw new SetupError(
      `${purpose} is missing, and installing it needs root.`,
      `Run this once, then the same command again:\n  sudo ${byHand}\n${otherwise}`,
    );
  }
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C.UTF-8' };
  /** @param {string[]} args */
  const aptGet = (args) => {
    const words = ['apt-get', '-y', '-q', ...args];
    const command = isRoot ? words : ['sudo', '-n', 'env', 'DEBIAN_FRONTEND=noninteractive', ...words];
    return run(/** @type {string} */ (command[0]), command.slice(1), {
      env,
      what: `apt-get ${args[0]}`,
      todo: `Check the network, or run by hand:\n  ${byHand}\n${otherwise}`,
    });
  };
  if (!listsAreFresh) {
    await aptGet(['update']);
    listsAreFresh = true;
  }
  await aptGet(['install', '--no-install-recommends', ...packages]);
}
