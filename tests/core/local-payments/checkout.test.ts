import Stripe from 'stripe';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { sessionOf, startSetting, type Setting } from './fixture';

let setting: Setting;
beforeAll(async () => {
  setting = await startSetting();
});
afterAll(() => setting.stop());

const createSession = (amount: number, more?: Partial<Stripe.Checkout.SessionCreateParams>) =>
  setting.stripe.checkout.sessions.create(sessionOf(amount, more));

describe('a checkout session', () => {
  it('is open, has a page and no intent yet', async () => {
    const session = await createSession(41_200, { metadata: { invoice: '7' }, client_reference_id: 'inv-7' });
    expect(session).toMatchObject({
      object: 'checkout.session',
      status: 'open',
      payment_status: 'unpaid',
      payment_intent: null,
      amount_total: 41_200,
      currency: 'usd',
      livemode: false,
      ui_mode: 'hosted_page',
      client_reference_id: 'inv-7',
      metadata: { invoice: '7' },
    });
    expect(session.url).toBe(`${setting.url}/pay/${session.id}`);
    expect(session.expires_at - session.created).toBe(24 * 3_600);
    expect(session.lastResponse.requestId).toMatch(/^req_/);
  });

  it('is paid with a charge, a booking with its fee and the metadata of the intent alone', async () => {
    const created = await createSession(10_000, {
      metadata: { of: 'session' },
      payment_intent_data: { metadata: { of: 'intent' }, description: 'Invoice 7' },
    });
    expect(setting.control.pay({ session: created.id })).toEqual({
      outcome: 'paid',
      code: null,
      message: null,
    });
    const session = await setting.stripe.checkout.sessions.retrieve(created.id, {
      expand: ['payment_intent.latest_charge.balance_transaction', 'line_items'],
    });
    expect(session).toMatchObject({ status: 'complete', payment_status: 'paid', url: null });
    const intent = session.payment_intent as Stripe.PaymentIntent;
    const charge = intent.latest_charge as Stripe.Charge;
    const booking = charge.balance_transaction as Stripe.BalanceTransaction;
    expect(intent).toMatchObject({
      status: 'succeeded',
      amount_received: 10_000,
      metadata: { of: 'intent' },
    });
    expect(charge).toMatchObject({
      paid: true,
      captured: true,
      metadata: { of: 'intent' },
      description: 'Invoice 7',
    });
    // 2.9 % of 100.00 is 2.90, and 0.30 more.
    expect(booking).toMatchObject({
      type: 'charge',
      amount: 10_000,
      fee: 320,
      net: 9_680,
      source: charge.id,
    });
    expect(session.line_items?.data[0]).toMatchObject({ description: 'Invoice 7', amount_total: 10_000 });
    expect('charges' in intent).toBe(false);
  });

  it.each([
    ['4000000000000002', 'generic_decline'],
    ['4000000000009995', 'insufficient_funds'],
    ['4000000000009987', 'lost_card'],
    ['4000000000009979', 'stolen_card'],
    ['4000000000000069', 'expired_card'],
    ['4000000000000127', 'incorrect_cvc'],
    ['4000000000000119', 'processing_error'],
    ['4000008400001629', 'generic_decline'],
    ['4000008260003178', 'insufficient_funds'],
  ])('stays open when the card %s is declined (%s)', async (card, code) => {
    const created = await createSession(5_000);
    expect(setting.control.pay({ session: created.id, card })).toMatchObject({ outcome: 'declined', code });
    const session = await setting.stripe.checkout.sessions.retrieve(created.id, {
      expand: ['payment_intent'],
    });
    const intent = session.payment_intent as Stripe.PaymentIntent;
    expect(session).toMatchObject({ status: 'open', payment_status: 'unpaid' });
    expect(intent.status).toBe('requires_payment_method');
    expect(intent.last_payment_error?.decline_code ?? intent.last_payment_error?.code).toBe(code);
    expect(setting.control.pay({ session: created.id }).outcome).toBe('paid');
  });

  it.each(['4000002500003155', '4000002760003184', '4000000000003220'])(
    'asks the holder of %s, and waits, fails or goes through by the answer',
    async (card) => {
      const left = await createSession(5_000);
      expect(setting.control.pay({ session: left.id, card, challenge: 'leave' }).outcome).toBe('challenged');
      const waiting = await setting.stripe.checkout.sessions.retrieve(left.id, {
        expand: ['payment_intent'],
      });
      expect((waiting.payment_intent as Stripe.PaymentIntent).status).toBe('requires_action');
      expect(waiting.payment_status).toBe('unpaid');

      const failed = await createSession(5_000);
      expect(setting.control.pay({ session: failed.id, card, challenge: 'fail' })).toMatchObject({
        outcome: 'declined',
        code: 'payment_intent_authentication_failure',
      });
      const accepted = await createSession(5_000);
      expect(setting.control.pay({ session: accepted.id, card, challenge: 'accept' }).outcome).toBe('paid');
    },
  );

  it('takes money once, however many tabs are open', async () => {
    const session = await createSession(5_000);
    setting.control.pay({ session: session.id });
    expect(() => setting.control.pay({ session: session.id })).toThrow(/complete/);
  });

  it('expires when told to, and then takes nothing', async () => {
    const session = await createSession(5_000);
    expect(await setting.stripe.checkout.sessions.expire(session.id)).toMatchObject({
      status: 'expired',
      url: null,
    });
    expect(() => setting.control.pay({ session: session.id })).toThrow(/expired/);
    await expect(setting.stripe.checkout.sessions.expire(session.id)).rejects.toMatchObject({
      type: 'StripeInvalidRequestError',
      statusCode: 400,
    });
  });

  it('expires by itself after its time, with a message', async () => {
    const session = await createSession(5_000);
    setting.control.advance({ seconds: 24 * 3_600 });
    expect((await setting.stripe.checkout.sessions.retrieve(session.id)).status).toBe('expired');
    await setting.control.settle();
    const told = setting.receiver.received.filter(({ event }) => event.type === 'checkout.session.expired');
    expect(told.map(({ event }) => (event.data.object as { id: string }).id)).toContain(session.id);
  });

  it.each<[string, Partial<Stripe.Checkout.SessionCreateParams> & Record<string, unknown>, string]>([
    ['an amount below the minimum', { line_items: sessionOf(49).line_items }, 'amount_too_small'],
    ['no address to go on to', { success_url: '' }, 'parameter_missing'],
    ['an address that is none', { success_url: 'nowhere' }, 'url_invalid'],
    ['no lines', { line_items: [] }, 'parameter_missing'],
    ['an e-mail address that is none', { customer_email: 'nobody' }, 'email_invalid'],
    ['a parameter that does not exist', { colour: 'red' }, 'parameter_unknown'],
  ])('refuses %s', async (_what, more, code) => {
    await expect(createSession(5_000, more)).rejects.toMatchObject({
      type: 'StripeInvalidRequestError',
      code,
    });
  });

  it('keeps the limits of metadata: 40 characters, 500 characters, 50 keys', async () => {
    const many = Object.fromEntries(Array.from({ length: 51 }, (_, at) => [`k${at}`, 'x']));
    await expect(createSession(5_000, { metadata: many })).rejects.toThrow(/50 keys/);
    await expect(createSession(5_000, { metadata: { ['k'.repeat(41)]: 'x' } })).rejects.toThrow(
      /40 characters/,
    );
    await expect(createSession(5_000, { metadata: { k: 'x'.repeat(501) } })).rejects.toThrow(
      /500 characters/,
    );
  });

  it('refuses a key that is not for tests, and unknown objects', async () => {
    const { connect } = await import('./fixture');
    await expect(connect(setting.url, 'sk_live_x').balance.retrieve()).rejects.toMatchObject({
      type: 'StripeAuthenticationError',
      statusCode: 401,
    });
    await expect(setting.stripe.checkout.sessions.retrieve('cs_test_none')).rejects.toMatchObject({
      statusCode: 404,
      code: 'resource_missing',
    });
  });
});

describe('a payment intent', () => {
  it('throws the card error with the intent in it, and can be confirmed again', async () => {
    const intent = await setting.stripe.paymentIntents.create({ amount: 2_000, currency: 'usd' });
    const failure = await setting.stripe.paymentIntents
      .confirm(intent.id, { payment_method: 'pm_card_chargeDeclined' })
      .catch((error: unknown) => error);
    expect(failure).toBeInstanceOf(Stripe.errors.StripeCardError);
    expect(failure).toMatchObject({
      statusCode: 402,
      code: 'card_declined',
      decline_code: 'generic_decline',
    });
    const paid = await setting.stripe.paymentIntents.confirm(intent.id, { payment_method: 'pm_card_visa' });
    expect(paid).toMatchObject({ status: 'succeeded', last_payment_error: null });
    await expect(
      setting.stripe.paymentIntents.confirm(intent.id, { payment_method: 'pm_card_visa' }),
    ).rejects.toMatchObject({ code: 'payment_intent_unexpected_state' });
  });

  it('holds money with manual capture, takes a part of it, and can be cancelled before', async () => {
    const params = {
      amount: 9_000,
      currency: 'usd',
      capture_method: 'manual',
      payment_method: 'pm_card_visa',
      confirm: true,
    } as const;
    const held = await setting.stripe.paymentIntents.create(params);
    expect(held).toMatchObject({ status: 'requires_capture', amount_capturable: 9_000, amount_received: 0 });
    const taken = await setting.stripe.paymentIntents.capture(held.id, { amount_to_capture: 6_000 });
    expect(taken).toMatchObject({ status: 'succeeded', amount_received: 6_000 });
    const other = await setting.stripe.paymentIntents.create(params);
    expect(await setting.stripe.paymentIntents.cancel(other.id)).toMatchObject({ status: 'canceled' });
  });

  it('knows each currency: lower case, no decimals for yen, steps of ten for dinars', async () => {
    const create = (amount: number, currency: string) =>
      setting.stripe.paymentIntents.create({ amount, currency });
    expect((await create(5_000, 'jpy')).amount).toBe(5_000);
    expect((await create(5_010, 'kwd')).amount).toBe(5_010);
    await expect(create(5_005, 'kwd')).rejects.toThrow(/divisible by 10/);
    await expect(create(5_000, 'USD')).rejects.toThrow(/currency/);
    await expect(create(50.5, 'usd')).rejects.toMatchObject({ code: 'parameter_invalid_integer' });
  });
});
