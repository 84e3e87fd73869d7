import { z } from 'zod';
import { contract, instant, inWorkspace } from './contract';
import { memberId, partyId } from './ids';

/** What is talked about. */
export const commentSubject = z.enum(['pairing', 'terms']);
export type CommentSubject = z.infer<typeof commentSubject>;

export const comment = z.object({
  id: z.uuid(),
  memberId,
  name: z.string(),
  /** The party that the writer acts for, for its mark. */
  partyId: partyId.nullable(),
  body: z.string(),
  createdAt: instant,
  mine: z.boolean(),
});
export type Comment = z.infer<typeof comment>;

const aboutSubject = inWorkspace.extend({ kind: commentSubject, subject: z.uuid() });

export const listComments = contract({
  id: 'comments.list',
  method: 'GET',
  path: '/workspaces/{workspace}/comments/{kind}/{subject}',
  summary: 'What the parties said about a pairing or a version of terms, oldest first',
  access: { scope: 'workspace', action: 'comment.write' },
  params: aboutSubject,
  response: z.object({ comments: z.array(comment) }),
});

export const writeComment = contract({
  id: 'comments.write',
  method: 'POST',
  path: '/workspaces/{workspace}/comments/{kind}/{subject}',
  summary: 'Say something to the parties of a pairing or of terms',
  access: { scope: 'workspace', action: 'comment.write' },
  params: aboutSubject,
  body: z.object({ body: z.string().trim().min(1, 'Write something first.').max(2000) }),
  response: comment,
  idempotent: true,
});
