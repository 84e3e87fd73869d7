import type { PartyId } from '@/lib/contracts/ids';

type Part = { partyId: PartyId; parts: number };

const greatestCommonDivisor = (a: bigint, b: bigint): bigint =>
  b === 0n ? a : greatestCommonDivisor(b, a % b);

/**
 * Adds up who holds what of several animals, each counted as one whole: integer parts over one common denominator,
 * in lowest terms. An animal that nobody holds a part of does not count.
 * @returns `of` is the sum of all parts; 0 when there is nothing to add
 */
export function sumHoldings(animals: readonly (readonly Part[])[]): { of: number; parts: Part[] } {
  const totals = animals.map((held) => held.reduce((sum, { parts }) => sum + BigInt(parts), 0n));
  const common = totals
    .filter((total) => total > 0n)
    .reduce((lcm, total) => (lcm / greatestCommonDivisor(lcm, total)) * total, 1n);
  const sums = new Map<PartyId, bigint>();
  animals.forEach((held, index) => {
    const total = totals[index] ?? 0n;
    if (total === 0n) return;
    for (const { partyId, parts } of held)
      sums.set(partyId, (sums.get(partyId) ?? 0n) + (BigInt(parts) * common) / total);
  });
  const shrink = [...sums.values()].reduce(greatestCommonDivisor, 0n);
  const parts = [...sums].map(([partyId, sum]) => ({ partyId, parts: Number(sum / (shrink || 1n)) }));
  return { of: parts.reduce((sum, part) => sum + part.parts, 0), parts };
}
