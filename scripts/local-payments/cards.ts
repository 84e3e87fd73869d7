/** The cards that Stripe publishes for tests, as they are widely listed, and what each of them does here. */

export interface Decline {
  code: string;
  declineCode?: string;
  message: string;
}

export interface TestCard {
  number: string;
  /** Ids of payment methods that stand for it in calls of the API. */
  tokens: readonly string[];
  label: string;
  brand: string;
  decline?: Decline;
  /** The bank asks the holder first (3-D Secure). */
  isChallenged?: boolean;
  dispute?: 'fraudulent' | 'product_not_received' | 'inquiry';
  refund?: 'succeeds-later' | 'fails-later';
  isAvailableAtOnce?: boolean;
}

const generic: Decline = {
  code: 'card_declined',
  declineCode: 'generic_decline',
  message: 'Your card was declined.',
};
const insufficient: Decline = {
  code: 'card_declined',
  declineCode: 'insufficient_funds',
  message: 'Your card has insufficient funds.',
};
const declined = (declineCode: string): Decline => ({ ...generic, declineCode });

function card(number: string, label: string, tokens: string[], more: Partial<TestCard> = {}): TestCard {
  return { number, label, tokens, brand: 'visa', ...more };
}

export const testCards: readonly TestCard[] = [
  card('4242424242424242', 'Accepted', ['pm_card_visa']),
  card('5555555555554444', 'Accepted (Mastercard)', ['pm_card_mastercard'], { brand: 'mastercard' }),
  card('4000000000000077', 'Accepted, available at once', ['pm_card_bypassPending'], {
    isAvailableAtOnce: true,
  }),
  card('4000000000000002', 'Declined', ['pm_card_visa_chargeDeclined', 'pm_card_chargeDeclined'], {
    decline: generic,
  }),
  card('4000000000009995', 'Declined: insufficient funds', ['pm_card_visa_chargeDeclinedInsufficientFunds'], {
    decline: insufficient,
  }),
  card('4000000000009987', 'Declined: lost card', ['pm_card_visa_chargeDeclinedLostCard'], {
    decline: declined('lost_card'),
  }),
  card('4000000000009979', 'Declined: stolen card', ['pm_card_visa_chargeDeclinedStolenCard'], {
    decline: declined('stolen_card'),
  }),
  card('4000000000000069', 'Declined: expired card', ['pm_card_chargeDeclinedExpiredCard'], {
    decline: { code: 'expired_card', message: 'Your card has expired.' },
  }),
  card('4000000000000127', 'Declined: wrong security code', ['pm_card_chargeDeclinedIncorrectCvc'], {
    decline: { code: 'incorrect_cvc', message: "Your card's security code is incorrect." },
  }),
  card('4000000000000119', 'Declined: processing error', ['pm_card_chargeDeclinedProcessingError'], {
    decline: {
      code: 'processing_error',
      message: 'An error occurred while processing your card. Try again in a little bit.',
    },
  }),
  card('4000002500003155', '3-D Secure', ['pm_card_authenticationRequiredOnSetup'], { isChallenged: true }),
  card('4000002760003184', '3-D Secure, always', ['pm_card_authenticationRequired'], { isChallenged: true }),
  card('4000000000003220', '3-D Secure required', ['pm_card_threeDSecure2Required'], { isChallenged: true }),
  card('4000008400001629', 'Declined after 3-D Secure', ['pm_card_threeDSecureRequiredChargeDeclined'], {
    isChallenged: true,
    decline: generic,
  }),
  card(
    '4000008260003178',
    'Insufficient funds after 3-D Secure',
    ['pm_card_authenticationRequiredChargeDeclinedInsufficientFunds'],
    {
      isChallenged: true,
      decline: insufficient,
    },
  ),
  card('4000000000000259', 'Accepted, then disputed as fraud', ['pm_card_createDispute'], {
    dispute: 'fraudulent',
  }),
  card(
    '4000000000002685',
    'Accepted, then disputed: not received',
    ['pm_card_createDisputeProductNotReceived'],
    {
      dispute: 'product_not_received',
    },
  ),
  card('4000000000001976', 'Accepted, then an inquiry', ['pm_card_createDisputeInquiry'], {
    dispute: 'inquiry',
  }),
  card('4000000000007726', 'Accepted; a refund succeeds later', ['pm_card_pendingRefund'], {
    refund: 'succeeds-later',
  }),
  card('4000000000005126', 'Accepted; a refund fails later', ['pm_card_refundFail'], {
    refund: 'fails-later',
  }),
];

/** The check digit of card numbers (ISO/IEC 7812-1, Luhn's formula). */
function hasValidCheckDigit(digits: string): boolean {
  let sum = 0;
  for (let at = 0; at < digits.length; at += 1) {
    const digit = Number(digits[digits.length - 1 - at]);
    const doubled = at % 2 === 1 ? digit * 2 : digit;
    sum += doubled > 9 ? doubled - 9 : doubled;
  }
  return sum % 10 === 0;
}

export interface CardEntry {
  number: string;
  /** Such as 04/32 or 04/2032. */
  expiry: string;
  securityCode: string;
}

type FieldProblem = { field: 'number' | 'expiry' | 'securityCode'; decline: Decline };

function hasPassed(expiry: string, now: Date): boolean | null {
  const match = /^(\d{1,2})\s*\/\s*(\d{2}|\d{4})$/.exec(expiry.trim());
  const month = Number(match?.[1]);
  if (match === null || month < 1 || month > 12) return null;
  const year = Number(match[2]) + (match[2]?.length === 2 ? 2000 : 0);
  return year * 12 + month < now.getUTCFullYear() * 12 + now.getUTCMonth() + 1;
}

/** Finds the test card that was typed, or says which field is wrong. */
export function readCardEntry(entry: CardEntry, now: Date): TestCard | FieldProblem {
  const digits = entry.number.replace(/[\s-]/g, '');
  const problem = (field: FieldProblem['field'], code: string, message: string): FieldProblem => ({
    field,
    decline: { code, message },
  });
  if (!/^\d{12,19}$/.test(digits) || !hasValidCheckDigit(digits)) {
    return problem('number', 'incorrect_number', 'Your card number is incorrect.');
  }
  const isPast = hasPassed(entry.expiry, now);
  if (isPast === null)
    return problem('expiry', 'invalid_expiry_month', 'Give the expiry as month and year, such as 04/32.');
  if (isPast) return problem('expiry', 'invalid_expiry_year', "Your card's expiry is in the past.");
  if (!/^\d{3,4}$/.test(entry.securityCode.trim())) {
    return problem('securityCode', 'invalid_cvc', "Your card's security code is invalid.");
  }
  const found = testCards.find((candidate) => candidate.number === digits);
  if (found !== undefined) return found;
  return {
    field: 'number',
    decline: {
      code: 'card_declined',
      declineCode: 'test_mode_live_card',
      message: 'This is no test card. Never enter a real card here.',
    },
  };
}

export function findByToken(token: string): TestCard | undefined {
  return testCards.find((candidate) => candidate.tokens.includes(token));
}
