'use client';

import type { Share } from '@/components/drawings/share-strip';
import type { PartyId } from '@/lib/contracts/ids';
import { useParties } from '@/lib/client/workspace';

interface PartyMark {
  id: PartyId;
  name: string;
  mark: number;
}

/** Parts of parties as the strip draws them. `also` knows parties beyond those of the workspace's frame. */
export function useShares(
  also: readonly PartyMark[] = [],
): (parts: readonly { partyId: PartyId; parts: number }[]) => Share[] {
  const parties = useParties();
  const others = new Map(also.map((party) => [party.id, party]));
  return (parts) =>
    parts.map(({ partyId, parts: held }) => {
      const party = parties.get(partyId) ?? others.get(partyId);
      return { partner: party?.mark ?? 6, name: party?.name ?? 'Another party', parts: held };
    });
}
