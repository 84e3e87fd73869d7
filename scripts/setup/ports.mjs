// Ports on this machine: a free one near the usual one, remembered so that addresses stay the same.

import net from 'node:net';
import { inMoiety, readJson, writeJson } from './places.mjs';
import { SetupError } from './progress.mjs';

const file = inMoiety('ports.json');

/**
 * Whether nothing listens on this port of the loopback interface.
 * @param {number} port
 * @returns {Promise<boolean>}
 */
export function isFree(port) {
  return new Promise((resolve) => {
    const server = net.createServer();
    server.once('error', () => resolve(false));
    server.listen({ port, host: '127.0.0.1', exclusive: true }, () => server.close(() => resolve(true)));
  });
}

/**
 * The port for a service: the one it had last time, else the usual one, else the next free one.
 * @param {string} name
 * @param {number} usual
 * @param {{ taken?: number[] }} [options] ports that are promised to others already
 */
export async function choosePort(name, usual, options = {}) {
  const remembered = readJson(file, /** @type {Record<string, number>} */ ({}));
  const first = remembered[name] ?? usual;
  const reserved = new Set(options.taken ?? []);
  for (const [other, port] of Object.entries(remembered)) if (other !== name) reserved.add(port);
  const candidates = [first, usual, ...Array.from({ length: 200 }, (_, i) => usual + 1 + i)];
  for (const port of candidates) {
    if (reserved.has(port) || !(await isFree(port))) continue;
    writeJson(file, { ...readJson(file, {}), [name]: port });
    return port;
  }
  throw new SetupError(
    `No free port for ${name} between ${usual} and ${usual + 200}.`,
    'End what uses them (ss -ltnp shows who).',
  );
}

/**
 * The port that a person asked for, and no other.
 * @param {string} text
 */
export async function requirePort(text) {
  const port = Number(text);
  if (!Number.isInteger(port) || port < 1 || port > 65_535) {
    throw new SetupError(`PORT is "${text}"; expected: a whole number from 1 to 65535.`);
  }
  if (!(await isFree(port))) {
    throw new SetupError(`Port ${port} is taken.`, 'Set another PORT, or none: then a free one is chosen.');
  }
  return port;
}

/**
 * A port that the system says is free now; for tests, which need not remember it.
 * @returns {Promise<number>}
 */
export function anyFreePort() {
  return new Promise((resolve, reject) => {
    const server = net.createServer();
    server.once('error', reject);
    server.listen({ port: 0, host: '127.0.0.1' }, () => {
      const address = server.address();
      const port = typeof address === 'object' && address !== null ? address.port : 0;
      server.close(() => resolve(port));
    });
  });
}
