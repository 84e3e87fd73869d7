import 'server-only';
import { findPairingForLog, listEventsOfPairing } from '@/db/queries/pairing-events';
import { listPairingEvents } from '@/lib/contracts/clutch';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { presentPairingEvent } from './pairing-event';

/** A member reads what was seen of a pairing. */
export const listPairingEventsUseCase = workspaceUseCase(
  listPairingEvents,
  async ({ tx, sees }, { params }) => {
    if (!(await findPairingForLog(tx, sees, params.pairing))) throw notFound('pairing');
    const rows = await listEventsOfPairing(tx, params.pairing);
    return { events: rows.map(presentPairingEvent) };
  },
);
