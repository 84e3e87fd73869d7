import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createCardPayments } from '@/lib/services/payments';
import { fromServiceAmount, toServiceAmount } from '@/lib/services/payments/amounts';
import type { CheckoutRequest } from '@/lib/services/payments/types';
import { startSetting, webhookSecret, type Received, type Setting } from './fixture';

let setting: Setting;
beforeAll(async () => {
  setting = await startSetting();
});
afterAll(() => setting.stop());

const request = (more: Partial<CheckoutRequest> = {}): CheckoutRequest => ({
  workspaceId: 'ws-1',
  invoiceId: 'inv-1',
  invoiceNumber: '2026-0007',
  amount: 41_200,
  currency: 'USD',
  description: 'Invoice 2026-0007',
  buyerEmail: 'buyer@mail.example',
  successUrl: 'https://moiety.example/paid/{CHECKOUT_SESSION_ID}',
  cancelUrl: 'https://moiety.example/invoice',
  idempotencyKey: `key-${Math.random()}`,
  ...more,
});

async function pay(more: Partial<CheckoutRequest> = {}, card?: string) {
  const session = await setting.payments.createCheckout(request(more));
  setting.control.pay({ session: session.id, card });
  const paid = await setting.payments.retrieveCheckout(session.id);
  return setting.payments.retrievePayment(paid.intentId ?? '');
}

async function all<T>(items: AsyncIterable<T>): Promise<T[]> {
  const found: T[] = [];
  for await (const item of items) found.push(item);
  return found;
}

describe('checkout through the service', () => {
  it('opens a page, and knows what was paid, with fee and owners', async () => {
    const session = await setting.payments.createCheckout(request({ metadata: { instalment: '2' } }));
    expect(session).toMatchObject({
      state: 'open',
      isPaid: false,
      amount: 41_200,
      currency: 'USD',
      intentId: null,
      workspaceId: 'ws-1',
      invoiceId: 'inv-1',
    });
    setting.control.pay({ session: session.id });
    const paid = await setting.payments.retrieveCheckout(session.id);
    expect(paid).toMatchObject({ state: 'complete', isPaid: true, url: null });
    const payment = await setting.payments.retrievePayment(paid.intentId ?? '');
    // 2.9 % of 412.00 is 11.948, rounded to 11.95, and 0.30 more.
    expect(payment).toMatchObject({
      state: 'succeeded',
      amount: 41_200,
      refunded: 0,
      currency: 'USD',
      fee: 1_225,
      net: 39_975,
      settlementCurrency: 'USD',
      invoiceId: 'inv-1',
      cardLast4: '4242',
      lastFailure: null,
    });
    expect(payment.metadata).toMatchObject({ instalment: '2', invoice_number: '2026-0007' });
    expect(payment.chargeId).toMatch(/^ch_/);
    expect(payment.balanceTransactionId).toMatch(/^txn_/);
  });

  it('is the same session for the same key, and a conflict for other values', async () => {
    const first = await setting.payments.createCheckout(request({ idempotencyKey: 'inv-1/1/1' }));
    const second = await setting.payments.createCheckout(request({ idempotencyKey: 'inv-1/1/1' }));
    expect(second.id).toBe(first.id);
    await expect(
      setting.payments.createCheckout(request({ idempotencyKey: 'inv-1/1/1', amount: 41_201 })),
    ).rejects.toMatchObject({ name: 'CardPaymentError', kind: 'conflict' });
  });

  it('says why a card was declined', async () => {
    const session = await setting.payments.createCheckout(request());
    setting.control.pay({ session: session.id, card: '4000000000009995' });
    const { intentId } = await setting.payments.retrieveCheckout(session.id);
    const payment = await setting.payments.retrievePayment(intentId ?? '');
    expect(payment).toMatchObject({
      state: 'waiting',
      chargeId: null,
      fee: null,
      lastFailure: { code: 'card_declined', declineCode: 'insufficient_funds' },
    });
  });

  it('expires an open page; one that was paid meanwhile stays paid', async () => {
    const open = await setting.payments.createCheckout(request());
    expect((await setting.payments.expireCheckout(open.id)).state).toBe('expired');
    expect((await setting.payments.expireCheckout(open.id)).state).toBe('expired');
    const paid = await setting.payments.createCheckout(request());
    setting.control.pay({ session: paid.id });
    expect(await setting.payments.expireCheckout(paid.id)).toMatchObject({ state: 'complete', isPaid: true });
    await expect(setting.payments.expireCheckout('cs_test_none')).rejects.toMatchObject({
      kind: 'not-found',
    });
  });
});

describe('refunds and reconciliation', () => {
  it('refunds by charge or by intent, and refuses too much', async () => {
    const payment = await pay();
    const refund = await setting.payments.refund({
      intentId: payment.intentId,
      amount: 1_200,
      currency: 'USD',
      reason: 'Arrived late',
      idempotencyKey: 'refund-1',
    });
    expect(refund).toMatchObject({ state: 'succeeded', amount: 1_200, chargeId: payment.chargeId });
    expect(refund.metadata.reason).toBe('Arrived late');
    await expect(
      setting.payments.refund({
        chargeId: payment.chargeId ?? '',
        amount: 40_001,
        currency: 'USD',
        idempotencyKey: 'refund-2',
      }),
    ).rejects.toMatchObject({ kind: 'refused', code: 'amount_too_large' });
    expect(await setting.payments.retrievePayment(payment.intentId)).toMatchObject({
      refunded: 1_200,
      fee: 1_225,
    });
  });

  it('lists every line of the account, so that the sums agree with the balance', async () => {
    const before = await all(setting.payments.listBalanceLines());
    const disputed = await pay({}, '4000000000000259');
    const lines = await all(setting.payments.listBalanceLines());
    expect(lines.slice(0, lines.length - before.length).map(({ category, net }) => [category, net])).toEqual([
      ['dispute', -42_700],
      ['charge', 39_975],
    ]);
    const balance = await setting.stripe.balance.retrieve();
    const total = [...balance.available, ...balance.pending].reduce((sum, { amount }) => sum + amount, 0);
    expect(lines.reduce((sum, { net }) => sum + net, 0)).toBe(total);
    const [dispute] = await all(setting.payments.listDisputes({ chargeId: disputed.chargeId ?? '' }));
    expect(dispute).toMatchObject({ state: 'open', reason: 'fraudulent', amount: 41_200 });
    expect(dispute?.lines.map(({ fee }) => fee)).toEqual([1_500]);
    expect(await all(setting.payments.listCharges({ from: new Date(Date.now() + 60_000) }))).toEqual([]);
  });
});

describe('messages', () => {
  it('are read when signed, and refused when not', async () => {
    await setting.control.settle();
    setting.receiver.received.length = 0;
    const payment = await pay();
    await setting.control.settle();
    const events = setting.receiver.received.map(({ body, signature }) =>
      setting.payments.parseWebhook(body, signature),
    );
    expect(events.map(({ kind }) => kind)).toEqual([
      'other',
      'charge-changed',
      'payment-succeeded',
      'checkout-completed',
    ]);
    expect(events[3]).toMatchObject({
      session: { invoiceId: 'inv-1', isPaid: true, intentId: payment.intentId },
    });
    const { body, signature } = setting.receiver.received[0] as Received;
    const refused = { name: 'CardPaymentError', kind: 'unsigned' };
    expect(() => setting.payments.parseWebhook(`${body} `, signature)).toThrow(
      expect.objectContaining(refused),
    );
    expect(() => setting.payments.parseWebhook(body, null)).toThrow(expect.objectContaining(refused));
    expect(() => setting.payments.parseWebhook(body, 'nonsense')).toThrow(expect.objectContaining(refused));
  });
});

describe('failures', () => {
  it('are told apart: wrong key, no answer, too many requests', async () => {
    const wrong = createCardPayments({ secretKey: 'sk_live_x', webhookSecret, apiBase: setting.url });
    await expect(wrong.retrieveCheckout('cs_test_x')).rejects.toMatchObject({ kind: 'misconfigured' });
    const nobody = createCardPayments({
      secretKey: 'sk_test_x',
      webhookSecret,
      apiBase: 'http://127.0.0.1:1',
    });
    await expect(nobody.retrieveCheckout('cs_test_x')).rejects.toMatchObject({ kind: 'unavailable' });
    setting.control.fault({ kind: 'rate-limit' });
    await expect(setting.payments.retrieveCheckout('cs_test_x')).rejects.toMatchObject({
      kind: 'unavailable',
    });
  });

  it('are not met before the first call', () => {
    expect(() => createCardPayments({ secretKey: '', webhookSecret: '' })).not.toThrow();
  });
});

describe('amounts', () => {
  // Special cases of Stripe's list of currencies; from memory.
  it.each([
    ['USD', 1_234, 1_234],
    ['JPY', 1_234, 1_234],
    ['KWD', 1_230, 1_230],
    ['ISK', 1_234, 123_400],
    ['UGX', 5_000, 500_000],
    ['MGA', 1_200, 12],
  ])('of %s: %i here are %i there, and back', (currency, here, there) => {
    expect(toServiceAmount(here, currency)).toBe(there);
    expect(fromServiceAmount(there, currency.toLowerCase())).toBe(here);
  });

  it.each([
    ['KWD', 1_234],
    ['MGA', 1_234],
    ['USD', 12.5],
  ])('of %s that cards cannot be charged are refused: %d', (currency, amount) => {
    expect(() => toServiceAmount(amount, currency)).toThrow(expect.objectContaining({ kind: 'refused' }));
  });
});
