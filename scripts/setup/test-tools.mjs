// Programs that the tests drive: a browser, and general-purpose ones that check what the product exports.

import process from 'node:process';
import { findOnPath } from './commands.mjs';
import { installFromDebian } from './debian.mjs';

const BROWSERS = ['chromium', 'chromium-browser', 'google-chrome', 'google-chrome-stable'];

/** The browser for the tests: CHROMIUM_PATH, or the first one found on PATH. */
function findChromium() {
  const set = process.env.CHROMIUM_PATH;
  if (set !== undefined && set !== '') return set;
  for (const name of BROWSERS) {
    const found = findOnPath(name);
    if (found !== null) return found;
  }
  return null;
}

/**
 * Finds or installs the browser.
 * @returns {Promise<string>} its path
 */
export async function ensureChromium() {
  const found = findChromium();
  if (found !== null) return found;
  await installFromDebian(
    ['chromium', 'chromium-sandbox'],
    'A browser for the tests (Chromium)',
    'Or install Chromium or Chrome in another way and set CHROMIUM_PATH to it.',
  );
  const installed = findChromium();
  if (installed === null) throw new Error('Chromium was installed but is not on PATH');
  return installed;
}

/** Program on PATH → Debian's package. */
const CHECKERS = { hledger: 'hledger', 'bean-check': 'beancount', pdftotext: 'poppler-utils' };

/**
 * Finds or installs the programs that check exports: two bookkeeping programs and a reader of PDF.
 * @returns {Promise<string[]>} the packages that were installed now
 */
export async function ensureCheckers() {
  const missing = Object.entries(CHECKERS).flatMap(([program, name]) =>
    findOnPath(program) === null ? [name] : [],
  );
  if (missing.length > 0) {
    await installFromDebian(
      missing,
      `For the tests, ${missing.join(', ')}`,
      'Or install them in another way.',
    );
  }
  return missing;
}
