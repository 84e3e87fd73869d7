'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useState } from 'react';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { Button } from '@/components/ui/button';
import { DateInput } from '@/components/ui/date-input';
import { ErrorState } from '@/components/ui/error-state';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { MoneyInput } from '@/components/ui/money-input';
import { Panel } from '@/components/ui/panel';
import { SkeletonText } from '@/components/ui/skeleton';
import { Textarea } from '@/components/ui/textarea';
import { useProject, useProposeTerms, useTermsList, useTermsPreview } from '@/lib/client/projects';
import { useWorkspace } from '@/lib/client/workspace';
import type { ProjectId } from '@/lib/contracts/ids';
import type { ProjectDetail } from '@/lib/contracts/project';
import type { TermsDetail } from '@/lib/contracts/terms';
import type { TermsDraft } from '@/lib/contracts/terms-content';
import { exponentOf } from '@/lib/money/minor-units';
import { ClauseList } from './clause-list';
import { ExampleSplit } from './example-split';
import { TermsCaution } from './terms-caution';
import { TermsFields } from './terms-fields';

type Version = Pick<TermsDetail, 'id' | 'number' | 'status' | 'content' | 'inForceFrom'>;

/** Proposes the first or the next version of a project's terms. */
export function TermsEditorScreen({ project }: { project: ProjectId }) {
  const { slug } = useWorkspace();
  const detail = useProject(project);
  const terms = useTermsList(project);
  if (detail.data && terms.data) return <TermsEditor project={detail.data} versions={terms.data.versions} />;
  return (
    <>
      <PageHeader title="Propose terms" back={{ href: `/${slug}/projects/${project}`, label: 'Project' }} />
      <PageBody>
        {detail.isError || terms.isError ? (
          <ErrorState onRetry={() => void Promise.all([detail.refetch(), terms.refetch()])} />
        ) : (
          <SkeletonText lines={10} />
        )}
      </PageBody>
    </>
  );
}

const blank: TermsDraft = {
  damSide: 1,
  sireSide: 1,
  houseShare: null,
  costsFirst: true,
  cardFees: 'off_the_top',
  division: 'proceeds',
  clauses: { death: '', exit: '', notice: '' },
};

function TermsEditor({ project, versions }: { project: ProjectDetail; versions: readonly Version[] }) {
  const { slug, today, currency } = useWorkspace();
  const router = useRouter();
  const propose = useProposeTerms();
  const open = versions.find(({ status }) => status === 'proposed') ?? null;
  const start = open ?? versions.find(({ status }) => status === 'agreed') ?? versions[0] ?? null;
  const [draft, setDraft] = useState<TermsDraft>(() => {
    if (!start) return blank;
    const { parties: _parties, ...content } = start.content;
    return content;
  });
  const [inForceFrom, setInForceFrom] = useState(open?.inForceFrom ?? today);
  const [note, setNote] = useState('');
  const [price, setPrice] = useState<number | null>(100_000);
  const [touched, setTouched] = useState(false);
  const change = (part: Partial<TermsDraft>) => {
    setTouched(true);
    setDraft((before) => ({ ...before, ...part }));
  };
  const preview = useTermsPreview(project.id, {
    content: draft,
    price: price !== null && price >= 1 ? price : 100_000,
    cardFee: 3_200,
    costs: draft.costsFirst ? 8_000 : 0,
  });
  useEffect(() => {
    if (!touched || propose.isSuccess) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [touched, propose.isSuccess]);
  const number = Math.max(0, ...versions.map((version) => version.number)) + 1;
  const messageFor = (field: string) => propose.error?.messageFor(field) ?? preview.error?.messageFor(field);
  const send = () =>
    propose.mutate(
      {
        params: { workspace: slug, project: project.id },
        body: { content: draft, inForceFrom, note, replaces: open?.id ?? null },
      },
      { onSuccess: ({ id }) => router.push(`/${slug}/projects/${project.id}/terms/${id}`) },
    );
  return (
    <>
      <PageHeader
        back={{ href: `/${slug}/projects/${project.id}`, label: project.name }}
        title={`Propose terms, version ${number}`}
        meta={open ? `takes the place of version ${open.number}, which is not agreed` : null}
        actions={
          <Button tone="primary" busy={propose.isPending} onClick={send}>
            Propose version {number}
          </Button>
        }
      />
      <PageBody>
        {propose.error ? (
          <FormErrorSummary
            title={propose.error.problem.status === 409 ? 'Somebody was faster' : 'This was not proposed'}
            message={propose.error.problem.detail}
            errors={propose.error.problem.errors.map(({ message }) => ({ message }))}
          />
        ) : null}
        <div className="grid min-w-0 items-start gap-5 lg:grid-cols-2">
          <div className="flex min-w-0 flex-col gap-5">
            <TermsCaution />
            <TermsFields
              draft={draft}
              change={change}
              parties={project.parties.filter(({ leftOn }) => leftOn === null)}
              messageFor={messageFor}
            />
            <Panel title="From when">
              <div className="flex flex-col gap-4">
                <Field
                  label="In force from"
                  hint="What was born or sold before keeps the version of its day."
                  error={messageFor('inForceFrom')}
                >
                  <DateInput
                    className="max-w-48"
                    value={inForceFrom}
                    onChange={(event) => setInForceFrom(event.target.value)}
                  />
                </Field>
                <Field label="Note to the others" optional>
                  <Textarea
                    rows={2}
                    maxLength={2000}
                    value={note}
                    onChange={(event) => {
                      setTouched(true);
                      setNote(event.target.value);
                    }}
                  />
                </Field>
              </div>
            </Panel>
          </div>
          <div className="flex min-w-0 flex-col gap-5 lg:sticky lg:top-20">
            <Panel title="An example sale">
              <Field label="The buyer pays" className="mb-3 max-w-52">
                <MoneyInput
                  currency={currency}
                  exponent={exponentOf(currency)}
                  value={price}
                  onChange={setPrice}
                />
              </Field>
              {preview.data ? (
                <ExampleSplit preview={preview.data} />
              ) : preview.isError ? (
                <p className="text-base text-alarm">{preview.error.problem.detail}</p>
              ) : (
                <SkeletonText lines={6} />
              )}
              <p className="mt-2 text-sm text-ink-3">Card fee and costs are made up for the example.</p>
            </Panel>
            {preview.data && preview.data.comparedWith !== null ? (
              <Panel
                title={`Beside version ${preview.data.comparedWith}`}
                aside={`${preview.data.clauses.filter(({ changed }) => changed).length} changed`}
              >
                <ClauseList clauses={preview.data.clauses} comparedWith={preview.data.comparedWith} />
              </Panel>
            ) : null}
          </div>
        </div>
      </PageBody>
    </>
  );
}
