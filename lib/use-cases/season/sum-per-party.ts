import type { PartyId } from '@/lib/contracts/ids';
import type { PairingFigures } from '@/lib/contracts/pairing-figures';

/** What each party would get in all: its share, and what it takes off the top. */
export function sumPerParty({
  shares,
  steps,
}: Pick<PairingFigures['proceeds'], 'shares' | 'steps'>): { partyId: PartyId; amount: number }[] {
  const sums = new Map<PartyId, number>();
  for (const { partyId, amount } of [...shares, ...steps]) {
    if (partyId !== null && amount > 0) sums.set(partyId, (sums.get(partyId) ?? 0) + amount);
  }
  return [...sums].map(([partyId, amount]) => ({ partyId, amount }));
}
