import Stripe from 'stripe';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { payCharge, startSetting, webhookSecret, type Received, type Setting } from './fixture';

let setting: Setting;
beforeEach(async () => {
  setting = await startSetting();
});
afterEach(() => setting.stop());

const verify = ({ body, signature }: Received, receivedAt?: number) =>
  setting.stripe.webhooks.constructEvent(body, signature, webhookSecret, 300, undefined, receivedAt);

async function payAndSettle(card?: string) {
  const paid = await payCharge(setting, 10_000, card);
  await setting.control.settle();
  return paid;
}

describe('messages of a payment', () => {
  it('come in order, signed, in the version of the endpoint', async () => {
    const { session } = await payAndSettle();
    expect(setting.receiver.types()).toEqual([
      'payment_intent.created',
      'charge.succeeded',
      'payment_intent.succeeded',
      'checkout.session.completed',
    ]);
    const events = setting.receiver.received.map((received) => verify(received));
    expect(events.at(-1)?.data.object).toMatchObject({ id: session.id, payment_status: 'paid' });
    expect(events.every((event) => event.api_version === '2026-10-28.endive' && !event.livemode)).toBe(true);
    const [listed] = (await setting.stripe.events.list({ type: 'checkout.session.completed' })).data;
    expect(listed?.id).toBe(events.at(-1)?.id);
  });

  it('are refused by the SDK when forged, altered or stale', async () => {
    setting.control.configure({ signature: 'bad' });
    await payAndSettle();
    expect(() => verify(setting.receiver.received[0] as Received)).toThrow(
      Stripe.errors.StripeSignatureVerificationError,
    );
    setting.receiver.received.length = 0;
    setting.control.configure({ signature: 'stale' });
    await payAndSettle();
    expect(() => verify(setting.receiver.received[0] as Received)).toThrow(/tolerance/);
    setting.receiver.received.length = 0;
    setting.control.configure({ signature: 'rotating' });
    await payAndSettle();
    const [rotated] = setting.receiver.received as [Received];
    expect(rotated.signature.match(/v1=/g)).toHaveLength(2);
    expect(verify(rotated).type).toBe('payment_intent.created');
    expect(() => verify({ ...rotated, body: rotated.body.replace('10000', '10001') })).toThrow(
      Stripe.errors.StripeSignatureVerificationError,
    );
  });

  it('come again after an answer that is not 2xx, with a fresh time in the signature', async () => {
    setting.receiver.answers = [500, 302, 200];
    await payAndSettle();
    const [first] = setting.receiver.received as [Received];
    const again = () => setting.receiver.received.filter(({ event }) => event.id === first.event.id);
    expect(again()).toHaveLength(1);
    expect((await setting.stripe.events.retrieve(first.event.id)).pending_webhooks).toBe(1);
    setting.control.advance({ seconds: 5 });
    await setting.control.settle();
    expect(again()).toHaveLength(2);
    setting.control.advance({ seconds: 600 });
    await setting.control.settle();
    expect(setting.control.deliveries().waiting).toBe(0);
    const times = again().map(({ signature }) => Number(/t=(\d+)/.exec(signature)?.[1]));
    expect(times[1] ?? 0).toBeGreaterThanOrEqual((times[0] ?? 0) + 5);
    expect(again().every(({ body }) => JSON.parse(body).created === first.event.created)).toBe(true);
    // Signed over the time of the attempt, so a late one is within the tolerance of its own time.
    expect(verify(again()[1] as Received, (times[1] ?? 0) * 1000 + 299_000).id).toBe(first.event.id);
  });

  it('stop after three days of failures', async () => {
    setting.receiver.answers = [500];
    await payAndSettle();
    for (let hour = 0; hour < 73; hour += 1) {
      setting.control.advance({ seconds: 3_600 });
      await setting.control.settle();
    }
    expect(setting.control.deliveries().waiting).toBe(0);
    const first = setting.receiver.received[0]?.event.id;
    expect(setting.receiver.received.filter(({ event }) => event.id === first)).toHaveLength(12);
  });

  it('wait less when the waits are compressed', async () => {
    setting.control.configure({ retryCompression: 1_000 });
    setting.receiver.answers = [500, 200];
    await payAndSettle();
    await expect.poll(() => setting.control.deliveries().waiting, { timeout: 3_000 }).toBe(0);
    expect(setting.receiver.received).toHaveLength(5);
  });

  it('come twice, as twins with two ids, in another order, late, or before the answer', async () => {
    setting.control.configure({ duplicates: 1 });
    await payAndSettle();
    expect(setting.receiver.received).toHaveLength(8);
    expect(new Set(setting.receiver.received.map(({ event }) => event.id)).size).toBe(4);

    setting.receiver.received.length = 0;
    setting.control.configure({ duplicates: 0, hasTwinEvents: true });
    await payAndSettle();
    expect(new Set(setting.receiver.received.map(({ event }) => event.id)).size).toBe(8);

    setting.receiver.received.length = 0;
    setting.control.configure({ hasTwinEvents: false, order: 'reversed' });
    await payAndSettle();
    expect(setting.receiver.types()[0]).toBe('checkout.session.completed');

    setting.receiver.received.length = 0;
    setting.control.configure({ order: 'shuffled' });
    await payAndSettle();
    expect(setting.receiver.types().sort()).toEqual([
      'charge.succeeded',
      'checkout.session.completed',
      'payment_intent.created',
      'payment_intent.succeeded',
    ]);

    setting.receiver.received.length = 0;
    setting.control.configure({ order: 'as-made', delay: 60 });
    const { charge } = await payAndSettle();
    expect(setting.receiver.received).toHaveLength(0);
    setting.control.advance({ seconds: 60 });
    await setting.control.settle();
    expect(setting.receiver.received).toHaveLength(4);

    setting.receiver.received.length = 0;
    setting.control.configure({ delay: 0, deliversBeforeAnswer: true });
    await setting.stripe.refunds.create({ charge: charge.id, amount: 100 });
    expect(setting.receiver.types()).toContain('charge.refunded');
  });

  it('are held while paused, and go out after a restart of the sending', async () => {
    setting.control.configure({ isPaused: true });
    await payAndSettle();
    expect(setting.receiver.received).toHaveLength(0);
    setting.control.configure({ isPaused: false });
    await setting.control.settle();
    expect(setting.receiver.received).toHaveLength(4);
  });

  it('may come about objects that nobody knows, and many times at once', async () => {
    setting.control.sendEvent({ type: 'charge.refunded', object: { id: 'ch_unknown', object: 'charge' } });
    await setting.control.settle();
    const [unknown] = setting.receiver.received as [Received];
    expect(verify(unknown).data.object).toMatchObject({ id: 'ch_unknown' });
    setting.control.configure({ concurrency: 50 });
    setting.control.redeliver({ event: unknown.event.id, times: 50 });
    await setting.control.settle();
    expect(setting.receiver.received).toHaveLength(51);
  });

  it('tell of a booking that follows the charge', async () => {
    setting.control.configure({ booksLater: true });
    const { charge } = await payAndSettle();
    const succeeded = setting.receiver.received.find(({ event }) => event.type === 'charge.succeeded');
    expect(succeeded?.event.data.object).toMatchObject({ id: charge.id, balance_transaction: null });
    setting.control.advance({ seconds: 1 });
    await setting.control.settle();
    const updated = setting.receiver.received.find(({ event }) => event.type === 'charge.updated');
    expect(updated?.event.data.previous_attributes).toEqual({ balance_transaction: null });
    const after = await setting.stripe.charges.retrieve(charge.id);
    expect(updated?.event.data.object).toMatchObject({ balance_transaction: after.balance_transaction });
  });

  it('tell of declines', async () => {
    await expect(payCharge(setting, 10_000, '4000000000000002')).rejects.toThrow(/declined/);
    await setting.control.settle();
    expect(setting.receiver.types()).toEqual([
      'payment_intent.created',
      'charge.failed',
      'payment_intent.payment_failed',
    ]);
  });
});
