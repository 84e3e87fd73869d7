/**
 * Amounts of money as integers in the minor unit of their currency (cents of USD, whole yen, thousandths of a dinar).
 * Every amount is a safe integer; products are taken with bigint. No float touches money.
 */
export type MinorUnits = number;

export class MoneyError extends Error {
  override name = 'MoneyError';
}

/** Decimals of the minor unit where they are not 2 (ISO 4217, list of active codes). */
const exponents: Readonly<Record<string, 0 | 3>> = {
  BIF: 0,
  CLP: 0,
  DJF: 0,
  GNF: 0,
  ISK: 0,
  JPY: 0,
  KMF: 0,
  KRW: 0,
  PYG: 0,
  RWF: 0,
  UGX: 0,
  VND: 0,
  VUV: 0,
  XAF: 0,
  XOF: 0,
  XPF: 0,
  BHD: 3,
  IQD: 3,
  JOD: 3,
  KWD: 3,
  LYD: 3,
  OMR: 3,
  TND: 3,
};

/** Decimals of a currency's minor unit by ISO 4217: 0, 2 or 3. */
export function exponentOf(currency: string): 0 | 2 | 3 {
  if (!/^[A-Z]{3}$/.test(currency)) throw new MoneyError(`"${currency}" is not an ISO 4217 code.`);
  return exponents[currency] ?? 2;
}

/** @throws {MoneyError} when the amount is not an integer in JavaScript's safe range */
export function assertMinorUnits(amount: number): MinorUnits {
  if (!Number.isSafeInteger(amount))
    throw new MoneyError(`${amount} is not a whole number of minor units in the safe range.`);
  return amount;
}

/**
 * Reads decimal text such as "1284.80", "-3" or "0.5" in a currency.
 * @throws {MoneyError} for anything else, and for more decimals than the currency has
 */
export function parseMoney(text: string, currency: string): MinorUnits {
  const match = /^(-?)(\d+)(?:\.(\d+))?$/.exec(text.trim());
  const exponent = exponentOf(currency);
  if (!match) throw new MoneyError(`"${text}" is not an amount.`);
  const [, sign, whole = '', decimals = ''] = match;
  if (decimals.length > exponent) throw new MoneyError(`${currency} has ${exponent} decimals.`);
  const units = Number(`${whole}${decimals.padEnd(exponent, '0')}`);
  return assertMinorUnits(sign && units !== 0 ? -units : units);
}

/** Plain decimal text with exactly the currency's decimals and no grouping, such as "1284.80" or "-3.05". */
export function toDecimal(amount: MinorUnits, currency: string): string {
  const exponent = exponentOf(currency);
  const digits = String(Math.abs(assertMinorUnits(amount))).padStart(exponent + 1, '0');
  const whole = digits.slice(0, digits.length - exponent);
  const decimals = digits.slice(digits.length - exponent);
  return `${amount < 0 ? '-' : ''}${whole}${exponent > 0 ? `.${decimals}` : ''}`;
}

/** For people: the currency's sign, grouped digits, a true minus sign. */
export function formatMoney(amount: MinorUnits, currency: string, locale = 'en-US'): string {
  const format = new Intl.NumberFormat(locale, {
    style: 'currency',
    currency,
    minimumFractionDigits: exponentOf(currency),
    maximumFractionDigits: exponentOf(currency),
  });
  // Decimal text, not a float: ECMA-402 formats numeric strings exactly.
  return format.format(toDecimal(amount, currency) as unknown as number).replace('-', '\u2212');
}

/**
 * The part of an amount that a rate in basis points takes (1/100 of a percent), rounded half away from zero to one
 * minor unit. Rounding happens once, on the whole amount.
 */
export function shareOfBasisPoints(amount: MinorUnits, basisPoints: number): MinorUnits {
  assertMinorUnits(amount);
  if (!Number.isSafeInteger(basisPoints) || basisPoints < 0)
    throw new MoneyError('A rate is a whole number of basis points, 0 or more.');
  const product = BigInt(Math.abs(amount)) * BigInt(basisPoints);
  const rounded = Number((product + 5000n) / 10_000n);
  return amount < 0 && rounded !== 0 ? -rounded : rounded;
}
