import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { allocate, allocateStep, type Holder } from '@/lib/money/allocate';

const holders = fc
  .array(fc.nat({ max: 1_000_000 }), { minLength: 1, maxLength: 8 })
  .filter((parts) => parts.some((part) => part > 0))
  .map((parts): Holder[] => parts.map((part, index) => ({ key: `h${index}`, parts: part, rank: index + 1 })));
const amount = fc.integer({ min: -1_000_000_000_000, max: 1_000_000_000_000 });
const byKey = (shares: { key: string; amount: number }[]) =>
  Object.fromEntries(shares.map(({ key, amount: share }) => [key, share + 0]));

describe('the one rule by which money is split', () => {
  test('loses nothing, keeps within one unit of the quota, gives nothing for no parts', () => {
    fc.assert(
      fc.property(amount, holders, (total, list) => {
        const shares = allocate(total, list);
        expect(shares.reduce((sum, share) => sum + share.amount, 0)).toBe(total);
        for (const { amount: share, parts, of } of shares) {
          const distance = BigInt(share) * BigInt(of) - BigInt(total) * BigInt(parts);
          expect((distance < 0n ? -distance : distance) < BigInt(of)).toBe(true);
          if (parts === 0) expect(share + 0).toBe(0);
        }
      }),
    );
  });

  test('mirrors a negative amount, and minds neither the order of holders nor a common factor of their parts', () => {
    fc.assert(
      fc.property(amount, holders, fc.integer({ min: 2, max: 50 }), (total, list, factor) => {
        const shares = byKey(allocate(total, list));
        const mirrored = byKey(allocate(-total, list));
        for (const { key } of list) expect((mirrored[key] ?? 0) + (shares[key] ?? 0)).toBe(0);
        expect(byKey(allocate(total, [...list].reverse()))).toEqual(shares);
        expect(
          byKey(
            allocate(
              total,
              list.map((holder) => ({ ...holder, parts: holder.parts * factor })),
            ),
          ),
        ).toEqual(shares);
      }),
    );
  });

  test('steps of a growing total add up to the split of the whole', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: -100_000, max: 100_000 }), { maxLength: 12 }),
        holders,
        (steps, list) => {
          const sums = new Map(list.map(({ key }) => [key, 0]));
          let total = 0;
          for (const step of steps) {
            for (const share of allocateStep(total, step, list))
              sums.set(share.key, (sums.get(share.key) ?? 0) + share.amount);
            total += step;
          }
          const whole = byKey(allocate(total, list));
          for (const { key } of list) expect((sums.get(key) ?? 0) + 0).toBe(whole[key]);
        },
      ),
    );
  });

  test('120 seats by the census of 1790 as Hamilton gave them (bill vetoed in 1792; COMAP, For All Practical Purposes, ch. 14)', () => {
    const states: [string, number, number][] = [
      ['Connecticut', 236841, 8],
      ['Delaware', 55540, 2],
      ['Georgia', 70835, 2],
      ['Kentucky', 68705, 2],
      ['Maryland', 278514, 9],
      ['Massachusetts', 475327, 16],
      ['New Hampshire', 141822, 5],
      ['New Jersey', 179570, 6],
      ['New York', 331589, 11],
      ['North Carolina', 353523, 12],
      ['Pennsylvania', 432879, 14],
      ['Rhode Island', 68446, 2],
      ['South Carolina', 206236, 7],
      ['Vermont', 85533, 3],
      ['Virginia', 630560, 21],
    ];
    const shares = byKey(
      allocate(
        120,
        states.map(([key, parts], index) => ({ key, parts, rank: index + 1 })),
      ),
    );
    expect(shares).toEqual(Object.fromEntries(states.map(([key, , seats]) => [key, seats])));
  });

  test('of equal remainders the lower rank takes the odd unit; nobody with a part and a rank used twice are refused', () => {
    const [first, second] = [
      { key: 'first', parts: 1, rank: 1 },
      { key: 'second', parts: 1, rank: 2 },
    ];
    expect(byKey(allocate(5, [second, first]))).toEqual({ first: 3, second: 2 });
    expect(() => allocate(5, [{ ...first, parts: 0 }])).toThrow(/Nobody holds a part/);
    expect(() => allocate(5, [first, { ...second, rank: 1 }])).toThrow(/same rank/);
  });
});
