import type Stripe from 'stripe';
import { readCharge, readDispute, readPayout, readRefund, readSession } from './read-objects';
import type { PaymentEvent } from './types';

/** Reads a verified event; kinds that the product does not book become `other`. */
export function readPaymentEvent(event: Stripe.Event): PaymentEvent {
  const common = { id: event.id, type: event.type, createdAt: new Date(event.created * 1000) };
  switch (event.type) {
    case 'checkout.session.completed':
    case 'checkout.session.async_payment_succeeded':
      return { ...common, kind: 'checkout-completed', session: readSession(event.data.object) };
    case 'checkout.session.expired':
      return { ...common, kind: 'checkout-expired', session: readSession(event.data.object) };
    case 'payment_intent.succeeded': {
      const { id, metadata } = event.data.object;
      return { ...common, kind: 'payment-succeeded', intentId: id, metadata };
    }
    case 'payment_intent.payment_failed': {
      const { id, metadata, last_payment_error: failure } = event.data.object;
      return {
        ...common,
        kind: 'payment-failed',
        intentId: id,
        metadata,
        code: failure?.code ?? null,
        declineCode: failure?.decline_code ?? null,
      };
    }
    case 'charge.succeeded':
    case 'charge.updated':
    case 'charge.captured':
    case 'charge.refunded':
      return { ...common, kind: 'charge-changed', charge: readCharge(event.data.object) };
    case 'refund.created':
    case 'refund.updated':
    case 'refund.failed':
    case 'charge.refund.updated':
      return { ...common, kind: 'refund-changed', refund: readRefund(event.data.object) };
    case 'charge.dispute.created':
    case 'charge.dispute.updated':
    case 'charge.dispute.closed':
    case 'charge.dispute.funds_withdrawn':
    case 'charge.dispute.funds_reinstated':
      return { ...common, kind: 'dispute-changed', dispute: readDispute(event.data.object) };
    case 'payout.created':
    case 'payout.updated':
    case 'payout.paid':
    case 'payout.failed':
    case 'payout.canceled':
      return { ...common, kind: 'payout-changed', payout: readPayout(event.data.object) };
    default:
      return { ...common, kind: 'other' };
  }
}
