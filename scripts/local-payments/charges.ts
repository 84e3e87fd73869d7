import type Stripe from 'stripe';
import { bookCharge } from './balance';
import { testCards, type Decline, type TestCard } from './cards';
import { newId, type World } from './world';

export function idOf(value: string | { id: string } | null | undefined): string | null {
  return value == null ? null : typeof value === 'string' ? value : value.id;
}

/** The test card that an intent was paid with. */
export function cardOf(world: World, intentId: string | null): TestCard | undefined {
  const number = intentId === null ? undefined : world.state.cards[intentId];
  return testCards.find((card) => card.number === number);
}

function outcomeOf(decline: Decline | undefined): Stripe.Charge.Outcome {
  return {
    advice_code: decline === undefined ? null : 'try_again_later',
    network_advice_code: null,
    network_decline_code: null,
    network_status: decline === undefined ? 'approved_by_network' : 'declined_by_network',
    reason: decline?.declineCode ?? null,
    risk_level: 'normal',
    risk_score: 10,
    seller_message:
      decline === undefined ? 'Payment complete.' : 'The bank did not return any further details.',
    type: decline === undefined ? 'authorized' : 'issuer_declined',
  };
}

function methodDetails(card: TestCard, amount: number): Stripe.Charge.PaymentMethodDetails {
  return {
    type: 'card',
    card: {
      amount_authorized: amount,
      authorization_code: null,
      brand: card.brand,
      checks: { address_line1_check: null, address_postal_code_check: null, cvc_check: 'pass' },
      country: 'US',
      electronic_commerce_indicator: null,
      exp_month: 12,
      exp_year: 2040,
      funding: 'credit',
      installments: null,
      last4: card.number.slice(-4),
      mandate: null,
      network: card.brand,
      network_transaction_id: null,
      regulated_status: 'unregulated',
      three_d_secure: null,
      transaction_link_id: null,
      wallet: null,
    },
  };
}

/** One attempt to take an intent's money: paid, authorised only (manual capture) or failed. */
export function createCharge(
  world: World,
  intent: Stripe.PaymentIntent,
  card: TestCard,
  payer: { email: string | null; name: string | null },
  decline?: Decline,
): Stripe.Charge {
  const isCaptured = decline === undefined && intent.capture_method !== 'manual';
  const charge: Stripe.Charge = {
    id: newId('ch'),
    object: 'charge',
    amount: intent.amount,
    amount_captured: isCaptured ? intent.amount : 0,
    amount_refunded: 0,
    application: null,
    application_fee: null,
    application_fee_amount: null,
    balance_transaction: null,
    billing_details: { address: null, email: payer.email, name: payer.name, phone: null, tax_id: null },
    calculated_statement_descriptor: 'LOCAL TEST',
    captured: isCaptured,
    created: world.now(),
    currency: intent.currency,
    customer: idOf(intent.customer),
    description: intent.description,
    disputed: false,
    failure_balance_transaction: null,
    failure_code: decline?.code ?? null,
    failure_message: decline?.message ?? null,
    fraud_details: {},
    livemode: false,
    metadata: { ...intent.metadata },
    on_behalf_of: null,
    outcome: outcomeOf(decline),
    paid: decline === undefined,
    payment_intent: intent.id,
    payment_method: idOf(intent.payment_method),
    payment_method_details: methodDetails(card, intent.amount),
    receipt_email: intent.receipt_email,
    receipt_number: null,
    receipt_url: null,
    refunded: false,
    review: null,
    shipping: null,
    source: null,
    source_transfer: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: decline === undefined ? 'succeeded' : 'failed',
    transfer_data: null,
    transfer_group: null,
  };
  world.state.charges[charge.id] = charge;
  world.state.cards[intent.id] = card.number;
  if (isCaptured) settleCharge(world, charge, card);
  return charge;
}

/** Books a captured charge, at once or a moment later, and plans the dispute that its card stands for. */
export function settleCharge(world: World, charge: Stripe.Charge, card: TestCard): void {
  if (world.settings.booksLater) world.schedule('book-charge', charge.id, 1);
  else charge.balance_transaction = bookCharge(world, charge, card.isAvailableAtOnce === true);
  if (card.dispute !== undefined) world.schedule('open-dispute', charge.id, 0);
}

/** The booking that was put off, with the `charge.updated` that tells of it. */
export function bookLate(world: World, chargeId: string): void {
  const charge = world.state.charges[chargeId];
  if (charge === undefined || charge.balance_transaction !== null) return;
  const card = cardOf(world, idOf(charge.payment_intent));
  world.change(charge, ['charge.updated'], (changed) => {
    changed.balance_transaction = bookCharge(world, charge, card?.isAvailableAtOnce === true);
  });
}
