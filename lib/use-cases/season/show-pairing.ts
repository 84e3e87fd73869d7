import 'server-only';
import { listClutchesOfPairings, listEventsOfPairings } from '@/db/queries/pairings';
import { findPairing } from '@/db/queries/pairings';
import { listEventsOfPairing } from '@/db/queries/pairing-events';
import { findTermsById } from '@/db/queries/clutches';
import { showPairing, type PairingVersion } from '@/lib/contracts/pairing';
import { reachOf } from '../permissions';
import { presentStandings } from '../projects/present-standings';
import { notFound } from '../refusal';
import { workspaceUseCase, type WorkspaceWorld } from '../world';
import { comparePairingVersions } from './compare-pairing-versions';
import { presentPairingEvent } from './pairing-event';
import { loadStandings, type PairingStanding } from './pairing-standing';
import { presentPairing, seesWorth } from './present-pairings';
import { seeFigures, seePlan } from './see-figures';

/** A member reads a pairing with everything that was proposed and answered. */
export const showPairingUseCase = workspaceUseCase(showPairing, async (world, { params }) => {
  const { tx, sees, actor } = world;
  const record = await findPairing(tx, sees, params.pairing);
  const [standing] = record ? await loadStandings(world, [record]) : [];
  if (!record || !standing) throw notFound('pairing');
  const events = await listEventsOfPairings(tx, [record.id]);
  const clutches = await listClutchesOfPairings(tx, [record.id]);
  const row = presentPairing(world, standing, { events, clutches });
  if (!row) throw notFound('pairing');
  const isParty = actor.partyId !== null && standing.partyIds.includes(actor.partyId);
  const mine = standing.versions[0]?.standings.find(({ partyId }) => partyId === actor.partyId);
  return {
    ...row,
    version: record.version,
    versions: await presentVersions(world, standing),
    me: {
      partyId: actor.partyId,
      mayDecide: isParty && record.status === 'proposed' && reachOf(actor.role, 'pairing.decide') !== 'no',
      state: isParty ? (mine?.state ?? null) : null,
    },
    mayPropose: record.status === 'proposed' && reachOf(actor.role, 'pairing.propose') !== 'no',
    events: (await listEventsOfPairing(tx, record.id)).map(presentPairingEvent),
  };
});

async function presentVersions(
  world: WorkspaceWorld,
  { versions }: PairingStanding,
): Promise<PairingVersion[]> {
  const worth = seesWorth(world);
  const seesComments = reachOf(world.actor.role, 'comment.write') !== 'no';
  const shown: PairingVersion[] = [];
  for (const [index, { version, standings }] of versions.entries()) {
    const { row, proposedBy, proposedByParty } = version;
    const before = versions[index + 1]?.version.row ?? null;
    const terms = {
      now: await findTermsById(world.tx, row.termsId),
      before: before ? await findTermsById(world.tx, before.termsId) : null,
    };
    shown.push({
      id: row.id,
      number: row.number,
      proposedBy,
      proposedByParty,
      proposedAt: row.proposedAt.toISOString(),
      answerBy: row.answerBy,
      lockedAt: row.lockedAt?.toISOString() ?? null,
      hash: row.hash,
      termsId: row.termsId,
      termsNumber: row.figures.termsNumber,
      plan: seePlan(row.plan, worth),
      figures: seeFigures(row.figures, worth),
      standings: presentStandings(standings, seesComments),
      changes: before
        ? comparePairingVersions(
            { ...before, terms: terms.before?.content },
            { ...row, terms: terms.now?.content },
            worth,
          )
        : [],
    });
  }
  return shown;
}
