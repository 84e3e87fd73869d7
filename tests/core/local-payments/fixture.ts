import http from 'node:http';
import type { AddressInfo } from 'node:net';
import Stripe from 'stripe';
import { createCardPayments, type CardPayments } from '@/lib/services/payments';
import {
  startLocalPayments,
  type LocalPayments,
  type LocalPaymentsOptions,
} from '../../../scripts/local-payments/start-local-payments';

export const webhookSecret = 'whsec_test_secret';

export interface Received {
  body: string;
  signature: string;
  event: Stripe.Event;
}

/** A stand-in for the app's webhook route. */
interface Receiver {
  url: string;
  received: Received[];
  types: () => string[];
  /** The status of each answer, from the next message on; the last one stays. */
  answers: number[];
  close: () => Promise<void>;
}

async function startReceiver(): Promise<Receiver> {
  const received: Received[] = [];
  const receiver: Receiver = {
    url: '',
    received,
    types: () => received.map(({ event }) => event.type),
    answers: [200],
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
  const server = http.createServer((request, answer) => {
    let body = '';
    request.setEncoding('utf8');
    request.on('data', (part: string) => (body += part));
    request.on('end', () => {
      const event = JSON.parse(body) as Stripe.Event;
      received.push({ body, signature: String(request.headers['stripe-signature']), event });
      answer.writeHead((receiver.answers.length > 1 ? receiver.answers.shift() : receiver.answers[0]) ?? 200);
      answer.end();
    });
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  receiver.url = `http://127.0.0.1:${(server.address() as AddressInfo).port}/hook`;
  return receiver;
}

export interface Setting extends LocalPayments {
  stripe: Stripe;
  payments: CardPayments;
  receiver: Receiver;
  stop: () => Promise<void>;
}

export function connect(url: string, key = 'sk_test_local'): Stripe {
  const { hostname, port } = new URL(url);
  return new Stripe(key, { host: hostname, port, protocol: 'http', telemetry: false, maxNetworkRetries: 2 });
}

/** The server on a free port, its receiver, the real SDK and the product's own service, all connected. */
export async function startSetting(options: Partial<LocalPaymentsOptions> = {}): Promise<Setting> {
  const receiver = await startReceiver();
  const local = await startLocalPayments({ port: 0, webhookUrl: receiver.url, webhookSecret, ...options });
  return {
    ...local,
    receiver,
    stripe: connect(local.url),
    payments: createCardPayments({ secretKey: 'sk_test_local', webhookSecret, apiBase: local.url }),
    stop: async () => {
      await local.close();
      await receiver.close();
    },
  };
}

/** Parameters of a session over one amount. */
export function sessionOf(amount: number, more: Partial<Stripe.Checkout.SessionCreateParams> = {}) {
  const params: Stripe.Checkout.SessionCreateParams = {
    mode: 'payment',
    success_url: 'https://moiety.example/paid?session={CHECKOUT_SESSION_ID}',
    cancel_url: 'https://moiety.example/invoice',
    line_items: [
      {
        quantity: 1,
        price_data: { currency: 'usd', unit_amount: amount, product_data: { name: 'Invoice 7' } },
      },
    ],
    ...more,
  };
  return params;
}

/** A session that was paid, and its charge. */
export async function payCharge(setting: Setting, amount: number, card = '4242424242424242') {
  const session = await setting.stripe.checkout.sessions.create(sessionOf(amount));
  const result = setting.control.pay({ session: session.id, card });
  if (result.outcome !== 'paid') throw new Error(`The payment was ${result.outcome}.`);
  const paid = await setting.stripe.checkout.sessions.retrieve(session.id, {
    expand: ['payment_intent.latest_charge'],
  });
  const intent = paid.payment_intent as Stripe.PaymentIntent;
  return { session: paid, intent, charge: intent.latest_charge as Stripe.Charge };
}
