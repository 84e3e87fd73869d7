import 'server-only';
import { listCommentsAbout } from '@/db/queries/comments';
import { listComments } from '@/lib/contracts/comment';
import { workspaceUseCase } from '../world';
import { findCommentSubject } from './comment-subject';

/** A party reads what was said about a pairing or a version of terms. */
export const listCommentsUseCase = workspaceUseCase(listComments, async (world, { params }) => {
  await findCommentSubject(world, params.kind, params.subject);
  const rows = await listCommentsAbout(world.tx, params.kind, params.subject);
  return {
    comments: rows.map((row) => ({
      ...row,
      createdAt: row.createdAt.toISOString(),
      mine: row.memberId === world.actor.memberId,
    })),
  };
});
