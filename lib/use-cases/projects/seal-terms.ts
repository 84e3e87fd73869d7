import 'server-only';
import { lockProject } from '@/db/queries/projects';
import { findTerms, lastTermsHash, listTermsDecisions, setTermsStatus } from '@/db/queries/terms';
import type { TermsId } from '@/lib/contracts/ids';
import { chainHash } from '../hash';
import { notFound } from '../refusal';
import type { WorkspaceWorld } from '../world';
import { isUnanimous, standingsOf } from './agreement';

/** Locks a version once every party has agreed, chained by hash to the version agreed before it. */
export async function sealTermsWhenUnanimous({ tx, now }: WorkspaceWorld, id: TermsId): Promise<boolean> {
  const record = await findTerms(tx, { everything: true }, id);
  if (!record) throw notFound('version of terms');
  const standings = standingsOf(
    record.content.parties.map((party) => party.id),
    await listTermsDecisions(tx, [id]),
  );
  if (!isUnanimous(standings)) return false;
  await lockProject(tx, record.projectId);
  const previousHash = await lastTermsHash(tx, record.projectId);
  const hash = chainHash(previousHash, {
    terms: { id, projectId: record.projectId, number: record.number, inForceFrom: record.inForceFrom },
    content: record.content,
    note: record.note,
    agreed: standings.map(({ partyId, by, at }) => ({ partyId, by, at: at?.toISOString() ?? null })),
  });
  await setTermsStatus(tx, id, { status: 'agreed', lockedAt: now, previousHash, hash });
  return true;
}
