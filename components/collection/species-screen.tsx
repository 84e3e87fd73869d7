'use client';

import { parseAsString, useQueryState } from 'nuqs';
import { useState } from 'react';
import { toast } from 'sonner';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { Badge } from '@/components/ui/badge';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { ErrorState } from '@/components/ui/error-state';
import { KeyValueList } from '@/components/ui/key-value-list';
import { Panel } from '@/components/ui/panel';
import { PlainTable } from '@/components/ui/plain-table';
import { Select } from '@/components/ui/select';
import { Skeleton } from '@/components/ui/skeleton';
import { useRemoveCombination, useRemoveLocus, useSpecies, useSpeciesList } from '@/lib/client/species';
import { useMay, useWorkspace } from '@/lib/client/workspace';
import type { LocusEntry } from '@/lib/contracts/locus';
import type { SpeciesDetail } from '@/lib/contracts/species-catalogue';
import { CombinationDialog } from './combination-dialog';
import { LocusForm } from './locus-form';
import { SpeciesForm } from './species-form';

const systems = {
  XY: 'XY: females two X, males X and Y',
  ZW: 'ZW: males two Z, females Z and W',
  TSD: 'by temperature',
  unknown: 'not known',
} as const;
type Open =
  { kind: 'species' | 'new-species' | 'combination' } | { kind: 'locus'; locus: LocusEntry | null } | null;

/** What is known of each species: its loci as data, what is usual for it, and where that is from. */
export function SpeciesScreen() {
  const { slug } = useWorkspace();
  const mayEdit = useMay('genetics.edit');
  const list = useSpeciesList();
  const species = list.data?.species ?? [];
  const [chosen, setChosen] = useQueryState('species', parseAsString.withDefault(''));
  const id = species.some((one) => one.id === chosen) ? chosen : (species[0]?.id ?? '');
  const detail = useSpecies(id);
  const [open, setOpen] = useState<Open>(null);
  return (
    <>
      <PageHeader
        title="Species and loci"
        back={{ href: `/${slug}/collection`, label: 'Collection' }}
        actions={
          mayEdit ? (
            <>
              <Button onClick={() => setOpen({ kind: 'new-species' })}>Add a species</Button>
              {detail.data ? (
                <Button tone="primary" onClick={() => setOpen({ kind: 'locus', locus: null })}>
                  Add a locus
                </Button>
              ) : null}
            </>
          ) : null
        }
      >
        {species.length > 1 ? (
          <Select
            aria-label="Species"
            className="w-64 max-w-full"
            value={id}
            onChange={(event) => void setChosen(event.target.value)}
            options={species.map((one) => ({ value: one.id, label: one.name }))}
          />
        ) : null}
      </PageHeader>
      <PageBody className="max-w-6xl">
        {list.isError ? (
          <ErrorState onRetry={() => void list.refetch()}>{list.error.problem?.detail}</ErrorState>
        ) : null}
        {list.data && species.length === 0 ? (
          <EmptyState
            title="No species yet"
            action={
              mayEdit ? (
                <Button onClick={() => setOpen({ kind: 'new-species' })}>Add the first species</Button>
              ) : null
            }
          >
            Animals belong to a species; its loci say what they can carry.
          </EmptyState>
        ) : null}
        {id && detail.isPending ? <Skeleton className="h-80 w-full" /> : null}
        {detail.data ? <SpeciesDetails species={detail.data} mayEdit={mayEdit} onOpen={setOpen} /> : null}
      </PageBody>
      {open?.kind === 'locus' && detail.data ? (
        <LocusForm species={detail.data} locus={open.locus} onClose={() => setOpen(null)} />
      ) : null}
      {open?.kind === 'combination' && detail.data ? (
        <CombinationDialog species={detail.data} onClose={() => setOpen(null)} />
      ) : null}
      {open?.kind === 'species' && detail.data ? (
        <SpeciesForm species={detail.data} onClose={() => setOpen(null)} />
      ) : null}
      {open?.kind === 'new-species' ? (
        <SpeciesForm
          species={null}
          onClose={() => setOpen(null)}
          onCreated={(made) => void setChosen(made)}
        />
      ) : null}
    </>
  );
}

function SpeciesDetails({
  species,
  mayEdit,
  onOpen,
}: {
  species: SpeciesDetail;
  mayEdit: boolean;
  onOpen: (open: Open) => void;
}) {
  const { slug } = useWorkspace();
  const removeLocus = useRemoveLocus();
  const removeCombination = useRemoveCombination();
  const nameOf = new Map(species.loci.map((locus) => [locus.id as string, locus.name]));
  const { profile } = species;
  const days = (span: { from: number; usual: number; to: number }) =>
    `${span.usual} d (${span.from}–${span.to})`;
  return (
    <>
      <Panel title="Loci" aside={`${species.loci.length} of ${species.name}`}>
        {species.loci.length === 0 ? (
          <p className="text-base text-ink-2">
            None yet. A locus says which alleles there are and what each pair of them looks like.
          </p>
        ) : (
          <PlainTable
            label="Loci"
            rows={species.loci}
            rowKey={(locus) => locus.id}
            columns={[
              {
                id: 'name',
                header: 'Locus',
                cell: (locus) => (
                  <span className="flex flex-col">
                    <strong>{locus.name}</strong>
                    <span className="text-sm text-ink-3">{locus.definition.dominance}</span>
                  </span>
                ),
              },
              {
                id: 'alleles',
                header: 'Alleles',
                mono: true,
                cell: (locus) => locus.definition.alleles.map(({ symbol }) => symbol).join(' '),
              },
              {
                id: 'place',
                header: 'Lies on',
                cell: (locus) =>
                  locus.definition.chromosome === 'autosomal' ? 'an autosome' : locus.definition.chromosome,
              },
              {
                id: 'looks',
                header: 'Looks',
                cell: (locus) =>
                  Object.entries(locus.definition.phenotypes)
                    .map(([genotype, look]) => `${genotype} ${look}`)
                    .join(' · '),
              },
              {
                id: 'harm',
                header: 'Harm',
                cell: (locus) => (
                  <span className="flex flex-col items-start gap-1">
                    {locus.definition.lethal.length ? (
                      <Badge tone="alarm">{locus.definition.lethal.join(', ')} dies in the egg</Badge>
                    ) : null}
                    {locus.definition.welfare.map((note) => (
                      <span key={note.text} className="text-sm">
                        <span className="font-semibold text-straw">{note.text}</span>{' '}
                        <span className="text-ink-3">({note.source})</span>
                      </span>
                    ))}
                    {locus.definition.lethal.length + locus.definition.welfare.length === 0 ? '–' : null}
                  </span>
                ),
              },
              {
                id: 'source',
                header: 'From',
                cell: (locus) => (
                  <span className="text-sm text-ink-2">
                    {locus.definition.source.citation}
                    {locus.definition.source.certainty === 'memory' ? ' (from memory)' : ''}
                  </span>
                ),
              },
              ...(mayEdit
                ? [
                    {
                      id: 'actions',
                      header: <span className="sr-only">Actions</span>,
                      cell: (locus: LocusEntry) => (
                        <span className="flex gap-1">
                          <Button
                            size="sm"
                            onClick={() => onOpen({ kind: 'locus', locus })}
                            aria-label={`Edit ${locus.name}`}
                          >
                            Edit
                          </Button>
                          {locus.recorded === 0 ? (
                            <Button
                              size="sm"
                              tone="plain"
                              busy={removeLocus.isPending}
                              aria-label={`Remove ${locus.name}`}
                              onClick={() =>
                                removeLocus.mutate(
                                  { params: { workspace: slug, locus: locus.id } },
                                  {
                                    onSuccess: () => toast.success(`${locus.name} removed`),
                                    onError: (error) => toast.error(error.problem.detail),
                                  },
                                )
                              }
                            >
                              Remove
                            </Button>
                          ) : null}
                        </span>
                      ),
                    },
                  ]
                : []),
            ]}
          />
        )}
      </Panel>
      <div className="grid gap-5 lg:grid-cols-2">
        <Panel
          title={species.name}
          aside={
            mayEdit ? (
              <Button size="sm" tone="link" onClick={() => onOpen({ kind: 'species' })}>
                Edit the species
              </Button>
            ) : null
          }
        >
          <KeyValueList
            ruled
            items={[
              { key: 'Scientific name', value: <i>{species.scientificName || '–'}</i> },
              { key: 'Sex is decided', value: systems[species.sexSystem] },
              { key: 'Codes begin with', value: species.codePrefix, mono: true },
              {
                key: 'Clutch',
                value: `${profile.clutchSize.usual} (${profile.clutchSize.from}–${profile.clutchSize.to})`,
                mono: true,
              },
              { key: 'Incubation', value: days(profile.intervals.incubation), mono: true },
              {
                key: 'Incubated at',
                value: `${profile.incubationCelsius.from}–${profile.incubationCelsius.to} °C`,
                mono: true,
              },
              {
                key: 'Breeding from',
                value: `♀ ${profile.breeding.femaleGrams} g, ${profile.breeding.femaleMonths} mo · ♂ ${profile.breeding.maleGrams} g, ${profile.breeding.maleMonths} mo`,
              },
            ]}
          />
          <p className="mt-2 text-sm text-ink-3">
            From:{' '}
            {[
              ...new Set([
                profile.clutchSize.source,
                profile.intervals.incubation.source,
                profile.incubationCelsius.source,
                profile.breeding.source,
              ]),
            ].join('; ')}
          </p>
        </Panel>
        <Panel
          title="Named combinations"
          aside={
            mayEdit && species.loci.length > 1 ? (
              <Button size="sm" tone="link" onClick={() => onOpen({ kind: 'combination' })}>
                Name one
              </Button>
            ) : null
          }
        >
          {species.combinations.length === 0 ? (
            <p className="text-base text-ink-2">
              None. A combination gives several looks together one name of the trade.
            </p>
          ) : null}
          <ul>
            {species.combinations.map((combination) => (
              <li
                key={combination.id}
                className="flex items-center justify-between gap-3 border-b border-rule-2 py-1.5 last:border-b-0"
              >
                <span>
                  <strong>{combination.name}</strong>{' '}
                  <span className="text-ink-2">
                    {Object.entries(combination.phenotypes)
                      .map(([locus, look]) =>
                        look === nameOf.get(locus)
                          ? look
                          : `${look} (${nameOf.get(locus) ?? 'removed locus'})`,
                      )
                      .join(' + ')}
                  </span>
                </span>
                {mayEdit ? (
                  <Button
                    size="sm"
                    tone="plain"
                    aria-label={`Remove the name ${combination.name}`}
                    onClick={() =>
                      removeCombination.mutate({ params: { workspace: slug, combination: combination.id } })
                    }
                  >
                    Remove
                  </Button>
                ) : null}
              </li>
            ))}
          </ul>
        </Panel>
      </div>
    </>
  );
}
