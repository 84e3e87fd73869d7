import { assertMinorUnits, MoneyError, type MinorUnits } from './minor-units';

/** Somebody who takes part in an allocation. */
export interface Holder<Key extends string = string> {
  key: Key;
  /** Integer, 0 or more, in proportion to the others'. */
  parts: number;
  /** Of two equal remainders the lower rank takes the odd unit; fixed by the terms and unique. */
  rank: number;
}

export interface Allocation<Key extends string = string> {
  key: Key;
  amount: MinorUnits;
  parts: number;
  /** All parts together. */
  of: number;
  /** Whether the holder took one of the odd units. */
  tookOddUnit: boolean;
}

/**
 * Splits whole units in proportion to whole weights by the largest remainder (Hamilton's method of 1792): every
 * holder gets the floor of its quota, the units left go one each to the largest remainders, equal remainders to the
 * earlier index. The result sums to `amount`; each share is within one unit of its quota; weight 0 gets 0; a negative
 * amount is the mirror of the positive one.
 * @param weights 0 or more, at least one above 0
 * @throws {MoneyError} when a weight is negative or all are 0
 */
export function allocateExact(
  amount: bigint,
  weights: readonly bigint[],
): { amount: bigint; tookOddUnit: boolean }[] {
  if (weights.some((weight) => weight < 0n)) throw new MoneyError('A weight is negative.');
  const total = weights.reduce((sum, weight) => sum + weight, 0n);
  if (total === 0n) throw new MoneyError('Nobody holds a part, so nothing can be split.');
  if (amount < 0n) {
    return allocateExact(-amount, weights).map((share) => ({ ...share, amount: -share.amount }));
  }
  const floors = weights.map((weight) => (amount * weight) / total);
  const remainders = weights.map((weight) => (amount * weight) % total);
  const left = Number(amount - floors.reduce((sum, floor) => sum + floor, 0n));
  const order = weights
    .map((_, index) => index)
    .sort((a, b) => {
      const [first, second] = [remainders[a] ?? 0n, remainders[b] ?? 0n];
      return first > second ? -1 : first < second ? 1 : a - b;
    });
  const odd = new Set(order.slice(0, left));
  return floors.map((floor, index) => ({
    amount: floor + (odd.has(index) ? 1n : 0n),
    tookOddUnit: odd.has(index),
  }));
}

/**
 * Splits an amount among holders in proportion to their parts (largest remainder, equal remainders to the lower
 * rank). Neither the order in which holders are given nor a common factor of their parts changes the result. This is
 * the only rule by which money is split: preview, posting, statement and export all call it.
 * @returns one allocation per holder, in the order given
 * @throws {MoneyError} when nobody holds a part, a rank is used twice, or a number is not a safe integer
 */
export function allocate<Key extends string>(
  amount: MinorUnits,
  holders: readonly Holder<Key>[],
): Allocation<Key>[] {
  assertMinorUnits(amount);
  for (const { parts } of holders) assertMinorUnits(parts);
  if (new Set(holders.map(({ rank }) => rank)).size !== holders.length)
    throw new MoneyError('Two holders have the same rank.');
  const byRank = [...holders].sort((a, b) => a.rank - b.rank);
  const shares = allocateExact(
    BigInt(amount),
    byRank.map(({ parts }) => BigInt(parts)),
  );
  const of = holders.reduce((sum, { parts }) => sum + parts, 0);
  return holders.map(({ key, parts }) => {
    const share = shares[byRank.findIndex((holder) => holder.key === key)];
    return { key, parts, of, amount: Number(share?.amount ?? 0n), tookOddUnit: share?.tookOddUnit ?? false };
  });
}

/**
 * What one step of a growing total adds to each holder: the allocation of the total after the step less the
 * allocation of the total before. However a total comes in pieces, the pieces add up to the allocation of the whole;
 * a single step may take one unit back from a holder.
 * @param before the total so far
 * @param step what comes now; negative for a refund
 */
export function allocateStep<Key extends string>(
  before: MinorUnits,
  step: MinorUnits,
  holders: readonly Holder<Key>[],
): Allocation<Key>[] {
  const earlier = allocate(before, holders);
  return allocate(before + step, holders).map((after, index) => ({
    ...after,
    amount: after.amount - (earlier[index]?.amount ?? 0),
  }));
}
