// Finds PostgreSQL's programs on this machine, or installs Debian's package.

import fs from 'node:fs';
import path from 'node:path';
import process from 'node:process';
import { findOnPath, run, succeeds } from './commands.mjs';
import { installFromDebian } from './debian.mjs';
import { SetupError } from './progress.mjs';

/** Views that run with the rights of the reader, on which the isolation of workspaces rests, came with 15. */
const OLDEST = 15;

const otherwise =
  'Or install PostgreSQL 15 or newer in another way and put its bin folder on PATH,\n' +
  'or point DATABASE_URL and DATABASE_OWNER_URL at a server that runs already (see README.md).';

/** @param {string} folder */
const isComplete = (folder) =>
  ['initdb', 'pg_ctl', 'postgres', 'psql'].every((name) => fs.existsSync(path.join(folder, name)));

/** @param {string} folder */
async function majorOf(folder) {
  const text = await run(path.join(folder, 'postgres'), ['--version'], { cwd: '/' });
  return Number(/(\d+)(?:\.|\s|$|[a-z])/.exec(text.replace('PostgreSQL', ''))?.[1] ?? 0);
}

/** Folders that may hold the programs: PATH first, then Debian's, the newest first. */
function candidates() {
  const found = [];
  const onPath = findOnPath('initdb');
  if (onPath !== null) found.push(path.dirname(fs.realpathSync(onPath)));
  const debian = '/usr/lib/postgresql';
  if (fs.existsSync(debian)) {
    const versions = fs.readdirSync(debian).sort((a, b) => Number(b) - Number(a));
    found.push(...versions.map((version) => path.join(debian, version, 'bin')));
  }
  return found.filter(isComplete);
}

/**
 * The folder with initdb, pg_ctl, postgres and psql.
 * @returns {Promise<{ bin: string, major: number, installed: boolean }>}
 */
export async function findPostgres() {
  for (const attempt of ['look', 'install']) {
    if (attempt === 'install') await installFromDebian(['postgresql'], 'PostgreSQL', otherwise);
    for (const bin of candidates()) {
      const major = await majorOf(bin);
      if (major >= OLDEST) return { bin, major, installed: attempt === 'install' };
    }
  }
  throw new SetupError(`No PostgreSQL of version ${OLDEST} or newer was found.`, otherwise);
}

/**
 * PostgreSQL refuses to run as root: as root, its programs run as the system user `postgres`.
 * @param {string} program
 * @param {string[]} args
 * @returns {[string, string[]]}
 */
export function asClusterUser(program, args) {
  if (process.getuid?.() !== 0) return [program, args];
  if (!succeeds('id', ['-u', 'postgres'])) {
    throw new SetupError(
      'PostgreSQL refuses to run as root, and there is no system user "postgres" to run it as.',
      'Run this as an ordinary user, or add the user:\n  useradd --system postgres',
    );
  }
  return ['runuser', ['-u', 'postgres', '--', program, ...args]];
}
