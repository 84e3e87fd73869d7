import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { sessionOf, startSetting, type Setting } from './fixture';

let setting: Setting;
beforeAll(async () => {
  setting = await startSetting();
});
afterAll(() => setting.stop());

const typed = {
  number: '4242 4242 4242 4242',
  expiry: '04/40',
  securityCode: '123',
  name: 'Test Buyer',
  email: 'buyer@mail.example',
};

async function open(amount = 5_000, name = 'Invoice 7') {
  const base = sessionOf(amount);
  const lines = base.line_items?.map((line) => ({
    ...line,
    price_data: { currency: 'usd', unit_amount: amount, product_data: { name } },
  }));
  const session = await setting.stripe.checkout.sessions.create({ ...base, line_items: lines });
  return { ...session, url: session.url ?? '' };
}

async function send(url: string, form: Record<string, string>) {
  const answer = await fetch(url, { method: 'POST', body: new URLSearchParams(form), redirect: 'manual' });
  return { status: answer.status, location: answer.headers.get('location'), html: await answer.text() };
}

describe('the payment page', () => {
  it('says what it is, names every field, and needs no script', async () => {
    const session = await open(128_480);
    const answer = await fetch(session.url);
    const html = await answer.text();
    expect(answer.headers.get('content-security-policy')).toContain("default-src 'none'");
    expect(html).toContain('Local test payments. No real card is charged.');
    expect(html).toContain('USD 1,284.80');
    expect(html).toContain('<html lang="en">');
    expect(html).not.toContain('<script');
    const inputs = [...html.matchAll(/<input id="(\w+)"/g)].map((match) => match[1]);
    expect(inputs).toEqual(['email', 'number', 'expiry', 'securityCode', 'name']);
    for (const id of inputs) expect(html).toContain(`<label for="${id}">`);
    expect(html).toContain('href="https://moiety.example/invoice"');
  });

  it('takes the money and leads to the address of success, with the session in it', async () => {
    const session = await open();
    const paid = await send(session.url, { ...typed, outcome: 'pay' });
    expect(paid).toMatchObject({
      status: 303,
      location: `https://moiety.example/paid?session=${session.id}`,
    });
    const again = await send(session.url, { ...typed, outcome: 'pay' });
    expect(again.status).toBe(409);
    expect(again.html).toContain('Already paid');
    const stored = await setting.stripe.checkout.sessions.retrieve(session.id);
    expect(stored.customer_details).toMatchObject({ email: 'buyer@mail.example', name: 'Test Buyer' });
  });

  it.each([
    ['number', '4242 4242 4242 4241', 'number is incorrect'],
    ['number', '4111 1111 1111 1111', 'no test card'],
    ['expiry', '04/20', 'in the past'],
    ['expiry', 'soon', 'month and year'],
    ['securityCode', '1', 'security code is invalid'],
    ['name', ' ', 'name on the card'],
    ['email', 'nobody', 'e-mail address'],
  ])('says what is wrong with %s "%s" and takes nothing', async (field, value, text) => {
    const session = await open();
    const answer = await send(session.url, { ...typed, [field]: value, outcome: 'pay' });
    expect(answer.status).toBe(422);
    expect(answer.html).toContain(text);
    expect(answer.html).toMatch(new RegExp(`<input id="${field}"[^>]* aria-invalid="true"`));
    expect(answer.html).not.toContain('4242 4242 4242 4241"');
    expect((await setting.stripe.checkout.sessions.retrieve(session.id)).payment_status).toBe('unpaid');
  });

  it('declines, and lets the buyer try again with the name kept', async () => {
    const session = await open();
    const declined = await send(session.url, { ...typed, number: '4000000000009995', outcome: 'pay' });
    expect(declined.status).toBe(402);
    expect(declined.html).toContain('role="alert"');
    expect(declined.html).toContain('insufficient funds');
    expect(declined.html).toContain('value="Test Buyer"');
    expect(declined.html).not.toContain('4000000000009995');
    expect((await send(session.url, { ...typed, outcome: 'decline' })).status).toBe(402);
    expect((await send(session.url, { ...typed, outcome: 'accept' })).status).toBe(303);
  });

  it('asks the bank, and goes by the answer', async () => {
    const session = await open();
    const asked = await send(session.url, { ...typed, outcome: 'challenge' });
    expect(asked).toMatchObject({ status: 303, location: `/pay/${session.id}/challenge` });
    const challenge = new URL(asked.location ?? '', setting.url).href;
    expect(await (await fetch(challenge)).text()).toContain('Your bank asks');
    const failed = await send(challenge, { answer: 'fail' });
    expect(failed.status).toBe(402);
    expect(failed.html).toContain('unable to authenticate');
    expect((await fetch(challenge, { redirect: 'manual' })).headers.get('location')).toBe(
      `/pay/${session.id}`,
    );
    await send(session.url, { ...typed, outcome: 'challenge' });
    expect((await send(challenge, { answer: 'accept' })).location).toContain(session.id);
    const stored = await setting.stripe.checkout.sessions.retrieve(session.id);
    expect(stored).toMatchObject({
      payment_status: 'paid',
      customer_details: { email: 'buyer@mail.example' },
    });
  });

  it('closes with the session, and shows text as text', async () => {
    const session = await open(5_000, '<b>Invoice & "7"</b>');
    expect(await (await fetch(session.url)).text()).toContain(
      '&lt;b&gt;Invoice &amp; &quot;7&quot;&lt;/b&gt;',
    );
    await setting.stripe.checkout.sessions.expire(session.id);
    expect(await (await fetch(session.url)).text()).toContain('This page has expired');
    expect((await send(session.url, { ...typed, outcome: 'pay' })).status).toBe(409);
    expect((await fetch(`${setting.url}/pay/cs_test_none`)).status).toBe(404);
  });
});

it('shows the last payments and the test cards at its root', async () => {
  const html = await (await fetch(setting.url)).text();
  expect(html).toContain('4000 0000 0000 0002');
  expect(html).toContain('USD 50.00');
});
