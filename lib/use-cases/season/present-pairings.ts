import 'server-only';
import { listClutchesOfPairings, listEventsOfPairings, type PairingRecord } from '@/db/queries/pairings';
import type { PairingRow } from '@/lib/contracts/pairing';
import { forecastSeason } from '@/lib/season/forecast';
import { reachOf } from '../permissions';
import { countAgreed } from '../projects/agreement';
import type { WorkspaceWorld } from '../world';
import { sumPerParty } from './sum-per-party';
import { loadStandings, type PairingStanding } from './pairing-standing';

/** Whether the caller may see what a pairing is worth. */
export const seesWorth = ({ actor }: Pick<WorkspaceWorld, 'actor'>) =>
  reachOf(actor.role, 'pairing.worth') !== 'no';

/** Pairings as rows of the season: where they stand, when what is expected, and what they would be worth. */
export async function presentPairings(
  world: WorkspaceWorld,
  records: readonly PairingRecord[],
): Promise<PairingRow[]> {
  const { tx } = world;
  const ids = records.map(({ id }) => id);
  const standings = await loadStandings(world, records);
  const events = await listEventsOfPairings(tx, ids);
  const laid = await listClutchesOfPairings(tx, ids);
  return standings.flatMap((standing) => {
    const { id } = standing.record;
    const row = presentPairing(world, standing, {
      events: events.filter(({ pairingId }) => pairingId === id),
      clutches: laid.filter(({ pairingId }) => pairingId === id),
    });
    return row ? [row] : [];
  });
}

export interface SeenOfPairing {
  events: Awaited<ReturnType<typeof listEventsOfPairings>>;
  clutches: Awaited<ReturnType<typeof listClutchesOfPairings>>;
}

/** One row; null for a pairing of which nothing was proposed yet. */
export function presentPairing(
  world: WorkspaceWorld,
  { record, versions, partyIds }: PairingStanding,
  seen: SeenOfPairing,
): PairingRow | null {
  const current = versions[0];
  if (!current) return null;
  const { figures, plan, number, answerBy } = current.version.row;
  const { profile } = record;
  const clutch = seen.clutches[0] ?? null;
  const facts = { plan, events: seen.events, clutch, bearing: profile.bearing };
  const { phases, moments, laying, hatching, basis } = forecastSeason(facts, profile.intervals, world.today);
  const isOpen = record.status === 'proposed';
  const me = world.actor.partyId;
  const mine = current.standings.find(({ partyId }) => partyId === me);
  return {
    id: record.id,
    season: record.season,
    status: record.status,
    project: { id: record.projectId, name: record.projectName },
    title: figures.title,
    sire: {
      id: record.sireId,
      code: record.sireCode,
      name: record.sireName,
      description: figures.sire.description,
    },
    dam: {
      id: record.damId,
      code: record.damCode,
      name: record.damName,
      description: figures.dam.description,
    },
    number,
    ...countAgreed(current.standings),
    waitingFor: isOpen
      ? current.standings.filter(({ state }) => state === 'waiting').map(({ partyId }) => partyId)
      : [],
    answerBy,
    waitsForMe: isOpen && me !== null && partyIds.includes(me) && mine?.state === 'waiting',
    youngParts: figures.youngParts.parts,
    eggsExpected: figures.eggsExpected,
    hatchlingsExpected: figures.hatchlingsExpected,
    phases: record.status === 'withdrawn' ? [] : phases,
    moments,
    laying,
    hatching,
    forecastFrom: basis,
    clutches: seen.clutches.map(({ pairingId: _pairing, young: _young, ...row }) => row),
    ...(seesWorth(world)
      ? { proceeds: { expected: figures.proceeds.expected, shares: sumPerParty(figures.proceeds) } }
      : {}),
  };
}
