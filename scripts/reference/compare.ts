import Fraction from 'fraction.js';
import type { Finding, Json } from './case-kind';

/** How far a computed double may be from the expected value. */
const TOLERANCE = 1e-9;

/** Reads "2/3", "0.25" or 0.25 exactly. */
export function readFraction(value: Json | undefined, what: string): Fraction {
  if (typeof value === 'number') return new Fraction(String(value));
  if (typeof value === 'string' && /^-?\d+(\.\d+)?(\/\d+)?$/.test(value.trim()))
    return new Fraction(value.trim());
  throw new Error(`${what}: "${JSON.stringify(value)}" is no number.`);
}

/** Compares without tolerance. */
export function compareExactly(what: string, expected: Json | undefined, actual: Fraction | null): Finding {
  const wanted = readFraction(expected, what);
  if (!actual) return { what, expected: wanted.toFraction(), actual: 'none', difference: '', ok: false };
  const difference = wanted.sub(actual);
  return {
    what,
    expected: wanted.toFraction(),
    actual: actual.toFraction(),
    difference: difference.toFraction(),
    ok: difference.equals(0),
  };
}

/** Compares to 1e-9. */
export function compareClosely(
  what: string,
  expected: Json | undefined,
  actual: number | undefined,
): Finding {
  const wanted = readFraction(expected, what).valueOf();
  const difference = wanted - (actual ?? Number.NaN);
  return {
    what,
    expected: String(wanted),
    actual: String(actual),
    difference: String(difference),
    ok: Math.abs(difference) <= TOLERANCE,
  };
}

/** Compares texts, counts or truths. */
export function compareSame(what: string, expected: Json | undefined, actual: Json): Finding {
  const texts = [JSON.stringify(expected), JSON.stringify(actual)];
  return {
    what,
    expected: String(texts[0]),
    actual: String(texts[1]),
    difference: '',
    ok: texts[0] === texts[1],
  };
}
