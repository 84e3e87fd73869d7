'use client';

import { Download, FileUp, GitFork, MoreHorizontal, Plus } from 'lucide-react';
import Link from 'next/link';
import { usePathname, useSearchParams } from 'next/navigation';
import { useQueryStates } from 'nuqs';
import { useMemo, useState } from 'react';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { SplitView } from '@/components/shell/split-view';
import { Button, buttonClasses } from '@/components/ui/button';
import { sortFromText, sortToText } from '@/components/ui/data-column';
import { DataTable } from '@/components/ui/data-table';
import { DropdownMenu, MenuLink } from '@/components/ui/dropdown-menu';
import { EmptyState } from '@/components/ui/empty-state';
import { ErrorState } from '@/components/ui/error-state';
import { IconButton } from '@/components/ui/icon-button';
import { useAnimals, useFileAddresses } from '@/lib/client/collection';
import { useSpeciesList } from '@/lib/client/species';
import { useMay, useWorkspace } from '@/lib/client/workspace';
import { animalSort } from '@/lib/contracts/animal-list';
import type { AnimalId } from '@/lib/contracts/ids';
import { animalColumns } from './animal-columns';
import { AnimalFilters } from './animal-filters';
import { AnimalPanel, AnimalPanelTitle, AnimalPanelFooter } from './animal-panel';
import { BulkActions } from './bulk-actions';
import { isFiltered, LIST_LIMIT, listParams, listQueryOf } from './list-params';
import { useShares } from './shares-of';
import { saySexes } from './words';

/** Rows from which on only those in sight are drawn. */
const VIRTUAL_FROM = 150;

/** The collection: animals in a list, the chosen one's record beside it. Which one is chosen stands in the path. */
export function CollectionScreen() {
  const workspace = useWorkspace();
  const home = `/${workspace.slug}/collection`;
  const search = useSearchParams().toString();
  const chosen = chosenIn(usePathname(), home);
  const [state, setState] = useQueryStates(listParams, { history: 'replace', throttleMs: 200 });
  const animals = useAnimals(listQueryOf(state));
  const [ticked, setTicked] = useState<string[]>([]);
  const shares = useShares();
  const files = useFileAddresses();
  const manySpecies = (useSpeciesList().data?.species.length ?? 0) > 1;
  const seesTubs = useMay('tub.see');
  const mayEdit = useMay('animal.edit');
  const mayImport = useMay('animal.import');

  const columns = useMemo(
    () =>
      animalColumns({
        shares,
        photo: (row) => (row.photoId ? files.photo(row.photoId, 'small') : null),
        today: workspace.today,
        manySpecies,
        seesTubs,
      }),
    [shares, files, workspace.today, manySpecies, seesTubs],
  );

  // The list stays as it is: only the address and the panel change, without asking the server for the page again.
  const open = (id: string | null) =>
    window.history.pushState(null, '', `${id ? `${home}/${id}` : home}${search ? `?${search}` : ''}`);

  const { rows = [], total = 0, sexes, ofAll = 0 } = animals.data ?? {};
  const isVirtual = rows.length > VIRTUAL_FROM;
  const { limit: _limit, ...exported } = listQueryOf(state);
  return (
    <>
      <PageHeader
        title="Collection"
        meta={
          sexes ? (
            <span>
              {total} {total === 1 ? 'animal' : 'animals'} ·{' '}
              <span className="font-mono" title="Males, females, unknown">
                {saySexes(sexes)}
              </span>
            </span>
          ) : null
        }
        actions={
          <>
            {mayEdit ? (
              <Link href={`${home}/new`} className={buttonClasses({ tone: 'primary' })}>
                <Plus aria-hidden /> Add an animal
              </Link>
            ) : null}
            <DropdownMenu
              label="More of the collection"
              trigger={
                <IconButton label="More" framed>
                  <MoreHorizontal aria-hidden />
                </IconButton>
              }
            >
              <MenuLink href={`${home}/lineage`} icon={<GitFork aria-hidden />}>
                Lineage
              </MenuLink>
              {mayImport ? (
                <MenuLink href={`${home}/import`} icon={<FileUp aria-hidden />}>
                  Import from CSV
                </MenuLink>
              ) : null}
              <MenuLink href={`${home}/species`}>Species and loci</MenuLink>
              {seesTubs ? <MenuLink href={`${home}/tubs`}>Tubs</MenuLink> : null}
            </DropdownMenu>
          </>
        }
      />
      <SplitView
        panel={chosen ? <AnimalPanel key={chosen} id={chosen} onClose={() => open(null)} /> : null}
        panelTitle={chosen ? <AnimalPanelTitle id={chosen} /> : null}
        footer={chosen ? <AnimalPanelFooter id={chosen} /> : undefined}
        onClose={() => open(null)}
      >
        <PageBody>
          <AnimalFilters state={state} onChange={(change) => void setState(change)} />
          {animals.isError && !animals.data ? (
            <ErrorState onRetry={() => void animals.refetch()} retrying={animals.isFetching}>
              {animals.error.problem?.detail}
            </ErrorState>
          ) : (
            <DataTable
              label="Animals"
              columns={columns}
              rows={rows}
              rowId={(row) => row.id}
              rowLabel={(row) => [row.code, row.name].filter(Boolean).join(' ')}
              sort={sortFromText(state.sort)}
              onSortChange={(sort) =>
                void setState({ sort: animalSort.safeParse(sortToText(sort)).data ?? null })
              }
              sortedByServer
              selected={ticked}
              onSelectedChange={setTicked}
              activeId={chosen}
              onRowOpen={(row) => open(row.id)}
              virtual={isVirtual}
              height={isVirtual ? 'calc(100dvh - 15rem)' : undefined}
              loading={animals.isPending}
              toolbar={
                ticked.length > 0 ? (
                  <BulkActions ids={ticked} onDone={() => setTicked([])} />
                ) : (
                  <span className="flex flex-wrap items-center gap-3 text-sm text-ink-3">
                    <Button asChild size="sm" tone="plain">
                      <a href={files.csv(exported)}>
                        <Download aria-hidden /> Export these {total}
                      </a>
                    </Button>
                    {total > rows.length
                      ? `The first ${LIST_LIMIT} of ${total} are shown; narrow the list to see the others.`
                      : null}
                  </span>
                )
              }
              empty={
                ofAll === 0 ? (
                  <NoAnimals home={home} mayEdit={mayEdit} mayImport={mayImport} />
                ) : (
                  <NoMatch onClear={isFiltered(state) ? () => void setState(null) : null} />
                )
              }
            />
          )}
        </PageBody>
      </SplitView>
    </>
  );
}

/** The animal that the path names under the collection. */
function chosenIn(path: string, home: string): AnimalId | null {
  const rest = path.startsWith(`${home}/`) ? path.slice(home.length + 1) : '';
  return /^[0-9a-f]{8}-[0-9a-f-]{27}$/i.test(rest) ? (rest as AnimalId) : null;
}

function NoAnimals({ home, mayEdit, mayImport }: { home: string; mayEdit: boolean; mayImport: boolean }) {
  return (
    <EmptyState
      title="No animals yet"
      action={
        <>
          {mayEdit ? (
            <Link href={`${home}/new`} className={buttonClasses({ tone: 'primary' })}>
              Add the first animal
            </Link>
          ) : null}
          {mayImport ? (
            <Link href={`${home}/import`} className={buttonClasses()}>
              Import a CSV file
            </Link>
          ) : null}
        </>
      }
    >
      Every animal stands here with what it looks like, what it carries and who owns which part of it. Begin
      with the parents: their young then follow from the clutches.
    </EmptyState>
  );
}

function NoMatch({ onClear }: { onClear: (() => void) | null }) {
  return (
    <EmptyState
      title="No animal matches"
      action={onClear ? <Button onClick={onClear}>Clear filters</Button> : null}
    >
      There are animals, but none is like this. Search looks into codes, names and what they look like and
      carry.
    </EmptyState>
  );
}
