import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { minorUnitsOf, plainDecimal, textOfMinorUnits } from '@/components/ui/number-text';

describe('an amount as typed', () => {
  it.each([
    ['1,150.5', 2, 115050],
    ['1150,50', 2, 115050],
    ['1.284,80', 2, 128480],
    ['1 284.80', 2, 128480],
    ['12,000', 2, 1200000],
    ['.5', 2, 50],
    ['−230.00', 2, -23000],
    ['1500', 0, 1500],
    ['0.125', 3, 125],
    ['-0', 2, 0],
  ])('%s with %i decimals is %i minor units', (text, exponent, minor) => {
    expect(minorUnitsOf(text, exponent)).toBe(minor);
  });

  it.each(['', 'abc', '1.2.3', '1,23,456', '12.345', '--5', '99999999999999999'])(
    '%j is no amount',
    (text) => {
      expect(minorUnitsOf(text, 2)).toBeNull();
    },
  );

  it('comes back the same for every safe amount and exponent', () => {
    fc.assert(
      fc.property(fc.maxSafeInteger(), fc.integer({ min: 0, max: 3 }), (minor, exponent) => {
        expect(minorUnitsOf(textOfMinorUnits(minor, exponent), exponent)).toBe(minor === 0 ? 0 : minor);
      }),
    );
  });

  it('keeps a plain number plain', () => {
    expect(plainDecimal('1,840')).toBe('1840');
    expect(plainDecimal('0,5')).toBe('0.5');
  });
});
