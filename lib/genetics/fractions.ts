import Fraction from 'fraction.js';
import { GeneticsError } from './genetics-error';

export const ZERO = new Fraction(0);
export const ONE = new Fraction(1);
export const HALF = new Fraction(1, 2);

/**
 * Reads a probability from text.
 * @param text "2/3", "1" or "0.25"
 * @param record id of the locus or animal to blame
 * @throws {GeneticsError} 'probability' when it is no number from 0 to 1
 */
export function parseProbability(text: string, record: string): Fraction {
  let value: Fraction | undefined;
  if (/^\s*\d+(\.\d+)?(\s*\/\s*\d+)?\s*$/.test(text)) {
    const [top = '', bottom = '1'] = text.split('/').map((part) => part.trim());
    if (Number(bottom) !== 0) value = new Fraction(top).div(new Fraction(bottom));
  }
  if (!value || value.lt(0) || value.gt(1)) {
    throw new GeneticsError('probability', record, `"${text}" is not a probability from 0 to 1 (${record}).`);
  }
  return value;
}

/** Sum of exact fractions; 0 for none. */
export function sum(values: Iterable<Fraction>): Fraction {
  let total = ZERO;
  for (const value of values) total = total.add(value);
  return total;
}

/** A fraction as text such as "2/3" or "1". */
export function fractionText(value: Fraction): string {
  return value.toFraction();
}
