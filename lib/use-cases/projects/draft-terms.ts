import 'server-only';
import { findParties, listPartiesOfProjects } from '@/db/queries/projects';
import type { ProjectId } from '@/lib/contracts/ids';
import type { TermsDraft, TermsContent } from '@/lib/contracts/terms-content';
import { invalid } from '../refusal';
import type { WorkspaceWorld } from '../world';
import { presentParties } from './present-projects';

/**
 * Drafted terms with the parties of the project as it stands today.
 * @throws {Refusal} 'invalid' when the house share goes to nobody of the workspace
 */
export async function completeTerms(
  { tx }: WorkspaceWorld,
  projectId: ProjectId,
  draft: TermsDraft,
): Promise<{ content: TermsContent; nameOf: (id: string) => string }> {
  const parties = presentParties(await listPartiesOfProjects(tx, [projectId]));
  const house = draft.houseShare ? await findParties(tx, [draft.houseShare.partyId]) : [];
  if (draft.houseShare && house.length === 0)
    throw invalid('content.houseShare.partyId', 'There is no such party here.');
  const isParty = parties.some(({ id }) => id === draft.houseShare?.partyId);
  if (draft.houseShare && !isParty && house[0]?.kind !== 'house')
    throw invalid(
      'content.houseShare.partyId',
      'The house share goes to a party of the project or to the house.',
    );
  const names = new Map<string, string>([...house, ...parties].map(({ id, name }) => [id, name]));
  return {
    content: { ...draft, parties: parties.map(({ id }, index) => ({ id, rank: index + 1 })) },
    nameOf: (id) => names.get(id) ?? 'another party',
  };
}
