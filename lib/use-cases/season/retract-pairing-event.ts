import 'server-only';
import { findPairingEvent, findPairingForLog, markPairingEventRetracted } from '@/db/queries/pairing-events';
import { retractPairingEvent } from '@/lib/contracts/clutch';
import { recordAudit } from '../audit';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { presentPairingEvent } from './pairing-event';

/** Something that was logged by mistake is marked, not removed. Doing it twice changes nothing. */
export const retractPairingEventUseCase = workspaceUseCase(retractPairingEvent, async (world, { params }) => {
  const { tx, sees, now } = world;
  const pairing = await findPairingForLog(tx, sees, params.pairing);
  const row = pairing && (await findPairingEvent(tx, pairing.id, params.event));
  if (!pairing || !row) throw notFound('entry');
  if (!row.retractedAt) {
    await markPairingEventRetracted(tx, row.id, now);
    await recordAudit(world, {
      action: 'pairing.log.retract',
      subject: { kind: 'pairing', id: pairing.id },
      detail: { kind: row.kind, seenOn: row.seenOn },
    });
  }
  return presentPairingEvent({ ...row, retractedAt: row.retractedAt ?? now });
});
