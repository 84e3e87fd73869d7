import 'server-only';
import { insertComment } from '@/db/queries/comments';
import { listPartiesOfProjects } from '@/db/queries/projects';
import { writeComment } from '@/lib/contracts/comment';
import { recordAudit } from '../audit';
import { notifyParties } from '../notify';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { findCommentSubject } from './comment-subject';
import { presentParties } from './present-projects';

/** A party says something about a pairing or a version of terms; the others are told in the product. */
export const writeCommentUseCase = workspaceUseCase(writeComment, async (world, { params, body }) => {
  const { tx, workspace, actor } = world;
  const subject = await findCommentSubject(world, params.kind, params.subject);
  const row = await insertComment(tx, {
    workspaceId: workspace.id,
    subjectKind: params.kind,
    subjectId: params.subject,
    memberId: actor.memberId,
    body: body.body,
  });
  if (!row) throw notFound('comment');
  const parties = presentParties(await listPartiesOfProjects(tx, [subject.projectId]));
  await notifyParties(
    world,
    parties.map(({ id }) => id),
    {
      kind: 'comment',
      title: `${actor.name} on ${subject.title}`,
      body: body.body.slice(0, 280),
      href: subject.href,
    },
    actor.memberId,
  );
  await recordAudit(world, {
    action: 'comment.write',
    subject: { kind: params.kind, id: params.subject },
    detail: { commentId: row.id },
  });
  return { ...row, createdAt: row.createdAt.toISOString(), mine: true };
});
