import { exponentOf } from '@/lib/money/minor-units';
import { CardPaymentError } from './errors';

/**
 * Currencies whose unit at Stripe differs from ISO 4217, as powers of ten that lead from ISO to Stripe.
 * Stripe counts ISK and UGX in hundredths that must be zero, and MGA without decimals.
 * Source: Stripe's documentation "Supported currencies", special cases and zero-decimal currencies; from memory.
 */
const shifts: Readonly<Record<string, 2 | -2>> = { ISK: 2, UGX: 2, MGA: -2 };

function refuse(amount: number, currency: string): never {
  throw new CardPaymentError(
    'refused',
    `The card service cannot take ${amount} minor units of ${currency}.`,
    {
      code: 'amount_not_representable',
    },
  );
}

/**
 * From minor units by ISO 4217 to the integer that Stripe takes.
 * @throws {CardPaymentError} when the amount is no safe integer, or finer than cards can be charged:
 *   three-decimal currencies only in steps of 10
 */
export function toServiceAmount(amount: number, currency: string): number {
  if (!Number.isSafeInteger(amount)) refuse(amount, currency);
  if (exponentOf(currency) === 3 && amount % 10 !== 0) refuse(amount, currency);
  const shift = shifts[currency];
  if (shift === undefined) return amount;
  if (shift === 2) return Number.isSafeInteger(amount * 100) ? amount * 100 : refuse(amount, currency);
  return amount % 100 === 0 ? amount / 100 : refuse(amount, currency);
}

/** The way back; `currency` in either case. */
export function fromServiceAmount(amount: number, currency: string): number {
  const code = currency.toUpperCase();
  const shift = shifts[code];
  if (shift === undefined) return amount;
  if (shift === -2) return amount * 100;
  return amount % 100 === 0 ? amount / 100 : refuse(amount, code);
}
