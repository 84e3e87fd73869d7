import type Stripe from 'stripe';
import { refused } from './api-error';
import { book } from './balance';
import { cardOf, idOf } from './charges';
import { newId, type World } from './world';

export interface RefundOptions {
  amount: number | null;
  reason: Stripe.Refund.Reason | null;
  metadata: Record<string, string>;
}

function assertRefundable(charge: Stripe.Charge): void {
  if (!charge.paid || !charge.captured)
    throw refused(`Charge ${charge.id} has not been captured.`, 'charge_not_refundable');
  if (charge.refunded)
    throw refused(`Charge ${charge.id} has already been refunded.`, 'charge_already_refunded');
}

function bookRefund(world: World, refund: Stripe.Refund): void {
  // The fee of the charge stays with the service.
  refund.balance_transaction = book(world, {
    type: 'refund',
    category: 'refund',
    amount: -refund.amount,
    currency: refund.currency,
    source: refund.id,
    description: 'REFUND FOR CHARGE',
  }).id;
}

/** @throws {ApiError} when the charge can't be refunded, or not by so much */
export function createRefund(world: World, charge: Stripe.Charge, options: RefundOptions): Stripe.Refund {
  assertRefundable(charge);
  const dispute = Object.values(world.state.disputes).find(
    (candidate) => idOf(candidate.charge) === charge.id,
  );
  if (dispute !== undefined && !dispute.is_charge_refundable) {
    throw refused(`Charge ${charge.id} has been charged back; cannot issue a refund.`, 'charge_disputed');
  }
  const left = charge.amount_captured - charge.amount_refunded;
  const amount = options.amount ?? left;
  if (amount > left) {
    throw refused(
      `Refund amount (${amount}) is greater than unrefunded amount on charge (${left})`,
      'amount_too_large',
      'amount',
    );
  }
  const behaviour = cardOf(world, idOf(charge.payment_intent))?.refund;
  const refund: Stripe.Refund = {
    id: newId('re'),
    object: 'refund',
    amount,
    balance_transaction: null,
    charge: charge.id,
    created: world.now(),
    currency: charge.currency,
    customer: idOf(charge.customer),
    customer_account: null,
    destination_details: {
      type: 'card',
      card: { type: 'refund', reference_status: 'pending', reference_type: 'acquirer_reference_number' },
    },
    metadata: options.metadata,
    payment_intent: idOf(charge.payment_intent),
    payment_method: charge.payment_method,
    reason: options.reason,
    receipt_number: null,
    source_transfer_reversal: null,
    status: behaviour === 'succeeds-later' ? 'pending' : 'succeeded',
    transfer_reversal: null,
    ...(behaviour === 'succeeds-later' ? { pending_reason: 'processing' as const } : {}),
  };
  bookRefund(world, refund);
  world.state.refunds[refund.id] = refund;
  world.change(charge, ['charge.refunded'], (changed) => {
    changed.amount_refunded += amount;
    changed.refunded = changed.amount_refunded === changed.amount_captured;
  });
  world.emit('refund.created', refund);
  if (behaviour === 'fails-later') world.schedule('fail-refund', refund.id, world.settings.refundAfter);
  else world.schedule('settle-refund', refund.id, behaviour === undefined ? 0 : world.settings.refundAfter);
  return refund;
}

/** The bank has the money: a pending refund succeeds, and the bank's reference becomes known. */
export function settleRefund(world: World, refund: Stripe.Refund): void {
  if (refund.status === 'failed' || refund.status === 'canceled') return;
  world.unschedule(refund.id, 'settle-refund');
  world.change(refund, ['refund.updated', 'charge.refund.updated'], (changed) => {
    changed.status = 'succeeded';
    delete changed.pending_reason;
    changed.destination_details = {
      type: 'card',
      card: {
        type: 'refund',
        reference: String(changed.created).padStart(23, '0'),
        reference_status: 'available',
        reference_type: 'acquirer_reference_number',
      },
    };
  });
}

/** The bank sends the money back, perhaps days later: the charge counts as not refunded by this amount again. */
export function failRefund(world: World, refund: Stripe.Refund): void {
  if (refund.status === 'failed' || refund.status === 'canceled') {
    throw refused(`Refund ${refund.id} has a status of ${refund.status}.`);
  }
  world.unschedule(refund.id, 'settle-refund', 'fail-refund');
  const charge = world.state.charges[idOf(refund.charge) ?? ''];
  world.change(refund, ['refund.updated', 'refund.failed', 'charge.refund.updated'], (changed) => {
    changed.status = 'failed';
    changed.failure_reason = 'expired_or_canceled_card';
    delete changed.pending_reason;
    changed.failure_balance_transaction = book(world, {
      type: 'refund_failure',
      category: 'refund_failure',
      amount: changed.amount,
      currency: changed.currency,
      source: changed.id,
      description: 'REFUND FAILURE',
    }).id;
  });
  if (charge === undefined) return;
  world.change(charge, ['charge.updated'], (changed) => {
    changed.amount_refunded -= refund.amount;
    changed.refunded = false;
  });
}
