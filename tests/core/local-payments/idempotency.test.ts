import { afterAll, beforeAll, beforeEach, expect, it } from 'vitest';
import Stripe from 'stripe';
import { connect, payCharge, sessionOf, startSetting, type Setting } from './fixture';

let setting: Setting;
beforeAll(async () => {
  setting = await startSetting();
});
afterAll(() => setting.stop());
beforeEach(() => {
  setting.control.configure({ latency: 0 });
});

const create = (amount: number, idempotencyKey: string, stripe = setting.stripe) =>
  stripe.checkout.sessions.create(sessionOf(amount), { idempotencyKey });

it('answers the same key with the same body, and says that it is a replay', async () => {
  const first = await create(5_000, 'same');
  const second = await create(5_000, 'same');
  expect(second.id).toBe(first.id);
  expect(second.lastResponse.headers['idempotent-replayed']).toBe('true');
  expect(second.lastResponse.headers['original-request']).toBe(first.lastResponse.requestId);
  expect(second.lastResponse.requestId).not.toBe(first.lastResponse.requestId);
});

it('refuses the same key with other parameters or for another path', async () => {
  await create(5_000, 'other');
  await expect(create(5_001, 'other')).rejects.toBeInstanceOf(Stripe.errors.StripeIdempotencyError);
  await expect(
    setting.stripe.customers.create({ name: 'A' }, { idempotencyKey: 'other' }),
  ).rejects.toMatchObject({ type: 'StripeIdempotencyError', statusCode: 400 });
});

it('keeps the keys of two accounts apart', async () => {
  const mine = await create(5_000, 'apart');
  const theirs = await create(5_000, 'apart', connect(setting.url, 'sk_test_other'));
  expect(theirs.id).not.toBe(mine.id);
});

it('keeps a declined card, but not a failed validation', async () => {
  const intent = await setting.stripe.paymentIntents.create({ amount: 2_000, currency: 'usd' });
  const confirm = () =>
    setting.stripe.paymentIntents.confirm(
      intent.id,
      { payment_method: 'pm_card_chargeDeclined' },
      { idempotencyKey: 'declined' },
    );
  await expect(confirm()).rejects.toMatchObject({ code: 'card_declined' });
  await expect(confirm()).rejects.toMatchObject({ code: 'card_declined' });
  const charges = await setting.stripe.charges.list({ payment_intent: intent.id });
  expect(charges.data).toHaveLength(1);

  await expect(create(1, 'mended')).rejects.toMatchObject({ code: 'amount_too_small' });
  expect((await create(5_000, 'mended')).amount_total).toBe(5_000);
});

it('forgets a key after a day', async () => {
  const first = await create(5_000, 'daily');
  setting.control.advance({ seconds: 24 * 3_600 - 60 });
  expect((await create(5_000, 'daily')).id).toBe(first.id);
  setting.control.advance({ seconds: 120 });
  expect((await create(5_000, 'daily')).id).not.toBe(first.id);
});

it('answers 409 while the first call of a key is under way; the SDK tries again and gets the one result', async () => {
  setting.control.configure({ latency: 100 });
  const patient = await Promise.all([create(5_000, 'flight'), create(5_000, 'flight')]);
  expect(patient[0].id).toBe(patient[1].id);
  const hasty = await Promise.allSettled(
    [1, 2].map(() =>
      setting.stripe.checkout.sessions.create(sessionOf(5_000), {
        idempotencyKey: 'hasty',
        maxNetworkRetries: 0,
      }),
    ),
  );
  const refused = hasty.filter((result) => result.status === 'rejected');
  expect(refused).toHaveLength(1);
  expect(refused[0]?.reason).toMatchObject({ statusCode: 409, code: 'idempotency_key_in_use' });
});

it('refunds once when the answer is lost and the SDK asks again', async () => {
  const { charge } = await payCharge(setting, 5_000);
  setting.control.fault({ kind: 'drop', when: 'after', path: '/v1/refunds' });
  const refund = await setting.stripe.refunds.create({ charge: charge.id, amount: 1_000 });
  expect(refund.lastResponse.headers['idempotent-replayed']).toBe('true');
  expect((await setting.stripe.charges.retrieve(charge.id)).amount_refunded).toBe(1_000);
});

it('keeps a 500 that came after the work had begun, and asks not to repeat it', async () => {
  const { charge } = await payCharge(setting, 5_000);
  setting.control.fault({ kind: 'error', when: 'after', path: '/v1/refunds' });
  const refund = () =>
    setting.stripe.refunds.create({ charge: charge.id, amount: 1_000 }, { idempotencyKey: 'stored-500' });
  await expect(refund()).rejects.toMatchObject({ statusCode: 500, type: 'StripeAPIError' });
  await expect(refund()).rejects.toMatchObject({ statusCode: 500, type: 'StripeAPIError' });
  expect((await setting.stripe.charges.retrieve(charge.id)).amount_refunded).toBe(1_000);
});

it('gets over a 500 before the work, but not over a 429', async () => {
  setting.control.fault({ kind: 'error', when: 'before', path: '/v1/checkout' });
  expect((await create(5_000, 'over')).status).toBe('open');
  setting.control.fault({ kind: 'rate-limit', path: '/v1/checkout' });
  await expect(create(5_000, 'limited')).rejects.toMatchObject({
    type: 'StripeRateLimitError',
    statusCode: 429,
  });
});
