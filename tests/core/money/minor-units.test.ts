import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { exponentOf, formatMoney, parseMoney, shareOfBasisPoints, toDecimal } from '@/lib/money/minor-units';

describe('amounts in minor units', () => {
  test('currencies have the decimals of ISO 4217', () => {
    expect(['USD', 'EUR', 'JPY', 'KWD'].map(exponentOf)).toEqual([2, 2, 0, 3]);
    expect(() => exponentOf('usd')).toThrow(/ISO 4217/);
  });

  test('decimal text and back is the same amount', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: -(2 ** 50), max: 2 ** 50 }),
        fc.constantFrom('USD', 'JPY', 'KWD'),
        (amount, currency) => {
          expect(parseMoney(toDecimal(amount, currency), currency)).toBe(amount + 0);
        },
      ),
    );
    expect(toDecimal(-5, 'USD')).toBe('-0.05');
    expect(toDecimal(1500, 'JPY')).toBe('1500');
  });

  test.each(['1,50', '1.505', '', '1e3', '--1'])('"%s" is not an amount in USD', (text) => {
    expect(() => parseMoney(text, 'USD')).toThrow();
  });

  test('a rate rounds half a unit away from zero: 8.25 % of 500.00 is 41.25, 2.9 % of 125.00 is 3.63', () => {
    expect(shareOfBasisPoints(50_000, 825)).toBe(4125);
    expect(shareOfBasisPoints(12_500, 290)).toBe(363);
    expect(shareOfBasisPoints(-12_500, 290)).toBe(-363);
  });

  test('people read it with sign, groups and a true minus', () => {
    expect(formatMoney(128_480, 'USD')).toBe('$1,284.80');
    expect(formatMoney(-305, 'USD')).toBe('\u2212$3.05');
  });
});
