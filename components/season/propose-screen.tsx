'use client';

import { useRouter } from 'next/navigation';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { ErrorState } from '@/components/ui/error-state';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { MoneyInput } from '@/components/ui/money-input';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { SkeletonText } from '@/components/ui/skeleton';
import { usePairing, useProposePairing, useProposePairingAgain } from '@/lib/client/season';
import { useWorkspace } from '@/lib/client/workspace';
import type { AnimalId, PairingId, ProjectId } from '@/lib/contracts/ids';
import type { PairingDetail, PairingPreview } from '@/lib/contracts/pairing';
import { exponentOf } from '@/lib/money/minor-units';
import { sayCount, saySeason } from './odds-words';
import { OutcomesTable } from './outcomes-table';
import { ParentsTable } from './parents-table';
import { ProposeFields } from './propose-fields';
import { useProposal, type ProposalForm } from './propose-state';
import { PunnettSquares } from './punnett-squares';
import { WarningsList } from './warnings-list';
import { WorthSplit } from './worth-split';

/** Proposes a pairing, or a new version of one: the choice on the left, what follows from it live on the right. */
export function ProposeScreen({ again, project }: { again: PairingId | null; project: string | null }) {
  const pairing = usePairing(again);
  if (again === null) return <ProposeForm project={project} />;
  if (pairing.isPending) {
    return (
      <PageBody>
        <SkeletonText lines={8} />
      </PageBody>
    );
  }
  if (pairing.isError) {
    return (
      <PageBody>
        <ErrorState onRetry={() => void pairing.refetch()}>{pairing.error.problem.detail}</ErrorState>
      </PageBody>
    );
  }
  return <ProposeForm key={pairing.data.number} again={pairing.data} project={null} />;
}

function ProposeForm({ again, project }: { again?: PairingDetail; project: string | null }) {
  const { slug } = useWorkspace();
  const router = useRouter();
  const { form, change, preview, settle } = useProposal(again, project);
  const propose = useProposePairing();
  const proposeAgain = useProposePairingAgain();
  const data = form.projectId && form.sireId && form.damId ? preview.data : undefined;
  const sending = again ? proposeAgain : propose;
  const refused = sending.error;
  const messageFor = (field: string) =>
    refused?.messageFor(field) ??
    preview.error?.messageFor(field) ??
    data?.obstacles.find((one) => one.field === field)?.message;

  const send = () => {
    if (!data) return;
    const body = {
      startsOn: form.startsOn || data.plan.startsOn,
      endsOn: form.endsOn || data.plan.endsOn,
      eggsExpected: form.eggsExpected ?? data.plan.eggsExpected,
      note: form.note,
      prices: form.prices ?? data.plan.prices ?? {},
      acknowledgedCautions: form.acknowledged,
      answerBy: form.answerBy || null,
    };
    const done = (id: PairingId) => {
      settle();
      router.push(`/${slug}/season/pairings/${id}`);
    };
    if (again)
      proposeAgain.mutate(
        { params: { workspace: slug, pairing: again.id }, body: { seen: again.number, ...body } },
        { onSuccess: () => done(again.id) },
      );
    else {
      propose.mutate(
        {
          params: { workspace: slug },
          body: {
            projectId: form.projectId as ProjectId,
            sireId: form.sireId as AnimalId,
            damId: form.damId as AnimalId,
            ...body,
          },
        },
        { onSuccess: ({ id }) => done(id) },
      );
    }
  };

  return (
    <>
      <PageHeader
        back={
          again
            ? { href: `/${slug}/season/pairings/${again.id}`, label: again.title }
            : { href: `/${slug}/season`, label: 'Season' }
        }
        title={again ? `Propose version ${again.number + 1}` : 'Propose a pairing'}
        meta={data ? saySeason(data.season) : null}
        actions={
          <Button
            tone="primary"
            busy={sending.isPending}
            disabled={!data || data.obstacles.length > 0}
            onClick={send}
          >
            {again ? `Propose version ${again.number + 1}` : 'Propose'}
          </Button>
        }
      />
      <PageBody>
        {refused ? (
          <FormErrorSummary
            title={refused.problem.status === 409 ? 'Somebody was faster' : 'This was not proposed'}
            message={refused.problem.detail}
            errors={refused.problem.errors.map(({ message }) => ({ message }))}
          />
        ) : null}
        <div className="grid min-w-0 items-start gap-5 lg:grid-cols-[minmax(18rem,22rem)_minmax(0,1fr)]">
          <ProposeFields
            form={form}
            change={change}
            preview={data}
            isAgain={again !== undefined}
            messageFor={messageFor}
          />
          <Figures
            preview={data}
            isChosen={Boolean(form.sireId && form.damId)}
            error={preview.error?.problem.detail}
            form={form}
            change={change}
            isFetching={preview.isFetching}
          />
        </div>
      </PageBody>
    </>
  );
}

function Figures({
  preview,
  isChosen,
  isFetching,
  error,
  form,
  change,
}: {
  preview: PairingPreview | undefined;
  isChosen: boolean;
  isFetching: boolean;
  error?: string;
  form: ProposalForm;
  change: (part: Partial<ProposalForm>) => void;
}) {
  const { currency } = useWorkspace();
  if (!preview) {
    if (error) return <ErrorState title="These two can’t be paired">{error}</ErrorState>;
    if (isChosen) return <SkeletonText lines={10} />;
    return (
      <EmptyState title="Choose a project, a sire and a dam">
        What can hatch, at what odds, how related the two are and whose the young would be is worked out while
        you choose. Nothing is kept before you propose.
      </EmptyState>
    );
  }
  const { figures, plan, medians } = preview;
  const prices = form.prices ?? plan.prices;
  return (
    <div
      className="grid min-w-0 items-start gap-5 xl:grid-cols-[minmax(0,1.3fr)_minmax(0,1fr)]"
      aria-busy={isFetching}
    >
      <div className="flex min-w-0 flex-col gap-5">
        <Panel
          title="What can hatch"
          aside={`${sayCount(figures.hatchlingsExpected)} hatchlings of ${figures.eggsExpected} eggs`}
        >
          <OutcomesTable
            figures={figures}
            currency={currency}
            price={
              prices
                ? (row) => (
                    <span className="inline-block w-28 text-left">
                      <MoneyInput
                        aria-label={`Price of one ${row.looksLike}`}
                        currency={currency}
                        exponent={exponentOf(currency)}
                        value={prices[row.key] ?? null}
                        onChange={(amount) => {
                          const { [row.key]: _before, ...others } = prices;
                          change({
                            prices:
                              amount === null || Number.isNaN(amount)
                                ? others
                                : { ...others, [row.key]: amount },
                          });
                        }}
                      />
                      {medians?.[row.key] ? (
                        <span className="block text-right font-sans text-tick text-ink-3">
                          median of {medians[row.key]} {medians[row.key] === 1 ? 'sale' : 'sales'}
                        </span>
                      ) : null}
                    </span>
                  )
                : undefined
            }
          />
          {figures.uncertain ? <Notice className="mt-4">{figures.uncertain}</Notice> : null}
        </Panel>
        {figures.squares.length > 0 ? (
          <Panel title="Punnett square" aside="his gametes across, hers down">
            <PunnettSquares squares={figures.squares} />
          </Panel>
        ) : null}
      </div>
      <div className="flex min-w-0 flex-col gap-5">
        <WarningsList figures={figures} />
        <Panel title="Parents">
          <ParentsTable figures={figures} />
        </Panel>
        {figures.proceeds && figures.termsNumber !== null ? (
          <Panel title="Whose it would be" aside={`terms v${figures.termsNumber}`}>
            <WorthSplit proceeds={figures.proceeds} termsNumber={figures.termsNumber} />
          </Panel>
        ) : null}
      </div>
    </div>
  );
}
