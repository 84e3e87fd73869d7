import { AxeBuilder } from '@axe-core/playwright';
import { chromium, type Browser, type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';

const { appUrl, accounts, chromium: executablePath } = inject('builtApp');
const flags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

let browser: Browser;
beforeAll(async () => {
  browser = await chromium.launch({ executablePath, args: flags });
});
afterAll(() => browser.close());

/** A person's browser window, signed in through the page as they would do it. */
async function signedIn(role: string, viewport = { width: 1440, height: 900 }): Promise<Page> {
  const account = accounts.find((candidate) => candidate.role === role);
  if (!account) throw new Error(`The demo has no ${role}.`);
  const context = await browser.newContext({ viewport, baseURL: appUrl });
  const page = await context.newPage();
  await page.goto('/sign-in');
  await page.getByLabel('Mail address').fill(account.email);
  await page.getByLabel('Password').fill(account.password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL(/\/collection/);
  return page;
}

async function violations(page: Page): Promise<string[]> {
  const { violations: found } = await new AxeBuilder({ page }).analyze();
  return found.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.target.join(' ')).join(', ')}`);
}

describe('the front door', () => {
  test('a visitor is sent to sign in and comes back to where they were going', async () => {
    const context = await browser.newContext({ baseURL: appUrl });
    const page = await context.newPage();
    await page.goto('/kilnhouse/season');
    expect(new URL(page.url()).pathname).toBe('/sign-in');
    expect(new URL(page.url()).searchParams.get('next')).toContain('/kilnhouse');
    expect(await violations(page)).toEqual([]);
    await context.close();
  });

  test('a wrong password says so and keeps the address that was typed', async () => {
    const context = await browser.newContext({ baseURL: appUrl });
    const page = await context.newPage();
    await page.goto('/sign-in');
    await page.getByLabel('Mail address').fill('nobody@kilnhouse.example');
    await page.getByLabel('Password').fill('not the password');
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();
    await page.getByText('Address or password is not right.').waitFor();
    expect(await page.getByLabel('Mail address').inputValue()).toBe('nobody@kilnhouse.example');
    await context.close();
  });
});

describe('inside the workspace', () => {
  test('the owner finds the animals, the season and the joint projects, without an accessibility violation', async () => {
    const page = await signedIn('owner');
    for (const place of ['collection', 'season', 'projects']) {
      await page.goto(`/kilnhouse/${place}`);
      await page.getByRole('heading', { level: 1 }).waitFor();
      expect({ place, violations: await violations(page) }).toEqual({ place, violations: [] });
    }
    await page.context().close();
  });

  test('the keeper is shown no money in the season', async () => {
    const page = await signedIn('keeper');
    await page.goto('/kilnhouse/season');
    await page.getByRole('heading', { level: 1 }).waitFor();
    expect(await page.locator('main').innerText()).not.toMatch(/\$\s?\d/);
    await page.context().close();
  });

  test('an address of a workspace that one is not a member of looks like one that does not exist', async () => {
    const page = await signedIn('partner');
    const answer = await page.goto('/some-other-house/season');
    expect(answer?.status()).toBe(404);
    await page.context().close();
  });
});
