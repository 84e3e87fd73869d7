'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { Textarea } from '@/components/ui/textarea';
import type { RequestError } from '@/lib/client/request';

export interface Answer {
  decision: 'agreed' | 'change_asked';
  comment: string;
}

/** "Agree" and "Ask for a change" of one version. The text that was typed stays when the request fails. */
export function DecisionButtons({
  number,
  state,
  busy,
  error,
  onAnswer,
  agreeLabel = 'Agree',
}: {
  number: number;
  /** What the caller's party has answered so far. */
  state: 'agreed' | 'change_asked' | 'waiting' | null;
  busy: boolean;
  error: RequestError | null;
  onAnswer: (answer: Answer, done: () => void) => void;
  agreeLabel?: string;
}) {
  const [asks, setAsks] = useState(false);
  const [comment, setComment] = useState('');
  const [missing, setMissing] = useState(false);
  const isStale = error?.problem.status === 409;
  const ask = () => {
    if (!comment.trim()) return setMissing(true);
    onAnswer({ decision: 'change_asked', comment: comment.trim() }, () => {
      setAsks(false);
      setComment('');
    });
  };
  return (
    <div className="flex min-w-0 flex-col gap-2">
      {error && !asks ? (
        <FormErrorSummary
          title={isStale ? 'This has changed in the meantime' : 'Your answer was not recorded'}
          message={error.problem.detail}
        />
      ) : null}
      <div className="flex flex-wrap gap-2">
        {state === 'agreed' ? null : (
          <Button
            tone="primary"
            className="flex-1"
            busy={busy && !asks}
            onClick={() => onAnswer({ decision: 'agreed', comment: '' }, () => undefined)}
          >
            {agreeLabel}
          </Button>
        )}
        <Button className="flex-1" disabled={busy} onClick={() => setAsks(true)}>
          Ask for a change
        </Button>
      </div>
      <Dialog
        open={asks}
        onOpenChange={setAsks}
        title={`Ask to change version ${number}`}
        description="The other parties are told. Whoever proposed it can then propose a new version; this one stays on record."
        footer={
          <>
            <Button onClick={() => setAsks(false)}>Cancel</Button>
            <Button tone="primary" busy={busy} onClick={ask}>
              Ask for a change
            </Button>
          </>
        }
      >
        {error ? (
          <FormErrorSummary title="Your answer was not recorded" message={error.problem.detail} />
        ) : null}
        <Field
          label="What should change"
          error={missing && !comment.trim() ? 'Say what should change.' : error?.messageFor('comment')}
        >
          <Textarea
            rows={4}
            maxLength={2000}
            value={comment}
            onChange={(event) => setComment(event.target.value)}
            autoFocus
          />
        </Field>
      </Dialog>
    </div>
  );
}
