'use client';

import { Pencil } from 'lucide-react';
import Link from 'next/link';
import { AnimalCode } from '@/components/collection/animal-code';
import { useShares } from '@/components/collection/shares-of';
import { statusWords } from '@/components/collection/words';
import { PartnerName } from '@/components/drawings/partner-name';
import { sayDay } from '@/components/drawings/season-days';
import { ShareStrip } from '@/components/drawings/share-strip';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { Badge } from '@/components/ui/badge';
import { buttonClasses } from '@/components/ui/button';
import { ErrorState } from '@/components/ui/error-state';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { PlainTable } from '@/components/ui/plain-table';
import { SkeletonText } from '@/components/ui/skeleton';
import { useProject } from '@/lib/client/projects';
import { useMay, useWorkspaceSlug } from '@/lib/client/workspace';
import type { ProjectId } from '@/lib/contracts/ids';
import type { ProjectDetail } from '@/lib/contracts/project';
import { termsState } from './terms-state';

/** A joint project: who is in it, whose the animals are, what was agreed, what is paired. */
export function ProjectScreen({ id }: { id: ProjectId }) {
  const slug = useWorkspaceSlug();
  const query = useProject(id);
  const back = { href: `/${slug}/projects`, label: 'Joint projects' };
  if (query.isPending || query.isError) {
    return (
      <>
        <PageHeader title="Joint project" back={back} />
        <PageBody>
          {query.isPending ? (
            <SkeletonText lines={10} />
          ) : (
            <ErrorState onRetry={() => void query.refetch()} retrying={query.isFetching}>
              {query.error.problem.detail}
            </ErrorState>
          )}
        </PageBody>
      </>
    );
  }
  return <ProjectPage project={query.data} />;
}

function ProjectPage({ project }: { project: ProjectDetail }) {
  const slug = useWorkspaceSlug();
  const mayEdit = useMay('project.edit');
  const mayProposePairing = useMay('pairing.propose');
  const shares = useShares(project.parties);
  const home = `/${slug}/projects/${project.id}`;
  const present = project.parties.filter(({ leftOn }) => leftOn === null);
  const left = project.parties.filter(({ leftOn }) => leftOn !== null);
  return (
    <>
      <PageHeader
        back={{ href: `/${slug}/projects`, label: 'Joint projects' }}
        title={project.name}
        meta={`${project.species.name} · since ${sayDay(project.startedOn)}${project.endedOn ? ` · ended ${sayDay(project.endedOn)}` : ''}`}
        actions={
          <>
            {mayEdit ? (
              <Link href={`${home}/edit`} className={buttonClasses()}>
                <Pencil aria-hidden /> Edit
              </Link>
            ) : null}
            {mayProposePairing && project.termsInForce ? (
              <Link
                href={`/${slug}/season/propose?project=${project.id}`}
                className={buttonClasses({ tone: 'primary' })}
              >
                Propose pairing
              </Link>
            ) : null}
          </>
        }
      />
      <PageBody>
        {project.purpose ? (
          <p className="max-w-prose text-lg whitespace-pre-line text-ink-2">{project.purpose}</p>
        ) : null}
        <div className="grid min-w-0 items-start gap-5 lg:grid-cols-[minmax(0,1fr)_minmax(20rem,26rem)]">
          <div className="flex min-w-0 flex-col gap-5">
            <Panel title="Animals" aside={`${project.animals}`}>
              {project.animalRows.length > 0 ? (
                <PlainTable
                  label="Animals of the project"
                  rows={project.animalRows}
                  rowKey={(row) => row.id}
                  columns={[
                    {
                      id: 'code',
                      header: 'Animal',
                      cell: (row) => (
                        <Link
                          href={`/${slug}/collection/${row.id}`}
                          className="inline-flex flex-col items-start hover:underline"
                        >
                          <AnimalCode code={row.code} sex={row.sex} size="sm" />
                          {row.name ? <span className="text-sm text-ink-3">{row.name}</span> : null}
                        </Link>
                      ),
                    },
                    { id: 'looks', header: 'Looks and carries', cell: (row) => row.description },
                    {
                      id: 'status',
                      header: 'Status',
                      cell: (row) => (
                        <span className="whitespace-nowrap">
                          {statusWords[row.status as keyof typeof statusWords] ?? row.status}
                        </span>
                      ),
                    },
                    {
                      id: 'parts',
                      header: 'Owned by',
                      cell: (row) => (
                        <ShareStrip
                          shares={shares(row.parts)}
                          label={`${row.code} is owned by`}
                          className="w-28"
                        />
                      ),
                    },
                  ]}
                />
              ) : (
                <p className="text-base text-ink-3">
                  No animal stands in this project yet. {mayEdit ? 'Add them under Edit.' : ''}
                </p>
              )}
            </Panel>
            <PairingsPanel project={project} mayPropose={mayProposePairing} />
          </div>
          <div className="flex min-w-0 flex-col gap-5">
            <Panel title="Partners" aside="in order of rank">
              <ol className="flex flex-col gap-1 text-base">
                {present.map((party) => (
                  <li key={party.id} className="flex justify-between gap-4">
                    <PartnerName partner={party.mark} name={party.name} />
                    <span className="text-sm text-ink-3">since {sayDay(party.joinedOn)}</span>
                  </li>
                ))}
                {left.map((party) => (
                  <li key={party.id} className="flex justify-between gap-4 text-ink-3">
                    {party.name}
                    <span className="text-sm">left {sayDay(party.leftOn ?? party.joinedOn)}</span>
                  </li>
                ))}
              </ol>
              <h3 className="mt-4 mb-1 text-base font-semibold">Parts in the project’s animals</h3>
              <ShareStrip
                shares={shares(project.holdings.parts)}
                size="lg"
                labels="percent"
                label="Parts in the project’s animals"
              />
            </Panel>
            {project.terms ? <TermsPanel project={project} terms={project.terms} home={home} /> : null}
          </div>
        </div>
      </PageBody>
    </>
  );
}

function PairingsPanel({ project, mayPropose }: { project: ProjectDetail; mayPropose: boolean }) {
  const slug = useWorkspaceSlug();
  if (project.pairingRows.length === 0) {
    if (!mayPropose) return null;
    return (
      <Panel title="Pairings">
        <p className="text-base text-ink-3">
          {project.termsInForce ? 'None is proposed yet.' : 'Pairings can be proposed once terms are agreed.'}
        </p>
      </Panel>
    );
  }
  return (
    <Panel title="Pairings" aside={`${project.pairingRows.length}`}>
      <ul className="divide-y divide-rule-2">
        {project.pairingRows.map((row) => (
          <li key={row.id} className="flex flex-wrap items-baseline justify-between gap-x-4 py-2 text-base">
            <Link href={`/${slug}/season/pairings/${row.id}`} className="min-w-0 hover:underline">
              <span className="font-mono font-semibold">
                {row.sireCode} × {row.damCode}
              </span>{' '}
              <span className="text-ink-2">{row.title}</span>
            </Link>
            <span className="flex items-baseline gap-3">
              <span className="text-sm text-ink-3">
                {row.season - 1}–{String(row.season % 100).padStart(2, '0')}
              </span>
              <Badge
                tone={row.status === 'agreed' ? 'moss' : row.status === 'proposed' ? 'straw' : 'neutral'}
              >
                {row.status === 'proposed'
                  ? `${row.agreed} of ${row.of} agreed`
                  : row.status === 'agreed'
                    ? 'Agreed'
                    : 'Ended'}
              </Badge>
            </span>
          </li>
        ))}
      </ul>
    </Panel>
  );
}

function TermsPanel({
  project,
  terms,
  home,
}: {
  project: ProjectDetail;
  terms: NonNullable<ProjectDetail['terms']>;
  home: string;
}) {
  const mayPropose = useMay('terms.propose');
  const open = terms.find(({ status }) => status === 'proposed');
  return (
    <Panel
      title="Terms"
      aside={
        mayPropose && !open && !project.endedOn ? (
          <Link href={`${home}/terms/new`} className="text-slate underline underline-offset-3">
            {terms.length === 0 ? 'Propose the first version' : 'Propose a new version'}
          </Link>
        ) : undefined
      }
    >
      {terms.length === 0 ? (
        <Notice tone="straw">
          Nothing is agreed yet. Before animals are paired, all parties agree who gives and gets what.
        </Notice>
      ) : null}
      <ul className="divide-y divide-rule-2">
        {terms.map((version) => {
          const state = termsState(version);
          return (
            <li key={version.id} className="flex items-baseline justify-between gap-4 py-2 text-base">
              <Link href={`${home}/terms/${version.id}`} className="hover:underline">
                <span className="font-semibold">Version {version.number}</span>{' '}
                <span className="text-sm text-ink-3">
                  {version.status === 'agreed' ? 'in force from' : 'from'} {sayDay(version.inForceFrom)}
                </span>
              </Link>
              <Badge tone={state.tone}>{state.text}</Badge>
            </li>
          );
        })}
      </ul>
      {terms.some(({ status }) => status === 'agreed') ? (
        <p className="mt-2 text-sm text-ink-3">
          Agreed versions are locked: they can be shown later exactly as they were agreed.
        </p>
      ) : null}
    </Panel>
  );
}
