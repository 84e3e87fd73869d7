import { describe, expect, it } from 'vitest';
import { expectHatchlings } from '@/lib/season/expect-hatchlings';

const clutch = { eggs: 6, eggRange: null, hatchRate: 0.81, hatched: null };

describe('expected hatchlings', () => {
  it('is eggs times hatch rate, with the binomial standard deviation times 1.2816 either way', () => {
    const sum = expectHatchlings(Array.from({ length: 100 }, () => clutch));
    expect(sum.expected).toBeCloseTo(486, 9);
    // sqrt(600 · 0.81 · 0.19) = 9.609…; times 1.2816 = 12.31
    expect(sum).toMatchObject({ from: 474, to: 498 });
  });
  it('adds the spread of the number of eggs', () => {
    const counted = expectHatchlings([{ ...clutch, eggs: 20 }]);
    const open = expectHatchlings([{ ...clutch, eggs: 20, eggRange: { from: 10, to: 30 } }]);
    expect(open.expected).toBe(counted.expected);
    expect(open.to - open.from).toBeGreaterThan(counted.to - counted.from);
  });
  it('takes what was counted as it is, and never leaves what is possible', () => {
    expect(expectHatchlings([{ ...clutch, hatched: 5 }])).toEqual({ expected: 5, from: 5, to: 5 });
    const one = expectHatchlings([{ ...clutch, eggs: 1 }]);
    expect(one.from).toBeGreaterThanOrEqual(0);
    expect(one.to).toBeLessThanOrEqual(1);
    expect(expectHatchlings([])).toEqual({ expected: 0, from: 0, to: 0 });
  });
});
