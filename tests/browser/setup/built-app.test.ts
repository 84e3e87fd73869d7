import { describe, expect, inject, test } from 'vitest';

const { appUrl, inboxUrl, paymentsUrl, accounts } = inject('builtApp');

describe('the product as the browser tests find it', () => {
  test.each([
    ['app', appUrl],
    ['inbox', inboxUrl],
    ['payment page', paymentsUrl],
  ])('the %s answers', async (_name, url) => {
    const answer = await fetch(url);
    expect(answer.status).toBeLessThan(500);
  });

  test('everybody in the demo scenario can sign in, and nobody with another password', async () => {
    expect(accounts.map((account) => account.role)).toEqual(
      expect.arrayContaining(['owner', 'partner', 'keeper', 'accountant']),
    );
    const signIn = (email: string, password: string) =>
      fetch(`${appUrl}/api/auth/sign-in/email`, {
        method: 'POST',
        headers: { 'Content-Type': 'application/json', Origin: appUrl },
        body: JSON.stringify({ email, password }),
      });
    const statuses: Record<string, number> = {};
    for (const { email, password } of accounts) statuses[email] = (await signIn(email, password)).status;
    expect(statuses).toEqual(Object.fromEntries(accounts.map(({ email }) => [email, 200])));
    const [first] = accounts;
    expect((await signIn(first?.email ?? '', 'not the password')).status).toBe(401);
  });
});
