'use client';

import Link from 'next/link';
import { OddsBar, percentText } from '@/components/drawings/odds-bar';
import { sayDay } from '@/components/drawings/season-days';
import { buttonClasses } from '@/components/ui/button';
import { ErrorState } from '@/components/ui/error-state';
import { Notice } from '@/components/ui/notice';
import { SkeletonText } from '@/components/ui/skeleton';
import { usePairing } from '@/lib/client/season';
import { useParties, useWorkspace } from '@/lib/client/workspace';
import type { PairingId } from '@/lib/contracts/ids';
import type { PairingDetail } from '@/lib/contracts/pairing';
import { DecisionButtons } from './decision-buttons';
import { readableOdds } from './odds-words';
import { PairCodes } from './pair-codes';
import { PairingState } from './pairing-state';
import { usePairingDecision } from './use-pairing-decision';
import { WarningsList } from './warnings-list';
import { WorthSplit } from './worth-split';

export function PairingPanelTitle({ id }: { id: PairingId }) {
  const pairing = usePairing(id).data;
  return pairing ? <span className="line-clamp-3">{pairing.title}</span> : 'Pairing';
}

/** The chosen pairing beside the season: what can hatch, whose it would be, where it stands. */
export function PairingPanel({ id, onClose }: { id: PairingId; onClose: () => void }) {
  const query = usePairing(id);
  if (query.isPending) return <SkeletonText lines={8} />;
  if (query.isError) {
    const isGone = query.error.problem.status === 404;
    return (
      <ErrorState
        title={isGone ? 'No such pairing' : undefined}
        onRetry={isGone ? onClose : () => void query.refetch()}
        retrying={query.isFetching}
      >
        {query.error.problem.detail}
      </ErrorState>
    );
  }
  return <PairingSummary pairing={query.data} />;
}

function PairingSummary({ pairing }: { pairing: PairingDetail }) {
  const parties = useParties();
  const version = pairing.versions[0];
  if (!version) return null;
  const { figures } = version;
  const waiting = pairing.waitingFor.map((id) => parties.get(id)?.name ?? 'a party').join(', ');
  return (
    <div className="flex flex-col gap-5">
      <div className="flex flex-wrap items-center justify-between gap-2">
        <PairCodes sire={pairing.sire.code} dam={pairing.dam.code} />
        <PairingState row={pairing} />
      </div>
      <p className="text-base text-ink-2">
        {pairing.project.name} · version {pairing.number}
        {waiting ? ` · waiting for ${waiting}` : ''}
        {pairing.status === 'proposed' && pairing.answerBy ? ` · answer by ${sayDay(pairing.answerBy)}` : ''}
        <span className="block text-sm text-ink-3">
          Inbreeding of the young {percentText(figures.inbreeding)}
          {figures.commonAncestors[0] ? ` · ${figures.commonAncestors[0]}` : ''}
        </span>
      </p>
      <section>
        <div className="mb-1 flex items-baseline justify-between gap-3">
          <h3 className="text-lg">What can hatch</h3>
          <span className="text-sm text-ink-3">odds · ≥ 1 in {figures.eggsExpected} eggs</span>
        </div>
        <ul className="flex flex-col gap-2">
          {figures.outcomes.slice(0, 8).map((row) => (
            <li key={row.key}>
              <OddsBar
                name={`${row.looksLike}${row.carries ? `, ${row.carries}` : ''}${row.sex ? ` (${row.sex}s)` : ''}`}
                probability={row.probability}
                fraction={readableOdds(row.odds)}
                atLeastOne={row.atLeastOne}
              />
            </li>
          ))}
        </ul>
        {figures.outcomes.length > 8 ? (
          <p className="mt-1 text-sm text-ink-3">
            {figures.outcomes.length - 8} more on the page of the pairing.
          </p>
        ) : null}
      </section>
      {figures.uncertain ? <Notice>{figures.uncertain}</Notice> : null}
      <WarningsList figures={figures} />
      {figures.proceeds ? (
        <section className="border-t border-rule pt-4">
          <div className="mb-2 flex items-baseline justify-between gap-3">
            <h3 className="text-lg">Terms v{version.termsNumber}</h3>
            <span className="text-sm text-ink-3">what each would get</span>
          </div>
          <WorthSplit proceeds={figures.proceeds} termsNumber={version.termsNumber} />
        </section>
      ) : null}
    </div>
  );
}

/** The actions of the chosen pairing. */
export function PairingPanelFooter({ id }: { id: PairingId }) {
  const { slug } = useWorkspace();
  const pairing = usePairing(id).data;
  const { answer, busy, error } = usePairingDecision(pairing);
  const href = `/${slug}/season/pairings/${id}`;
  const waits = pairing?.me.mayDecide && pairing.me.state === 'waiting';
  return (
    <div className="flex flex-col gap-2">
      {pairing && waits ? (
        <DecisionButtons
          number={pairing.number}
          state={pairing.me.state}
          busy={busy}
          error={error}
          onAnswer={answer}
          agreeLabel="Agree to this pairing"
        />
      ) : null}
      <Link href={href} className={buttonClasses({ wide: true })}>
        Open the pairing
      </Link>
    </div>
  );
}
