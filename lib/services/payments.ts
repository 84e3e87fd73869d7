import 'server-only';
import Stripe from 'stripe';
import { toServiceAmount } from './payments/amounts';
import { CardPaymentError, readFailure } from './payments/errors';
import { readPaymentEvent } from './payments/events';
import { createReads } from './payments/reads';
import { readRefund, readSession } from './payments/read-objects';
import type { CardPayments, CheckoutRequest, RefundRequest } from './payments/types';

export type { CardPayments } from './payments/types';

/** What the card-payment service needs to know. */
export interface CardPaymentsConfiguration {
  /** A secret or restricted key of Stripe. */
  secretKey: string;
  /** The signing secret of the webhook endpoint. */
  webhookSecret: string;
  /** Where Stripe answers, such as http://127.0.0.1:12111; without it, Stripe itself. */
  apiBase?: string;
}

const REAL_HOST = 'api.stripe.com';

/** Seconds by which a signed message may be older than now; the limit that Stripe's documentation recommends. */
const SIGNATURE_TOLERANCE = 300;

function connect({ secretKey, apiBase }: CardPaymentsConfiguration): Stripe {
  const common = { maxNetworkRetries: 2, timeout: 20_000, telemetry: false } as const;
  const base = apiBase === undefined || apiBase === '' ? null : new URL(apiBase);
  if (base === null || base.hostname === REAL_HOST) return new Stripe(secretKey, common);
  const protocol = base.protocol === 'http:' ? 'http' : 'https';
  const port = base.port === '' ? (protocol === 'http' ? 80 : 443) : Number(base.port);
  return new Stripe(secretKey, { ...common, host: base.hostname, port, protocol });
}

async function createCheckout(stripe: Stripe, request: CheckoutRequest) {
  const metadata = {
    ...request.metadata,
    workspace_id: request.workspaceId,
    invoice_id: request.invoiceId,
    invoice_number: request.invoiceNumber,
  };
  const session = await stripe.checkout.sessions.create(
    {
      mode: 'payment',
      success_url: request.successUrl,
      cancel_url: request.cancelUrl,
      client_reference_id: request.invoiceId,
      line_items: [
        {
          quantity: 1,
          price_data: {
            currency: request.currency.toLowerCase(),
            unit_amount: toServiceAmount(request.amount, request.currency),
            product_data: { name: request.description },
          },
        },
      ],
      // The session's metadata does not reach the payment by itself: both get the same.
      metadata,
      payment_intent_data: { metadata, description: request.description },
      ...(request.buyerEmail == null || request.buyerEmail === ''
        ? {}
        : { customer_email: request.buyerEmail }),
    },
    { idempotencyKey: request.idempotencyKey },
  );
  return readSession(session);
}

async function expireCheckout(stripe: Stripe, sessionId: string) {
  try {
    return readSession(await stripe.checkout.sessions.expire(sessionId));
  } catch (error) {
    // A session that is no longer open refuses to expire: what it has become is the answer.
    if (!(error instanceof Stripe.errors.StripeInvalidRequestError) || error.statusCode !== 400) throw error;
    const session = readSession(await stripe.checkout.sessions.retrieve(sessionId));
    if (session.state === 'open') throw error;
    return session;
  }
}

async function refund(stripe: Stripe, request: RefundRequest) {
  const target =
    request.chargeId === undefined ? { payment_intent: request.intentId } : { charge: request.chargeId };
  const made = await stripe.refunds.create(
    {
      ...target,
      amount: toServiceAmount(request.amount, request.currency),
      reason: request.cause ?? 'requested_by_customer',
      metadata: { ...request.metadata, ...(request.reason ? { reason: request.reason.slice(0, 500) } : {}) },
    },
    { idempotencyKey: request.idempotencyKey },
  );
  return readRefund(made);
}

/**
 * Card payments through Stripe's SDK. Nothing is connected or checked before the first call.
 * Every call throws {@link CardPaymentError} and nothing else.
 */
export function createCardPayments(configuration: CardPaymentsConfiguration): CardPayments {
  let connected: Stripe | undefined;
  const stripe = () => (connected ??= connect(configuration));
  /** Runs a call, and turns what it throws into the one kind of error. */
  async function call<T>(work: (client: Stripe) => Promise<T>): Promise<T> {
    try {
      return await work(stripe());
    } catch (error) {
      throw readFailure(error);
    }
  }
  return {
    createCheckout: (request) => call((client) => createCheckout(client, request)),
    retrieveCheckout: (id) =>
      call(async (client) => readSession(await client.checkout.sessions.retrieve(id))),
    expireCheckout: (id) => call((client) => expireCheckout(client, id)),
    refund: (request) => call((client) => refund(client, request)),
    ...createReads(stripe, call),
    parseWebhook: (rawBody, signature) => {
      if (signature == null || signature === '') {
        throw new CardPaymentError('unsigned', 'The message is not signed.');
      }
      try {
        const { webhookSecret } = configuration;
        return readPaymentEvent(
          stripe().webhooks.constructEvent(rawBody, signature, webhookSecret, SIGNATURE_TOLERANCE),
        );
      } catch (error) {
        throw readFailure(error);
      }
    },
  };
}
