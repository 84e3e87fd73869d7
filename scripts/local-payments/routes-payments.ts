import type Stripe from 'stripe';
import { checkChargeAmount, checkCurrency } from './amounts';
import { invalid, missing } from './api-error';
import { findByToken, type TestCard } from './cards';
import { idOf } from './charges';
import { listPage, readPaging } from './lists';
import type { Parameters } from './parameters';
import { cancelIntent, captureIntent, confirmIntent, createIntent } from './payment-intents';
import { createRefund } from './refunds';
import type { Routes } from './route';
import type { World } from './world';

function findIntent(world: World, id: string, param = 'intent'): Stripe.PaymentIntent {
  const intent = world.state.intents[id];
  if (intent === undefined) throw missing('payment_intent', id, param);
  return intent;
}

function findCharge(world: World, id: string, param = 'id'): Stripe.Charge {
  const charge = world.state.charges[id];
  if (charge === undefined) throw missing('charge', id, param);
  return charge;
}

function findRefund(world: World, id: string): Stripe.Refund {
  const refund = world.state.refunds[id];
  if (refund === undefined) throw missing('refund', id);
  return refund;
}

function readCard(parameters: Parameters): TestCard | null {
  const token = parameters.text('payment_method');
  if (token === null) return null;
  const card = findByToken(token);
  if (card === undefined) throw missing('PaymentMethod', token, 'payment_method');
  return card;
}

function confirm(
  world: World,
  intent: Stripe.PaymentIntent,
  card: TestCard | null,
  returnUrl: string | null,
) {
  if (card === null) {
    throw invalid(
      'You cannot confirm this PaymentIntent because it is missing a payment method.',
      'payment_method',
      'payment_intent_unexpected_state',
    );
  }
  confirmIntent(world, intent, card, { email: intent.receipt_email, name: null }, returnUrl);
  return intent;
}

const cancellationReasons = ['abandoned', 'duplicate', 'fraudulent', 'requested_by_customer'] as const;

const intents: Routes = {
  'POST /v1/payment_intents': (world, parameters) => {
    const currency = checkCurrency(parameters.requiredText('currency'));
    const amount = checkChargeAmount(parameters.requiredInteger('amount'), currency);
    const customer = parameters.text('customer');
    if (customer !== null && world.state.customers[customer] === undefined)
      throw missing('customer', customer, 'customer');
    const options = {
      amount,
      currency,
      customer,
      metadata: parameters.metadata(),
      description: parameters.text('description'),
      receiptEmail: parameters.email('receipt_email'),
      captureMethod:
        parameters.oneOf('capture_method', ['automatic_async', 'automatic', 'manual']) ?? 'automatic_async',
    };
    const card = readCard(parameters);
    const confirms = parameters.flag('confirm') ?? false;
    const returnUrl = parameters.address('return_url');
    parameters.texts('payment_method_types');
    parameters.finish();
    const intent = createIntent(world, options);
    if (confirms) return confirm(world, intent, card, returnUrl);
    if (card !== null) intent.status = 'requires_confirmation';
    if (card !== null) world.state.cards[intent.id] = card.number;
    return intent;
  },
  'GET /v1/payment_intents/:id': (world, parameters, id) => {
    parameters.text('client_secret');
    parameters.finish();
    return findIntent(world, id);
  },
  'POST /v1/payment_intents/:id': (world, parameters, id) => {
    const intent = findIntent(world, id);
    const metadata = parameters.metadata(intent.metadata);
    const description = parameters.has('description') ? parameters.text('description') : intent.description;
    parameters.finish();
    return Object.assign(intent, { metadata, description });
  },
  'POST /v1/payment_intents/:id/confirm': (world, parameters, id) => {
    const card = readCard(parameters);
    const returnUrl = parameters.address('return_url');
    parameters.finish();
    return confirm(world, findIntent(world, id), card, returnUrl);
  },
  'POST /v1/payment_intents/:id/capture': (world, parameters, id) => {
    const amount = parameters.integer('amount_to_capture');
    parameters.finish();
    const intent = findIntent(world, id);
    captureIntent(world, intent, amount);
    return intent;
  },
  'POST /v1/payment_intents/:id/cancel': (world, parameters, id) => {
    const reason = parameters.oneOf('cancellation_reason', cancellationReasons);
    parameters.finish();
    const intent = findIntent(world, id);
    cancelIntent(world, intent, reason);
    return intent;
  },
  'GET /v1/payment_intents': (world, parameters) => {
    const paging = readPaging(parameters);
    const customer = parameters.text('customer');
    parameters.finish();
    const found = Object.values(world.state.intents).filter(
      (intent) => customer === null || intent.customer === customer,
    );
    return listPage(found, paging, '/v1/payment_intents');
  },
};

const charges: Routes = {
  'GET /v1/charges/:id': (world, parameters, id) => {
    parameters.finish();
    return findCharge(world, id);
  },
  'GET /v1/charges': (world, parameters) => {
    const paging = readPaging(parameters);
    const intent = parameters.text('payment_intent');
    const customer = parameters.text('customer');
    parameters.finish();
    const found = Object.values(world.state.charges).filter(
      (charge) =>
        (intent === null || charge.payment_intent === intent) &&
        (customer === null || charge.customer === customer),
    );
    return listPage(found, paging, '/v1/charges');
  },
};

/** The charge that a refund names, directly or through its intent. */
function readRefunded(world: World, parameters: Parameters): Stripe.Charge {
  const chargeId = parameters.text('charge');
  const intentId = parameters.text('payment_intent');
  if (chargeId !== null) return findCharge(world, chargeId, 'charge');
  if (intentId === null) {
    throw invalid(
      'One of the following params should be provided for this request: payment_intent or charge.',
    );
  }
  const intent = findIntent(world, intentId, 'payment_intent');
  const charge = world.state.charges[idOf(intent.latest_charge) ?? ''];
  if (charge === undefined) throw invalid('This PaymentIntent does not have a successful charge to refund.');
  return charge;
}

const refunds: Routes = {
  'POST /v1/refunds': (world, parameters) => {
    const charge = readRefunded(world, parameters);
    const amount = parameters.integer('amount');
    if (amount !== null && amount < 1)
      throw invalid('Invalid positive integer', 'amount', 'parameter_invalid_integer');
    const reason = parameters.oneOf('reason', ['duplicate', 'fraudulent', 'requested_by_customer']);
    const metadata = parameters.metadata();
    parameters.finish();
    return createRefund(world, charge, { amount, reason, metadata });
  },
  'GET /v1/refunds/:id': (world, parameters, id) => {
    parameters.finish();
    return findRefund(world, id);
  },
  'POST /v1/refunds/:id': (world, parameters, id) => {
    const refund = findRefund(world, id);
    const metadata = parameters.metadata(refund.metadata ?? {});
    parameters.finish();
    return world.change(refund, ['refund.updated'], (changed) => {
      changed.metadata = metadata;
    });
  },
  'GET /v1/refunds': (world, parameters) => {
    const paging = readPaging(parameters);
    const charge = parameters.text('charge');
    const intent = parameters.text('payment_intent');
    parameters.finish();
    const found = Object.values(world.state.refunds).filter(
      (refund) =>
        (charge === null || refund.charge === charge) &&
        (intent === null || refund.payment_intent === intent),
    );
    return listPage(found, paging, '/v1/refunds');
  },
};

export const paymentRoutes: Routes = { ...intents, ...charges, ...refunds };
