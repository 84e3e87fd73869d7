import 'server-only';
import { and, asc, eq } from 'drizzle-orm';
import type { CommentSubject } from '@/lib/contracts/comment';
import type { Transaction } from '../scope';
import { comments } from '../schema/activity';
import { users } from '../schema/auth';
import { members } from '../schema/workspace';

function selectComments(tx: Transaction) {
  return tx
    .select({
      id: comments.id,
      memberId: comments.memberId,
      name: users.name,
      partyId: members.partyId,
      body: comments.body,
      createdAt: comments.createdAt,
    })
    .from(comments)
    .innerJoin(members, and(eq(members.workspaceId, comments.workspaceId), eq(members.id, comments.memberId)))
    .innerJoin(users, eq(users.id, members.userId));
}

/** What was said about a thing that the caller has already been let see, oldest first. */
export async function listCommentsAbout(tx: Transaction, kind: CommentSubject, subjectId: string) {
  return selectComments(tx)
    .where(and(eq(comments.subjectKind, kind), eq(comments.subjectId, subjectId)))
    .orderBy(asc(comments.createdAt), asc(comments.id));
}

export async function insertComment(tx: Transaction, row: typeof comments.$inferInsert) {
  const id = crypto.randomUUID();
  await tx.insert(comments).values({ ...row, id });
  const [written] = await selectComments(tx).where(eq(comments.id, id));
  return written ?? null;
}
