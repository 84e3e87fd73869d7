import 'server-only';
import { findPairing, lockPairing, setPairing } from '@/db/queries/pairings';
import { withdrawPairing } from '@/lib/contracts/pairing';
import { recordAudit } from '../audit';
import { notifyParties } from '../notify';
import { notFound, Refusal, stale } from '../refusal';
import { workspaceUseCase } from '../world';
import { loadCurrent } from './decide-pairing';

/** A partner takes back a proposed pairing; what was answered stays on record. */
export const withdrawPairingUseCase = workspaceUseCase(withdrawPairing, async (world, { params, body }) => {
  const { tx, sees, actor } = world;
  if (!(await findPairing(tx, sees, params.pairing))) throw notFound('pairing');
  await lockPairing(tx, params.pairing);
  const { record, versions, partyIds } = await loadCurrent(world, params.pairing);
  if (record.status === 'agreed')
    throw new Refusal('wrong_state', 'An agreed pairing is not withdrawn: what was agreed stays on record.');
  if (record.status !== 'proposed') throw new Refusal('wrong_state', 'This pairing is not open any more.');
  if (body.version !== record.version) throw stale('pairing', record.version);
  await setPairing(tx, record.id, { status: 'withdrawn' });
  const title = versions[0]?.version.row.figures.title ?? `${record.sireCode} × ${record.damCode}`;
  await notifyParties(
    world,
    partyIds,
    {
      kind: 'pairing-withdrawn',
      title: `${actor.name} withdrew ${title}`,
      body: body.reason,
      href: `season/pairings/${record.id}`,
    },
    actor.memberId,
  );
  await recordAudit(world, {
    action: 'pairing.withdraw',
    subject: { kind: 'pairing', id: record.id },
    reason: body.reason,
  });
  return { status: 'withdrawn' as const };
});
