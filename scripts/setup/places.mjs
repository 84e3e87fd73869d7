// Where the two commands keep what they make on this machine. Everything is below `.moiety/`, which git ignores.

import crypto from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';

export const root = path.resolve(import.meta.dirname, '../..');
export const moiety = path.join(root, '.moiety');

/** @param {...string} parts */
export const inMoiety = (...parts) => path.join(moiety, ...parts);

/** Makes `.moiety` when it is missing. It stays readable: the database's system user has to pass through it. */
export function ensureMoiety() {
  fs.mkdirSync(moiety, { recursive: true, mode: 0o755 });
}

/**
 * Reads a JSON file of ours; a missing or broken file counts as the fallback, because all of them can be made again.
 * @template T
 * @param {string} file
 * @param {T} fallback
 * @returns {T}
 */
export function readJson(file, fallback) {
  try {
    return JSON.parse(fs.readFileSync(file, 'utf8'));
  } catch {
    return fallback;
  }
}

/**
 * Writes a JSON file in one go, so that a reader never sees half of it.
 * @param {string} file
 * @param {unknown} value
 * @param {number} [mode]
 */
export function writeJson(file, value, mode = 0o644) {
  fs.mkdirSync(path.dirname(file), { recursive: true });
  const draft = `${file}.${process.pid}.tmp`;
  fs.writeFileSync(draft, `${JSON.stringify(value, null, 2)}\n`, { mode });
  fs.renameSync(draft, file);
}

/** A short name for this folder, for things that must live outside it. */
export function folderHash() {
  return crypto.createHash('sha256').update(root).digest('hex').slice(0, 12);
}
