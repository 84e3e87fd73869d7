// Progress lines with durations, and the one kind of error that is shown to a person without a stack.

import process from 'node:process';

/** An error that a person can do something about: `what` went wrong and what `todo` about it. */
export class SetupError extends Error {
  /**
   * @param {string} what one sentence
   * @param {string} [todo] what to do now; may have several lines
   */
  constructor(what, todo) {
    super(what);
    this.name = 'SetupError';
    this.todo = todo;
  }
}

const colour = process.stdout.isTTY === true && process.env.NO_COLOR === undefined;
/** @param {string} code @param {string} text */
const paint = (code, text) => (colour ? `\u001b[${code}m${text}\u001b[0m` : text);
/** @param {string} text */
export const bold = (text) => paint('1', text);
/** @param {string} text */
export const dim = (text) => paint('2', text);

/** @param {number} milliseconds */
export function showDuration(milliseconds) {
  if (milliseconds < 60_000) return `${(milliseconds / 1000).toFixed(1)} s`;
  const seconds = Math.round(milliseconds / 1000);
  return `${Math.floor(seconds / 60)} min ${seconds % 60} s`;
}

/**
 * Runs one step of a set-up and prints one line with its duration; `work` may return a remark for that line.
 * @template T
 * @param {string} title
 * @param {(remark: (text: string) => void) => Promise<T> | T} work
 * @returns {Promise<T>}
 */
export async function step(title, work) {
  const begun = Date.now();
  let note = '';
  if (colour) process.stdout.write(`  … ${title}\r`);
  try {
    const result = await work((text) => {
      note = text;
    });
    const tail = note === '' ? '' : dim(` (${note})`);
    console.log(`  ${paint('32', '✓')} ${title}${tail} ${dim(showDuration(Date.now() - begun))}`);
    return result;
  } catch (error) {
    console.log(`  ${paint('31', '✗')} ${title} ${dim(showDuration(Date.now() - begun))}`);
    throw error;
  }
}

/**
 * Prints an error for a person: set-up errors with what to do, anything else with its stack.
 * @param {unknown} error
 */
export function reportFailure(error) {
  if (error instanceof SetupError) {
    console.error(`\n${paint('31', 'Stopped:')} ${error.message}`);
    if (error.todo !== undefined) console.error(`\n${error.todo.replace(/^/gm, '  ')}`);
    console.error('');
    return;
  }
  console.error(error);
}
