import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { createServer } from 'node:net';
import { describe, expect, test } from 'vitest';
import { run } from '../../../scripts/setup/commands.mjs';
import { localServices, plainVariables } from '../../../scripts/setup/environment.mjs';
import { processBirth, withLock } from '../../../scripts/setup/lock.mjs';
import { anyFreePort, isFree } from '../../../scripts/setup/ports.mjs';
import { countTests } from '../../../scripts/setup/test-steps.mjs';

describe('counting tests', () => {
  const report = {
    numPassedTests: 5,
    numFailedTests: 0,
    numPendingTests: 1,
    numTodoTests: 1,
    testResults: [],
  };

  test('sums what passed, failed and was skipped', () => {
    expect(countTests({ ...report, numFailedTests: 2 }, 1)).toEqual({ passed: 5, failed: 2, skipped: 2 });
    expect(countTests(report, 0)).toEqual({ passed: 5, failed: 0, skipped: 2 });
  });

  test('counts a file that could not be loaded as a failure', () => {
    const testResults = [{ status: 'failed', assertionResults: [] }];
    expect(countTests({ ...report, testResults }, 1).failed).toBe(1);
  });

  test('never passes a run that ended with an error or wrote no report', () => {
    expect(countTests(report, 1).failed).toBe(1);
    expect(countTests(null, 0)).toEqual({ passed: 0, failed: 1, skipped: 0 });
  });
});

describe('running programs', () => {
  test('returns what they write, and shows the end of it when they fail', async () => {
    expect(await run('/bin/sh', ['-c', 'cat; echo err >&2'], { input: 'in' })).toBe('in');
    await expect(run('/bin/sh', ['-c', 'echo the reason >&2; exit 3'], { what: 'It' })).rejects.toThrow(
      /It ended with 3\nthe reason/,
    );
    await expect(run('/no/such/program', [])).rejects.toThrow(/ENOENT/);
  });

  test('tells a process that runs from one that has ended', async () => {
    const child = spawn('/bin/sleep', ['30']);
    const { pid } = child;
    if (pid === undefined) throw new Error('sleep did not start');
    expect(processBirth(pid)).toMatch(/^\d+$/);
    child.kill('SIGKILL');
    await once(child, 'exit');
    expect(processBirth(pid)).toBeNull();
  });
});

test('a lock lets one in at a time', async () => {
  let inside = 0;
  let most = 0;
  const visit = () =>
    withLock('lock-test', async () => {
      inside += 1;
      most = Math.max(most, inside);
      await new Promise((resolve) => setTimeout(resolve, 20));
      inside -= 1;
    });
  await Promise.all([visit(), visit(), visit()]);
  expect(most).toBe(1);
});

test('a port counts as free only while nobody listens on it', async () => {
  const port = await anyFreePort();
  expect(await isFree(port)).toBe(true);
  const server = createServer().listen(port, '127.0.0.1');
  await once(server, 'listening');
  expect(await isFree(port)).toBe(false);
  server.close();
  await once(server, 'close');
});

describe('services that are ours to run', () => {
  test('are all of them when nothing is set', () => {
    expect(localServices({})).toEqual({ database: true, payments: true, mail: true });
  });

  test('are left alone where the person has set their own', () => {
    const own = {
      DATABASE_URL: 'postgres://a/b',
      DATABASE_OWNER_URL: 'postgres://a/b',
      STRIPE_SECRET_KEY: 'sk_live_1',
      STRIPE_WEBHOOK_SECRET: 'whsec_1',
      SMTP_URL: 'smtp://a',
    };
    expect(localServices(own)).toEqual({ database: false, payments: false, mail: false });
  });

  test('are refused when set by half', () => {
    expect(() => localServices({ DATABASE_URL: 'postgres://a/b' })).toThrow(/DATABASE_OWNER_URL is not/);
    expect(() => localServices({ STRIPE_SECRET_KEY: 'sk_live_1' })).toThrow(/only in part/);
  });

  test('get nothing from the environment of the tests', () => {
    expect(process.env.DATABASE_URL).toBeDefined();
    expect(Object.keys(plainVariables())).toContain('PATH');
    expect(
      Object.keys(plainVariables()).filter((name) => /^(DATABASE|STRIPE|SMTP|STORAGE|AUTH)_/.test(name)),
    ).toEqual([]);
  });
});
