import type Stripe from 'stripe';
import { checkChargeAmount } from './amounts';
import { ApiError, refused } from './api-error';
import type { Decline, TestCard } from './cards';
import { cardOf, createCharge, idOf, settleCharge } from './charges';
import { newId, type World } from './world';

export interface IntentOptions {
  amount: number;
  currency: string;
  metadata: Record<string, string>;
  description: string | null;
  customer?: string | null;
  receiptEmail?: string | null;
  captureMethod?: 'automatic_async' | 'automatic' | 'manual';
}

export interface Payer {
  email: string | null;
  name: string | null;
}

export function createIntent(world: World, options: IntentOptions): Stripe.PaymentIntent {
  const id = newId('pi');
  const intent: Stripe.PaymentIntent = {
    id,
    object: 'payment_intent',
    allowed_payment_method_types: null,
    amount: options.amount,
    amount_capturable: 0,
    amount_received: 0,
    application: null,
    application_fee_amount: null,
    automatic_payment_methods: null,
    canceled_at: null,
    cancellation_reason: null,
    capture_method: options.captureMethod ?? 'automatic_async',
    client_secret: `${id}_secret_${newId('s').slice(2)}`,
    confirmation_method: 'automatic',
    created: world.now(),
    currency: options.currency,
    customer: options.customer ?? null,
    customer_account: null,
    description: options.description,
    excluded_payment_method_types: null,
    last_payment_error: null,
    latest_charge: null,
    livemode: false,
    managed_payments: null,
    metadata: { ...options.metadata },
    next_action: null,
    on_behalf_of: null,
    payment_method: null,
    payment_method_configuration_details: null,
    payment_method_options: {},
    payment_method_types: ['card'],
    payment_record: null,
    processing: null,
    receipt_email: options.receiptEmail ?? null,
    review: null,
    setup_future_usage: null,
    shipping: null,
    source: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: 'requires_payment_method',
    transfer_data: null,
    transfer_group: null,
  };
  world.state.intents[id] = intent;
  world.emit('payment_intent.created', intent);
  return intent;
}

function unexpectedState(intent: Stripe.PaymentIntent, doing: string): ApiError {
  return refused(
    `You cannot ${doing} this PaymentIntent because it has a status of ${intent.status}.`,
    'payment_intent_unexpected_state',
  );
}

function cardError(intent: Stripe.PaymentIntent, decline: Decline, chargeId?: string): ApiError {
  return new ApiError(
    402,
    {
      type: 'card_error',
      code: decline.code,
      message: decline.message,
      ...(decline.declineCode === undefined ? {} : { decline_code: decline.declineCode }),
      ...(chargeId === undefined ? {} : { charge: chargeId }),
      payment_intent: structuredClone(intent),
    },
    true,
  );
}

/** Puts the intent back to where another card can be tried. */
function failAttempt(
  world: World,
  intent: Stripe.PaymentIntent,
  decline: Decline,
  charge?: Stripe.Charge,
): never {
  intent.status = 'requires_payment_method';
  intent.next_action = null;
  intent.payment_method = null;
  intent.last_payment_error = {
    type: 'card_error',
    code: decline.code,
    message: decline.message,
    ...(decline.declineCode === undefined ? {} : { decline_code: decline.declineCode }),
    ...(charge === undefined ? {} : { charge: charge.id }),
  };
  if (charge !== undefined) {
    intent.latest_charge = charge.id;
    world.emit('charge.failed', charge);
  }
  world.emit('payment_intent.payment_failed', intent);
  throw cardError(intent, decline, charge?.id);
}

function take(world: World, intent: Stripe.PaymentIntent, card: TestCard, payer: Payer): void {
  if (card.decline !== undefined) {
    failAttempt(world, intent, card.decline, createCharge(world, intent, card, payer, card.decline));
  }
  const charge = createCharge(world, intent, card, payer);
  intent.latest_charge = charge.id;
  intent.next_action = null;
  intent.last_payment_error = null;
  world.emit('charge.succeeded', charge);
  if (charge.captured) {
    intent.status = 'succeeded';
    intent.amount_received = intent.amount;
    world.emit('payment_intent.succeeded', intent);
  } else {
    intent.status = 'requires_capture';
    intent.amount_capturable = intent.amount;
    world.emit('payment_intent.amount_capturable_updated', intent);
  }
}

/**
 * Tries to pay an intent with a card.
 * @returns whether the card's holder must answer a challenge first
 * @throws {ApiError} 402 when the card is declined
 */
export function confirmIntent(
  world: World,
  intent: Stripe.PaymentIntent,
  card: TestCard,
  payer: Payer,
  returnUrl: string | null = null,
): boolean {
  const isOpen = ['requires_payment_method', 'requires_confirmation', 'requires_action'].includes(
    intent.status,
  );
  if (!isOpen) throw unexpectedState(intent, 'confirm');
  intent.payment_method = newId('pm');
  world.state.cards[intent.id] = card.number;
  if (card.isChallenged !== true) {
    take(world, intent, card, payer);
    return false;
  }
  intent.status = 'requires_action';
  intent.next_action = {
    type: 'redirect_to_url',
    redirect_to_url: { url: `${world.baseUrl}/challenge/${intent.id}`, return_url: returnUrl },
  };
  world.emit('payment_intent.requires_action', intent);
  return true;
}

/**
 * The holder's answer to the challenge.
 * @throws {ApiError} 402 when it failed, or the card is declined after it
 */
export function answerChallenge(
  world: World,
  intent: Stripe.PaymentIntent,
  isAccepted: boolean,
  payer: Payer,
): void {
  const card = cardOf(world, intent.id);
  if (intent.status !== 'requires_action' || card === undefined)
    throw unexpectedState(intent, 'authenticate');
  if (isAccepted) take(world, intent, card, payer);
  else {
    failAttempt(world, intent, {
      code: 'payment_intent_authentication_failure',
      message: 'We are unable to authenticate your payment method. Please choose another one and try again.',
    });
  }
}

export function captureIntent(world: World, intent: Stripe.PaymentIntent, amount: number | null): void {
  const charge = world.state.charges[idOf(intent.latest_charge) ?? ''];
  const card = cardOf(world, intent.id);
  if (intent.status !== 'requires_capture' || charge === undefined || card === undefined) {
    throw unexpectedState(intent, 'capture');
  }
  const captured = checkChargeAmount(amount ?? intent.amount, intent.currency, 'amount_to_capture');
  if (captured > intent.amount_capturable) {
    throw refused('The amount is larger than what can be captured.', 'amount_too_large', 'amount_to_capture');
  }
  world.change(charge, ['charge.captured'], (changed) => {
    changed.captured = true;
    changed.amount_captured = captured;
    settleCharge(world, changed, card);
  });
  intent.status = 'succeeded';
  intent.amount_capturable = 0;
  intent.amount_received = captured;
  world.emit('payment_intent.succeeded', intent);
}

export function cancelIntent(
  world: World,
  intent: Stripe.PaymentIntent,
  reason: Stripe.PaymentIntent.CancellationReason | null,
): void {
  if (intent.status === 'succeeded' || intent.status === 'canceled') throw unexpectedState(intent, 'cancel');
  intent.status = 'canceled';
  intent.canceled_at = world.now();
  intent.cancellation_reason = reason;
  intent.amount_capturable = 0;
  intent.next_action = null;
  world.emit('payment_intent.canceled', intent);
}
