import Stripe from 'stripe';

/**
 * - `declined`: the card's bank said no; the buyer can try another card
 * - `refused`: the service understood and says no, such as a refund over what is left
 * - `conflict`: an idempotency key came with other values than before
 * - `not-found`: the service does not know the object
 * - `unavailable`: no answer, a late answer, or too many requests; the same call with the same key is safe
 * - `misconfigured`: the key is missing, wrong or not allowed to do this
 * - `unsigned`: a message whose signature does not hold
 */
export type CardPaymentFailure =
  'declined' | 'refused' | 'conflict' | 'not-found' | 'unavailable' | 'misconfigured' | 'unsigned';

/** The one error of the card-payment service. */
export class CardPaymentError extends Error {
  override name = 'CardPaymentError';
  /** The service's own code, such as `charge_already_refunded`. */
  readonly code: string | null;
  readonly declineCode: string | null;
  /** To be quoted when asking the service's support. */
  readonly requestId: string | null;

  constructor(
    readonly kind: CardPaymentFailure,
    message: string,
    details: {
      code?: string | null;
      declineCode?: string | null;
      requestId?: string | null;
      cause?: unknown;
    } = {},
  ) {
    super(message, details.cause === undefined ? undefined : { cause: details.cause });
    this.code = details.code ?? null;
    this.declineCode = details.declineCode ?? null;
    this.requestId = details.requestId ?? null;
  }
}

function kindOf(error: InstanceType<typeof Stripe.errors.StripeError>): CardPaymentFailure {
  const { errors } = Stripe;
  if (error instanceof errors.StripeCardError) return 'declined';
  if (error instanceof errors.StripeIdempotencyError) return 'conflict';
  if (error instanceof errors.StripeAuthenticationError) return 'misconfigured';
  if (error instanceof errors.StripePermissionError) return 'misconfigured';
  if (error instanceof errors.StripeSignatureVerificationError) return 'unsigned';
  if (error instanceof errors.StripeRateLimitError) return 'unavailable';
  if (error instanceof errors.StripeConnectionError) return 'unavailable';
  const status = error.statusCode ?? 500;
  if (status === 404) return 'not-found';
  return status === 409 || status === 429 || status >= 500 ? 'unavailable' : 'refused';
}

/** Turns whatever the SDK throws into a {@link CardPaymentError}. */
export function readFailure(error: unknown): CardPaymentError {
  if (error instanceof CardPaymentError) return error;
  if (error instanceof Stripe.errors.StripeError) {
    return new CardPaymentError(kindOf(error), error.message, {
      code: error.code ?? null,
      declineCode: error.decline_code ?? null,
      requestId: error.requestId ?? null,
      cause: error,
    });
  }
  // The SDK throws plain errors for an empty key and for bodies that are no JSON.
  const message = error instanceof Error ? error.message : String(error);
  return new CardPaymentError('misconfigured', message, { cause: error });
}
