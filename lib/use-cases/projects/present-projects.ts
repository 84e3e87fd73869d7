import 'server-only';
import { findTermsInForce } from '@/db/queries/clutches';
import { listPairingDecisions, listPairingRecords, listPairingVersions } from '@/db/queries/pairings';
import { listPartiesOfProjects, type ProjectRecord } from '@/db/queries/projects';
import { listTermsDecisions, listTermsOf } from '@/db/queries/terms';
import type { PartyId } from '@/lib/contracts/ids';
import type { ProjectRow } from '@/lib/contracts/project';
import { reachOf } from '../permissions';
import type { WorkspaceWorld } from '../world';
import { standingsOf } from './agreement';

/** Parties of a project that take part in decisions today. */
export const presentParties = <Party extends { leftOn: string | null }>(parties: readonly Party[]): Party[] =>
  parties.filter(({ leftOn }) => leftOn === null);

/** Projects as rows: who is in them, what is in force and what waits for the caller. */
export async function presentProjects(
  world: WorkspaceWorld,
  records: readonly ProjectRecord[],
): Promise<ProjectRow[]> {
  const { tx, actor, today } = world;
  const ids = records.map(({ id }) => id);
  const parties = await listPartiesOfProjects(tx, ids);
  const seesTerms = reachOf(actor.role, 'terms.see') !== 'no';
  const waiting = await countWaiting(world, records, actor.partyId);
  const rows: ProjectRow[] = [];
  for (const { speciesId, speciesName, version: _version, ...record } of records) {
    const inForce = seesTerms ? await findTermsInForce(tx, record.id, today) : null;
    rows.push({
      ...record,
      species: { id: speciesId, name: speciesName },
      parties: parties
        .filter(({ projectId }) => projectId === record.id)
        .map(({ projectId: _project, ...party }) => party),
      ...(seesTerms ? { termsInForce: inForce?.number ?? null } : {}),
      waitingForMe: waiting.get(record.id) ?? 0,
    });
  }
  return rows;
}

/** Per project, the open proposals that the party has not answered yet. */
async function countWaiting(
  { tx, sees }: WorkspaceWorld,
  records: readonly ProjectRecord[],
  partyId: PartyId | null,
): Promise<Map<string, number>> {
  const counts = new Map<string, number>();
  if (!partyId) return counts;
  const ids = records.map(({ id }) => id);
  const parties = presentParties(await listPartiesOfProjects(tx, ids)).filter(({ id }) => id === partyId);
  const mine = new Set(parties.map(({ projectId }) => projectId));
  const add = (projectId: string) => counts.set(projectId, (counts.get(projectId) ?? 0) + 1);

  const terms = (await listTermsOf(tx, ids)).filter(
    ({ status, projectId }) => status === 'proposed' && mine.has(projectId),
  );
  const termsDecisions = await listTermsDecisions(
    tx,
    terms.map(({ id }) => id),
  );
  for (const version of terms) {
    const [standing] = standingsOf(
      [partyId],
      termsDecisions.filter(({ subjectId }) => subjectId === version.id),
    );
    if (standing?.state === 'waiting') add(version.projectId);
  }
  const pairings = (await listPairingRecords(tx, sees, {})).filter(
    ({ status, projectId }) => status === 'proposed' && mine.has(projectId),
  );
  const versions = await listPairingVersions(
    tx,
    pairings.map(({ id }) => id),
  );
  const latest = pairings.map((pairing) => ({
    pairing,
    version: versions.find(({ row }) => row.pairingId === pairing.id),
  }));
  const decisions = await listPairingDecisions(
    tx,
    latest.flatMap(({ version }) => (version ? [version.row.id] : [])),
  );
  for (const { pairing, version } of latest) {
    const [standing] = standingsOf(
      [partyId],
      decisions.filter(({ subjectId }) => subjectId === version?.row.id),
    );
    if (standing?.state === 'waiting') add(pairing.projectId);
  }
  return counts;
}
