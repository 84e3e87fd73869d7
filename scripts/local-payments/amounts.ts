import { invalid } from './api-error';

/** Smallest charges in the currency's smallest unit, and the step of three-decimal currencies. From memory of
 * Stripe's documentation "Minimum and maximum charge amounts"; currencies that are not listed take one unit. */
const minimums: Readonly<Record<string, number>> = {
  usd: 50,
  aud: 50,
  brl: 50,
  cad: 50,
  chf: 50,
  eur: 50,
  nzd: 50,
  sgd: 50,
  gbp: 30,
  jpy: 50,
  dkk: 250,
  nok: 300,
  sek: 300,
  mxn: 1000,
  hkd: 400,
  pln: 200,
  czk: 1500,
  huf: 17_500,
  ron: 200,
};
const threeDecimals = new Set(['bhd', 'jod', 'kwd', 'omr', 'tnd']);
const LARGEST = 99_999_999;

const known = new Set(Intl.supportedValuesOf('currency').map((code) => code.toLowerCase()));

export function checkCurrency(currency: string, param = 'currency'): string {
  if (!known.has(currency)) {
    throw invalid(`Invalid currency: ${currency}. Use a three-letter code in lower case.`, param);
  }
  return currency;
}

/** @throws {ApiError} when the amount is not one that a card can be charged */
export function checkChargeAmount(amount: number, currency: string, param = 'amount'): number {
  const least = minimums[currency] ?? 1;
  if (amount < least) {
    throw invalid(
      `Amount must be at least ${least} in the smallest unit of ${currency}`,
      param,
      'amount_too_small',
    );
  }
  if (amount > LARGEST) {
    throw invalid(
      `Amount must be no more than ${LARGEST} in the smallest unit of ${currency}`,
      param,
      'amount_too_large',
    );
  }
  if (threeDecimals.has(currency) && amount % 10 !== 0) {
    throw invalid(`Amounts in ${currency} must be divisible by 10`, param);
  }
  return amount;
}

/** Decimals that the payment page shows. */
function decimalsOf(currency: string): number {
  const zero = 'bif clp djf gnf jpy kmf krw mga pyg rwf vnd vuv xaf xof xpf';
  if (zero.includes(currency)) return 0;
  return threeDecimals.has(currency) ? 3 : 2;
}

/** For people, such as "USD 1,284.80". */
export function showAmount(amount: number, currency: string): string {
  const decimals = decimalsOf(currency);
  const digits = String(Math.abs(amount)).padStart(decimals + 1, '0');
  const whole = digits.slice(0, digits.length - decimals).replace(/\B(?=(\d{3})+$)/g, ',');
  const rest = decimals === 0 ? '' : `.${digits.slice(-decimals)}`;
  return `${currency.toUpperCase()} ${amount < 0 ? '\u2212' : ''}${whole}${rest}`;
}

/** The service's fee: basis points of the amount, rounded half up, plus a fixed part. */
export function feeOf(amount: number, fee: { basisPoints: number; fixed: number }): number {
  return Math.floor((amount * fee.basisPoints + 5_000) / 10_000) + fee.fixed;
}
