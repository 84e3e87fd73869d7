import 'server-only';
import type { findPairingEvent } from '@/db/queries/pairing-events';
import type { PairingEvent } from '@/lib/contracts/clutch';

type Row = NonNullable<Awaited<ReturnType<typeof findPairingEvent>>>;

/** An event of a pairing as it crosses the wire. */
export function presentPairingEvent({ retractedAt, ...row }: Row): PairingEvent {
  return { ...row, retracted: retractedAt !== null };
}
