import type { TermsId } from '@/lib/contracts/ids';
import { countAgreed } from './agreement';
import type { TermsStanding } from './terms-standing';

/** A version of terms as it crosses the wire. */
export function presentTerms({ record, standings }: TermsStanding, inForceId: TermsId | null) {
  const { id, number, status, inForceFrom, note, proposedBy, proposedByParty, content, hash } = record;
  return {
    id,
    number,
    status,
    inForceFrom,
    note,
    proposedBy,
    proposedByParty,
    content,
    hash,
    inForce: id === inForceId,
    proposedAt: record.proposedAt?.toISOString() ?? null,
    lockedAt: record.lockedAt?.toISOString() ?? null,
    ...countAgreed(standings),
  };
}
