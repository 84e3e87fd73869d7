'use client';

import { Plus } from 'lucide-react';
import Link from 'next/link';
import { useQueryStates } from 'nuqs';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { SplitView } from '@/components/shell/split-view';
import { Button, buttonClasses } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { ErrorState } from '@/components/ui/error-state';
import { Skeleton } from '@/components/ui/skeleton';
import { useSeason } from '@/lib/client/season';
import { useMay, useWorkspace } from '@/lib/client/workspace';
import type { PairingId } from '@/lib/contracts/ids';
import { saySeason } from './odds-words';
import { PairingPanel, PairingPanelFooter, PairingPanelTitle } from './pairing-panel';
import { SeasonFigures } from './season-figures';
import { SeasonFilters } from './season-filters';
import { SeasonLanes } from './season-lanes';
import { isFiltered, seasonParams, seasonQueryOf } from './season-params';

/** The season: its figures, every pairing as a lane of the ribbon, the chosen one beside it. */
export function SeasonScreen() {
  const workspace = useWorkspace();
  const [state, setState] = useQueryStates(seasonParams, { history: 'replace' });
  const season = useSeason(seasonQueryOf(state));
  const mayPropose = useMay('pairing.propose');
  const chosen = state.pairing as PairingId | null;
  const choose = (pairing: string | null) => void setState({ pairing }, { history: 'push' });
  const data = season.data;
  const projects = new Set(data?.rows.map(({ project }) => project.name));
  const propose = `/${workspace.slug}/season/propose${state.project ? `?project=${state.project}` : ''}`;

  return (
    <SplitView
      panel={chosen ? <PairingPanel key={chosen} id={chosen} onClose={() => choose(null)} /> : null}
      panelTitle={chosen ? <PairingPanelTitle id={chosen} /> : null}
      footer={chosen ? <PairingPanelFooter key={chosen} id={chosen} /> : undefined}
      onClose={() => choose(null)}
    >
      <PageHeader
        title={data ? saySeason(data.season) : 'Season'}
        meta={
          data
            ? `${[...projects].slice(0, 2).join(', ')}${projects.size > 2 ? ` and ${projects.size - 2} more` : ''}${projects.size ? ' · ' : ''}${data.of} ${data.of === 1 ? 'pairing' : 'pairings'}`
            : null
        }
        actions={
          mayPropose ? (
            <Link href={propose} className={buttonClasses({ tone: 'primary' })}>
              <Plus aria-hidden /> Propose pairing
            </Link>
          ) : null
        }
      >
        {data ? (
          <SeasonFilters
            state={state}
            season={data.season}
            seasons={data.seasons}
            onChange={(change) => void setState(change)}
          />
        ) : null}
      </PageHeader>
      <PageBody>
        {season.isPending ? (
          <SeasonSkeleton />
        ) : season.isError && !data ? (
          <ErrorState onRetry={() => void season.refetch()} retrying={season.isFetching}>
            {season.error.problem.detail}
          </ErrorState>
        ) : data && data.rows.length > 0 ? (
          <>
            <SeasonFigures season={data} />
            <SeasonLanes season={data} chosen={chosen} onOpen={(id) => choose(id)} />
          </>
        ) : isFiltered(state) ? (
          <EmptyState
            title="No pairing matches"
            action={
              <Button onClick={() => void setState({ project: null, party: null, state: null })}>
                Clear filters
              </Button>
            }
          >
            There may be pairings in this season, but none is like this.
          </EmptyState>
        ) : (
          <EmptyState
            title="No pairings in this season yet"
            action={
              mayPropose ? (
                <Link href={propose} className={buttonClasses({ tone: 'primary' })}>
                  Propose the first pairing
                </Link>
              ) : null
            }
          >
            A pairing is proposed with what it can give and whose that would be. Once every party of its
            project has agreed, it stands here as a lane across the year, and what is seen in the room
            replaces what was expected.
          </EmptyState>
        )}
      </PageBody>
    </SplitView>
  );
}

function SeasonSkeleton() {
  return (
    <div role="status" aria-label="Loading the season" className="flex flex-col gap-4">
      <div className="flex gap-10">
        {[0, 1, 2].map((figure) => (
          <Skeleton key={figure} className="h-12 w-28" />
        ))}
      </div>
      {[0, 1, 2, 3, 4].map((lane) => (
        <Skeleton key={lane} className="h-20 w-full" />
      ))}
    </div>
  );
}
