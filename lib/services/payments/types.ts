/** Amounts in this file are integers in the minor unit that ISO 4217 gives the currency; currencies are upper case. */

export interface CheckoutRequest {
  workspaceId: string;
  invoiceId: string;
  invoiceNumber: string;
  amount: number;
  currency: string;
  /** What the buyer reads on the payment page. */
  description: string;
  buyerEmail?: string | null;
  /** May hold {CHECKOUT_SESSION_ID}. Reaching it proves no payment. */
  successUrl: string;
  cancelUrl: string;
  /** One per invoice, instalment and attempt: the same key with other values is refused. */
  idempotencyKey: string;
  /** At most 47 more keys (40 characters) and values (500 characters). */
  metadata?: Record<string, string>;
}

export interface CheckoutSession {
  id: string;
  /** The payment page; null once it is no longer open. */
  url: string | null;
  state: 'open' | 'complete' | 'expired';
  isPaid: boolean;
  amount: number;
  currency: string;
  /** Null before the first attempt to pay. */
  intentId: string | null;
  workspaceId: string | null;
  invoiceId: string | null;
  metadata: Record<string, string>;
  expiresAt: Date;
}

export interface CardPayment {
  intentId: string;
  state: 'succeeded' | 'processing' | 'waiting' | 'cancelled';
  amount: number;
  refunded: number;
  currency: string;
  /** Null as long as no charge succeeded. */
  chargeId: string | null;
  /** The balance transaction and its figures are null until the service has booked the charge. */
  balanceTransactionId: string | null;
  fee: number | null;
  net: number | null;
  /** The currency that `fee` and `net` are in. */
  settlementCurrency: string | null;
  paidAt: Date | null;
  isDisputed: boolean;
  cardBrand: string | null;
  cardLast4: string | null;
  workspaceId: string | null;
  invoiceId: string | null;
  metadata: Record<string, string>;
  /** Why the last attempt failed; null when none did. */
  lastFailure: { code: string; declineCode: string | null; message: string } | null;
}

export interface CardCharge {
  id: string;
  intentId: string | null;
  isPaid: boolean;
  amount: number;
  refunded: number;
  currency: string;
  isDisputed: boolean;
  balanceTransactionId: string | null;
  createdAt: Date;
  metadata: Record<string, string>;
}

export type RefundRequest = (
  { chargeId: string; intentId?: undefined } | { intentId: string; chargeId?: undefined }
) & {
  amount: number;
  currency: string;
  /** In the words of whoever refunds; kept with the refund. */
  reason?: string;
  cause?: 'duplicate' | 'fraudulent' | 'requested_by_customer';
  idempotencyKey: string;
  metadata?: Record<string, string>;
};

export interface CardRefund {
  id: string;
  /** `pending` money may still fail to arrive, and a `succeeded` refund may fail days later. */
  state: 'pending' | 'succeeded' | 'failed' | 'cancelled';
  amount: number;
  currency: string;
  chargeId: string | null;
  intentId: string | null;
  balanceTransactionId: string | null;
  failureBalanceTransactionId: string | null;
  failureReason: string | null;
  createdAt: Date;
  metadata: Record<string, string>;
}

export interface CardDispute {
  id: string;
  /** An inquiry has taken no money yet. */
  state: 'inquiry' | 'inquiry-closed' | 'open' | 'under-review' | 'won' | 'lost';
  reason: string;
  amount: number;
  currency: string;
  chargeId: string;
  intentId: string | null;
  /** The bookings so far: the withdrawal with its fee, and the return when won. */
  lines: BalanceLine[];
  answerBy: Date | null;
  createdAt: Date;
}

/** One line of the account at the payment service. */
export interface BalanceLine {
  id: string;
  /** charge, refund, refund_failure, adjustment, payout, payout_failure …, as the service names it. */
  type: string;
  /** Finer than `type`: tells a dispute from another adjustment. */
  category: string;
  /** Positive comes in, negative goes out; `net` is `amount` less `fee`. */
  amount: number;
  fee: number;
  net: number;
  currency: string;
  /** The charge, refund, dispute or payout. */
  sourceId: string | null;
  createdAt: Date;
  availableOn: Date;
  isAvailable: boolean;
  description: string | null;
}

export interface CardPayout {
  id: string;
  state: 'pending' | 'in-transit' | 'paid' | 'failed' | 'cancelled';
  amount: number;
  currency: string;
  balanceTransactionId: string | null;
  failureBalanceTransactionId: string | null;
  arrivesOn: Date;
  createdAt: Date;
  /** Whether the service can say which lines a payout is made of. */
  isAutomatic: boolean;
}

/** From inclusive, to exclusive. */
export interface Period {
  from?: Date;
  to?: Date;
}

/**
 * What a message of the service is about. The object is as it was when the message was made: messages come twice,
 * late and in any order, so whoever books re-reads the object and keys on its id, not on the message's.
 */
export type PaymentEvent = {
  id: string;
  /** The service's name, such as `charge.refunded`. */
  type: string;
  createdAt: Date;
} & (
  | { kind: 'checkout-completed' | 'checkout-expired'; session: CheckoutSession }
  | { kind: 'payment-succeeded'; intentId: string; metadata: Record<string, string> }
  | {
      kind: 'payment-failed';
      intentId: string;
      metadata: Record<string, string>;
      code: string | null;
      declineCode: string | null;
    }
  | { kind: 'charge-changed'; charge: CardCharge }
  | { kind: 'refund-changed'; refund: CardRefund }
  | { kind: 'dispute-changed'; dispute: CardDispute }
  | { kind: 'payout-changed'; payout: CardPayout }
  | { kind: 'other' }
);

/** Card payments: the buyer pays on the service's own page, and no card data reaches this product. */
export interface CardPayments {
  createCheckout(request: CheckoutRequest): Promise<CheckoutSession>;
  retrieveCheckout(sessionId: string): Promise<CheckoutSession>;
  /** Closes the payment page. One that was paid or expired before is returned as it is, so check `state`. */
  expireCheckout(sessionId: string): Promise<CheckoutSession>;
  retrievePayment(intentId: string): Promise<CardPayment>;
  retrieveCharge(chargeId: string): Promise<CardCharge>;
  refund(request: RefundRequest): Promise<CardRefund>;
  retrieveRefund(refundId: string): Promise<CardRefund>;
  retrieveDispute(disputeId: string): Promise<CardDispute>;
  retrieveBalanceLine(balanceTransactionId: string): Promise<BalanceLine>;
  /** Newest first; with a payout, the lines that it is made of. */
  listBalanceLines(filter?: Period & { payoutId?: string; sourceId?: string }): AsyncIterable<BalanceLine>;
  /** Newest first. */
  listCharges(filter?: Period & { intentId?: string }): AsyncIterable<CardCharge>;
  /** Newest first. */
  listRefunds(filter?: Period & { chargeId?: string; intentId?: string }): AsyncIterable<CardRefund>;
  /** Newest first. */
  listDisputes(filter?: Period & { chargeId?: string }): AsyncIterable<CardDispute>;
  /** Newest first. */
  listPayouts(filter?: Period): AsyncIterable<CardPayout>;
  /**
   * Checks the signature over the unparsed body and reads the event.
   * @throws {CardPaymentError} of kind `unsigned` when it is forged, altered or older than five minutes
   */
  parseWebhook(rawBody: string | Uint8Array, signatureHeader: string | null | undefined): PaymentEvent;
}
