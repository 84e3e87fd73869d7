import 'server-only';
import {
  listPairingDecisions,
  listPairingVersions,
  type PairingRecord,
  type PairingVersionRecord,
} from '@/db/queries/pairings';
import { listPartiesOfProjects } from '@/db/queries/projects';
import type { PartyId, ProjectId } from '@/lib/contracts/ids';
import { presentParties } from '../projects/present-projects';
import { standingsOf, type Standing } from '../projects/agreement';
import type { WorkspaceWorld } from '../world';

export interface PairingStanding {
  record: PairingRecord;
  /** Newest first; never empty for a pairing that was proposed. */
  versions: { version: PairingVersionRecord; standings: Standing[] }[];
  /** Who decides: the parties of the project today, in rank order; for a locked version those that agreed to it. */
  partyIds: PartyId[];
}

/** Pairings with their versions and where each party stands on each of them. */
export async function loadStandings(
  { tx }: Pick<WorkspaceWorld, 'tx'>,
  records: readonly PairingRecord[],
): Promise<PairingStanding[]> {
  const versions = await listPairingVersions(
    tx,
    records.map(({ id }) => id),
  );
  const decisions = await listPairingDecisions(
    tx,
    versions.map(({ row }) => row.id),
  );
  const parties = presentParties(
    await listPartiesOfProjects(tx, [...new Set(records.map(({ projectId }) => projectId))]),
  );
  const partiesOf = (projectId: ProjectId) =>
    parties.filter((party) => party.projectId === projectId).map(({ id }) => id);
  return records.map((record) => ({
    record,
    partyIds: partiesOf(record.projectId),
    versions: versions
      .filter(({ row }) => row.pairingId === record.id)
      .map((version) => {
        const about = decisions.filter(({ subjectId }) => subjectId === version.row.id);
        const agreed = [...new Set(about.map(({ partyId }) => partyId))];
        // What is locked shows who agreed to it then, whoever is in the project today.
        return {
          version,
          standings: standingsOf(version.row.lockedAt ? agreed : partiesOf(record.projectId), about),
        };
      }),
  }));
}
