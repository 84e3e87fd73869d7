import type { PartyId } from '@/lib/contracts/ids';

/** A decision as it was recorded; they come oldest first, and of a party's several the last one counts. */
export interface Decision {
  subjectId: string;
  partyId: PartyId;
  decision: 'agreed' | 'change_asked';
  comment: string;
  by: string;
  decidedAt: Date;
}

export interface Standing {
  partyId: PartyId;
  state: 'agreed' | 'change_asked' | 'waiting';
  by: string | null;
  at: Date | null;
  comment: string;
}

/** Where each party stands on one version, in the order of the parties given. */
export function standingsOf(partyIds: readonly PartyId[], decisions: readonly Decision[]): Standing[] {
  const latest = new Map(decisions.map((decision) => [decision.partyId, decision]));
  return partyIds.map((partyId) => {
    const decision = latest.get(partyId);
    if (!decision) return { partyId, state: 'waiting', by: null, at: null, comment: '' };
    return {
      partyId,
      state: decision.decision,
      by: decision.by,
      at: decision.decidedAt,
      comment: decision.comment,
    };
  });
}

/** How many parties have agreed, and of how many. */
export function countAgreed(standings: readonly Standing[]): { agreed: number; of: number } {
  return { agreed: standings.filter(({ state }) => state === 'agreed').length, of: standings.length };
}

/** Whether every party has agreed; nobody at all is not everybody. */
export function isUnanimous(standings: readonly Standing[]): boolean {
  return standings.length > 0 && standings.every(({ state }) => state === 'agreed');
}

/** "2 of 3 agreed, waiting for Bram": the state in words. */
export function describeStandings(standings: readonly Standing[], nameOf: (id: PartyId) => string): string {
  const { agreed, of } = countAgreed(standings);
  const waiting = standings.filter(({ state }) => state === 'waiting').map(({ partyId }) => nameOf(partyId));
  const asking = standings
    .filter(({ state }) => state === 'change_asked')
    .map(({ partyId }) => nameOf(partyId));
  if (agreed === of) return `agreed by all ${of}`;
  const parts = [`${agreed} of ${of} agreed`];
  if (asking.length) parts.push(`${asking.join(', ')} asked for a change`);
  if (waiting.length) parts.push(`waiting for ${waiting.join(', ')}`);
  return parts.join(', ');
}
