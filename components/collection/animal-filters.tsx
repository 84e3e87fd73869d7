'use client';

import { X } from 'lucide-react';
import { Button } from '@/components/ui/button';
import { SearchInput } from '@/components/ui/search-input';
import { Select } from '@/components/ui/select';
import { animalStatus } from '@/lib/contracts/animal';
import { useSpecies, useSpeciesList } from '@/lib/client/species';
import { useParties, useWorkspace } from '@/lib/client/workspace';
import { isFiltered, type ListState } from './list-params';
import { statusWords } from './words';

type Change = (change: Partial<ListState> | null) => void;

/** Search and filters above the list; all of them stand in the address. */
export function AnimalFilters({ state, onChange }: { state: ListState; onChange: Change }) {
  const workspace = useWorkspace();
  const parties = useParties();
  const species = useSpeciesList().data?.species ?? [];
  const chosenSpecies = state.species || (species.length === 1 ? (species[0]?.id ?? '') : '');
  const loci = useSpecies(chosenSpecies).data?.loci ?? [];
  const choice = (text: string) => ({ value: '', label: text });

  return (
    <div className="flex flex-wrap items-center gap-2" role="group" aria-label="Filters">
      <SearchInput
        label="Search code, name, looks"
        className="w-full sm:w-64"
        value={state.q}
        onChange={(event) => onChange({ q: event.target.value })}
      />
      <Select
        aria-label="Status"
        className="w-auto min-w-32"
        value={state.status}
        onChange={(event) => onChange({ status: event.target.value as ListState['status'] })}
        options={[
          { value: 'present', label: 'In the collection' },
          ...animalStatus.options.map((status) => ({ value: status, label: statusWords[status] })),
          { value: 'all', label: 'All, also gone' },
        ]}
      />
      {species.length > 1 ? (
        <Select
          aria-label="Species"
          className="w-auto min-w-32"
          value={state.species}
          onChange={(event) => onChange({ species: event.target.value, locus: '' })}
          options={[choice('Every species'), ...species.map(({ id, name }) => ({ value: id, label: name }))]}
        />
      ) : null}
      <Select
        aria-label="Sex"
        className="w-auto min-w-28"
        value={state.sex}
        onChange={(event) => onChange({ sex: event.target.value as ListState['sex'] })}
        options={[
          choice('Any sex'),
          { value: 'male', label: 'Males' },
          { value: 'female', label: 'Females' },
          { value: 'unknown', label: 'Unknown' },
        ]}
      />
      {workspace.projects.length > 0 ? (
        <Select
          aria-label="Project"
          className="w-auto min-w-32"
          value={state.project}
          onChange={(event) => onChange({ project: event.target.value })}
          options={[
            choice('Any project'),
            ...workspace.projects.map(({ id, name }) => ({ value: id, label: name })),
          ]}
        />
      ) : null}
      <Select
        aria-label="Holder"
        className="w-auto min-w-32"
        value={state.holder}
        onChange={(event) => onChange({ holder: event.target.value })}
        options={[
          choice('Any owner'),
          ...[...parties.values()].map(({ id, name }) => ({ value: id, label: name })),
        ]}
      />
      {loci.length > 0 ? (
        <>
          <Select
            aria-label="Locus"
            className="w-auto min-w-32"
            value={state.locus}
            onChange={(event) => onChange({ locus: event.target.value })}
            options={[choice('Any locus'), ...loci.map(({ id, name }) => ({ value: id, label: name }))]}
          />
          {state.locus ? (
            <Select
              aria-label="At the locus"
              className="w-auto min-w-32"
              value={state.at}
              onChange={(event) => onChange({ at: event.target.value as ListState['at'] })}
              options={[
                { value: 'carries', label: 'has a copy' },
                { value: 'shows', label: 'shows it' },
                { value: 'possible', label: 'may have a copy' },
                { value: 'free', label: 'has no copy' },
              ]}
            />
          ) : null}
        </>
      ) : null}
      {isFiltered(state) ? (
        <Button size="sm" tone="plain" icon={<X aria-hidden />} onClick={() => onChange(null)}>
          Clear filters
        </Button>
      ) : null}
    </div>
  );
}
