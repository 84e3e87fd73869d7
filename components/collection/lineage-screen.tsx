'use client';

import dynamic from 'next/dynamic';
import { useRouter } from 'next/navigation';
import { parseAsInteger, parseAsString, parseAsStringLiteral, useQueryStates } from 'nuqs';
import { useMemo, useState } from 'react';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import type { LineageAnimal } from '@/components/drawings/lineage-elements';
import { Button } from '@/components/ui/button';
import { Combobox } from '@/components/ui/combobox';
import { EmptyState } from '@/components/ui/empty-state';
import { ErrorState } from '@/components/ui/error-state';
import { Segmented } from '@/components/ui/segmented';
import { Select } from '@/components/ui/select';
import { Skeleton } from '@/components/ui/skeleton';
import { useLineage } from '@/lib/client/lineage';
import { useSpeciesList } from '@/lib/client/species';
import { useWorkspace } from '@/lib/client/workspace';
import type { AnimalId, LocusId, SpeciesId } from '@/lib/contracts/ids';
import type { Lineage } from '@/lib/contracts/lineage';
import { LineageChoice } from './lineage-choice';
import { LineageLegend } from './lineage-legend';
import { LineageTable } from './lineage-table';
import { sexWords } from './words';

const LineageGraph = dynamic(
  () => import('@/components/drawings/lineage-graph').then((module) => module.LineageGraph),
  {
    ssr: false,
    loading: () => <Skeleton className="h-full w-full rounded-xl" />,
  },
);

const params = {
  animal: parseAsString.withDefault(''),
  species: parseAsString.withDefault(''),
  up: parseAsInteger.withDefault(3),
  down: parseAsInteger.withDefault(2),
  locus: parseAsString.withDefault(''),
  view: parseAsStringLiteral(['graph', 'table'] as const).withDefault('graph'),
};

const generations = [0, 1, 2, 3, 4, 6, 10].map((number) => ({
  value: String(number),
  label: number === 10 ? 'all' : String(number),
}));

/** Who descends from whom: a graph in the standard symbols, and a table that says the same. */
export function LineageScreen() {
  const { slug } = useWorkspace();
  const router = useRouter();
  const [state, setState] = useQueryStates(params, { history: 'push' });
  const species = useSpeciesList().data?.species ?? [];
  const lineage = useLineage({
    animal: (state.animal || undefined) as AnimalId | undefined,
    species: (state.animal ? undefined : state.species || undefined) as SpeciesId | undefined,
    up: state.up >= 10 ? 30 : Math.max(0, state.up),
    down: state.down >= 10 ? 30 : Math.max(0, state.down),
    locus: (state.locus || undefined) as LocusId | undefined,
  });
  const { data } = lineage;
  const [focused, setFocused] = useState<string | null>(null);
  const nodes = useMemo(() => new Map(data?.nodes.map((node) => [node.key, node])), [data]);
  const animals = useMemo(() => (data?.nodes ?? []).map(toAnimal), [data]);
  const root = data?.root ? nodes.get(data.root) : undefined;
  const current = focused && nodes.has(focused) ? focused : (data?.root ?? null);
  const open = (key: string) => {
    if (nodes.get(key)?.shown) router.push(`/${slug}/collection/${key}`);
  };
  const hasChoice = Boolean(state.animal || state.species);

  return (
    <>
      <PageHeader
        title={root ? `Lineage of ${root.code}` : 'Lineage'}
        meta={data ? `${data.nodes.length} animals` : null}
        back={{
          href: state.animal ? `/${slug}/collection/${state.animal}` : `/${slug}/collection`,
          label: root?.code ?? 'Collection',
        }}
        actions={
          <Segmented
            label="Show as"
            value={state.view}
            onChange={(view) => void setState({ view })}
            options={[
              { value: 'graph', label: 'Graph' },
              { value: 'table', label: 'Table' },
            ]}
          />
        }
      />
      <PageBody>
        <div className="flex flex-wrap items-center gap-2" role="group" aria-label="What to show">
          <LineageChoice
            animal={state.animal}
            label={root?.code}
            onChange={(animal) => {
              setFocused(null);
              void setState({ animal, species: '' });
            }}
          />
          {species.length ? (
            <Select
              aria-label="A whole species"
              className="w-auto min-w-40"
              value={state.animal ? '' : state.species}
              placeholder="or a whole species"
              onChange={(event) => {
                setFocused(null);
                void setState({ species: event.target.value, animal: '', locus: '' });
              }}
              options={species.map(({ id, name }) => ({ value: id, label: name }))}
            />
          ) : null}
          {state.animal ? (
            <>
              <GenerationSelect
                label="Generations up"
                value={state.up}
                onChange={(up) => void setState({ up })}
              />
              <GenerationSelect
                label="Generations down"
                value={state.down}
                onChange={(down) => void setState({ down })}
              />
            </>
          ) : null}
          {data?.loci.length ? (
            <Select
              aria-label="Colour by a locus"
              className="w-auto min-w-40"
              value={state.locus}
              placeholder="Colour by a locus"
              onChange={(event) => void setState({ locus: event.target.value })}
              options={data.loci.map(({ id, name }) => ({ value: id, label: name }))}
            />
          ) : null}
          {data ? (
            <div className="w-48 max-sm:w-full">
              <Combobox
                aria-label="Find in the graph"
                placeholder="Find in the graph"
                value={null}
                options={data.nodes
                  .filter(({ shown }) => shown)
                  .map(({ key, code, name, description }) => ({
                    value: key,
                    label: code,
                    hint: name,
                    keywords: [description],
                  }))}
                onChange={(key) => setFocused(key)}
              />
            </div>
          ) : null}
        </div>
        {!hasChoice ? (
          <EmptyState title="Choose an animal">
            Its ancestors and descendants are drawn then. A whole species shows every animal that you may see.
          </EmptyState>
        ) : lineage.isError && !data ? (
          <ErrorState onRetry={() => void lineage.refetch()} retrying={lineage.isFetching}>
            {lineage.error.problem?.detail}
          </ErrorState>
        ) : !data ? (
          <Skeleton className="h-[60dvh] w-full rounded-xl" />
        ) : state.view === 'table' ? (
          <LineageTable lineage={data} focused={current} />
        ) : (
          <>
            <div className="h-[calc(100dvh-17.5rem)] min-h-96">
              <LineageGraph
                animals={animals}
                relatedMates={data.relatedMates}
                root={data.root}
                focused={current}
                onFocus={setFocused}
                onOpen={open}
                describe={(key) => sayNode(data, key)}
              />
            </div>
            <div className="flex flex-wrap items-center justify-between gap-3">
              <p className="text-base">
                {current ? sayNode(data, current) : 'Choose an animal in the graph.'}
              </p>
              {current && nodes.get(current)?.shown ? (
                <div className="flex gap-2">
                  {current !== data.root ? (
                    <Button size="sm" onClick={() => void setState({ animal: current, species: '' })}>
                      Make it the root
                    </Button>
                  ) : null}
                  <Button size="sm" onClick={() => open(current)}>
                    Open the record
                  </Button>
                </div>
              ) : null}
            </div>
            <LineageLegend locus={data.loci.find(({ id }) => id === state.locus)?.name ?? null} />
          </>
        )}
      </PageBody>
    </>
  );
}

function GenerationSelect({
  label,
  value,
  onChange,
}: {
  label: string;
  value: number;
  onChange: (value: number) => void;
}) {
  return (
    <label className="flex items-center gap-1.5 text-sm text-ink-2">
      {label}
      <Select
        className="w-20"
        value={String(Math.min(value, 10))}
        onChange={(event) => onChange(Number(event.target.value))}
        options={generations}
      />
    </label>
  );
}

function toAnimal(node: Lineage['nodes'][number]): LineageAnimal {
  const { key, shown, code, sex, fill, sire, dam, possibleSires, status } = node;
  return { key, shown, code, sex, fill, sire, dam, possibleSires, dead: status === 'died' };
}

/** One animal of the graph in words: what the symbol and its lines say. */
function sayNode(lineage: Lineage, key: string): string {
  const codes = new Map(
    lineage.nodes.map((node) => [node.key, node.shown ? node.code : 'one that is not shown to you']),
  );
  const node = lineage.nodes.find((one) => one.key === key);
  if (!node) return '';
  if (!node.shown) return 'An animal that is not shown to you.';
  const parents = [
    node.sire
      ? `sire ${codes.get(node.sire)}`
      : node.possibleSires.length
        ? `sire one of ${node.possibleSires.map((sire) => codes.get(sire)).join(', ')}`
        : null,
    node.dam ? `dam ${codes.get(node.dam)}` : null,
  ].filter(Boolean);
  return [node.code, sexWords[node.sex].toLowerCase(), node.description, ...parents]
    .filter(Boolean)
    .join(', ');
}
