/**
 * Reads what a person typed as a decimal: `1,840`, `1 840.5`, `0,5`. A comma followed by exactly three digits parts
 * thousands, any other single comma is a decimal comma. Returns the plain form (`1840.5`) or null when it is no number.
 */
export function plainDecimal(text: string): string | null {
  let plain = text.replace(/[\s\u00a0\u202f_']/g, '').replace(/^[−–]/, '-');
  if (/^[-+]?\d{1,3}(,\d{3})+(\.\d*)?$/.test(plain)) plain = plain.replace(/,/g, '');
  else if (/^[-+]?\d{1,3}(\.\d{3})+,\d*$/.test(plain)) plain = plain.replace(/\./g, '').replace(',', '.');
  else if (/^[-+]?\d*,\d*$/.test(plain)) plain = plain.replace(',', '.');
  return /^[-+]?(\d+\.?\d*|\.\d+)$/.test(plain) ? plain : null;
}

/**
 * Minor units of an amount as typed, e.g. `1,150.5` with exponent 2 → 115050. No floating point on the way. Null when it
 * is no number, has more decimals than the currency, or does not fit a safe integer.
 */
export function minorUnitsOf(text: string, exponent: number): number | null {
  const plain = plainDecimal(text);
  if (plain === null) return null;
  const negative = plain.startsWith('-');
  const [whole = '', decimals = ''] = plain.replace(/^[-+]/, '').split('.');
  if (decimals.replace(/0+$/, '').length > exponent) return null;
  const digits = whole + decimals.slice(0, exponent).padEnd(exponent, '0');
  const minor = Number(digits === '' ? '0' : digits);
  if (!Number.isSafeInteger(minor)) return null;
  return negative && minor !== 0 ? -minor : minor;
}

/** The amount as a person would type it: 115050 with exponent 2 → `1150.50`. */
export function textOfMinorUnits(minor: number, exponent: number): string {
  const digits = String(Math.abs(minor)).padStart(exponent + 1, '0');
  const sign = minor < 0 ? '-' : '';
  if (exponent === 0) return sign + digits;
  return `${sign}${digits.slice(0, -exponent)}.${digits.slice(-exponent)}`;
}
