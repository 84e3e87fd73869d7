import type Stripe from 'stripe';
import { refused } from './api-error';
import type { TestCard } from './cards';
import { idOf } from './charges';
import { answerChallenge, cancelIntent, confirmIntent, createIntent, type Payer } from './payment-intents';
import { newId, type World } from './world';

export interface SessionOptions {
  currency: string;
  lines: { name: string; unitAmount: number; quantity: number }[];
  uiMode: 'hosted_page' | 'embedded_page' | 'elements';
  successUrl: string | null;
  cancelUrl: string | null;
  returnUrl: string | null;
  clientReferenceId: string | null;
  customer: string | null;
  customerEmail: string | null;
  expiresAt: number;
  metadata: Record<string, string>;
  intent: { metadata: Record<string, string>; description: string | null };
}

function makeLines(options: SessionOptions): Stripe.LineItem[] {
  return options.lines.map((line) => ({
    id: newId('li'),
    object: 'item',
    adjustable_quantity: null,
    amount_discount: 0,
    amount_subtotal: line.unitAmount * line.quantity,
    amount_tax: 0,
    amount_total: line.unitAmount * line.quantity,
    currency: options.currency,
    description: line.name,
    metadata: null,
    price: null,
    quantity: line.quantity,
  }));
}

export function createSession(world: World, options: SessionOptions): Stripe.Checkout.Session {
  const id = newId('cs_test');
  const isHosted = options.uiMode === 'hosted_page';
  const lines = makeLines(options);
  const total = lines.reduce((sum, line) => sum + line.amount_total, 0);
  const session: Stripe.Checkout.Session = {
    id,
    object: 'checkout.session',
    adaptive_pricing: { enabled: false },
    after_expiration: null,
    allow_promotion_codes: null,
    allowed_payment_method_types: null,
    amount_subtotal: total,
    amount_total: total,
    automatic_tax: { enabled: false, liability: null, provider: null, status: null },
    billing_address_collection: null,
    cancel_url: options.cancelUrl,
    client_reference_id: options.clientReferenceId,
    client_secret: isHosted ? null : `${id}_secret_${newId('s').slice(2)}`,
    collected_information: null,
    consent: null,
    consent_collection: null,
    created: world.now(),
    currency: options.currency,
    currency_conversion: null,
    custom_fields: [],
    custom_text: {
      after_submit: null,
      shipping_address: null,
      submit: null,
      terms_of_service_acceptance: null,
    },
    customer: options.customer,
    customer_account: null,
    customer_creation: options.customer === null ? 'if_required' : null,
    customer_details: null,
    customer_email: options.customerEmail,
    discounts: [],
    expires_at: options.expiresAt,
    integration_identifier: null,
    invoice: null,
    invoice_creation: null,
    livemode: false,
    locale: null,
    managed_payments: null,
    metadata: options.metadata,
    mode: 'payment',
    origin_context: null,
    payment_intent: null,
    payment_link: null,
    payment_method_collection: 'if_required',
    payment_method_configuration_details: null,
    payment_method_options: {},
    payment_method_types: ['card'],
    payment_status: 'unpaid',
    permissions: null,
    recovered_from: null,
    ...(options.returnUrl === null ? {} : { return_url: options.returnUrl }),
    saved_payment_method_options: null,
    setup_intent: null,
    shipping_address_collection: null,
    shipping_cost: null,
    shipping_options: [],
    status: 'open',
    submit_type: null,
    subscription: null,
    success_url: options.successUrl,
    total_details: { amount_discount: 0, amount_shipping: 0, amount_tax: 0 },
    ui_mode: options.uiMode,
    url: isHosted ? `${world.baseUrl}/pay/${id}` : null,
    wallet_options: null,
  };
  world.state.sessions[id] = session;
  world.state.lineItems[id] = lines;
  world.state.intentOptions[id] = options.intent;
  world.schedule('expire-session', id, options.expiresAt - world.now());
  return session;
}

/** The intent of a session is made when somebody first tries to pay. */
function intentFor(world: World, session: Stripe.Checkout.Session): Stripe.PaymentIntent {
  const found = world.state.intents[idOf(session.payment_intent) ?? ''];
  if (found !== undefined) return found;
  const options = world.state.intentOptions[session.id] ?? { metadata: {}, description: null };
  const intent = createIntent(world, {
    ...options,
    amount: session.amount_total ?? 0,
    currency: session.currency ?? 'usd',
    customer: idOf(session.customer),
  });
  session.payment_intent = intent.id;
  return intent;
}

function complete(world: World, session: Stripe.Checkout.Session, payer: Payer): void {
  session.status = 'complete';
  session.payment_status = 'paid';
  session.url = null;
  session.customer_details = {
    address: null,
    business_name: null,
    email: payer.email,
    individual_name: null,
    name: payer.name,
    phone: null,
    tax_exempt: 'none',
    tax_ids: [],
  };
  world.unschedule(session.id, 'expire-session');
  world.emit('checkout.session.completed', session);
}

function assertOpen(session: Stripe.Checkout.Session): void {
  if (session.status !== 'open') {
    throw refused(`This Checkout Session is ${session.status ?? 'closed'} and takes no payment.`);
  }
}

/**
 * What the payment page does with a card.
 * @returns whether the card's holder must answer a challenge first
 * @throws {ApiError} 402 when the card is declined, 400 when the session is no longer open
 */
export function paySession(
  world: World,
  session: Stripe.Checkout.Session,
  card: TestCard,
  payer: Payer,
): boolean {
  assertOpen(session);
  const isChallenged = confirmIntent(world, intentFor(world, session), card, payer);
  if (!isChallenged) complete(world, session, payer);
  return isChallenged;
}

/** The holder's answer to the challenge of a session's payment; throws as `paySession` does. */
export function answerSessionChallenge(
  world: World,
  session: Stripe.Checkout.Session,
  isAccepted: boolean,
  payer: Payer,
): void {
  assertOpen(session);
  answerChallenge(world, intentFor(world, session), isAccepted, payer);
  complete(world, session, payer);
}

/** Ends an open session, and the attempt that it may have begun. */
export function expireSession(world: World, session: Stripe.Checkout.Session): void {
  if (session.status !== 'open') {
    throw refused(
      `Only Checkout Sessions with a status in ["open"] can be expired. This Checkout Session has a status of ${session.status}.`,
    );
  }
  session.status = 'expired';
  session.url = null;
  world.unschedule(session.id, 'expire-session');
  const intent = world.state.intents[idOf(session.payment_intent) ?? ''];
  if (intent !== undefined && intent.status !== 'canceled') cancelIntent(world, intent, 'automatic');
  world.emit('checkout.session.expired', session);
}

/** The address that a paid session sends its buyer to. */
export function successAddress(session: Stripe.Checkout.Session): string {
  return (session.success_url ?? '/').replaceAll('{CHECKOUT_SESSION_ID}', session.id);
}
