import 'server-only';
import { listPartiesOfProjects } from '@/db/queries/projects';
import { listTermsDecisions, listTermsOf, type TermsRecord } from '@/db/queries/terms';
import type { PartyId, ProjectId } from '@/lib/contracts/ids';
import type { WorkspaceWorld } from '../world';
import { standingsOf, type Standing } from './agreement';
import { presentParties } from './present-projects';

export interface TermsStanding {
  record: TermsRecord;
  standings: Standing[];
}

/** Every version of a project's terms with where each of its parties stands, newest first. */
export async function loadTermsStandings(
  { tx }: Pick<WorkspaceWorld, 'tx'>,
  projectId: ProjectId,
): Promise<{ versions: TermsStanding[]; partyIds: PartyId[]; nameOf: (id: string) => string }> {
  const versions = await listTermsOf(tx, [projectId]);
  const decisions = await listTermsDecisions(
    tx,
    versions.map(({ id }) => id),
  );
  const parties = await listPartiesOfProjects(tx, [projectId]);
  const names = new Map<string, string>(parties.map(({ id, name }) => [id, name]));
  return {
    partyIds: presentParties(parties).map(({ id }) => id),
    nameOf: (id) => names.get(id) ?? 'another party',
    versions: versions.map((record) => ({
      record,
      standings: standingsOf(
        record.content.parties.map(({ id }) => id),
        decisions.filter(({ subjectId }) => subjectId === record.id),
      ),
    })),
  };
}

/** The version that another one is read against: the last that was agreed before it, or the one before it. */
export function versionBefore(versions: readonly TermsStanding[], number: number): TermsRecord | null {
  const earlier = versions.map(({ record }) => record).filter((record) => record.number < number);
  return earlier.find(({ status }) => status === 'agreed') ?? earlier[0] ?? null;
}
