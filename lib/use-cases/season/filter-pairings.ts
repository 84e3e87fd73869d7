import type { PartyId } from '@/lib/contracts/ids';
import type { PairingRow } from '@/lib/contracts/pairing';

/** Whether a row is in the state asked for; a withdrawn pairing is shown only when asked for. */
export function isInState(
  row: PairingRow,
  state: 'waiting' | 'mine' | 'agreed' | 'change_asked' | 'withdrawn' | undefined,
): boolean {
  switch (state) {
    case undefined:
      return row.status !== 'withdrawn';
    case 'mine':
      return row.waitsForMe;
    case 'waiting':
      return row.status === 'proposed';
    case 'change_asked':
      return row.status === 'proposed' && row.agreed + row.waitingFor.length < row.of;
    case 'agreed':
      return row.status === 'agreed' || row.status === 'ended';
    case 'withdrawn':
      return row.status === 'withdrawn';
  }
}

/** Whether the young would be partly this party's. */
export const isPartlyOf = (row: PairingRow, party: PartyId | undefined) =>
  party === undefined || row.youngParts.some(({ partyId, parts }) => partyId === party && parts > 0);
