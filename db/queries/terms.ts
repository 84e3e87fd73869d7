import 'server-only';
import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm';
import type { PartyId, ProjectId, TermsId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { users } from '../schema/auth';
import { projects, termsDecisions, termsVersions } from '../schema/projects';
import { members } from '../schema/workspace';
import { inVisibleProject, type Visibility } from './visibility';

function selectTerms(tx: Transaction) {
  return tx
    .select({
      id: termsVersions.id,
      projectId: termsVersions.projectId,
      projectName: projects.name,
      number: termsVersions.number,
      status: termsVersions.status,
      content: termsVersions.content,
      inForceFrom: termsVersions.inForceFrom,
      note: termsVersions.note,
      proposedById: termsVersions.proposedBy,
      proposedByParty: members.partyId,
      proposedBy: users.name,
      proposedAt: termsVersions.proposedAt,
      lockedAt: termsVersions.lockedAt,
      previousHash: termsVersions.previousHash,
      hash: termsVersions.hash,
      version: termsVersions.version,
    })
    .from(termsVersions)
    .innerJoin(
      projects,
      and(eq(projects.workspaceId, termsVersions.workspaceId), eq(projects.id, termsVersions.projectId)),
    )
    .innerJoin(
      members,
      and(eq(members.workspaceId, termsVersions.workspaceId), eq(members.id, termsVersions.proposedBy)),
    )
    .innerJoin(users, eq(users.id, members.userId));
}
export type TermsRecord = NonNullable<Awaited<ReturnType<typeof findTerms>>>;

/** Versions of the terms of projects that the caller has already been let see, newest first. */
export async function listTermsOf(tx: Transaction, projectIds: readonly ProjectId[]) {
  if (projectIds.length === 0) return [];
  return selectTerms(tx)
    .where(inArray(termsVersions.projectId, [...projectIds]))
    .orderBy(asc(termsVersions.projectId), desc(termsVersions.number));
}

export async function findTerms(tx: Transaction, sees: Visibility, id: TermsId) {
  const [row] = await selectTerms(tx).where(
    and(eq(termsVersions.id, id), inVisibleProject(sees, termsVersions.projectId)),
  );
  return row ?? null;
}

/** Locks a version for the rest of the transaction, so that of two decisions at once the second sees the first. */
export async function lockTerms(tx: Transaction, id: TermsId): Promise<void> {
  await tx.select({ id: termsVersions.id }).from(termsVersions).where(eq(termsVersions.id, id)).for('update');
}

/** Every decision on versions of terms, oldest first; of a party's several, the last one counts. */
export async function listTermsDecisions(tx: Transaction, ids: readonly TermsId[]) {
  if (ids.length === 0) return [];
  return tx
    .select({
      subjectId: termsDecisions.termsId,
      partyId: termsDecisions.partyId,
      decision: termsDecisions.decision,
      comment: termsDecisions.comment,
      by: users.name,
      decidedAt: termsDecisions.decidedAt,
    })
    .from(termsDecisions)
    .innerJoin(
      members,
      and(eq(members.workspaceId, termsDecisions.workspaceId), eq(members.id, termsDecisions.decidedBy)),
    )
    .innerJoin(users, eq(users.id, members.userId))
    .where(inArray(termsDecisions.termsId, [...ids]))
    .orderBy(asc(termsDecisions.decidedAt));
}

export async function insertTerms(
  tx: Transaction,
  row: typeof termsVersions.$inferInsert & { id: TermsId },
): Promise<void> {
  await tx.insert(termsVersions).values(row);
}

export async function insertTermsDecision(
  tx: Transaction,
  row: typeof termsDecisions.$inferInsert & { partyId: PartyId },
): Promise<void> {
  await tx.insert(termsDecisions).values(row);
}

export async function setTermsStatus(
  tx: Transaction,
  id: TermsId,
  change: Pick<typeof termsVersions.$inferInsert, 'status'> & Partial<typeof termsVersions.$inferInsert>,
): Promise<void> {
  await tx
    .update(termsVersions)
    .set({ ...change, version: sql`${termsVersions.version} + 1` })
    .where(eq(termsVersions.id, id));
}

/** Hash of the last agreed version of a project, to chain the next one to. */
export async function lastTermsHash(tx: Transaction, projectId: ProjectId): Promise<string | null> {
  const [row] = await tx
    .select({ hash: termsVersions.hash })
    .from(termsVersions)
    .where(and(eq(termsVersions.projectId, projectId), eq(termsVersions.status, 'agreed')))
    .orderBy(desc(termsVersions.number))
    .limit(1);
  return row?.hash ?? null;
}
