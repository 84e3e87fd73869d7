'use client';

import { useState, type FormEvent } from 'react';
import { partnerMark } from '@/components/drawings/partner-marks';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { Skeleton } from '@/components/ui/skeleton';
import { Textarea } from '@/components/ui/textarea';
import { useComments, useWriteComment } from '@/lib/client/season';
import { useParties, useWorkspace } from '@/lib/client/workspace';
import type { CommentSubject } from '@/lib/contracts/comment';
import { sayMoment } from './odds-words';

/** What the parties say to each other about a pairing or terms. */
export function TalkPanel({
  kind,
  subject,
  parties: count,
}: {
  kind: CommentSubject;
  subject: string;
  parties: number;
}) {
  const { slug: workspace, timeZone } = useWorkspace();
  const comments = useComments(kind, subject);
  const write = useWriteComment();
  const parties = useParties();
  const [text, setText] = useState('');
  const send = (event: FormEvent) => {
    event.preventDefault();
    if (!text.trim()) return;
    write.mutate(
      { params: { workspace, kind, subject }, body: { body: text.trim() } },
      { onSuccess: () => setText('') },
    );
  };
  return (
    <div className="flex flex-col gap-3">
      {comments.isPending ? <Skeleton className="h-12" /> : null}
      <ul className="flex flex-col gap-2.5 text-base">
        {comments.data?.comments.map((comment) => {
          const party = comment.partyId ? parties.get(comment.partyId) : undefined;
          return (
            <li key={comment.id}>
              <p className="text-sm text-ink-3">
                <span
                  className="text-base font-semibold"
                  style={party ? { color: partnerMark(party.mark).text } : undefined}
                >
                  {comment.name}
                </span>{' '}
                {sayMoment(comment.createdAt, timeZone)}
              </p>
              <p className="break-words whitespace-pre-line">{comment.body}</p>
            </li>
          );
        })}
      </ul>
      {comments.data?.comments.length === 0 ? (
        <p className="text-base text-ink-3">Nothing was said yet.</p>
      ) : null}
      <form onSubmit={send} className="flex flex-col gap-2">
        {write.isError ? (
          <FormErrorSummary title="This was not sent" message={write.error.problem.detail} />
        ) : null}
        <Field label={`Write to the ${count} of you`} hideLabel>
          <Textarea
            rows={2}
            maxLength={2000}
            placeholder={`Write to the ${count} of you …`}
            value={text}
            onChange={(event) => setText(event.target.value)}
          />
        </Field>
        {text.trim() ? (
          <Button type="submit" size="sm" busy={write.isPending} className="self-end">
            Send
          </Button>
        ) : null}
      </form>
    </div>
  );
}
