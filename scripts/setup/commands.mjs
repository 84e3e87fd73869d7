// Running other programs: to the end, with their output kept for the error message.

import { spawn, spawnSync } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { SetupError } from './progress.mjs';

/** Programs that run now. @type {Set<import('node:child_process').ChildProcess>} */
const active = new Set();

/** Ends the programs that `run` and `runVisibly` are waiting for, when this one is asked to stop. */
export function endCommands() {
  for (const child of active) child.kill('SIGTERM');
}

/**
 * Runs a program to its end and returns what it wrote.
 * @param {string} program
 * @param {string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, input?: string, what?: string, todo?: string, logFile?: string, shownLines?: number }} [options]
 * @returns {Promise<string>} standard output
 * @throws {SetupError} when it cannot be started or ends with an error; the last lines are in the message
 */
export function run(program, args, options = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, {
      cwd: options.cwd,
      env: options.env ?? process.env,
      stdio: [options.input === undefined ? 'ignore' : 'pipe', 'pipe', 'pipe'],
    });
    active.add(child);
    let out = '';
    let all = '';
    const keep = (/** @type {Buffer} */ chunk) => {
      all = (all + chunk.toString()).slice(-200_000);
    };
    child.stdout?.on('data', (chunk) => {
      out += chunk.toString();
      keep(chunk);
    });
    child.stderr?.on('data', keep);
    if (options.input !== undefined) {
      child.stdin?.on('error', () => {});
      child.stdin?.end(options.input);
    }
    const what = options.what ?? `${path.basename(program)} ${args[0] ?? ''}`.trim();
    child.on('error', (error) => reject(new SetupError(`${what}: ${error.message}`, options.todo)));
    // 'exit', not 'close': a daemon that the program leaves behind may hold the pipes open.
    child.on('exit', (code, signal) => {
      active.delete(child);
      setTimeout(() => {
        if (options.logFile !== undefined) {
          fs.mkdirSync(path.dirname(options.logFile), { recursive: true });
          fs.writeFileSync(options.logFile, all);
        }
        if (code === 0) return resolve(out);
        const tail = all
          .trimEnd()
          .split('\n')
          .slice(-(options.shownLines ?? 40))
          .join('\n');
        const how = signal === null ? `ended with ${code}` : `was ended by ${signal}`;
        return reject(new SetupError(`${what} ${how}\n${tail}`, options.todo));
      }, 10);
    });
  });
}

/**
 * Runs a program to its end, its output going to the terminal.
 * @param {string} program
 * @param {string[]} args
 * @param {{ cwd: string, env: NodeJS.ProcessEnv }} options
 * @returns {Promise<number>} its exit code; 1 when it was ended by a signal
 */
export function runVisibly(program, args, { cwd, env }) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, { cwd, env, stdio: ['ignore', 'inherit', 'inherit'] });
    active.add(child);
    child.on('error', reject);
    child.on('exit', (code) => {
      active.delete(child);
      resolve(code ?? 1);
    });
  });
}

/**
 * The full path of a program on PATH, or null.
 * @param {string} name
 */
export function findOnPath(name) {
  for (const folder of (process.env.PATH ?? '').split(path.delimiter)) {
    if (folder === '') continue;
    const candidate = path.join(folder, name);
    try {
      fs.accessSync(candidate, fs.constants.X_OK);
      if (fs.statSync(candidate).isFile()) return candidate;
    } catch {
      // not here
    }
  }
  return null;
}

/**
 * Whether a program runs and ends well.
 * @param {string} program
 * @param {string[]} args
 */
export function succeeds(program, args) {
  return spawnSync(program, args, { stdio: 'ignore', cwd: '/' }).status === 0;
}
