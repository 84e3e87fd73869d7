'use client';

import { Check, CircleDashed, MessageCircleQuestion } from 'lucide-react';
import type { ReactNode } from 'react';
import { sayDay } from '@/components/drawings/season-days';
import { partnerMark } from '@/components/drawings/partner-marks';
import { useParties, useWorkspace } from '@/lib/client/workspace';
import type { Standing } from '@/lib/contracts/agreement';
import type { PartyId } from '@/lib/contracts/ids';
import { sayMoment } from './odds-words';

/** Where every party stands on a version: who agreed when, who asks for what, who is waited for. */
export function AgreementPanel({
  standings,
  number,
  me,
  answerBy,
  lockedAt,
  hash,
  children,
}: {
  standings: readonly Standing[];
  number: number;
  me: PartyId | null;
  answerBy: string | null;
  lockedAt: string | null;
  hash: string | null;
  /** The buttons of the decision. */
  children?: ReactNode;
}) {
  const parties = useParties();
  const { timeZone } = useWorkspace();
  return (
    <div className="flex flex-col gap-3">
      <ul className="divide-y divide-rule-2">
        {standings.map((standing) => {
          const party = parties.get(standing.partyId);
          const isMe = standing.partyId === me;
          const name = party?.name ?? 'A party';
          return (
            <li key={standing.partyId} className="flex gap-3 py-2.5">
              <StateSign state={standing.state} mark={party?.mark ?? 6} />
              <div className="min-w-0 text-base">
                <p>
                  <span className="font-semibold">{name}</span>
                  {isMe ? <span className="text-ink-3"> (you)</span> : null}{' '}
                  {sayStanding(standing.state, number)}
                </p>
                <p className="text-sm text-ink-3">
                  {standing.at
                    ? `${standing.by && standing.by !== name ? `${standing.by}, ` : ''}${sayMoment(standing.at, timeZone)}`
                    : answerBy
                      ? `answer by ${sayDay(answerBy)}`
                      : 'no answer yet'}
                </p>
                {standing.comment ? (
                  <p className="mt-1 rounded-lg bg-rule-2 px-3 py-1.5 break-words">{standing.comment}</p>
                ) : null}
              </div>
            </li>
          );
        })}
      </ul>
      {lockedAt ? (
        <p className="text-sm text-ink-3">
          Locked {sayMoment(lockedAt, timeZone)}: this version can’t be changed any more.
          {hash ? (
            <span
              className="block font-mono text-tick break-all"
              title="SHA-256, chained to the agreement before it"
            >
              {hash.slice(0, 16)}…
            </span>
          ) : null}
        </p>
      ) : null}
      {children}
    </div>
  );
}

function sayStanding(state: Standing['state'], number: number): string {
  if (state === 'agreed') return `agreed to version ${number}`;
  if (state === 'change_asked') return `asks to change version ${number}`;
  return 'has not answered';
}

function StateSign({ state, mark }: { state: Standing['state']; mark: number }) {
  const { fill, text } = partnerMark(mark);
  if (state === 'agreed') {
    return (
      <span
        aria-hidden
        className="grid size-6 shrink-0 place-items-center rounded-full text-paper"
        style={{ background: fill }}
      >
        <Check className="size-3.5" strokeWidth={3} />
      </span>
    );
  }
  const Icon = state === 'change_asked' ? MessageCircleQuestion : CircleDashed;
  return <Icon aria-hidden className="size-6 shrink-0" style={{ color: text }} />;
}
