'use client';

import { Plus } from 'lucide-react';
import Link from 'next/link';
import { parseAsString, parseAsStringLiteral, useQueryStates } from 'nuqs';
import { PartnerName } from '@/components/drawings/partner-name';
import { sayDay } from '@/components/drawings/season-days';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { Badge } from '@/components/ui/badge';
import { buttonClasses } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { ErrorState } from '@/components/ui/error-state';
import { SearchInput } from '@/components/ui/search-input';
import { Segmented } from '@/components/ui/segmented';
import { Skeleton } from '@/components/ui/skeleton';
import { useProjects } from '@/lib/client/projects';
import { useMay, useWorkspaceSlug } from '@/lib/client/workspace';
import type { ProjectRow } from '@/lib/contracts/project';

const which = ['running', 'ended', 'all'] as const;
const params = {
  search: parseAsString.withDefault(''),
  which: parseAsStringLiteral(which).withDefault('running'),
};

/** The joint projects that the caller sees. */
export function ProjectsScreen() {
  const slug = useWorkspaceSlug();
  const [state, setState] = useQueryStates(params, { history: 'replace' });
  const mayCreate = useMay('project.create');
  // All of them are few: they are filtered here, so that typing is answered at once.
  const projects = useProjects();
  const rows = projects.data?.rows.filter(
    (row) =>
      row.name.toLowerCase().includes(state.search.trim().toLowerCase()) &&
      (state.which === 'all' || (state.which === 'ended') === (row.endedOn !== null)),
  );
  return (
    <>
      <PageHeader
        title="Joint projects"
        meta={
          projects.data
            ? `${projects.data.total} ${projects.data.total === 1 ? 'project' : 'projects'}`
            : null
        }
        actions={
          mayCreate ? (
            <Link href={`/${slug}/projects/new`} className={buttonClasses({ tone: 'primary' })}>
              <Plus aria-hidden /> Start a project
            </Link>
          ) : null
        }
      >
        <div className="flex flex-wrap gap-2">
          <SearchInput
            label="Search projects"
            className="w-64"
            value={state.search}
            onChange={(event) => void setState({ search: event.target.value || null })}
          />
          <Segmented
            label="Which projects"
            value={state.which}
            onChange={(value) => void setState({ which: value })}
            options={[
              { value: 'running', label: 'Running' },
              { value: 'ended', label: 'Ended' },
              { value: 'all', label: 'All' },
            ]}
          />
        </div>
      </PageHeader>
      <PageBody>
        {projects.isPending ? (
          <div role="status" aria-label="Loading projects" className="flex flex-col gap-2">
            {[0, 1, 2].map((row) => (
              <Skeleton key={row} className="h-24 w-full" />
            ))}
          </div>
        ) : projects.isError && !projects.data ? (
          <ErrorState onRetry={() => void projects.refetch()} retrying={projects.isFetching}>
            {projects.error.problem.detail}
          </ErrorState>
        ) : rows && rows.length > 0 ? (
          <ul className="divide-y divide-rule-2 overflow-hidden rounded-xl border border-rule bg-paper">
            {rows.map((row) => (
              <ProjectLine key={row.id} row={row} href={`/${slug}/projects/${row.id}`} />
            ))}
          </ul>
        ) : projects.data && projects.data.total > 0 ? (
          <EmptyState title="No project matches">
            Look at all projects, or search for something else.
          </EmptyState>
        ) : (
          <EmptyState
            title="No joint projects yet"
            action={
              mayCreate ? (
                <Link href={`/${slug}/projects/new`} className={buttonClasses({ tone: 'primary' })}>
                  Start the first project
                </Link>
              ) : null
            }
          >
            A joint project holds partners, animals and the terms that they agree on. Start one, then propose
            its terms: pairings can be proposed once all parties have agreed.
          </EmptyState>
        )}
      </PageBody>
    </>
  );
}

function ProjectLine({ row, href }: { row: ProjectRow; href: string }) {
  return (
    <li className="relative px-4 py-3 hover:bg-hover sm:px-5">
      <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1">
        <Link href={href} className="text-lg font-semibold after:absolute after:inset-0">
          {row.name}
        </Link>
        <span className="flex flex-wrap gap-1.5">
          {row.waitingForMe > 0 ? (
            <Badge tone="ember">
              {row.waitingForMe === 1 ? 'One proposal waits' : `${row.waitingForMe} proposals wait`} for you
            </Badge>
          ) : null}
          {row.endedOn ? <Badge>Ended {sayDay(row.endedOn)}</Badge> : null}
          {row.termsInForce === undefined ? null : row.termsInForce === null ? (
            <Badge tone="straw">No terms agreed</Badge>
          ) : (
            <Badge tone="moss">Terms v{row.termsInForce}</Badge>
          )}
        </span>
      </div>
      <p className="mt-0.5 text-base text-ink-2">
        {row.species.name} · {row.animals} {row.animals === 1 ? 'animal' : 'animals'} · {row.pairings}{' '}
        {row.pairings === 1 ? 'pairing' : 'pairings'} · since {sayDay(row.startedOn)}
      </p>
      <p className="mt-1 flex flex-wrap gap-x-4 text-base">
        {row.parties
          .filter(({ leftOn }) => leftOn === null)
          .map((party) => (
            <PartnerName key={party.id} partner={party.mark} name={party.name} />
          ))}
      </p>
    </li>
  );
}
