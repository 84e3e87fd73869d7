// Where a cluster's data lies. As root it belongs to the system user `postgres`, who must be able to walk there.

import { execFileSync } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import process from 'node:process';
import { succeeds } from './commands.mjs';
import { ensureMoiety, folderHash, inMoiety } from './places.mjs';
import { asClusterUser } from './postgres-binaries.mjs';
import { SetupError } from './progress.mjs';

/** The user and group that own the cluster's files, or null when they are our own. */
export function clusterOwner() {
  if (process.getuid?.() !== 0) return null;
  const id = (/** @type {string} */ flag) =>
    Number(execFileSync('id', [flag, 'postgres'], { encoding: 'utf8' }));
  return { uid: id('-u'), gid: id('-g') };
}

/**
 * The folder for a cluster: `.moiety/<name>`, or one below /var/tmp when the system user cannot walk through
 * the parents of this tree (a root user's home is closed to others). A pointer file in `.moiety` remembers it.
 * @param {string} name
 */
export function clusterFolder(name) {
  ensureMoiety();
  const pointer = inMoiety(`${name}.folder`);
  if (fs.existsSync(pointer)) return fs.readFileSync(pointer, 'utf8').trim();
  const inside = inMoiety(name);
  if (fs.existsSync(inside) || clusterOwner() === null) return inside;
  const [program, args] = asClusterUser('test', ['-x', inMoiety()]);
  if (succeeds(program, args)) return inside;
  const outside = path.join('/var/tmp', `moiety-${folderHash()}`, name);
  fs.writeFileSync(pointer, `${outside}\n`);
  return outside;
}

/**
 * Makes the empty folder that initdb fills, owned by the user that the cluster runs as.
 * @param {string} folder
 */
export function makeClusterFolder(folder) {
  const owner = clusterOwner();
  fs.mkdirSync(path.dirname(folder), { recursive: true, mode: 0o755 });
  if (fs.existsSync(folder) && fs.readdirSync(folder).length > 0) {
    throw new SetupError(
      `${folder} holds something that is not a complete database cluster.`,
      'Start over with:\n  npm run reset',
    );
  }
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  if (owner !== null) fs.chownSync(folder, owner.uid, owner.gid);
}
