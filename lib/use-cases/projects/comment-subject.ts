import 'server-only';
import { findPairing } from '@/db/queries/pairings';
import { findTerms } from '@/db/queries/terms';
import type { CommentSubject } from '@/lib/contracts/comment';
import type { PairingId, ProjectId, TermsId } from '@/lib/contracts/ids';
import { notFound } from '../refusal';
import type { WorkspaceWorld } from '../world';

/** What is talked about, if the caller sees it: its project and where it stands in the product. */
export async function findCommentSubject(
  { tx, sees }: WorkspaceWorld,
  kind: CommentSubject,
  id: string,
): Promise<{ projectId: ProjectId; title: string; href: string }> {
  if (kind === 'pairing') {
    const pairing = await findPairing(tx, sees, id as PairingId);
    if (!pairing) throw notFound('pairing');
    return {
      projectId: pairing.projectId,
      title: `${pairing.sireCode} × ${pairing.damCode}`,
      href: `season/pairings/${id}`,
    };
  }
  const terms = await findTerms(tx, sees, id as TermsId);
  if (!terms) throw notFound('version of terms');
  return {
    projectId: terms.projectId,
    title: `terms version ${terms.number} of ${terms.projectName}`,
    href: `projects/${terms.projectId}/terms/${id}`,
  };
}
