'use client';

import Link from 'next/link';
import { parseAsString, useQueryState } from 'nuqs';
import { useEffect, useRef, useState } from 'react';
import { toast } from 'sonner';
import { AgreementPanel } from '@/components/season/agreement-panel';
import { DecisionButtons } from '@/components/season/decision-buttons';
import { TalkPanel } from '@/components/season/talk-panel';
import { sayDay } from '@/components/drawings/season-days';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { Badge } from '@/components/ui/badge';
import { Button, buttonClasses } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { ErrorState } from '@/components/ui/error-state';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { SkeletonText } from '@/components/ui/skeleton';
import { useDecideTerms, useTerms, useTermsPreview, useWithdrawTerms } from '@/lib/client/projects';
import { useMay, useWorkspace } from '@/lib/client/workspace';
import type { ProjectId, TermsId } from '@/lib/contracts/ids';
import type { TermsDetail } from '@/lib/contracts/terms';
import { ClauseList } from './clause-list';
import { ExampleSplit } from './example-split';
import { TermsCaution } from './terms-caution';
import { termsState } from './terms-state';

/** A version of a project's terms: clause by clause, beside the version before, and who stands where. */
export function TermsScreen({ project, terms }: { project: ProjectId; terms: TermsId }) {
  const { slug } = useWorkspace();
  const query = useTerms(project, terms);
  if (query.data) return <TermsPage terms={query.data} />;
  return (
    <>
      <PageHeader title="Terms" back={{ href: `/${slug}/projects/${project}`, label: 'Project' }} />
      <PageBody>
        {query.isError ? (
          <ErrorState onRetry={() => void query.refetch()} retrying={query.isFetching}>
            {query.error.problem.detail}
          </ErrorState>
        ) : (
          <SkeletonText lines={10} />
        )}
      </PageBody>
    </>
  );
}

function TermsPage({ terms }: { terms: TermsDetail }) {
  const { slug } = useWorkspace();
  const talks = useMay('comment.write');
  const decide = useDecideTerms();
  const [opened] = useQueryState('decide', parseAsString);
  const agreement = useRef<HTMLDivElement>(null);
  const { parties: _parties, ...content } = terms.content;
  const preview = useTermsPreview(terms.project.id, {
    content,
    price: 100_000,
    cardFee: 3_200,
    costs: content.costsFirst ? 8_000 : 0,
  });
  const opensDecision = opened === '1' && terms.me.mayDecide;
  useEffect(() => {
    // A link from a mail leads straight to the answer.
    if (opensDecision) agreement.current?.querySelector<HTMLElement>('button')?.focus();
  }, [opensDecision]);
  const answer = (given: { decision: 'agreed' | 'change_asked'; comment: string }, done: () => void) =>
    decide.mutate(
      { params: { workspace: slug, project: terms.project.id, terms: terms.id }, body: given },
      {
        onSuccess: ({ status, agreed, of }) => {
          done();
          toast.success(
            status === 'agreed' ? 'Agreed by all: these terms are locked.' : `${agreed} of ${of} agreed.`,
          );
        },
      },
    );
  const state = termsState(terms);
  const home = `/${slug}/projects/${terms.project.id}`;
  return (
    <>
      <PageHeader
        back={{ href: home, label: terms.project.name }}
        title={`Terms, version ${terms.number}`}
        meta={
          <span className="inline-flex flex-wrap items-center gap-2">
            in force from {sayDay(terms.inForceFrom)} <Badge tone={state.tone}>{state.text}</Badge>
          </span>
        }
        actions={
          <>
            {terms.mayPropose && terms.status !== 'withdrawn' ? (
              <Link href={`${home}/terms/new`} className={buttonClasses()}>
                {terms.status === 'proposed' ? 'Propose a change' : 'Propose a new version'}
              </Link>
            ) : null}
            {terms.me.mayDecide && terms.me.state === 'waiting' ? (
              <Button
                tone="primary"
                busy={decide.isPending}
                onClick={() => answer({ decision: 'agreed', comment: '' }, () => undefined)}
              >
                Agree to version {terms.number}
              </Button>
            ) : null}
          </>
        }
      />
      <PageBody>
        {terms.status === 'withdrawn' ? (
          <Notice tone="straw">
            This version was withdrawn or replaced; it is shown as it was proposed.
          </Notice>
        ) : null}
        <div className="grid min-w-0 items-start gap-5 lg:grid-cols-[minmax(0,1fr)_minmax(19rem,23rem)]">
          <div className="flex min-w-0 flex-col gap-5">
            <Panel
              title="What it says"
              aside={terms.comparedWith ? `beside version ${terms.comparedWith.number}` : 'the first version'}
            >
              <ClauseList clauses={terms.clauses} comparedWith={terms.comparedWith?.number ?? null} />
              {terms.note ? (
                <p className="mt-3 border-t border-rule-2 pt-3 text-base whitespace-pre-line text-ink-2">
                  {terms.note}
                </p>
              ) : null}
            </Panel>
            {preview.data ? (
              <Panel title="An example sale" aside="card fee and costs are made up">
                <ExampleSplit preview={preview.data} />
              </Panel>
            ) : null}
          </div>
          <div className="flex min-w-0 flex-col gap-5" ref={agreement}>
            <Panel title="Agreement" aside={`${terms.agreed} of ${terms.of}`}>
              <AgreementPanel
                standings={terms.standings}
                number={terms.number}
                me={terms.me.partyId}
                answerBy={null}
                lockedAt={terms.lockedAt}
                hash={terms.hash}
              >
                {terms.me.mayDecide ? (
                  <DecisionButtons
                    number={terms.number}
                    state={terms.me.state}
                    busy={decide.isPending}
                    error={decide.error}
                    onAnswer={answer}
                  />
                ) : null}
              </AgreementPanel>
              <p className="mt-3 text-sm text-ink-3">Proposed by {terms.proposedBy}.</p>
            </Panel>
            <TermsCaution />
            {talks ? (
              <Panel title="Talk">
                <TalkPanel kind="terms" subject={terms.id} parties={terms.of} />
              </Panel>
            ) : null}
            {terms.mayPropose && terms.status === 'proposed' ? <WithdrawTerms terms={terms} /> : null}
          </div>
        </div>
      </PageBody>
    </>
  );
}

function WithdrawTerms({ terms }: { terms: TermsDetail }) {
  const { slug } = useWorkspace();
  const withdraw = useWithdrawTerms();
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button tone="quiet" size="sm" className="self-start" onClick={() => setOpen(true)}>
        Withdraw this version
      </Button>
      <ConfirmDialog
        open={open}
        onOpenChange={setOpen}
        title={`Withdraw version ${terms.number}?`}
        description="It can’t be agreed any more. It stays on record, and the next proposal gets a new number."
        confirmLabel="Withdraw"
        busy={withdraw.isPending}
        onConfirm={() =>
          withdraw.mutate(
            {
              params: { workspace: slug, project: terms.project.id, terms: terms.id },
              body: { version: terms.version, reason: '' },
            },
            { onSuccess: () => setOpen(false) },
          )
        }
      >
        {withdraw.isError ? (
          <FormErrorSummary title="This was not withdrawn" message={withdraw.error.problem.detail} />
        ) : null}
      </ConfirmDialog>
    </>
  );
}
