import 'server-only';
import { findPairingEvent, findPairingForLog, insertPairingEvent } from '@/db/queries/pairing-events';
import { logPairingEvent } from '@/lib/contracts/clutch';
import { recordAudit } from '../audit';
import { invalid, notFound, Refusal } from '../refusal';
import { workspaceUseCase } from '../world';
import { presentPairingEvent } from './pairing-event';

/** The keeper (or a partner) logs what was seen of a pairing that is agreed. */
export const logPairingEventUseCase = workspaceUseCase(logPairingEvent, async (world, { params, body }) => {
  const { tx, sees, workspace, actor, today } = world;
  const pairing = await findPairingForLog(tx, sees, params.pairing);
  if (!pairing) throw notFound('pairing');
  if (pairing.status !== 'agreed') {
    throw new Refusal('wrong_state', 'Only an agreed pairing is logged. This one is not agreed (any more).');
  }
  if (body.seenOn > today) throw invalid('seenOn', 'This day has not come yet.');
  if (body.minutes !== null && body.kind !== 'lock') throw invalid('minutes', 'Only a lock has a duration.');
  const id = await insertPairingEvent(tx, {
    ...body,
    workspaceId: workspace.id,
    pairingId: pairing.id,
    recordedBy: actor.memberId,
  });
  await recordAudit(world, {
    action: 'pairing.log',
    subject: { kind: 'pairing', id: pairing.id },
    detail: { kind: body.kind, seenOn: body.seenOn },
  });
  const row = await findPairingEvent(tx, pairing.id, id);
  if (!row) throw notFound('entry');
  return presentPairingEvent(row);
});
