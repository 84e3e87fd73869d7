import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, expect, it } from 'vitest';
import { connect, payCharge, sessionOf, startSetting, webhookSecret, type Setting } from './fixture';
import { startLocalPayments } from '../../../scripts/local-payments/start-local-payments';

const settings: Setting[] = [];
async function start(options: Parameters<typeof startSetting>[0] = {}) {
  const setting = await startSetting(options);
  settings.push(setting);
  return setting;
}
afterEach(async () => {
  for (const setting of settings.splice(0)) await setting.stop();
});

it('pages through lists from both ends, newest first', async () => {
  const { stripe } = await start();
  const ids: string[] = [];
  for (let at = 0; at < 7; at += 1) ids.unshift((await stripe.customers.create({ name: `Buyer ${at}` })).id);
  const first = await stripe.customers.list({ limit: 3 });
  expect(first.data.map(({ id }) => id)).toEqual(ids.slice(0, 3));
  expect(first.has_more).toBe(true);
  const last = await stripe.customers.list({ limit: 3, starting_after: ids[5] });
  expect(last).toMatchObject({ has_more: false, data: [{ id: ids[6] }] });
  const before = await stripe.customers.list({ limit: 2, ending_before: ids[4] });
  expect(before.data.map(({ id }) => id)).toEqual([ids[2], ids[3]]);
  const all: string[] = [];
  for await (const customer of stripe.customers.list({ limit: 2 })) all.push(customer.id);
  expect(all).toEqual(ids);
  await expect(stripe.customers.list({ limit: 101 })).rejects.toMatchObject({ statusCode: 400 });
  await expect(stripe.customers.list({ starting_after: 'cus_none' })).rejects.toMatchObject({
    statusCode: 404,
  });
});

it('expands inside lists, and refuses what is no object', async () => {
  const setting = await start();
  const { charge } = await payCharge(setting, 10_000);
  const listed = await setting.stripe.charges.list({ expand: ['data.balance_transaction'] });
  expect(listed.data[0]?.balance_transaction).toMatchObject({ object: 'balance_transaction', fee: 320 });
  await expect(setting.stripe.charges.retrieve(charge.id, { expand: ['colour'] })).rejects.toThrow(
    /expanded/,
  );
});

it('unsets metadata with an empty text', async () => {
  const { stripe } = await start();
  const { id } = await stripe.customers.create({ metadata: { a: '1', b: '2' } });
  expect((await stripe.customers.update(id, { metadata: { a: '' } })).metadata).toEqual({ b: '2' });
  expect((await stripe.customers.update(id, { metadata: '' })).metadata).toEqual({});
});

it('pays out what is available, and every line belongs to one payout', async () => {
  const setting = await start();
  const { stripe, control } = setting;
  const { charge } = await payCharge(setting, 10_000);
  await payCharge(setting, 20_000, '4000000000000077');
  await stripe.refunds.create({ charge: charge.id, amount: 1_000 });
  // The charge of 100.00 is not available yet; 200.00 less 6.10 less the refund of 10.00 is.
  expect((await stripe.balance.retrieve()).available).toMatchObject([{ amount: 18_390, currency: 'usd' }]);
  await expect(stripe.payouts.create({ amount: 18_391, currency: 'usd' })).rejects.toMatchObject({
    code: 'balance_insufficient',
  });
  control.advance({ seconds: 2 * 86_400 });
  const payout = control.payOut({});
  expect(payout).toMatchObject({ amount: 28_070, status: 'pending', automatic: true });
  expect((await stripe.balance.retrieve()).available).toMatchObject([{ amount: 0 }]);
  const lines = await stripe.balanceTransactions.list({ payout: payout?.id ?? '' });
  expect(lines.data.map(({ type }) => type).sort()).toEqual(['charge', 'charge', 'payout', 'refund']);
  expect(lines.data.reduce((sum, { net }) => sum + net, 0)).toBe(0);
  control.advance({ seconds: 86_400 });
  expect((await stripe.payouts.retrieve(payout?.id ?? '')).status).toBe('paid');
  expect(control.payOut({})).toBeNull();
  control.failPayout({ id: payout?.id ?? '' });
  expect((await stripe.balance.retrieve()).available).toMatchObject([{ amount: 28_070 }]);
});

it('keeps everything over a restart, also messages that still wait', async () => {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'local-payments-'));
  try {
    const before = await start({ dataFolder: folder });
    before.receiver.answers = [500];
    const { session } = await payCharge(before, 10_000);
    const kept = await before.stripe.checkout.sessions.create(sessionOf(700), { idempotencyKey: 'kept' });
    await before.control.settle();
    await before.close();
    expect(readdirSync(folder)).toEqual(['state.json']);

    before.receiver.answers = [200];
    before.receiver.received.length = 0;
    const after = await startLocalPayments({
      port: 0,
      webhookUrl: before.receiver.url,
      webhookSecret,
      dataFolder: folder,
    });
    try {
      const stripe = connect(after.url);
      expect((await stripe.checkout.sessions.retrieve(session.id)).payment_status).toBe('paid');
      const replayed = await stripe.checkout.sessions.create(sessionOf(700), { idempotencyKey: 'kept' });
      expect(replayed.id).toBe(kept.id);
      after.control.advance({ seconds: 5 });
      await after.control.settle();
      expect(before.receiver.types()).toContain('checkout.session.completed');
    } finally {
      await after.close();
    }
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
});

it('is controlled over HTTP by JSON alone, and answers no other host name', async () => {
  const { url, stripe } = await start();
  const session = await stripe.checkout.sessions.create(sessionOf(700));
  const call = (name: string, body: string, type = 'application/json') =>
    fetch(`${url}/_control/${name}`, { method: 'POST', body, headers: { 'content-type': type } });
  const paid = await call('pay', JSON.stringify({ session: session.id }));
  expect(await paid.json()).toEqual({ outcome: 'paid', code: null, message: null });
  expect((await call('pay', '{}', 'text/plain')).status).toBe(405);
  expect((await call('configure', '{"order":"sideways"}')).status).toBe(400);
  expect((await call('toString', '{}')).status).toBe(404);
  const { request } = await import('node:http');
  const status = await new Promise((resolve, reject) => {
    const asked = request(url, { headers: { host: 'elsewhere.example' } }, (answer) => {
      answer.resume();
      resolve(answer.statusCode);
    });
    asked.on('error', reject).end();
  });
  expect(status).toBe(421);
});
