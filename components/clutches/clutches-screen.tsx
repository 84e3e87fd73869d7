'use client';

import Link from 'next/link';
import { parseAsInteger, parseAsString, parseAsStringLiteral, useQueryStates } from 'nuqs';
import { sayDay } from '@/components/drawings/season-days';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { Badge } from '@/components/ui/badge';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { ErrorState } from '@/components/ui/error-state';
import { SearchInput } from '@/components/ui/search-input';
import { Select } from '@/components/ui/select';
import { Skeleton } from '@/components/ui/skeleton';
import { useClutches } from '@/lib/client/clutches';
import { useWorkspace } from '@/lib/client/workspace';
import type { ClutchRow } from '@/lib/contracts/clutch';

const states = ['incubating', 'hatching', 'hatched', 'lost'] as const;
const filters = {
  search: parseAsString.withDefault(''),
  state: parseAsStringLiteral(states),
  season: parseAsInteger,
  offset: parseAsInteger.withDefault(0),
};
const PAGE = 100;
export const clutchStateWords: Record<ClutchRow['state'], string> = {
  incubating: 'Incubating',
  hatching: 'Hatching due',
  hatched: 'Hatched',
  lost: 'No fertile eggs',
};

/** The clutches of the projects that the caller sees, newest first. */
export function ClutchesScreen() {
  const { slug, today } = useWorkspace();
  const [filter, setFilter] = useQueryStates(filters, { history: 'replace' });
  const { search, state, season, offset } = filter;
  const narrowed = search !== '' || state !== null || season !== null;
  const clutches = useClutches({
    ...(search ? { search } : {}),
    ...(state ? { state } : {}),
    ...(season ? { season } : {}),
    ...(offset ? { offset } : {}),
  });
  const year = Number(today.slice(0, 4));
  const rows = clutches.data?.rows ?? [];
  const total = clutches.data?.total ?? 0;
  return (
    <>
      <PageHeader
        title="Clutches"
        meta={clutches.data ? `${total} ${total === 1 ? 'clutch' : 'clutches'}` : null}
      >
        <div className="flex flex-wrap gap-2">
          <SearchInput
            label="Search clutches"
            className="w-64"
            value={search}
            onChange={(event) => void setFilter({ search: event.target.value || null, offset: null })}
          />
          <Select
            aria-label="State"
            className="w-44"
            placeholder="Any state"
            value={state ?? ''}
            onChange={({ target }) =>
              void setFilter({ state: states.find((one) => one === target.value) ?? null, offset: null })
            }
            options={states.map((value) => ({ value, label: clutchStateWords[value] }))}
          />
          <Select
            aria-label="Year of laying"
            className="w-36"
            placeholder="Any year"
            value={season ? String(season) : ''}
            onChange={({ target }) =>
              void setFilter({ season: target.value ? Number(target.value) : null, offset: null })
            }
            options={Array.from({ length: 8 }, (_, back) => ({
              value: String(year - back),
              label: `Laid ${year - back}`,
            }))}
          />
        </div>
      </PageHeader>
      <PageBody>
        {clutches.isPending ? (
          <div role="status" aria-label="Loading clutches" className="flex flex-col gap-2">
            {[0, 1, 2].map((row) => (
              <Skeleton key={row} className="h-16 w-full" />
            ))}
          </div>
        ) : clutches.isError && !clutches.data ? (
          <ErrorState onRetry={() => void clutches.refetch()} retrying={clutches.isFetching}>
            {clutches.error.problem.detail}
          </ErrorState>
        ) : rows.length > 0 ? (
          <ul className="divide-y divide-rule-2 overflow-hidden rounded-xl border border-rule bg-paper">
            {rows.map((row) => (
              <ClutchLine key={row.id} row={row} href={`/${slug}/clutches/${row.id}`} />
            ))}
          </ul>
        ) : narrowed ? (
          <EmptyState title="No clutch matches">
            Choose another state or year, or search for something else.
          </EmptyState>
        ) : (
          <EmptyState title="No clutches yet">
            Log a laying on the page of an agreed pairing, in Season.
          </EmptyState>
        )}
        {total > PAGE ? (
          <div className="mt-4 flex items-center gap-2">
            <Button
              disabled={offset === 0}
              onClick={() => void setFilter({ offset: Math.max(0, offset - PAGE) || null })}
            >
              Newer
            </Button>
            <Button
              disabled={offset + PAGE >= total}
              onClick={() => void setFilter({ offset: offset + PAGE })}
            >
              Older
            </Button>
          </div>
        ) : null}
      </PageBody>
    </>
  );
}

function ClutchLine({ row, href }: { row: ClutchRow; href: string }) {
  return (
    <li>
      <Link
        href={href}
        className="grid gap-x-4 gap-y-1 px-4 py-3 hover:bg-hover sm:grid-cols-[7rem_minmax(0,1fr)_minmax(0,14rem)_8rem]"
      >
        <span className="font-mono font-semibold">{row.code}</span>
        <span className="min-w-0">
          <span className="font-mono">
            {row.sire.code} × {row.dam.code}
          </span>
          <span className="block truncate text-sm text-ink-3">{row.project.name}</span>
        </span>
        <span className="text-sm text-ink-2">
          Laid {sayDay(row.laidOn)}, {row.eggs} eggs
          <span className="block">
            {row.hatchedOn
              ? `Hatched ${sayDay(row.hatchedOn)}, ${row.hatchlings} young`
              : row.pipExpected
                ? `Pips about ${sayDay(row.pipExpected.usual)}`
                : null}
          </span>
        </span>
        <span>
          <Badge>{clutchStateWords[row.state]}</Badge>
        </span>
      </Link>
    </li>
  );
}
