import type { PartyId } from '@/lib/contracts/ids';
import type { splitStep } from '@/lib/contracts/terms';
import type { TermsContent } from '@/lib/contracts/terms-content';
import { allocate } from '@/lib/money/allocate';
import { shareOfBasisPoints } from '@/lib/money/minor-units';
import type { z } from 'zod';
import { percentOf } from './terms-words';

type Parts = readonly { partyId: PartyId; parts: number }[];
export type SplitStep = z.infer<typeof splitStep>;

export interface YoungShare {
  partyId: PartyId;
  parts: number;
  /** Such as "1 of 2 of the dam side"; in words, one per side. */
  why: string[];
}

const gcd = (a: bigint, b: bigint): bigint => (b === 0n ? a : gcd(b, a % b));

/**
 * Whose the young are: each side's parts go to the owners of that parent by their own parts. The result is whole parts
 * in lowest terms; a side without owners gives nothing.
 */
export function partsOfYoung(
  { damSide, sireSide, parties }: TermsContent,
  parents: { sire: Parts; dam: Parts },
): YoungShare[] {
  const total = (parts: Parts) => parts.reduce((sum, one) => sum + one.parts, 0);
  const [ofDam, ofSire] = [total(parents.dam), total(parents.sire)];
  // Over the common denominator (all owners' parts of the dam) × (all of the sire).
  const sides = [
    { word: 'dam side', weight: damSide, parts: parents.dam, of: ofDam, scale: ofSire || 1 },
    { word: 'sire side', weight: sireSide, parts: parents.sire, of: ofSire, scale: ofDam || 1 },
  ];
  const sums = new Map<PartyId, { parts: bigint; why: string[] }>();
  for (const { word, weight, parts, of, scale } of sides) {
    if (weight === 0 || of === 0) continue;
    for (const { partyId, parts: own } of parts) {
      const before = sums.get(partyId) ?? { parts: 0n, why: [] };
      const share = own === of ? word : `${own} of ${of} of the ${word}`;
      sums.set(partyId, {
        parts: before.parts + BigInt(weight) * BigInt(own) * BigInt(scale),
        why: [...before.why, share],
      });
    }
  }
  const shrink = [...sums.values()].map(({ parts }) => parts).reduce(gcd, 0n) || 1n;
  const rank = (id: PartyId) => parties.find((party) => party.id === id)?.rank ?? Number.MAX_SAFE_INTEGER;
  return [...sums]
    .map(([partyId, { parts, why }]) => ({ partyId, parts: Number(parts / shrink), why }))
    .sort((a, b) => rank(a.partyId) - rank(b.partyId) || (a.partyId < b.partyId ? -1 : 1));
}

export interface Sale {
  /** What the buyer pays for the animal, minor units. */
  price: number;
  cardFee: number;
  /** Costs of the clutch that are still to be recovered, and who paid them; null leaves it open. */
  costs: number;
  costsPaidBy: PartyId | null;
}

/**
 * Cuts a sale step by step: card fee, house share, costs, then each party's part of what is left (largest remainder, odd
 * cents by rank). Each step holds exactly what the step before has left. What is recovered never exceeds what is there.
 */
export function splitSale(
  content: TermsContent,
  young: readonly YoungShare[],
  sale: Sale,
  nameOf: (id: PartyId) => string,
): SplitStep[] {
  const steps: SplitStep[] = [];
  let left = sale.price;
  const take = (label: string, cuts: SplitStep['cuts']) => {
    const real = cuts.filter(({ amount }) => amount > 0);
    if (real.length === 0) return;
    steps.push({ label, amount: left, cuts: real });
    left -= real.reduce((sum, { amount }) => sum + amount, 0);
  };
  const fee = Math.min(sale.cardFee, left);
  const paysFee = content.cardFees === 'house';
  if (!paysFee)
    take('Paid by the buyer', [{ label: 'Card fee', amount: fee, partyId: null, note: 'off the top' }]);
  if (content.houseShare) {
    const { partyId, basisPoints } = content.houseShare;
    const house = shareOfBasisPoints(left, basisPoints);
    const borne = paysFee ? Math.min(fee, house) : 0;
    take(steps.length === 0 ? 'Paid by the buyer' : 'After the card fee', [
      {
        label: 'House share',
        amount: house - borne,
        partyId,
        note: `${percentOf(basisPoints)} to ${nameOf(partyId)}${borne ? ', less the card fee' : ''}`,
      },
      { label: 'Card fee', amount: borne, partyId: null, note: 'out of the house share' },
    ]);
  }
  if (content.costsFirst)
    take(steps.length === 0 ? 'Paid by the buyer' : 'After the house share', [
      {
        label: 'Costs of the clutch',
        amount: Math.min(sale.costs, left),
        partyId: sale.costsPaidBy,
        note: 'recovered first',
      },
    ]);
  const holders = young.filter(({ parts }) => parts > 0);
  if (holders.length > 0 && left > 0) {
    const of = holders.reduce((sum, { parts }) => sum + parts, 0);
    const shares = allocate(
      left,
      holders.map(({ partyId, parts }, index) => ({ key: partyId, parts, rank: index + 1 })),
    );
    take(
      steps.length === 0 ? 'Paid by the buyer' : 'To divide',
      shares.map(({ key, amount, parts }, index) => ({
        label: nameOf(key),
        amount,
        partyId: key,
        note: `${parts} of ${of}: ${holders[index]?.why.join(', ') ?? ''}`,
      })),
    );
  }
  return steps;
}
