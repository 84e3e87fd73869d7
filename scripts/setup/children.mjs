// Programs that keep running beside this one: started in their own process group, ended in order, remembered
// in a file so that a later command can end what a killed one has left behind.

import { spawn } from 'node:child_process';
import fs from 'node:fs';
import process from 'node:process';
import { setTimeout as sleep } from 'node:timers/promises';
import { processBirth } from './lock.mjs';
import { inMoiety, readJson, root, writeJson } from './places.mjs';
import { SetupError } from './progress.mjs';

/** How long a program may take to end by itself, in milliseconds. */
const PATIENCE = 10_000;

/**
 * @typedef {object} Child
 * @property {string} name
 * @property {number} pid also the number of its process group
 * @property {string} birth
 * @property {string} logFile
 * @property {() => Promise<void>} stop
 * @property {Promise<void>} ended
 */

/** @param {number} pid @param {string} birth */
const isSame = (pid, birth) => processBirth(pid) === birth;

/** @param {number} group @param {NodeJS.Signals} signal */
function signalGroup(group, signal) {
  try {
    process.kill(-group, signal);
  } catch {
    // it has ended meanwhile
  }
}

/**
 * Ends a process group: asks first, insists later.
 * @param {number} pid
 * @param {string} birth
 */
async function endGroup(pid, birth) {
  if (!isSame(pid, birth)) return;
  signalGroup(pid, 'SIGTERM');
  const until = Date.now() + PATIENCE;
  while (isSame(pid, birth) && Date.now() < until) await sleep(50);
  if (isSame(pid, birth)) signalGroup(pid, 'SIGKILL');
}

/**
 * @param {string} file
 * @param {number} lines
 */
export function lastLines(file, lines = 25) {
  try {
    return fs.readFileSync(file, 'utf8').trimEnd().split('\n').slice(-lines).join('\n');
  } catch {
    return '';
  }
}

/**
 * Starts a program in the background.
 * @param {{ name: string, program: string, args: string[], env: NodeJS.ProcessEnv, logFile?: string }} what
 * @returns {Child}
 */
export function startChild({ name, program, args, env, logFile = inMoiety('logs', `${name}.log`) }) {
  fs.mkdirSync(inMoiety('logs'), { recursive: true });
  const log = fs.openSync(logFile, 'w');
  // In a group of its own: Ctrl-C in the terminal reaches us alone, and we end the others in order.
  const child = spawn(program, args, { cwd: root, env, stdio: ['ignore', log, log], detached: true });
  fs.closeSync(log);
  const { pid } = child;
  if (pid === undefined) throw new SetupError(`${name} could not be started: ${program}`);
  const birth = processBirth(pid) ?? '';
  const ended = new Promise((/** @type {(value: void) => void} */ resolve) =>
    child.on('exit', () => resolve()),
  );
  child.on('error', () => {});
  return { name, pid, birth, logFile, ended, stop: () => endGroup(pid, birth) };
}

/**
 * Waits until an address answers.
 * @param {Child} child
 * @param {string} url
 * @param {number} [patience] milliseconds
 */
export async function waitForAnswer(child, url, patience = 60_000) {
  let hasEnded = false;
  void child.ended.then(() => {
    hasEnded = true;
  });
  const until = Date.now() + patience;
  for (;;) {
    if (hasEnded) {
      throw new SetupError(
        `${child.name} ended while starting.\n${lastLines(child.logFile)}`,
        `Its log is ${child.logFile}`,
      );
    }
    try {
      const answer = await fetch(url, { redirect: 'manual', signal: AbortSignal.timeout(15_000) });
      await answer.arrayBuffer();
      if (answer.status < 500) return;
    } catch {
      // not yet
    }
    if (Date.now() > until) {
      throw new SetupError(
        `${child.name} did not answer at ${url} within ${patience / 1000} s.\n${lastLines(child.logFile)}`,
        `Its log is ${child.logFile}`,
      );
    }
    await sleep(100);
  }
}

const runningFile = inMoiety('running.json');

/**
 * What a running `npm start` has written about itself.
 * @typedef {{ pid: number, birth: string, url: string, startedCluster: boolean, isStopping: boolean, children: { name: string, pid: number, birth: string }[] }} Running
 */

/** @param {Running | null} running */
export function rememberRunning(running) {
  if (running === null) fs.rmSync(runningFile, { force: true });
  else writeJson(runningFile, running);
}

/**
 * What is running now: an `npm start`, or what is left of one that was killed.
 * @returns {{ running: Running, isAlive: boolean } | null}
 */
export function findRunning() {
  const running = readJson(runningFile, /** @type {Running | null} */ (null));
  return running === null ? null : { running, isAlive: isSame(running.pid, running.birth) };
}

/** Waits until an `npm start` that was asked to stop has done so. */
export async function waitForStop() {
  const until = Date.now() + 4 * PATIENCE;
  while (findRunning()?.isAlive === true && Date.now() < until) await sleep(100);
}

/**
 * Ends an `npm start` of another terminal, or what is left of one.
 * @param {Running} running
 */
export async function endRunning(running) {
  if (isSame(running.pid, running.birth)) {
    try {
      process.kill(running.pid, 'SIGTERM');
    } catch {
      // it has ended meanwhile
    }
    const until = Date.now() + 3 * PATIENCE;
    while (isSame(running.pid, running.birth) && Date.now() < until) await sleep(100);
  }
  for (const child of [...running.children].reverse()) await endGroup(child.pid, child.birth);
  rememberRunning(null);
}
