import type Stripe from 'stripe';
import { fromServiceAmount } from './amounts';
import type {
  BalanceLine,
  CardCharge,
  CardDispute,
  CardPayment,
  CardPayout,
  CardRefund,
  CheckoutSession,
} from './types';

/** The service gives an id or, when asked to expand, the object. */
function idOf(value: string | { id: string } | null | undefined): string | null {
  return value == null ? null : typeof value === 'string' ? value : value.id;
}

const moment = (seconds: number) => new Date(seconds * 1000);

function ownersIn(metadata: Record<string, string>) {
  return { workspaceId: metadata.workspace_id ?? null, invoiceId: metadata.invoice_id ?? null };
}

function sessionState(status: Stripe.Checkout.Session.Status | null): CheckoutSession['state'] {
  if (status === 'complete') return 'complete';
  return status === 'expired' ? 'expired' : 'open';
}

export function readSession(session: Stripe.Checkout.Session): CheckoutSession {
  const currency = (session.currency ?? '').toUpperCase();
  const metadata = session.metadata ?? {};
  return {
    id: session.id,
    url: session.url,
    state: sessionState(session.status),
    isPaid: session.payment_status === 'paid',
    amount: fromServiceAmount(session.amount_total ?? 0, currency),
    currency,
    intentId: idOf(session.payment_intent),
    ...ownersIn(metadata),
    metadata,
    expiresAt: moment(session.expires_at),
  };
}

const intentStates: Partial<Record<Stripe.PaymentIntent.Status, CardPayment['state']>> = {
  succeeded: 'succeeded',
  processing: 'processing',
  canceled: 'cancelled',
};

/** Takes an intent whose `latest_charge.balance_transaction` is expanded. */
export function readPayment(intent: Stripe.PaymentIntent): CardPayment {
  const charge = typeof intent.latest_charge === 'object' ? intent.latest_charge : null;
  const paid = charge?.paid === true ? charge : null;
  const booking = typeof paid?.balance_transaction === 'object' ? paid.balance_transaction : null;
  const failure = intent.last_payment_error;
  const card = charge?.payment_method_details?.card;
  return {
    intentId: intent.id,
    state: intentStates[intent.status] ?? 'waiting',
    amount: fromServiceAmount(
      intent.status === 'succeeded' ? intent.amount_received : intent.amount,
      intent.currency,
    ),
    refunded: fromServiceAmount(paid?.amount_refunded ?? 0, intent.currency),
    currency: intent.currency.toUpperCase(),
    chargeId: paid?.id ?? null,
    balanceTransactionId: idOf(paid?.balance_transaction),
    fee: booking === null ? null : fromServiceAmount(booking.fee, booking.currency),
    net: booking === null ? null : fromServiceAmount(booking.net, booking.currency),
    settlementCurrency: booking?.currency.toUpperCase() ?? null,
    paidAt: paid === null ? null : moment(paid.created),
    isDisputed: paid?.disputed ?? false,
    cardBrand: card?.brand ?? null,
    cardLast4: card?.last4 ?? null,
    ...ownersIn(intent.metadata),
    metadata: intent.metadata,
    lastFailure:
      failure === null
        ? null
        : {
            code: failure.code ?? failure.type,
            declineCode: failure.decline_code ?? null,
            message: failure.message ?? '',
          },
  };
}

export function readCharge(charge: Stripe.Charge): CardCharge {
  return {
    id: charge.id,
    intentId: idOf(charge.payment_intent),
    isPaid: charge.paid,
    amount: fromServiceAmount(charge.amount, charge.currency),
    refunded: fromServiceAmount(charge.amount_refunded, charge.currency),
    currency: charge.currency.toUpperCase(),
    isDisputed: charge.disputed,
    balanceTransactionId: idOf(charge.balance_transaction),
    createdAt: moment(charge.created),
    metadata: charge.metadata,
  };
}

function refundState(status: string | null): CardRefund['state'] {
  if (status === 'succeeded' || status === 'failed') return status;
  return status === 'canceled' ? 'cancelled' : 'pending';
}

export function readRefund(refund: Stripe.Refund): CardRefund {
  return {
    id: refund.id,
    state: refundState(refund.status),
    amount: fromServiceAmount(refund.amount, refund.currency),
    currency: refund.currency.toUpperCase(),
    chargeId: idOf(refund.charge),
    intentId: idOf(refund.payment_intent),
    balanceTransactionId: idOf(refund.balance_transaction),
    failureBalanceTransactionId: idOf(refund.failure_balance_transaction),
    failureReason: refund.failure_reason ?? null,
    createdAt: moment(refund.created),
    metadata: refund.metadata ?? {},
  };
}

export function readBalanceLine(line: Stripe.BalanceTransaction): BalanceLine {
  const amount = (value: number) => fromServiceAmount(value, line.currency);
  return {
    id: line.id,
    type: line.type,
    category: line.reporting_category,
    amount: amount(line.amount),
    fee: amount(line.fee),
    net: amount(line.net),
    currency: line.currency.toUpperCase(),
    sourceId: idOf(line.source),
    createdAt: moment(line.created),
    availableOn: moment(line.available_on),
    isAvailable: line.status === 'available',
    description: line.description,
  };
}

function disputeState(status: Stripe.Dispute.Status): CardDispute['state'] {
  switch (status) {
    case 'won':
      return 'won';
    case 'lost':
      return 'lost';
    case 'under_review':
      return 'under-review';
    case 'warning_needs_response':
    case 'warning_under_review':
      return 'inquiry';
    case 'warning_closed':
    case 'prevented':
      return 'inquiry-closed';
    default:
      return 'open';
  }
}

export function readDispute(dispute: Stripe.Dispute): CardDispute {
  const dueBy = dispute.evidence_details.due_by;
  return {
    id: dispute.id,
    state: disputeState(dispute.status),
    reason: dispute.reason,
    amount: fromServiceAmount(dispute.amount, dispute.currency),
    currency: dispute.currency.toUpperCase(),
    chargeId: idOf(dispute.charge) ?? '',
    intentId: idOf(dispute.payment_intent),
    lines: dispute.balance_transactions.map(readBalanceLine),
    answerBy: dueBy === null ? null : moment(dueBy),
    createdAt: moment(dispute.created),
  };
}

const payoutStates: Readonly<Record<string, CardPayout['state']>> = {
  pending: 'pending',
  in_transit: 'in-transit',
  paid: 'paid',
  failed: 'failed',
  canceled: 'cancelled',
};

export function readPayout(payout: Stripe.Payout): CardPayout {
  return {
    id: payout.id,
    state: payoutStates[payout.status] ?? 'pending',
    amount: fromServiceAmount(payout.amount, payout.currency),
    currency: payout.currency.toUpperCase(),
    balanceTransactionId: idOf(payout.balance_transaction),
    failureBalanceTransactionId: idOf(payout.failure_balance_transaction),
    arrivesOn: moment(payout.arrival_date),
    createdAt: moment(payout.created),
    isAutomatic: payout.automatic,
  };
}
