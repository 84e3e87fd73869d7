// One at a time: two commands that both want to make or start the same thing wait for each other.

import fs from 'node:fs';
import process from 'node:process';
import { setTimeout as sleep } from 'node:timers/promises';
import { ensureMoiety, inMoiety } from './places.mjs';
import { SetupError } from './progress.mjs';

/**
 * When a process began, in the kernel's ticks since boot; tells a process from a later one with the same number.
 * @param {number} pid
 * @returns {string | null} null when there is no such process, '' where the system does not tell
 */
export function processBirth(pid) {
  try {
    process.kill(pid, 0);
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'EPERM') return null;
  }
  try {
    // The second field, the program's name in parentheses, may hold spaces.
    const stat = fs.readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    // A process that has ended keeps its entry until its parent asks; where nobody asks, for good.
    return fields[0] === 'Z' ? null : (fields[19] ?? '');
  } catch {
    return '';
  }
}

/** @param {string} text */
function isHeld(text) {
  const [pid, birth] = text.split(' ');
  const now = processBirth(Number(pid));
  return now !== null && (birth === undefined || now === birth);
}

/**
 * Runs `work` while holding a lock file in `.moiety`. A lock whose holder is gone is taken over.
 * @template T
 * @param {string} name
 * @param {() => Promise<T>} work
 * @param {number} [patience] milliseconds
 * @returns {Promise<T>}
 */
export async function withLock(name, work, patience = 180_000) {
  ensureMoiety();
  const file = inMoiety(`${name}.lock`);
  const mine = `${process.pid} ${processBirth(process.pid) ?? ''}`;
  const until = Date.now() + patience;
  for (;;) {
    try {
      fs.writeFileSync(file, mine, { flag: 'wx' });
      break;
    } catch (error) {
      if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'EEXIST') throw error;
    }
    let holder = '';
    try {
      holder = fs.readFileSync(file, 'utf8');
    } catch {
      continue;
    }
    if (holder !== '' && !isHeld(holder)) {
      fs.rmSync(file, { force: true });
      continue;
    }
    if (Date.now() > until) {
      throw new SetupError(
        `Another command has held ${file} for too long.`,
        `If nothing is running any more, remove that file and try again.`,
      );
    }
    await sleep(100);
  }
  try {
    return await work();
  } finally {
    fs.rmSync(file, { force: true });
  }
}
