// The production build, made again only when something that goes into it has changed.

import crypto from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import process from 'node:process';
import { run } from './commands.mjs';
import { withLock } from './lock.mjs';
import { inMoiety, readJson, root, writeJson } from './places.mjs';

/** What the build reads. Tests, seeds and scripts are not in it. */
const FOLDERS = ['app', 'components', 'db', 'fonts', 'lib', 'public'];
const FILE_PATTERN =
  /^(package-lock\.json|tsconfig\.json|next\.config\.ts|postcss\.config\.mjs|[a-z-]+\.tsx?)$/;
const NOT_SOURCES = new Set(['next-env.d.ts', 'vitest.config.ts', 'drizzle.config.ts', 'knip.ts']);

/** @param {string} folder @returns {string[]} */
function filesBelow(folder) {
  if (!fs.existsSync(folder)) return [];
  return fs.readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const file = path.join(folder, entry.name);
    return entry.isDirectory() ? filesBelow(file) : entry.isFile() ? [file] : [];
  });
}

/** A digest of every source file's name and content. */
function hashSources() {
  const files = [
    ...fs
      .readdirSync(root)
      .filter((name) => FILE_PATTERN.test(name) && !NOT_SOURCES.has(name))
      .map((name) => path.join(root, name)),
    ...FOLDERS.flatMap((folder) => filesBelow(path.join(root, folder))),
  ].sort();
  const hash = crypto.createHash('sha256').update(process.versions.modules);
  for (const file of files) {
    const content = fs.readFileSync(file);
    hash.update(`${path.relative(root, file)}\0${content.length}\0`).update(content);
  }
  return hash.digest('hex');
}

/** @param {string} distDir */
function buildId(distDir) {
  try {
    return fs.readFileSync(path.join(root, distDir, 'BUILD_ID'), 'utf8');
  } catch {
    return null;
  }
}

/**
 * Builds unless the present build was made from the same sources.
 * @param {{ distDir?: string }} [options]
 * @returns {Promise<boolean>} whether it was built now
 */
export function ensureBuild(options = {}) {
  const distDir = options.distDir ?? '.next';
  return withLock(
    'build',
    async () => {
      const stamp = inMoiety(`build${distDir.replaceAll('/', '-')}.json`);
      // Before the build, so that an edit during it leads to another one.
      const sources = hashSources();
      const kept = readJson(stamp, { sources: '', id: '' });
      if (kept.sources === sources && kept.id !== '' && kept.id === buildId(distDir)) return false;
      await run(process.execPath, [path.join(root, 'node_modules/next/dist/bin/next'), 'build'], {
        cwd: root,
        env: {
          ...process.env,
          NODE_ENV: 'production',
          NEXT_DIST_DIR: distDir,
          NEXT_TELEMETRY_DISABLED: '1',
          NO_COLOR: '1',
        },
        what: 'next build',
        todo: 'The whole output is in .moiety/logs/build.log',
        logFile: inMoiety('logs/build.log'),
      });
      writeJson(stamp, { sources, id: buildId(distDir) });
      return true;
    },
    15 * 60_000,
  );
}
