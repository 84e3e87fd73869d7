'use client';

import Link from 'next/link';
import { parseAsString, useQueryState } from 'nuqs';
import { useEffect, useRef, useState } from 'react';
import { PairingLog } from '@/components/clutches/pairing-log';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { Badge } from '@/components/ui/badge';
import { Button, buttonClasses } from '@/components/ui/button';
import { ErrorState } from '@/components/ui/error-state';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { Select } from '@/components/ui/select';
import { SkeletonText } from '@/components/ui/skeleton';
import { sayDay } from '@/components/drawings/season-days';
import { usePairing } from '@/lib/client/season';
import { useMay, useParties, useWorkspace } from '@/lib/client/workspace';
import type { PairingId } from '@/lib/contracts/ids';
import type { PairingDetail } from '@/lib/contracts/pairing';
import { AgreementPanel } from './agreement-panel';
import { ChangesList } from './changes-list';
import { DecisionButtons } from './decision-buttons';
import { sayCount } from './odds-words';
import { OutcomesTable } from './outcomes-table';
import { PairCodes } from './pair-codes';
import { PairingProgress } from './pairing-progress';
import { PairingState } from './pairing-state';
import { ParentsTable } from './parents-table';
import { PunnettSquares } from './punnett-squares';
import { TalkPanel } from './talk-panel';
import { usePairingDecision } from './use-pairing-decision';
import { WarningsList } from './warnings-list';
import { WithdrawButton } from './withdraw-button';
import { WorthSplit } from './worth-split';

/** A pairing on a page of its own: what can hatch, the parents, whose it would be, who has agreed, what was said. */
export function PairingScreen({ id }: { id: PairingId }) {
  const { slug } = useWorkspace();
  const query = usePairing(id);
  const back = { href: `/${slug}/season`, label: 'Season' };
  if (query.isPending) {
    return (
      <>
        <PageHeader title="Pairing" back={back} />
        <PageBody>
          <SkeletonText lines={12} />
        </PageBody>
      </>
    );
  }
  if (query.isError) {
    return (
      <>
        <PageHeader title="Pairing" back={back} />
        <PageBody>
          <ErrorState onRetry={() => void query.refetch()} retrying={query.isFetching}>
            {query.error.problem.detail}
          </ErrorState>
        </PageBody>
      </>
    );
  }
  return <PairingPage pairing={query.data} />;
}

function PairingPage({ pairing }: { pairing: PairingDetail }) {
  const { slug, currency } = useWorkspace();
  const parties = useParties();
  const talks = useMay('comment.write');
  const [shown, setShown] = useState(0);
  const { answer, busy, error } = usePairingDecision(pairing);
  const [decide] = useQueryState('decide', parseAsString);
  const agreement = useRef<HTMLDivElement>(null);
  const version = pairing.versions[shown] ?? pairing.versions[0];
  const opensDecision = decide === '1' && pairing.me.mayDecide;
  useEffect(() => {
    // A link from a mail leads straight to the answer.
    if (opensDecision) agreement.current?.querySelector<HTMLElement>('button')?.focus();
  }, [opensDecision]);
  if (!version) return null;
  const isCurrent = version === pairing.versions[0];
  const { figures } = version;
  const before = pairing.versions[pairing.versions.indexOf(version) + 1];
  const mayAnswer = isCurrent && pairing.me.mayDecide;
  return (
    <>
      <PageHeader
        back={{
          href: `/${slug}/season?pairing=${pairing.id}&season=${pairing.season}`,
          label: `Season ${pairing.season - 1}–${String(pairing.season % 100).padStart(2, '0')}`,
        }}
        lead={<PairCodes sire={pairing.sire.code} dam={pairing.dam.code} size="md" />}
        title={pairing.title}
        meta={
          <span className="inline-flex flex-wrap items-center gap-2">
            <Link href={`/${slug}/projects/${pairing.project.id}`} className="hover:underline">
              {pairing.project.name}
            </Link>
            <PairingState row={pairing} />
          </span>
        }
        actions={
          <>
            {pairing.versions.length > 1 ? (
              <Select
                aria-label="Version"
                className="w-auto"
                value={String(pairing.versions.indexOf(version))}
                onChange={(event) => setShown(Number(event.target.value))}
                options={pairing.versions.map(({ number, lockedAt }, index) => ({
                  value: String(index),
                  label: `Version ${number}${lockedAt ? ', agreed' : index === 0 ? '' : ', replaced'}`,
                }))}
              />
            ) : (
              <Badge>Version {version.number}</Badge>
            )}
            {pairing.mayPropose ? (
              <Link href={`/${slug}/season/propose?again=${pairing.id}`} className={buttonClasses()}>
                Propose a change
              </Link>
            ) : null}
            {mayAnswer && pairing.me.state === 'waiting' ? (
              <Button
                tone="primary"
                busy={busy}
                onClick={() => answer({ decision: 'agreed', comment: '' }, () => undefined)}
              >
                Agree to version {version.number}
              </Button>
            ) : null}
          </>
        }
      />
      <PageBody>
        {isCurrent ? null : (
          <Notice tone="straw">
            This is version {version.number}, which was replaced. It is shown as it was proposed.
          </Notice>
        )}
        <div className="grid min-w-0 items-start gap-5 lg:grid-cols-2 xl:grid-cols-[minmax(0,1.25fr)_minmax(0,1fr)_minmax(18rem,21rem)]">
          <div className="flex min-w-0 flex-col gap-5">
            <Panel
              title="What can hatch"
              aside={`${sayCount(figures.hatchlingsExpected)} hatchlings expected of ${figures.eggsExpected} eggs`}
            >
              <OutcomesTable figures={figures} currency={currency} />
              {figures.uncertain ? <Notice className="mt-4">{figures.uncertain}</Notice> : null}
            </Panel>
            {figures.squares.length > 0 ? (
              <Panel title="Punnett square" aside="his gametes across, hers down">
                <PunnettSquares squares={figures.squares} />
              </Panel>
            ) : null}
          </div>
          <div className="flex min-w-0 flex-col gap-5">
            <Panel title="Parents">
              <ParentsTable figures={figures} />
            </Panel>
            <WarningsList figures={figures} />
            {figures.proceeds ? (
              <Panel
                title="Whose it would be"
                aside={`${sayCount(figures.hatchlingsExpected)} hatchlings · terms v${version.termsNumber}`}
              >
                <WorthSplit proceeds={figures.proceeds} termsNumber={version.termsNumber} />
                <p className="mt-3 text-sm text-ink-3">
                  An expectation over many clutches, not a promise; prices are the proposer’s. By the{' '}
                  <Link
                    href={`/${slug}/projects/${pairing.project.id}/terms/${version.termsId}`}
                    className="text-slate underline"
                  >
                    terms of the project
                  </Link>
                  .
                </p>
              </Panel>
            ) : null}
            <PairingProgress pairing={pairing} />
            {pairing.status === 'agreed' ? <PairingLog pairing={pairing.id} /> : null}
          </div>
          <div className="flex min-w-0 flex-col gap-5 lg:max-xl:col-span-2" ref={agreement}>
            <Panel
              title="Agreement"
              aside={`${version.standings.filter(({ state }) => state === 'agreed').length} of ${version.standings.length}`}
            >
              <AgreementPanel
                standings={version.standings}
                number={version.number}
                me={pairing.me.partyId}
                answerBy={version.answerBy}
                lockedAt={version.lockedAt}
                hash={version.hash}
              >
                {mayAnswer ? (
                  <DecisionButtons
                    number={version.number}
                    state={pairing.me.state}
                    busy={busy}
                    error={error}
                    onAnswer={answer}
                  />
                ) : null}
              </AgreementPanel>
              {isCurrent && pairing.waitingFor.length > 0 ? (
                <p className="mt-3 text-sm text-straw">
                  Waiting for{' '}
                  {pairing.waitingFor.map((party) => parties.get(party)?.name ?? 'a party').join(', ')}.
                </p>
              ) : null}
            </Panel>
            {before ? (
              <Panel title={`Changed since version ${before.number}`}>
                <ChangesList changes={version.changes} />
              </Panel>
            ) : null}
            <Panel title="The plan" aside={`version ${version.number}`}>
              <dl className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-4 gap-y-1 text-base">
                <dt className="text-ink-2">Together</dt>
                <dd>
                  {sayDay(version.plan.startsOn)} – {sayDay(version.plan.endsOn)}
                </dd>
                <dt className="text-ink-2">Proposed by</dt>
                <dd>{version.proposedBy}</dd>
              </dl>
              {version.plan.note ? (
                <p className="mt-2 text-base whitespace-pre-line">{version.plan.note}</p>
              ) : null}
            </Panel>
            {talks ? (
              <Panel title="Talk">
                <TalkPanel kind="pairing" subject={pairing.id} parties={version.standings.length} />
              </Panel>
            ) : null}
            {pairing.mayPropose ? <WithdrawButton pairing={pairing} /> : null}
          </div>
        </div>
      </PageBody>
    </>
  );
}
